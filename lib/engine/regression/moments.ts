import type { FitData } from './fit';

/** Weighted means and the sums of squares about them. */
export interface Moments {
  readonly n: number;
  /** Σ w. */
  readonly weight: number;
  readonly meanX: number;
  readonly meanY: number;
  readonly sxx: number;
  readonly sxy: number;
  readonly syy: number;
  /** True when every weight is 1. */
  readonly unweighted: boolean;
}

/**
 * Means first, then everything about them, in two passes over bare arrays (a fit spends its time here). Means are
 * taken about the first value, so that a large offset of x or y costs no digits.
 *
 *     x̄ = x₁ + Σ w (x - x₁) / Σ w      Sxx = Σ w (x - x̄)²      Sxy = Σ w (x - x̄)(y - ȳ)      Syy = Σ w (y - ȳ)²
 */
export function momentsOf({ x, y, w }: FitData): Moments {
  const n = x.length;
  const [x1 = 0] = x;
  const [y1 = 0] = y;
  let weight = 0;
  let sumX = 0;
  let sumY = 0;
  let unweighted = true;
  for (let i = 0; i < n; i += 1) {
    const wi = w[i] as number;
    if (wi !== 1) unweighted = false;
    weight += wi;
    sumX += wi * ((x[i] as number) - x1);
    sumY += wi * ((y[i] as number) - y1);
  }
  const meanX = x1 + sumX / weight;
  const meanY = y1 + sumY / weight;
  let sxx = 0;
  let sxy = 0;
  let syy = 0;
  for (let i = 0; i < n; i += 1) {
    const a = (x[i] as number) - meanX;
    const b = (y[i] as number) - meanY;
    const wa = (w[i] as number) * a;
    sxx += wa * a;
    sxy += wa * b;
    syy += (w[i] as number) * b * b;
  }
  return { n, weight, meanX, meanY, sxx, sxy, syy, unweighted };
}
