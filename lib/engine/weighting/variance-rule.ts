import type { CurvePoint } from '../prepare-points';
import type { Fit } from '../regression/fit';
import type { CurveRequest } from '../types';
import { fittedVariance, varianceByFunction } from './fitted-variance';
import { interpolateLevels, levelVariances } from './level-variance';

/** The variance v of one reading, up to a factor, at the points and at an unknown. */
export interface VarianceRule {
  readonly ofPoints: readonly number[];
  /** @param y the unknown's mean, per 10 mm; `givenWeight` the weight it carries under "given" */
  at(x: number, y: number, givenWeight?: number): number;
}

/**
 * What a weighting says about the variance of one reading (measurement model, section 3).
 *
 * @param first the unweighted fit, for the weightings whose variance depends on ŷ
 */
export function varianceRule(
  request: CurveRequest,
  points: readonly CurvePoint[],
  first: () => Fit,
): VarianceRule {
  switch (request.weighting) {
    case 'none':
      return { ofPoints: points.map(() => 1), at: () => 1 };
    case '1/x':
      return powerOfX(points, 1);
    case '1/x2':
      return powerOfX(points, 2);
    case '1/y':
      return fittedVariance(points, first(), 1);
    case '1/y2':
      return fittedVariance(points, first(), 2);
    case 'varianceFunction':
      return varianceByFunction(points, first(), functionOf(request));
    case 'replicates':
    case 'given': {
      const levels = levelVariances(points, request.weighting);
      return {
        ofPoints: levels.ofPoints,
        at: (_x, y, givenWeight) =>
          request.weighting === 'given' && givenWeight !== undefined
            ? 1 / givenWeight
            : interpolateLevels(levels.byMean, y),
      };
    }
  }
}

/** The checks of the request refuse this weighting without its function. */
function functionOf(request: CurveRequest) {
  return request.varianceFunction as NonNullable<CurveRequest['varianceFunction']>;
}

/** v = x or x². Below the lowest fitted standard its variance holds: v = 0 would make an unknown certain. */
function powerOfX(points: readonly CurvePoint[], power: 1 | 2): VarianceRule {
  const lowest = Math.min(...points.map((point) => point.concentration));
  return {
    ofPoints: points.map((point) => point.concentration ** power),
    at: (x) => Math.max(x, lowest) ** power,
  };
}
