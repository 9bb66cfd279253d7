import { coefficientOf } from '@/lib/engine/regression/fit';
import { fitLine } from '@/lib/engine/regression/fit-line';
import { equalWeights, inQuadrature, mapPoints, numbersWithin, uAt } from './point-math';
import { readingAt, readingBy } from './reading-at';
import type { CorrectionWarning, Points, StepOutcome } from './types';
import { say, sayWithU, warnIf } from './words';

/** A slope across the window counts when it is this many standard uncertainties, and moves A by this much. */
const SLOPE_T = 3;
const SLOPE_CHANGE = 0.001;

/**
 * Offset by the reading at a wavelength where the analyte does not absorb: A = A(λ) - A(λ0), u² = u(λ)² + u(λ0)².
 * u is only carried when the points bring one: one reading does not show its own spread.
 *
 * @throws EngineError WAVELENGTH_OUTSIDE; CorrectionError READING_IS_GAP
 */
export function offsetAt(points: Points, nm: number): StepOutcome {
  const { value, u } = readingAt(points, nm);
  return taken(points, value, u, `Subtracted the reading at ${nm} nm, ${say(value)}, from every point.`, []);
}

/**
 * Offset by the mean of a window:
 *
 *     A = A(λ) - m       m = Σ A_i / n       u(m) = s / √n       s² = Σ (A_i - m)² / (n - 1)
 *
 * A mean that slopes is no offset: warned when the slope of a line through the window is over 3 times its standard
 * uncertainty and A changes by over 0.001 across it.
 *
 * @throws EngineError BAND_EMPTY, BAND_REVERSED, WAVELENGTH_OUTSIDE; CorrectionError READING_IS_GAP
 */
export function offsetByWindow(points: Points, fromNm: number, toNm: number): StepOutcome {
  const { value } = readingBy(points, {
    kind: 'bandMean',
    wavelengthNm: (fromNm + toNm) / 2,
    halfWidthNm: (toNm - fromNm) / 2,
  });
  const { x, y } = numbersWithin(points, fromNm, toNm);
  const n = y.length;
  const squares = y.reduce((sum, a) => sum + (a - value) ** 2, 0);
  const u = n > 1 ? Math.sqrt(squares / (n - 1) / n) : null;
  const mean = u === null ? say(value) : sayWithU(value, u);
  const did = `Subtracted the mean of ${n} points from ${fromNm} to ${toNm} nm, ${mean}, from every point.`;
  return taken(points, value, u, did, slopeWarning(x, y));
}

function taken(
  points: Points,
  value: number,
  u: number | null,
  did: string,
  warnings: readonly CorrectionWarning[],
): StepOutcome {
  return {
    points: mapPoints(points, (a, _, i) => ({ a: a - value, u: inQuadrature(uAt(points, i), u) })),
    did,
    warnings,
    found: [{ name: 'offset', value, unit: '', ...(u === null ? {} : { u }) }],
  };
}

function slopeWarning(x: readonly number[], y: readonly number[]): readonly CorrectionWarning[] {
  if (x.length < 4) return [];
  const slope = coefficientOf(fitLine({ x, y, w: equalWeights(x) }), 1);
  const change = slope.value * ((x.at(-1) as number) - (x[0] as number));
  return warnIf(
    Math.abs(slope.value) > SLOPE_T * slope.u && Math.abs(change) > SLOPE_CHANGE,
    'OFFSET_SLOPES',
    `The absorbance changes by ${say(change, 2)} across the window (limit ${SLOPE_CHANGE}): something absorbs or scatters there. Choose another window, or a scatter or line baseline.`,
  );
}
