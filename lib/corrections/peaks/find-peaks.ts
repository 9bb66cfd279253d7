import type { Points } from '@/lib/corrections/types';

export interface Peak {
  /** Vertex of the parabola through the highest point and its neighbours. */
  readonly positionNm: number;
  readonly height: number;
  /** How far the curve must come down from the top before it rises to a higher one, or ends. */
  readonly prominence: number;
  /** Full width at half the height over zero; null when the curve does not come down to it on both sides. */
  readonly halfWidthNm: number | null;
  /** The highest point itself. */
  readonly index: number;
}

/**
 * Peaks of a spectrum, highest first. A peak is a point with a number that is higher than its left neighbour and not
 * lower than its right one, both with numbers (of a plateau its first point, if the curve falls after it), and whose
 * prominence is at least `leastProminence`. The default 0.005 is some ten times the noise of an ordinary instrument.
 *
 * Position and height: the parabola through three points at λ0 < λ1 < λ2, in Newton's form
 * A0 + d01 (λ - λ0) + c (λ - λ0)(λ - λ1), has its vertex at (λ0 + λ1)/2 - d01/(2c). A symmetric band sampled
 * symmetrically gives its exact place; else the error falls with the third power of the spacing.
 *
 * Half-width: from crossing to crossing of half the height, linear between points. Over zero: subtract a baseline
 * first when there is one.
 */
export function findPeaks(points: Points, leastProminence = 0.005): readonly Peak[] {
  const { absorbance } = points;
  return absorbance
    .flatMap((_, i) => (isTop(absorbance, i) ? [peakAt(points, i)] : []))
    .filter(({ prominence }) => prominence >= leastProminence)
    .sort((a, b) => b.height - a.height || a.index - b.index);
}

type Ordinates = readonly (number | null | undefined)[];

function isTop(a: Ordinates, i: number): boolean {
  const [left, here, right] = [a[i - 1] ?? null, a[i] ?? null, a[i + 1] ?? null];
  if (left === null || here === null || right === null) return false;
  if (!(here > left && here >= right)) return false;
  let after = i + 1;
  while (a[after] === here) after += 1;
  const next = a[after] ?? null;
  return next !== null && next < here;
}

function peakAt(points: Points, i: number): Peak {
  const vertex = vertexAt(points, i);
  const top = points.absorbance[i] as number;
  const valley = Math.max(valleyOn(points.absorbance, i, -1), valleyOn(points.absorbance, i, 1));
  const half = vertex.height / 2;
  const low = crossing(points, i, -1, half);
  const high = crossing(points, i, 1, half);
  return {
    ...vertex,
    prominence: top - valley,
    halfWidthNm: low === null || high === null ? null : high - low,
    index: i,
  };
}

/** Vertex of the parabola through point i and its neighbours. */
export function vertexAt({ wavelengthNm, absorbance }: Points, i: number) {
  const [x0, x1, x2] = [i - 1, i, i + 1].map((k) => wavelengthNm[k] as number) as [number, number, number];
  const [a0, a1, a2] = [i - 1, i, i + 1].map((k) => absorbance[k] as number) as [number, number, number];
  const d01 = (a1 - a0) / (x1 - x0);
  const c = ((a2 - a1) / (x2 - x1) - d01) / (x2 - x0);
  if (c === 0) return { positionNm: x1, height: a1 };
  const positionNm = (x0 + x1) / 2 - d01 / (2 * c);
  return { positionNm, height: a0 + (positionNm - x0) * (d01 + c * (positionNm - x1)) };
}

/** The lowest number on one side before a higher one, a gap or the end. */
function valleyOn(a: Ordinates, top: number, step: 1 | -1): number {
  const height = a[top] as number;
  let lowest = height;
  for (let i = top + step; i >= 0 && i < a.length; i += step) {
    const here = a[i] ?? null;
    if (here === null || here > height) break;
    lowest = Math.min(lowest, here);
  }
  return lowest;
}

function crossing({ wavelengthNm, absorbance }: Points, top: number, step: 1 | -1, level: number) {
  for (let i = top + step; i >= 0 && i < absorbance.length; i += step) {
    const here = absorbance[i] ?? null;
    if (here === null) return null;
    if (here > level) continue;
    const before = absorbance[i - step] as number;
    const from = wavelengthNm[i - step] as number;
    return from + ((before - level) / (before - here)) * ((wavelengthNm[i] as number) - from);
  }
  return null;
}
