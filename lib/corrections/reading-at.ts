import { readSpectrum, type ReadingRule } from '@/lib/engine/spectrum/read-spectrum';
import { CorrectionError } from './errors';
import { ontoGrid } from './interpolate';
import { SAME_NM, uAt } from './point-math';
import type { Points } from './types';

export interface UsedReading {
  readonly value: number;
  /** From the u of the points it rests on; null when they carry none. */
  readonly u: number | null;
  readonly atNm: number;
}

/**
 * A reading that a correction rests on, by the engine's rules; it must have a number. A mean of n points has
 * u² = Σu²/n², an interpolated reading that of interpolation, a point its own.
 *
 * @throws EngineError as readSpectrum; CorrectionError READING_IS_GAP
 */
export function readingBy(points: Points, rule: ReadingRule): UsedReading {
  const { value, atNm, reason, points: used } = readSpectrum(points, rule);
  if (value === null) {
    throw new CorrectionError('READING_IS_GAP', `there is no reading at ${atNm} nm: ${reason}`);
  }
  if (points.u === undefined) return { value, atNm, u: null };
  if (rule.kind === 'interpolated') {
    return { value, atNm, u: uAt(ontoGrid(points, [atNm]), 0) };
  }
  const us = used.map(({ wavelengthNm }) =>
    uAt(
      points,
      points.wavelengthNm.findIndex((nm) => Math.abs(nm - wavelengthNm) <= SAME_NM),
    ),
  );
  if (us.some((u) => u === null)) return { value, atNm, u: null };
  return { value, atNm, u: Math.hypot(...(us as number[])) / us.length };
}

/** The reading at one wavelength, interpolated. */
export function readingAt(points: Points, wavelengthNm: number): UsedReading {
  return readingBy(points, { kind: 'interpolated', wavelengthNm });
}
