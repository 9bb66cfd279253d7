import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import cdf from '@stdlib/stats-base-dists-t-cdf';
import quantile from '@stdlib/stats-base-dists-t-quantile';

/** Quantiles found so far: every unknown of a curve asks for the same few. */
const known = new Map<string, number>();
const KNOWN_AT_MOST = 500;

/** From here on the first term in 1/ν has every digit; the package's quantile falls to 0 further out. */
const NEARLY_NORMAL = 1e8;

/**
 * t(probability; ν), ν not rounded; for large ν z + (z³ + z)/(4ν), so the normal quantile z when ν is infinite.
 *
 * @source Abramowitz & Stegun, 26.7.5, typed from memory; checked against quantiles of fifty digits
 */
export function tQuantile(probability: number, nu: number): number {
  const key = `${probability}/${nu}`;
  const found = known.get(key);
  if (found !== undefined) return found;
  const t = nu < NEARLY_NORMAL ? quantile(probability, nu) : nearlyNormal(probability, nu);
  if (known.size >= KNOWN_AT_MOST) known.clear();
  known.set(key, t);
  return t;
}

function nearlyNormal(probability: number, nu: number): number {
  const z = normalQuantile(probability, 0, 1);
  return z + (z ** 3 + z) / (4 * nu);
}

/** Two-sided p of a t statistic. */
export function tTwoSidedP(t: number, nu: number): number {
  return 2 * cdf(-Math.abs(t), nu);
}
