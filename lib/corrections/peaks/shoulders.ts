import { type Filter, filterRuns } from '@/lib/corrections/savitzky-golay';
import { numbersWithin } from '@/lib/corrections/point-math';
import type { Points } from '@/lib/corrections/types';
import { vertexAt } from './find-peaks';

export interface Shoulder {
  readonly positionNm: number;
  /** Of the spectrum there, not smoothed, at the nearest point. */
  readonly absorbance: number;
  /** A'' there, in absorbance per nm², below zero. */
  readonly curvature: number;
}

/** Curvature below this part of the spectrum's strongest is no shoulder. */
const LEAST_PART = 0.05;

/**
 * Shoulders: bands that make no top of their own. A shoulder stands where the second derivative A'' (Savitzky-Golay)
 * has a local minimum below zero and A has no local maximum in the stretch about it where A'' stays below zero. Its
 * depth must be 5 % of the deepest A'' of the spectrum or more. Place: the vertex of the parabola through the minimum
 * of A'' and its neighbours. It is not the middle of the hidden band: a steep neighbour pushes it away.
 *
 * @throws CorrectionError as the filter: STEP_UNEVEN, FILTER_IMPOSSIBLE, WINDOW_TOO_NARROW
 */
export function findShoulders(
  points: Points,
  filter: Filter = { windowPoints: 9, polynomial: 4 },
): readonly Shoulder[] {
  const second = filterRuns(points, filter, 2).filtered;
  const curvature = second.absorbance;
  const deepest = numbersWithin(second, -Infinity, Infinity).y.reduce((low, c) => Math.min(low, c), 0);
  return curvature.flatMap((c, i) => {
    if (c === null || !(c <= LEAST_PART * deepest && c < 0) || !isMinimum(curvature, i)) return [];
    if (hasTop(points.absorbance, curvature, i)) return [];
    const { positionNm, height } = vertexAt(second, i);
    return [{ positionNm, absorbance: points.absorbance[i] as number, curvature: height }];
  });
}

type Ordinates = readonly (number | null)[];

function isMinimum(c: Ordinates, i: number): boolean {
  const [left, here, right] = [c[i - 1] ?? null, c[i] as number, c[i + 1] ?? null];
  return left !== null && right !== null && here < left && here <= right;
}

/**
 * Whether A has a maximum where A'' belongs to this minimum: out to where A'' is no more below zero, or rises to a
 * ridge between two minima.
 */
function hasTop(a: Ordinates, c: Ordinates, at: number): boolean {
  const edge = (step: 1 | -1) => {
    let i = at;
    while ((c[i + step] ?? 0) < 0 && (c[i + step] as number) >= (c[i] as number)) i += step;
    return i;
  };
  for (let i = edge(-1); i <= edge(1); i += 1) {
    const [left, here, right] = [a[i - 1] ?? null, a[i] as number, a[i + 1] ?? null];
    if (left !== null && right !== null && here >= left && here >= right) return true;
  }
  return false;
}
