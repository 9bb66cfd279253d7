import type { FittedCurve } from '../fit-curve';
import { coefficientOf, slopeAt } from '../regression/fit';
import type { LimitAnswer } from '../types';
import { blankScatter } from './blank-scatter';
import { currieLimits } from './currie';
import { din32645Limits, iso11843Limits } from './from-calibration';
import { ichLimits } from './ich';

/** Both risks of ISO 11843-2 unless asked otherwise. */
export const USUAL_RISKS = { alpha: 0.05, beta: 0.05 } as const;

/**
 * The family of limits of a curve, in the measured solution, each with its name, what it decides and what it rests
 * on. They answer different questions; a result is judged by the critical value alone.
 *
 * @param readings K, the number of readings of an unknown
 */
export function detectionLimits(curve: FittedCurve, readings: number): readonly LimitAnswer[] {
  const { fit } = curve;
  const slope = Math.abs(slopeAt(fit, 0));
  const blank = blankScatter(curve, slope);
  return [
    ...ichLimits(fit.residualSd, slope, 'the residual standard deviation'),
    ...(fit.model === 'proportional' ? [] : ichLimits(coefficientOf(fit, 0).u, slope, INTERCEPT)),
    ...(blank ? [...ichOfBlank(blank), ...currieLimits(blank)] : []),
    ...iso11843Limits(curve, readings, USUAL_RISKS),
    ...din32645Limits(curve, readings),
  ];
}

export const INTERCEPT = 'the standard uncertainty of the intercept';

export function ichOfBlank({ sd, slope, n, of }: NonNullable<ReturnType<typeof blankScatter>>) {
  return ichLimits(sd, slope, `the standard deviation of ${n} ${of}`);
}
