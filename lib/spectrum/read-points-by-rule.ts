import { EngineError } from '@/lib/engine/errors';
import { readSpectrum, type ReadingRule, type SpectrumReading } from '@/lib/engine/spectrum/read-spectrum';
import { LIMITS } from '@/lib/limits';
import type { GapReason } from '@/lib/readers/types';
import type { SpectrumGapReason, SpectrumPointsView, SpectrumReadingView } from '@/lib/views/spectrum';
import type { ReadingGap } from './reading-form';

const REASON_WORDS: Record<GapReason, string> = {
  aboveRange: 'above the range of the instrument',
  belowRange: 'below the range of the instrument',
  missing: 'no reading',
  unreadable: 'not a number',
};

/** A reading is stored as above range, missing or unreadable; "below range" is no number either. */
const AS_STORED: Record<GapReason, SpectrumGapReason> = {
  aboveRange: 'aboveRange',
  belowRange: 'unreadable',
  missing: 'missing',
  unreadable: 'unreadable',
};

function gapBehind(view: SpectrumPointsView, reading: SpectrumReading): ReadingGap | undefined {
  const empty = reading.points
    .filter((point) => point.absorbance === null)
    .map((point) => point.wavelengthNm);
  const gaps = view.gaps.filter((gap) => empty.includes(gap.wavelengthNm));
  // above range outweighs the rest: it must never look like a mere hole
  return gaps.find((gap) => gap.reason === 'aboveRange') ?? gaps[0];
}

function readingView(view: SpectrumPointsView, reading: SpectrumReading) {
  const gap = reading.value === null ? gapBehind(view, reading) : undefined;
  const above = (value: number | null | undefined) => (value ?? -Infinity) > LIMITS.absorbance;
  return {
    value: reading.value,
    gapReason: reading.value === null ? AS_STORED[gap?.reason ?? 'missing'] : null,
    gapText: gap ? gap.text || REASON_WORDS[gap.reason] : null,
    atNm: reading.atNm,
    mainValue: reading.mainValue,
    minusValue: reading.minusValue ?? null,
    absorbanceLimitExceeded:
      above(reading.mainValue) || above(reading.minusValue) || gap?.reason === 'aboveRange',
  };
}

function unread(error: string) {
  const nothing = {
    value: null,
    gapReason: null,
    gapText: null,
    atNm: null,
    mainValue: null,
    minusValue: null,
  };
  return { ...nothing, absorbanceLimitExceeded: false, error };
}

/**
 * One absorbance off one spectrum by a rule, as read: before blank and path length. A gap gives null with its
 * reason; a rule that cannot be followed on this spectrum gives its sentence in `error`.
 */
export function readPointsByRule(
  view: SpectrumPointsView,
  rule: ReadingRule,
  pathLengthMm: number | null,
): SpectrumReadingView {
  const who = { spectrumId: view.id, name: view.name, pathLengthMm };
  if (!view.isAbsorbance)
    return { ...who, ...unread('Its ordinate is not absorbance, so no absorbance can be read off it') };
  const gapReasons = Object.fromEntries(view.gaps.map((gap) => [gap.index, REASON_WORDS[gap.reason]]));
  try {
    return { ...who, ...readingView(view, readSpectrum({ ...view, gapReasons }, rule)) };
  } catch (error) {
    if (error instanceof EngineError) return { ...who, ...unread(error.message) };
    throw error;
  }
}
