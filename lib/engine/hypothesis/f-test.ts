import { significantText } from '../../format/round';
import { fQuantile, fUpperP } from '../stats/f-distribution';
import type { TestAnswer } from '../types';

export interface FTest {
  readonly statistic: number;
  readonly df1: number;
  readonly df2: number;
  /** Level of confidence the verdict is given at. */
  readonly level: number;
  readonly stands: string;
  readonly falls: string;
}

/** The answer of a one-sided F test: falls when p < 1 - level. */
export function fTestAnswer({ statistic, df1, df2, level, stands, falls }: FTest): TestAnswer {
  const p = fUpperP(statistic, df1, df2);
  const passed = p >= 1 - level;
  const critical = fQuantile(level, df1, df2);
  const numbers = `F ${significantText(statistic, 4)}, limit ${significantText(critical, 4)} at ${level * 100} %, p ${significantText(p, 2)}`;
  return { statistic, df1, df2, p, critical, passed, verdict: `${passed ? stands : falls} (${numbers}).` };
}
