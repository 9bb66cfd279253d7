import { EngineError } from '../errors';
import type { CurvePoint } from '../prepare-points';
import { type Fit, valueAt } from '../regression/fit';
import type { VarianceRule } from './variance-rule';

/**
 * v = ŷ or ŷ², with ŷ from the unweighted fit (the second of two passes uses these weights). For an unknown below
 * the lowest fitted value, that value's variance holds, as the lowest standard's does under 1/x.
 *
 * @throws EngineError FITTED_NOT_POSITIVE
 */
export function fittedVariance(points: readonly CurvePoint[], first: Fit, power: 1 | 2): VarianceRule {
  const fitted = points.map((point) => valueAt(first, point.concentration));
  const lowest = Math.min(...fitted);
  if (lowest <= 0) {
    const at = points[fitted.indexOf(lowest)];
    throw new EngineError(
      'FITTED_NOT_POSITIVE',
      `weights 1/y need fitted absorbances above zero, got ${lowest.toPrecision(3)} at the concentration ${at?.concentration}; use 1/x or a variance function`,
      '/weighting',
    );
  }
  return {
    ofPoints: fitted.map((value) => value ** power),
    at: (_x, y) => Math.max(y, lowest) ** power,
  };
}

/**
 * v = s0² + (k ŷ)², ŷ per 10 mm, from the unweighted fit at the points and as measured at an unknown. Without s0 it is
 * the law of 1/y², and is refused where that is.
 *
 * @throws EngineError FITTED_NOT_POSITIVE
 */
export function varianceByFunction(
  points: readonly CurvePoint[],
  first: Fit,
  { s0, k }: { readonly s0: number; readonly k: number },
): VarianceRule {
  if (s0 === 0) {
    const law = fittedVariance(points, first, 2);
    return { ofPoints: law.ofPoints.map((v) => k * k * v), at: (x, y) => k * k * law.at(x, y) };
  }
  const variance = (y: number) => s0 ** 2 + (k * y) ** 2;
  return {
    ofPoints: points.map((point) => variance(valueAt(first, point.concentration))),
    at: (_x, y) => variance(y),
  };
}
