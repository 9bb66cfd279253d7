import { EngineError } from '../errors';
import { mean } from '../math';
import { type CurvePoint, responseOf } from '../prepare-points';
import { pointsByLevel, scatterOf } from './replicate-scatter';

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
  const variances = new Map<CurvePoint, number>();
  const byMean = [...pointsByLevel(points)].map(([concentration, group]): Level => {
    const level = weighting === 'given' ? givenLevel(group) : replicateLevel(group, concentration);
    for (const point of group) variances.set(point, weighting === 'given' ? ofGiven(point) : level.variance);
    return level;
  });
  return {
    ofPoints: points.map((point) => variances.get(point) as number),
    byMean: byMean.sort((a, b) => a.meanY - b.meanY),
  };
}

function givenLevel(group: readonly CurvePoint[]): Level {
  return { meanY: mean(group.map(responseOf)), variance: mean(group.map(ofGiven)) };
}

/** A blank level carries no weight of its own in a request: it takes 1. */
function ofGiven(point: CurvePoint): number {
  return 1 / (point.givenWeight ?? 1);
}

function replicateLevel(group: readonly CurvePoint[], concentration: number): Level {
  if (group.length < READINGS_NEEDED) {
    throw new EngineError(
      'REPLICATES_TOO_FEW',
      `weights from replicates need at least ${READINGS_NEEDED} readings at every level, got ${group.length} at ${concentration}`,
      '/weighting',
    );
  }
  const scatter = scatterOf(group);
  if (scatter.variance === 0) {
    throw new EngineError(
      'REPLICATES_WITHOUT_SPREAD',
      `weights from replicates need readings that differ, got the same one throughout at ${concentration}`,
      '/weighting',
    );
  }
  return scatter;
}

/** v read linearly in y between levels, constant outside them. */
export function interpolateLevels(levels: readonly Level[], y: number): number {
  const next = levels.findIndex((level) => level.meanY >= y);
  // A curve has two levels at least; above them all the last one holds.
  const high = (levels[next] ?? levels.at(-1)) as Level;
  const low = levels[next - 1];
  if (low === undefined || next === -1) return high.variance;
  const part = (y - low.meanY) / (high.meanY - low.meanY);
  return low.variance + part * (high.variance - low.variance);
}
