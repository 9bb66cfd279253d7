import { significantText } from '../../format/round';
import type { FittedCurve } from '../fit-curve';
import { fQuantile, fUpperP } from '../stats/f-distribution';
import type { TestAnswer } from '../types';
import { type Level, noScatter } from './levels';

const CONFIDENCE = 0.95;

/**
 * Critical value of Cochran's C for the variances of k levels of n readings each.
 *
 *     C = 1 / (1 + (k - 1) / F(1 - α/k; n - 1, (k - 1)(n - 1)))
 *
 * @source ISO 5725-2, in our own words
 */
export function cochranCritical(k: number, n: number, confidence: number): number {
  const f = fQuantile(1 - (1 - confidence) / k, n - 1, (k - 1) * (n - 1));
  return 1 / (1 + (k - 1) / f);
}

/**
 * Does one level scatter more than all the others? C = s²_max / Σ s², at 95 %. Under weights the variances are the
 * weighted ones. p is the bound k·P(F > (k - 1) C / (1 - C)), exact where C > 1/2.
 *
 * @source Cochran (1941); ISO 5725-2, in our own words
 */
export function cochran({ data, request }: FittedCurve, levels: readonly Level[]): TestAnswer {
  const k = levels.length;
  // A curve has two levels at least.
  const n = (levels[0] as Level).readings;
  if (n < 2 || levels.some((level) => level.readings !== n)) {
    return {
      reason: "Cochran's test needs the same number of readings, two or more, at every level.",
    };
  }
  const total = levels.reduce((sum, level) => sum + level.squares, 0);
  if (total <= noScatter(data))
    return { reason: "Cochran's test needs readings that differ: these are identical." };
  const widest = levels.reduce((most, level) => (level.squares > most.squares ? level : most));
  const statistic = widest.squares / total;
  const critical = cochranCritical(k, n, CONFIDENCE);
  const df1 = n - 1;
  const df2 = (k - 1) * df1;
  const p = statistic >= 1 ? 0 : Math.min(1, k * fUpperP(((k - 1) * statistic) / (1 - statistic), df1, df2));
  const passed = statistic <= critical;
  const where = `${significantText(widest.concentration, 6)} ${request.unit}`;
  const words = passed
    ? 'No level scatters more than the others'
    : `The level ${where} scatters more than all the others`;
  const numbers = `C ${significantText(statistic, 4)}, limit ${significantText(critical, 4)} at 95 %, p ${significantText(p, 2)}`;
  return { statistic, df1, df2, p, critical, passed, verdict: `${words} (${numbers}).` };
}
