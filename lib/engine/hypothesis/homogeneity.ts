import type { FittedCurve } from '../fit-curve';
import type { TestAnswer } from '../types';
import { fTestAnswer } from './f-test';
import { levelsOf } from './levels';

/**
 * Do the two ends of the curve scatter alike? F = larger over smaller variance of the highest and the lowest level,
 * at 99 %. Under weights the variances are the weighted ones, so the test says whether the weights settled it.
 *
 * @source ISO 8466-1, in our own words
 */
export function homogeneity({ data }: FittedCurve): TestAnswer {
  const levels = levelsOf(data);
  const ends = [levels[0], levels.at(-1)].flatMap((level) => (level ? [level] : []));
  if (ends.some((level) => level.readings < 2)) {
    return {
      reason: 'Comparing variances needs two readings or more at the lowest and at the highest level.',
    };
  }
  const variances = ends.map(({ squares, readings }) => ({
    variance: squares / (readings - 1),
    df: readings - 1,
  }));
  const [smaller, larger] = variances.sort((a, b) => a.variance - b.variance);
  const size = data.y.reduce((sum, y, i) => sum + (data.w[i] ?? 0) * y * y, 0);
  if (!smaller || !larger || smaller.variance <= 1e-24 * size) {
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
