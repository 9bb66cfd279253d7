import { mean } from '../unknown/convert-readings';
import { studentizedRangeQuantile } from '../stats/studentized-range';

/** The uncertainty of a mean of readings without a curve to lend its scatter. */
export interface MeanReading {
  readonly mean: number;
  /** Of the mean. */
  readonly u: number;
  /** Standard deviation of one reading that was used; null when nothing is known of it. */
  readonly sd: number | null;
  readonly degreesOfFreedom: number;
  readonly apart: { readonly range: number; readonly limit: number; readonly own: boolean } | null;
}

/** Degrees of freedom that stand for a standard deviation known beforehand in the table of studentized ranges. */
const KNOWN = 1e5;
const AGREEMENT = 0.95;

/**
 * u of a mean of p readings: s/√p with their own standard deviation and ν = p - 1; with a standard deviation known
 * beforehand σ/√p and ν infinite, unless the range exceeds q(0.95; p, ∞)·σ, when the larger of both counts. One
 * reading of which nothing is known has u = 0 (and a flag elsewhere).
 *
 * @param known σ, in the units of the values
 * @source JCGM 100:2008 (GUM), 4.2 and 4.3
 */
export function meanReading(values: readonly number[], known: number | undefined): MeanReading {
  const p = values.length;
  const centre = mean(values);
  const own = p < 2 ? 0 : Math.sqrt(values.reduce((sum, value) => sum + (value - centre) ** 2, 0) / (p - 1));
  const estimated = { mean: centre, u: own / Math.sqrt(p), sd: own, degreesOfFreedom: p - 1, apart: null };
  if (known === undefined) return p < 2 ? { ...estimated, sd: null, degreesOfFreedom: Infinity } : estimated;
  const stated = { ...estimated, u: known / Math.sqrt(p), sd: known, degreesOfFreedom: Infinity };
  if (p < 2) return stated;
  const range = Math.max(...values) - Math.min(...values);
  const limit = studentizedRangeQuantile(AGREEMENT, p, KNOWN) * known;
  if (range <= limit) return stated;
  const apart = { range, limit, own: own > known };
  return { ...(own > known ? estimated : stated), apart };
}
