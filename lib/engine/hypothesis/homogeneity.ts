import type { FittedCurve } from '../fit-curve';
import type { TestAnswer } from '../types';
import { fTestAnswer } from './f-test';
import { type Level, noScatter } from './levels';

/**
 * Do the two ends of the curve scatter alike? F = larger over smaller variance of the highest and the lowest level,
 * at 99 %. Under weights the variances are the weighted ones, so the test says whether the weights settled it.
 *
 * @source ISO 8466-1, in our own words
 */
export function homogeneity({ data }: FittedCurve, levels: readonly Level[]): TestAnswer {
  // A curve has two levels at least.
  const ends = [levels[0] as Level, levels.at(-1) as Level];
  if (ends.some((level) => level.readings < 2)) {
    return {
      reason: 'Comparing variances needs two readings or more at the lowest and at the highest level.',
    };
  }
  const [smaller, larger] = ends
    .map(({ squares, readings }) => ({ variance: squares / (readings - 1), df: readings - 1 }))
    .sort((a, b) => a.variance - b.variance) as [End, End];
  if (smaller.variance <= noScatter(data)) {
    return { reason: 'Comparing variances needs readings that differ at both ends: some are identical.' };
  }
  return fTestAnswer({
    statistic: larger.variance / smaller.variance,
    df1: larger.df,
    df2: smaller.df,
    level: 0.99,
    stands: 'The two ends of the curve scatter alike',
    falls: 'The two ends of the curve scatter differently',
  });
}

interface End {
  readonly variance: number;
  readonly df: number;
}
