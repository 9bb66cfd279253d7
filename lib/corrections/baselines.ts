import { CorrectionError } from './errors';
import { inQuadrature, mapPoints, SAME_NM, scaled, uAt } from './point-math';
import { readingAt } from './reading-at';
import type { CorrectionWarning, Points, StepOutcome } from './types';
import { count, say, sayWithU, warnIf } from './words';

/** A straight line through two readings of a spectrum. */
export interface LineBaseline {
  readonly lowNm: number;
  readonly highNm: number;
  readonly valueAt: (nm: number) => number;
  /** From the u of the two readings; null when they carry none. */
  readonly uAt: (nm: number) => number | null;
}

/**
 * The line through the readings A1 at λ1 and A3 at λ3:
 *
 *     p = (λ - λ1)/(λ3 - λ1)      L = (1 - p) A1 + p A3      u² = (1 - p)² u1² + p² u3²
 *
 * @throws EngineError WAVELENGTH_OUTSIDE; CorrectionError WAVELENGTHS_NOT_IN_ORDER, READING_IS_GAP
 */
export function lineThrough(points: Points, lowNm: number, highNm: number): LineBaseline {
  if (!(highNm - lowNm > SAME_NM)) {
    throw new CorrectionError(
      'WAVELENGTHS_NOT_IN_ORDER',
      `a baseline needs two wavelengths in ascending order, got ${lowNm} and ${highNm} nm`,
    );
  }
  const low = readingAt(points, lowNm);
  const high = readingAt(points, highNm);
  const part = (nm: number) => (nm - lowNm) / (highNm - lowNm);
  return {
    lowNm,
    highNm,
    valueAt: (nm) => (1 - part(nm)) * low.value + part(nm) * high.value,
    uAt: (nm) => inQuadrature(scaled(low.u, 1 - part(nm)), scaled(high.u, part(nm))),
  };
}

/** Subtract the straight line through two readings from every point. Errors: as lineThrough. */
export function straightBaseline(points: Points, lowNm: number, highNm: number): StepOutcome {
  const line = lineThrough(points, lowNm, highNm);
  return {
    points: without(points, line),
    did: `Subtracted the straight line from ${say(line.valueAt(lowNm))} at ${lowNm} nm to ${say(line.valueAt(highNm))} at ${highNm} nm.`,
    warnings: outsideWarning(points, line),
  };
}

/**
 * Three-point baseline (Morton and Stubbs), at λ1 < λ2 < λ3:
 *
 *     A = A2 - [A1 (λ3 - λ2) + A3 (λ2 - λ1)] / (λ3 - λ1)
 *
 * The line is taken off every point, so that the corrected spectrum reads A at λ2. It is right when the background
 * is straight between λ1 and λ3 and the analyte's own absorbances there were allowed for in the method.
 *
 * @throws EngineError WAVELENGTH_OUTSIDE; CorrectionError WAVELENGTHS_NOT_IN_ORDER, READING_IS_GAP
 */
export function threePointBaseline(
  points: Points,
  lowNm: number,
  middleNm: number,
  highNm: number,
): StepOutcome {
  if (!(lowNm < middleNm && middleNm < highNm)) {
    throw new CorrectionError(
      'WAVELENGTHS_NOT_IN_ORDER',
      `a three-point baseline needs three ascending wavelengths, got ${lowNm}, ${middleNm} and ${highNm} nm`,
    );
  }
  const line = lineThrough(points, lowNm, highNm);
  const middle = readingAt(points, middleNm);
  const value = middle.value - line.valueAt(middleNm);
  const u = inQuadrature(middle.u, line.uAt(middleNm));
  return {
    points: without(points, line),
    did: `Three-point baseline at ${lowNm}, ${middleNm} and ${highNm} nm: ${say(middle.value)} at ${middleNm} nm became ${u === null ? say(value) : sayWithU(value, u)}.`,
    warnings: outsideWarning(points, line),
    found: [
      { name: `corrected absorbance at ${middleNm} nm`, value, unit: '', ...(u === null ? {} : { u }) },
    ],
  };
}

function without(points: Points, line: LineBaseline): Points {
  return mapPoints(points, (a, nm, i) => ({
    a: a - line.valueAt(nm),
    u: inQuadrature(uAt(points, i), line.uAt(nm)),
  }));
}

function outsideWarning(
  { wavelengthNm }: Points,
  { lowNm, highNm }: LineBaseline,
): readonly CorrectionWarning[] {
  const outside = wavelengthNm.filter((nm) => nm < lowNm - SAME_NM || nm > highNm + SAME_NM).length;
  return warnIf(
    outside > 0,
    'BASELINE_EXTRAPOLATED',
    `${count(outside, 'point')} of ${wavelengthNm.length} lie outside ${lowNm} to ${highNm} nm, where the line is extrapolated. Read only between them.`,
  );
}
