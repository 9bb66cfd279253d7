import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import cdf from '@stdlib/stats-base-dists-t-cdf';
import quantile from '@stdlib/stats-base-dists-t-quantile';

/** Quantiles found so far: every unknown of a curve asks for the same few. */
const known = new Map<string, number>();
const KNOWN_AT_MOST = 500;

/** t(probability; ν), ν not rounded; the normal quantile when ν is infinite. */
export function tQuantile(probability: number, nu: number): number {
  const key = `${probability}/${nu}`;
  const found = known.get(key);
  if (found !== undefined) return found;
  const t = Number.isFinite(nu) ? quantile(probability, nu) : normalQuantile(probability, 0, 1);
  if (known.size >= KNOWN_AT_MOST) known.clear();
  known.set(key, t);
  return t;
}

/** Two-sided p of a t statistic. */
export function tTwoSidedP(t: number, nu: number): number {
  return 2 * cdf(-Math.abs(t), nu);
}
