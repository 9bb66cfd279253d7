import type { FittedCurve } from '../fit-curve';
import { fitLine } from '../regression/fit-line';
import { fitQuadratic } from '../regression/fit-quadratic';
import type { TestAnswer } from '../types';
import { fTestAnswer } from './f-test';
import { type Level, noScatter } from './levels';

/**
 * Mandel's test: does a quadratic leave less scatter than a straight line, by more than chance?
 *
 *     F = [(n - 2) s²_line - (n - 3) s²_quadratic] / s²_quadratic        against F(0.99; 1, n - 3)
 *
 * Both fits take the curve's points and weights. It is made for every model, since a bend is a bend.
 *
 * @source Mandel (1964), as used in ISO 8466-1, in our own words
 */
export function mandel({ data, fit }: FittedCurve, levels: readonly Level[]): TestAnswer {
  const n = data.x.length;
  if (n < 4) return { reason: `Mandel's test needs at least four readings, got ${n}.` };
  if (levels.length < 3) return { reason: "Mandel's test needs at least three levels." };
  const line = (fit.model === 'linear' ? fit : fitLine(data)).residualSquares;
  const quadratic = (fit.model === 'quadratic' ? fit : fitQuadratic(data)).residualSquares;
  if (quadratic <= noScatter(data))
    return { reason: "Mandel's test needs scatter: a quadratic runs through every point." };
  return fTestAnswer({
    statistic: Math.max(0, line - quadratic) / (quadratic / (n - 3)),
    df1: 1,
    df2: n - 3,
    level: 0.99,
    stands: 'A straight line is as good as a quadratic',
    falls: 'The readings bend: a quadratic fits better than a straight line',
  });
}
