import { mean } from '../math';
import { type CurvePoint, NORMAL_PATH_MM, responseOf } from '../prepare-points';
import type { LevelScatter } from './learn-variance-function';

/** Variances below this part of the squared mean are what rounding leaves of identical readings. */
const IDENTICAL = 1e-14;

/** The readings of the fit by concentration, in the order they come. */
export function pointsByLevel(points: readonly CurvePoint[]): ReadonlyMap<number, readonly CurvePoint[]> {
  const groups = new Map<number, CurvePoint[]>();
  for (const point of points) {
    const group = groups.get(point.concentration);
    if (group) group.push(point);
    else groups.set(point.concentration, [point]);
  }
  return groups;
}

/**
 * Mean per 10 mm and variance of the readings of one level. The variance is that of the absorbance as read, so that
 * the path enters once, with the weight. Zero for readings that are all the same. There are two readings at least.
 */
export function scatterOf(group: readonly CurvePoint[]): LevelScatter {
  const meanY = mean(group.map(responseOf));
  const squares = group.reduce(
    (sum, point) => sum + (((responseOf(point) - meanY) * point.pathLengthMm) / NORMAL_PATH_MM) ** 2,
    0,
  );
  const degreesOfFreedom = group.length - 1;
  const variance = squares / degreesOfFreedom;
  return { meanY, variance: variance <= (IDENTICAL * meanY) ** 2 ? 0 : variance, degreesOfFreedom };
}

/** The scatter of every level that has two readings or more. */
export function replicateScatter(points: readonly CurvePoint[]): readonly LevelScatter[] {
  return [...pointsByLevel(points).values()].filter((group) => group.length > 1).map(scatterOf);
}
