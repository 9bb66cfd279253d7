import { absorbanceAsRead } from './absorbance';
import { invert } from './calibration/invert';
import type { FittedCurve } from './fit-curve';
import type { Level } from './hypothesis/levels';
import type { CurvePoint } from './prepare-points';
import { leverageAt, valueAt } from './regression/fit';
import type { LevelAnswer, PointAnswer } from './types';

/** Leverage of a point that the curve must pass through: it has no residual to judge. */
const FORCED = 1 - 1e-12;

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
  const weight = position === undefined ? 0 : (curve.data.w[position] as number);
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
    standardisedResidual: standardisedResidual(curve, residual, weight, leverage),
    cooksDistance: cooksDistance(curve, residual, weight, leverage),
    ...(point.excludedBecause === undefined
      ? {}
      : { excluded: true as const, excludedBecause: point.excludedBecause }),
  };
}

/**
 * Internally studentised residual r √w / (s √(1 - h)): the residual in units of its own standard deviation. Null where
 * Cook's distance is.
 *
 * @source Cook and Weisberg, Residuals and Influence in Regression (1982), 2.2
 */
function standardisedResidual(
  { fit }: FittedCurve,
  residual: number | null,
  weight: number,
  leverage: number | null,
): number | null {
  if (residual === null || leverage === null || leverage >= FORCED || fit.residualSd === 0) return null;
  return (residual * Math.sqrt(weight)) / (fit.residualSd * Math.sqrt(1 - leverage));
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
  if (residual === null || leverage === null || leverage >= FORCED || fit.residualSd === 0) return null;
  return (weight * residual ** 2 * leverage) / (fit.q * fit.residualSd ** 2 * (1 - leverage) ** 2);
}

/** The fitted readings of each concentration together, in rising order. */
export function levelAnswers(curve: FittedCurve, levels: readonly Level[]): readonly LevelAnswer[] {
  const { y } = curve.data;
  return levels.map(({ concentration, members }) => {
    const meanAbsorbance = members.reduce((sum, i) => sum + (y[i] as number), 0) / members.length;
    const found = invert(curve.fit, meanAbsorbance);
    return {
      concentration,
      readings: members.length,
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
