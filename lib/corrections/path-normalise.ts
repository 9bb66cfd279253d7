import { CorrectionError } from './errors';
import { inQuadrature, mapPoints, scaled, uAt } from './point-math';
import type { Points, StepOutcome } from './types';
import { say, sayWithU } from './words';

export const NORMAL_PATH_MM = 10;

/**
 * Absorbance as it would be in 10 mm: A10 = A × 10 mm / l, u(A10)² = (10/l)² u(A)² + A10² (u(l)/l)².
 * Blank first: what does not grow with the path (the walls of the cell) must be off before.
 *
 * @throws CorrectionError FACTOR_NOT_POSITIVE
 */
export function normalisePath(points: Points, pathLengthMm: number, uMm = 0): StepOutcome {
  if (!(pathLengthMm > 0) || !Number.isFinite(pathLengthMm)) {
    throw new CorrectionError('FACTOR_NOT_POSITIVE', `a path length is above zero, got ${pathLengthMm} mm`);
  }
  const factor = NORMAL_PATH_MM / pathLengthMm;
  const relativeU = uMm / pathLengthMm;
  const length = uMm === 0 ? say(pathLengthMm) : sayWithU(pathLengthMm, uMm);
  return {
    points: mapPoints(points, (a, _, i) => ({
      a: a * factor,
      u: inQuadrature(
        scaled(uAt(points, i), factor),
        relativeU === 0 ? null : Math.abs(a * factor) * relativeU,
      ),
    })),
    did: `Multiplied by ${say(factor)}: from a path length of ${length} mm to ${NORMAL_PATH_MM} mm.`,
    warnings: [],
  };
}
