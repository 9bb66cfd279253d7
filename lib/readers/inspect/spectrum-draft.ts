import type { Gap, ReaderWarning, SignalKind, XUnit } from '../types';

/** A spectrum as a reader decoded it, before it is looked at for what a person should know. */
export interface SpectrumDraft {
  readonly name: string;
  readonly x: Float64Array;
  readonly xUnit: XUnit;
  readonly xUnitGuessed: boolean;
  readonly y: Float64Array;
  readonly signal: SignalKind;
  readonly signalGuessed: boolean;
  readonly signalText: string;
  readonly signalScale: number;
  readonly gaps: readonly Gap[];
  readonly block: number;
  readonly line: number;
  readonly header: Readonly<Record<string, string>>;
  readonly warnings: readonly ReaderWarning[];
}

export const UNIT_WORDS: Record<XUnit, string> = {
  nm: 'nm',
  '1/cm': '1/cm',
  um: 'µm',
  angstrom: 'Å',
  eV: 'eV',
};

/** The points of a draft at the places given, in that order; gaps move with them. */
export function pickPoints(draft: SpectrumDraft, places: ArrayLike<number>): SpectrumDraft {
  const n = places.length;
  const x = new Float64Array(n);
  const y = new Float64Array(n);
  const byPlace = new Map(draft.gaps.map((gap) => [gap.index, gap]));
  const gaps: Gap[] = [];
  for (let i = 0; i < n; i++) {
    const from = places[i] ?? 0;
    x[i] = draft.x[from] ?? NaN;
    y[i] = draft.y[from] ?? NaN;
    const gap = byPlace.get(from);
    if (gap) gaps.push({ ...gap, index: i });
  }
  return { ...draft, x, y, gaps };
}

/** A draft without what overflowed: such an ordinate is a gap, a point at such an x has no place and is left out. */
export function finiteDraft(draft: SpectrumDraft): SpectrumDraft {
  const placed = draft.x.every(Number.isFinite);
  const kept = placed
    ? draft
    : pickPoints(
        draft,
        Array.from(draft.x.keys()).filter((i) => Number.isFinite(draft.x[i])),
      );
  const lost = draft.x.length - kept.x.length;
  const message = `${lost} ${lost === 1 ? 'point has' : 'points have'} an x that is no finite number and ${lost === 1 ? 'was' : 'were'} left out`;
  const warnings =
    lost === 0 ? kept.warnings : [...kept.warnings, { code: 'ROW_WITHOUT_X', message, value: lost }];
  const known = new Set(kept.gaps.map((gap) => gap.index));
  const more: Gap[] = [];
  kept.y.forEach((value, index) => {
    if (!Number.isFinite(value) && !known.has(index))
      more.push({ index, reason: 'unreadable', text: String(value) });
  });
  if (more.length === 0) return { ...kept, warnings };
  const y = kept.y.map((value) => (Number.isFinite(value) ? value : NaN));
  const gaps = [...kept.gaps, ...more].sort((a, b) => a.index - b.index);
  return { ...kept, y, gaps, warnings };
}
