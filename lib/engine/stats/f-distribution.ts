import cdf from '@stdlib/stats-base-dists-f-cdf';
import quantile from '@stdlib/stats-base-dists-f-quantile';

/** P(F > f), taken from the reciprocal so that small p keep their digits. */
export function fUpperP(f: number, df1: number, df2: number): number {
  if (f <= 0) return 1;
  return cdf(1 / f, df2, df1);
}

/** Quantiles found so far: a curve asks for the same few again and again. */
const known = new Map<string, number>();
const KNOWN_AT_MOST = 500;

export function fQuantile(probability: number, df1: number, df2: number): number {
  const key = `${probability}/${df1}/${df2}`;
  const found = known.get(key);
  if (found !== undefined) return found;
  const f = quantile(probability, df1, df2);
  if (known.size >= KNOWN_AT_MOST) known.clear();
  known.set(key, f);
  return f;
}
