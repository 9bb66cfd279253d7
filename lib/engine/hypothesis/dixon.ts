import type { Outlier } from './grubbs';

/**
 * Critical values of Dixon's Q (r10) for 3 to 10 values, two-tailed.
 *
 * @source Rorabacher, Anal. Chem. 63 (1991) 139
 */
const CRITICAL: Readonly<Record<number, readonly number[]>> = {
  0.95: [0.97, 0.829, 0.71, 0.625, 0.568, 0.526, 0.493, 0.466],
  0.99: [0.994, 0.926, 0.821, 0.74, 0.68, 0.634, 0.598, 0.568],
};

const FEWEST = 3;

/** Null where the table has no value: outside 3 to 10 values. */
export function dixonCritical(n: number, confidence: 0.95 | 0.99): number | null {
  return CRITICAL[confidence]?.[n - FEWEST] ?? null;
}

/**
 * Dixon's test of the value with the widest gap to its neighbour, Q = gap / range. The caller's values are not all
 * equal. Null where the table has no critical value.
 */
export function dixon(values: readonly number[], confidence: 0.95 | 0.99): Outlier | null {
  const critical = dixonCritical(values.length, confidence);
  if (critical === null) return null;
  const order = values.map((value, at) => ({ value, at })).sort((a, b) => a.value - b.value);
  // There are three values at least.
  const [low, second] = order as [Ranked, Ranked];
  const [beforeLast, high] = order.slice(-2) as [Ranked, Ranked];
  const range = high.value - low.value;
  const gapLow = second.value - low.value;
  const gapHigh = high.value - beforeLast.value;
  return gapLow > gapHigh
    ? { at: low.at, statistic: gapLow / range, critical }
    : { at: high.at, statistic: gapHigh / range, critical };
}

interface Ranked {
  readonly value: number;
  readonly at: number;
}
