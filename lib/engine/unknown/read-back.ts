import { invert } from '../calibration/invert';
import type { FittedCurve } from '../fit-curve';
import { fittedVarianceAt, slopeAt } from '../regression/fit';
import type { UnknownRequest } from '../types';
import type { ConvertedReadings } from './convert-readings';
import { judgeReplicates, type ReplicateJudgement } from './replicates';

/** A concentration in the measured solution with the two parts of its uncertainty. */
export interface ReadBack {
  readonly c: number;
  /** f'(c). */
  readonly slope: number;
  readonly weight: number;
  readonly replicates: ReplicateJudgement;
  /** u²(y0) of the mean. */
  readonly varianceY0: number;
  readonly uReadings: number;
  readonly uCurve: number;
  readonly u: number;
}

/**
 * Read a mean absorbance back through the curve:
 *
 *     f(c) = ȳ0        u²(c) = [u²(y0) + gᵀVg] / f'(c)²        u²(y0) = s² / (p w(c))
 *
 * Unweighted line: u(c) = (s/b) √(1/p + 1/n + (c - x̄)²/Sxx). Null when the curve never has that value.
 *
 * @source EURACHEM/CITAC Guide CG 4, example A5 and E.4; ISO 8466-1 and 8466-2
 */
export function readBack(
  curve: FittedCurve,
  readings: ConvertedReadings,
  unknown: UnknownRequest,
): ReadBack | null {
  const { fit } = curve;
  const y0 = readings.meanY;
  const c = y0 === null ? null : invert(fit, y0);
  if (y0 === null || c === null) return null;
  const slope = slopeAt(fit, c);
  const weight = curve.weightAt(c, y0, readings.pathLengthMm, unknown.weight);
  const replicates = judgeReplicates(curve, readings, fit.residualSd / Math.sqrt(weight));
  const varianceY0 = replicates.sd ** 2 / readings.y.length;
  const uReadings = Math.sqrt(varianceY0) / Math.abs(slope);
  const uCurve = Math.sqrt(fittedVarianceAt(fit, c)) / Math.abs(slope);
  return { c, slope, weight, replicates, varianceY0, uReadings, uCurve, u: Math.hypot(uReadings, uCurve) };
}
