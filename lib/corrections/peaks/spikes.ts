import type { Points } from '@/lib/corrections/types';
import { bend } from './noise';

export interface Spike {
  readonly atNm: number;
  readonly index: number;
  /** How far the point stands above (or below) the middle of its two neighbours. */
  readonly height: number;
  /** The height in robust standard deviations of its surroundings. */
  readonly times: number;
}

/** Points on either side that say what is usual here. */
const REACH = 10;
const FEWEST_AROUND = 6;
const LIMIT = 8;
/** sd of a normal distribution per median absolute deviation. */
const MAD_TO_SD = 1.4826;
/** A step of printed digits is no spike. */
const SMALLEST_SD = 1e-4;

/**
 * Spikes: single points that stand out of their neighbours,
 *
 *     h_i = A_i - (A_(i-1) + A_(i+1))/2        |h_i| > 8 × max(1.4826 MAD, 0.0001)
 *
 * MAD: median of |h| of the 10 points on either side, without i and its two neighbours, which a spike bends the
 * other way. Of points side by side only the largest counts. A real band is many points wide and bends its
 * surroundings as much, so it is not taken for one.
 */
export function findSpikes({ wavelengthNm, absorbance }: Points): readonly Spike[] {
  const heights = absorbance.map((_, i) => {
    const d = bend(absorbance, i);
    return d === null ? null : -d / 2;
  });
  return heights.flatMap((height, index) => {
    if (height === null || !largestHere(heights, index)) return [];
    const around = usual(heights, index);
    if (around === null) return [];
    const times = Math.abs(height) / Math.max(MAD_TO_SD * around, SMALLEST_SD);
    return times > LIMIT ? [{ atNm: wavelengthNm[index] as number, index, height, times }] : [];
  });
}

function largestHere(heights: readonly (number | null)[], i: number): boolean {
  const size = (k: number) => Math.abs(heights[k] ?? 0);
  return size(i) >= size(i - 1) && size(i) > size(i + 1);
}

function usual(heights: readonly (number | null)[], at: number): number | null {
  const sizes = heights
    .slice(Math.max(0, at - REACH), at + REACH + 1)
    .flatMap((height, k) => {
      const i = Math.max(0, at - REACH) + k;
      return height === null || Math.abs(i - at) <= 1 ? [] : [Math.abs(height)];
    })
    .sort((a, b) => a - b);
  if (sizes.length < FEWEST_AROUND) return null;
  const middle = sizes.length / 2;
  return ((sizes[Math.ceil(middle) - 1] as number) + (sizes[Math.floor(middle)] as number)) / 2;
}
