import type { FittedCurve } from '../fit-curve';
import type { TestAnswer } from '../types';
import { fTestAnswer } from './f-test';
import { type Level, noScatter } from './levels';

/**
 * Lack of fit: is the scatter of the levels about the curve more than that of replicates within them?
 *
 *     F = [(SS_res - SS_pe)/(m - q)] / [SS_pe/(n - m)]        m levels, at 95 %
 *
 * @source IUPAC 1998 (Danzer, Currie), in our own words; checked on the data of CG 4 A5 with scipy
 */
export function lackOfFit({ fit, data }: FittedCurve, levels: readonly Level[]): TestAnswer {
  const df1 = levels.length - fit.q;
  const df2 = fit.n - levels.length;
  if (df2 <= 0)
    return { reason: 'Lack of fit needs replicates: two readings or more at one level at least.' };
  const pure = levels.reduce((sum, level) => sum + level.squares, 0);
  if (pure <= noScatter(data))
    return { reason: 'Lack of fit needs replicates that differ: these are identical.' };
  return fTestAnswer({
    statistic: Math.max(0, fit.residualSquares - pure) / df1 / (pure / df2),
    df1,
    df2,
    level: 0.95,
    stands: 'The levels lie about the curve no further than their replicates scatter',
    falls: 'The levels lie further from the curve than their replicates scatter',
  });
}
