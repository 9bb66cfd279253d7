import type { FittedCurve } from '../fit-curve';
import { mean, median } from '../math';
import type { TestAnswer } from '../types';
import { fTestAnswer } from './f-test';
import { type Level, noScatter } from './levels';

/** With two readings both lie equally far from their median, and the test has nothing to compare. */
const READINGS_NEEDED = 3;

/**
 * Do the levels scatter alike? Levene's test in the form of Brown and Forsythe, an analysis of variance of the
 * distances z = √w |y - median of the level|, at 95 %. Distances from medians are little moved by one stray reading
 * and by readings that are not normally distributed.
 *
 *     F = [Σ n_i (z̄_i - z̄)² / (k - 1)] / [Σ Σ (z_ij - z̄_i)² / (N - k)]
 *
 * Levels of fewer than three readings take no part.
 *
 * @source Brown and Forsythe, J. Am. Stat. Assoc. 69 (1974) 364; checked with scipy
 */
export function levene({ data }: FittedCurve, levels: readonly Level[]): TestAnswer {
  const { y, w } = data;
  const groups = levels
    .filter((level) => level.readings >= READINGS_NEEDED)
    .map(({ members }) => {
      const middle = median(members.map((i) => y[i] as number));
      return members.map((i) => Math.sqrt(w[i] as number) * Math.abs((y[i] as number) - middle));
    });
  if (groups.length < 2)
    return { reason: "Levene's test needs three readings or more at two levels at least." };
  const all = groups.flat();
  const grand = mean(all);
  const df1 = groups.length - 1;
  const df2 = all.length - groups.length;
  let between = 0;
  let within = 0;
  for (const group of groups) {
    const own = mean(group);
    between += group.length * (own - grand) ** 2;
    for (const z of group) within += (z - own) ** 2;
  }
  if (within <= noScatter(data))
    return { reason: "Levene's test needs readings that differ: these are identical." };
  return fTestAnswer({
    statistic: between / df1 / (within / df2),
    df1,
    df2,
    level: 0.95,
    stands: 'The levels scatter alike, judged about their medians',
    falls: 'The levels scatter differently, judged about their medians',
  });
}
