import type { FittedCurve } from '../fit-curve';
import { fittedVarianceAt, slopeAt, valueAt } from '../regression/fit';
import { tQuantile } from '../stats/student-t';

/** Probability that a blank stays below the critical value. */
export const DETECTION_CONFIDENCE = 0.95;

export interface CriticalValue {
  readonly value: number;
  /** Weight of one reading at x = 0. */
  readonly weight: number;
  readonly t: number;
  /** K. */
  readonly readings: number;
}

/**
 * Critical value of the concentration: the smallest result that can be told from a blank.
 *
 *     x_C = t(0.95; ν) (s/b) √(1/K + 1/n + x̄²/Sxx)
 *
 * and for weights and other curves the same with the general variance at x = 0, s²/(K w(0)) + gᵀVg over f'(0)².
 *
 * @param readings K, the number of readings of the unknown
 * @source ISO 11843-2, in our own words
 */
export function criticalValue(curve: FittedCurve, readings: number, pathLengthMm: number): CriticalValue {
  const { fit } = curve;
  const weight = curve.weightAt(0, valueAt(fit, 0), pathLengthMm);
  const variance = fit.residualSd ** 2 / (readings * weight) + fittedVarianceAt(fit, 0);
  const t = tQuantile(DETECTION_CONFIDENCE, fit.degreesOfFreedom);
  return { value: (t * Math.sqrt(variance)) / Math.abs(slopeAt(fit, 0)), weight, t, readings };
}
