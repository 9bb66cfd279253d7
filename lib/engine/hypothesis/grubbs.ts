import { mean, std } from '../math';
import { tQuantile, tTwoSidedP } from '../stats/student-t';

export interface Outlier {
  /** Position among the values. */
  readonly at: number;
  readonly statistic: number;
  readonly critical: number;
}

/**
 * Critical value of the largest of n standardised residuals with ν degrees of freedom, two-sided.
 *
 *     r = √(ν t² / (ν - 1 + t²))        t at 1 - α/(2n) with ν - 1 degrees of freedom
 *
 * For a mean (ν = n - 1, and G = r √((n - 1)/n)) it is Grubbs' critical value; for a fitted curve ν = n - q. A bound
 * (Bonferroni's), exact where it matters.
 *
 * @source Grubbs (1950), ISO 5725-2; for regression Srikantan, Sankhya A 23 (1961) 251; in our own words
 */
export function largestResidualCritical(n: number, nu: number, confidence: number): number {
  const t = tQuantile(1 - (1 - confidence) / (2 * n), nu - 1);
  return Math.sqrt((nu * t * t) / (nu - 1 + t * t));
}

/** p of the largest of n standardised residuals r, two-sided, as a bound: n·P(|t| > r √((ν - 1)/(ν - r²))). */
export function largestResidualP(r: number, n: number, nu: number): number {
  // |r| cannot exceed √ν, and reaches it when a single reading holds all the scatter.
  if (r * r >= nu) return 0;
  return Math.min(1, n * tTwoSidedP(r * Math.sqrt((nu - 1) / (nu - r * r)), nu - 1));
}

/**
 * Grubbs' critical value G(n), two-sided, one outlier:
 *
 *     G = (n - 1)/√n · √(t² / (n - 2 + t²))        t at 1 - α/(2n) with n - 2 degrees of freedom
 */
export function grubbsCritical(n: number, confidence: number): number {
  return largestResidualCritical(n, n - 1, confidence) * Math.sqrt((n - 1) / n);
}

/** Grubbs' test of the value furthest from the mean, G = |y - ȳ| / s. The caller has three values or more, not equal. */
export function grubbs(values: readonly number[], confidence: number): Outlier {
  const middle = mean([...values]);
  const far = values.map((value) => Math.abs(value - middle));
  const largest = Math.max(...far);
  return {
    at: far.indexOf(largest),
    statistic: largest / Number(std([...values])),
    critical: grubbsCritical(values.length, confidence),
  };
}
