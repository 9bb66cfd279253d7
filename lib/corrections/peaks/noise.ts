import type { Points } from '@/lib/corrections/types';

export interface Noise {
  /** Standard deviation of one point; null when no three points stand together. */
  readonly sd: number | null;
  /** Second differences it rests on. */
  readonly n: number;
}

/**
 * Noise from second differences: d_i = A_(i-1) - 2 A_i + A_(i+1) has the variance 6 σ² for independent errors, so
 *
 *     σ = √(Σ d² / n) / √6
 *
 * A straight line adds nothing to it; a bend adds A'' Δλ², so in a sharp band it is an upper bound. Evenly spaced
 * points are taken for granted. Points next to a gap are left out.
 */
export function noiseOf({ absorbance }: Points): Noise {
  let n = 0;
  let squares = 0;
  for (let i = 1; i < absorbance.length - 1; i += 1) {
    const d = bend(absorbance, i);
    if (d === null) continue;
    n += 1;
    squares += d * d;
  }
  return { sd: n === 0 ? null : Math.sqrt(squares / n / 6), n };
}

/** A_(i-1) - 2 A_i + A_(i+1), or null beside a gap or an end. */
export function bend(absorbance: readonly (number | null)[], i: number): number | null {
  const [left, here, right] = [absorbance[i - 1] ?? null, absorbance[i] ?? null, absorbance[i + 1] ?? null];
  return left === null || here === null || right === null ? null : left - 2 * here + right;
}
