import { EngineError } from '../errors';
import { type CurvePoint, NORMAL_PATH_MM } from '../prepare-points';

interface Level {
  readonly meanY: number;
  readonly variance: number;
}

/** Fewer readings say too little about a standard deviation to weight a fit by it. */
const READINGS_NEEDED = 4;

/**
 * Variances by level: s² of the level's readings (of the absorbance as read, so that the path enters once, with
 * the weight), or 1/w of the weights given.
 *
 * @throws EngineError REPLICATES_TOO_FEW, REPLICATES_WITHOUT_SPREAD
 */
export function levelVariances(
  points: readonly CurvePoint[],
  weighting: 'replicates' | 'given',
): { readonly ofPoints: readonly number[]; readonly byMean: readonly Level[] } {
  const groups = new Map<number, CurvePoint[]>();
  for (const point of points) {
    const group = groups.get(point.concentration);
    if (group) group.push(point);
    else groups.set(point.concentration, [point]);
  }
  const levels = new Map<number, Level>();
  for (const [concentration, group] of groups) {
    const meanY = group.reduce((sum, point) => sum + (point.y ?? 0), 0) / group.length;
    const variance =
      weighting === 'given'
        ? group.reduce((sum, point) => sum + ofGiven(point), 0) / group.length
        : replicateVariance(group, meanY, concentration);
    levels.set(concentration, { meanY, variance });
  }
  return {
    ofPoints: points.map((point) =>
      weighting === 'given' ? ofGiven(point) : (levels.get(point.concentration)?.variance ?? NaN),
    ),
    byMean: [...levels.values()].sort((a, b) => a.meanY - b.meanY),
  };
}

/** A blank level carries no weight of its own in a request: it takes 1. */
function ofGiven(point: CurvePoint): number {
  return 1 / (point.givenWeight ?? 1);
}

function replicateVariance(group: readonly CurvePoint[], meanY: number, concentration: number): number {
  if (group.length < READINGS_NEEDED) {
    throw new EngineError(
      'REPLICATES_TOO_FEW',
      `weights from replicates need at least ${READINGS_NEEDED} readings at every level, got ${group.length} at ${concentration}`,
      '/weighting',
    );
  }
  const squares = group.map(
    (point) => ((((point.y ?? 0) - meanY) * point.pathLengthMm) / NORMAL_PATH_MM) ** 2,
  );
  const variance = squares.reduce((sum, value) => sum + value, 0) / (group.length - 1);
  // Identical readings leave a rounding error of the mean, not an exact zero.
  if (variance <= (1e-14 * meanY) ** 2) {
    throw new EngineError(
      'REPLICATES_WITHOUT_SPREAD',
      `weights from replicates need readings that differ, got the same one throughout at ${concentration}`,
      '/weighting',
    );
  }
  return variance;
}

/** v read linearly in y between levels, constant outside them. */
export function interpolateLevels(levels: readonly Level[], y: number): number {
  const next = levels.findIndex((level) => level.meanY >= y);
  const high = levels[next] ?? levels.at(-1);
  const low = next > 0 ? levels[next - 1] : high;
  if (!high || !low) return NaN;
  if (low === high || next === -1) return high.variance;
  const part = (y - low.meanY) / (high.meanY - low.meanY);
  return low.variance + part * (high.variance - low.variance);
}
