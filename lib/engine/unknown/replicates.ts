import { type Absorbance, highestAsRead } from '../absorbance';
import type { FittedCurve } from '../fit-curve';
import { studentizedRangeQuantile } from '../stats/studentized-range';
import { type ConvertedReadings, mean } from './convert-readings';

/** Common practice; the model of this product fixes it. */
const AGREEMENT = 0.95;

export interface ReplicateJudgement {
  /** Standard deviation of one reading of this unknown that is used, per 10 mm. */
  readonly sd: number;
  /** True when it is the unknown's own, because the replicates disagree and it is the larger one. */
  readonly own: boolean;
  readonly disagree: boolean;
  /** Range and its limit; both per 10 mm, or as read when the method set the limit. */
  readonly range: number;
  readonly limit: number;
}

/**
 * Do the replicates of an unknown agree? Their range is compared with q(0.95; p, n - q)·s(y0), or with the limit
 * set in the method. When they disagree, the larger of s(y0) and their own standard deviation counts.
 * Readings above the absorbance limit are not judged: no number is made of them.
 *
 * @param curveSd s(y0) = s/√w(x0)
 */
export function judgeReplicates(
  curve: FittedCurve,
  readings: ConvertedReadings,
  curveSd: number,
): ReplicateJudgement {
  const { y, used, asRead } = readings;
  const p = y.length;
  const numbers = used.map((i) => (asRead[i] as Absorbance).value as number);
  const overLimit = asRead.some((item) => highestAsRead(item) > curve.request.absorbanceLimit);
  const agree = { sd: curveSd, own: false, disagree: false, range: 0, limit: 0 };
  if (p < 2 || overLimit) return agree;
  const set = curve.request.replicateLimit;
  const judged = set === undefined ? y : numbers;
  const range = Math.max(...judged) - Math.min(...judged);
  const limit = set ?? studentizedRangeQuantile(AGREEMENT, p, curve.fit.degreesOfFreedom) * curveSd;
  // A trace of rounding is no disagreement where the curve has no scatter at all.
  if (range <= limit + 1e-12) return { ...agree, range, limit };
  const centre = mean(y);
  const ownSd = Math.sqrt(y.reduce((sum, value) => sum + (value - centre) ** 2, 0) / (p - 1));
  return { sd: Math.max(curveSd, ownSd), own: ownSd > curveSd, disagree: true, range, limit };
}
