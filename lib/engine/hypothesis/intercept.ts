import { significantText } from '../../format/round';
import type { FittedCurve } from '../fit-curve';
import { coefficientOf } from '../regression/fit';
import { fitLine } from '../regression/fit-line';
import { tTwoSidedP } from '../stats/student-t';
import type { TestAnswer } from '../types';
import { coverageFactor } from '../uncertainty/expand';
import type { Level } from './levels';

/**
 * Is the intercept told from zero? t = a / u(a) against t(1 - (1 - confidence)/2; ν). A line through zero has none
 * of its own, so the free line of the same points and weights is asked.
 */
export function interceptTest({ fit, data, request }: FittedCurve, levels: readonly Level[]): TestAnswer {
  if (fit.model === 'proportional' && levels.length < 3) {
    return { reason: 'The intercept can be tested with three levels or more.' };
  }
  const free = fit.model === 'proportional' ? fitLine(data) : fit;
  const { value: a, u } = coefficientOf(free, 0);
  if (!(u > 0)) return { reason: 'The intercept cannot be tested: the readings lie on the curve exactly.' };
  const statistic = a / u;
  const df1 = free.degreesOfFreedom;
  const critical = coverageFactor(request.confidence, df1);
  const p = tTwoSidedP(statistic, df1);
  const passed = Math.abs(statistic) <= critical;
  const words = passed ? 'The intercept cannot be told from zero' : 'The intercept differs from zero';
  const numbers = `t ${significantText(statistic, 4)}, limit ${significantText(critical, 4)}, p ${significantText(p, 2)}`;
  return { statistic, df1, p, critical, passed, verdict: `${words} (${numbers}).` };
}
