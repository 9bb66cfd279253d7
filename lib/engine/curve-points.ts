import { absorbanceAsRead } from './absorbance';
import { invert } from './calibration/invert';
import type { FittedCurve } from './fit-curve';
import type { CurvePoint } from './prepare-points';
import { leverageAt, valueAt } from './regression/fit';
import type { LevelAnswer, PointAnswer } from './types';

/** 100 (x' - x)/x; null at concentration zero. */
function relativeErrorPercent(found: number | null, x: number): number | null {
  return found === null || x === 0 ? null : (100 * (found - x)) / x;
}

/** Every reading of the curve with its residual, back-calculation and influence; those left out too. */
export function pointAnswers(curve: FittedCurve): readonly PointAnswer[] {
  const position = new Map(curve.active.map((point, i) => [point.id, i]));
  return curve.points.map((point) => pointAnswer(curve, point, position.get(point.id)));
}

function pointAnswer(curve: FittedCurve, point: CurvePoint, position: number | undefined): PointAnswer {
  const { fit } = curve;
  const fitted = valueAt(fit, point.concentration);
  const residual = point.y === null ? null : point.y - fitted;
  const found = point.y === null ? null : invert(fit, point.y);
  const weight = position === undefined ? 0 : (curve.data.w[position] ?? 0);
  const leverage = position === undefined ? null : leverageAt(fit, point.concentration, weight);
  return {
    name: point.name,
    role: point.role,
    standardIndex: point.standardIndex,
    replicate: point.replicate,
    concentration: point.concentration,
    pathLengthMm: point.pathLengthMm,
    absorbanceAsRead: absorbanceAsRead(point.asRead),
    ...(point.asRead.censored ? { censored: point.asRead.censored.text } : {}),
    absorbance: point.y,
    weight,
    fitted,
    residual,
    backCalculated: found,
    relativeErrorPercent: relativeErrorPercent(found, point.concentration),
    leverage,
    cooksDistance: cooksDistance(curve, residual, weight, leverage),
    ...(point.excludedBecause === undefined
      ? {}
      : { excluded: true as const, excludedBecause: point.excludedBecause }),
  };
}

/**
 * D = w r² h / (q s² (1 - h)²); null for a point left out, for one that the curve must pass through (h = 1), and
 * where there is no scatter to compare with.
 *
 * @source Cook, Technometrics 19 (1977) 15
 */
function cooksDistance(
  curve: FittedCurve,
  residual: number | null,
  weight: number,
  leverage: number | null,
): number | null {
  const { fit } = curve;
  if (residual === null || leverage === null || leverage >= 1 - 1e-12 || fit.residualSd === 0) return null;
  return (weight * residual ** 2 * leverage) / (fit.q * fit.residualSd ** 2 * (1 - leverage) ** 2);
}

/** The fitted readings of each concentration together, in rising order. */
export function levelAnswers(curve: FittedCurve): readonly LevelAnswer[] {
  const { x, y } = curve.data;
  return [...new Set(x)]
    .sort((a, b) => a - b)
    .map((concentration) => {
      const own = y.filter((_, i) => x[i] === concentration);
      const meanAbsorbance = own.reduce((sum, value) => sum + value, 0) / own.length;
      const found = invert(curve.fit, meanAbsorbance);
      return {
        concentration,
        readings: own.length,
        meanAbsorbance,
        meanBackCalculated: found,
        relativeErrorPercent: relativeErrorPercent(found, concentration),
      };
    });
}

/**
 * Relative standard error, per cent: 100 √(Σ ((x' - x)/x)² / (n - q)), per reading at non-zero levels, n being
 * their number; null when a reading cannot be calculated back or too few are left.
 *
 * @source EPA method 8000D, in our own words
 */
export function relativeStandardErrorPercent(
  curve: FittedCurve,
  points: readonly PointAnswer[],
): number | null {
  const errors = points
    .filter((point) => !point.excluded && point.concentration > 0)
    .map((point) => point.relativeErrorPercent);
  const known = errors.filter((error) => error !== null);
  const free = errors.length - curve.fit.q;
  if (known.length < errors.length || free <= 0) return null;
  return Math.sqrt(known.reduce((sum, error) => sum + error ** 2, 0) / free);
}
