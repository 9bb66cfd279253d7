import { quadraticForm } from './regression/fit';
import type { CurveResult } from './types';
import { coverageFactor } from './uncertainty/expand';

export interface BandPoint {
  readonly concentration: number;
  readonly fitted: number;
  /** Ends of the confidence interval of the curve itself, at the curve's level of confidence. */
  readonly low: number;
  readonly high: number;
}

/**
 * The curve and its confidence band for drawing: f(x) ± t √(gᵀVg), g = (1, x) or (1, x, x²), pointwise.
 *
 * @param curve a curve as it was answered, from the live calculation or from storage
 */
export function curveBand(curve: CurveResult, concentrations: readonly number[]): readonly BandPoint[] {
  const t = coverageFactor(curve.confidence, curve.degreesOfFreedom);
  const [a, b, d] = [curve.intercept.value, curve.slope.value, curve.quadratic?.value ?? 0];
  return concentrations.map((concentration) => {
    const g = [1, concentration, concentration ** 2].slice(0, curve.covariance.length);
    const fitted = a + concentration * (b + concentration * d);
    const variance = quadraticForm(curve.covariance, g);
    const half = t * Math.sqrt(Math.max(0, variance));
    return { concentration, fitted, low: fitted - half, high: fitted + half };
  });
}
