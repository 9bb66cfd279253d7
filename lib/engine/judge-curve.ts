import { significantText } from '../format/round';
import { highestAsRead } from './absorbance';
import { slopeLooseness } from './calibration/fieller';
import type { FittedCurve } from './fit-curve';
import { fitModel } from './fit-curve';
import { type Flag, flag, type FlagCode } from './flags';
import type { CurvePoint } from './prepare-points';
import { coefficientOf } from './regression/fit';
import type { CurveRequest, CurveResult, LevelAnswer, PointAnswer, TestAnswer } from './types';
import { coverageFactor } from './uncertainty/expand';

/** Above it the usual formula for u(c) is an approximation. */
const LOOSE_G = 0.05;
const FEW_DEGREES_OF_FREEDOM = 3;
const BACK_CALCULATION_LIMIT = { lowest: 20, others: 10 } as const;
const INFLUENCE_LIMIT = 1;

export interface CurveFacts {
  readonly curve: FittedCurve;
  readonly points: readonly PointAnswer[];
  readonly levels: readonly LevelAnswer[];
  readonly tests: CurveResult['tests'];
  readonly criticalValue: number;
}

/** Everything worth saying about a curve. */
export function judgeCurve(facts: CurveFacts): readonly Flag[] {
  const { curve } = facts;
  return [
    ...judgeStandards(curve.request, curve.points),
    ...judgeLeftOut(curve),
    ...judgeSlope(curve),
    ...judgeIntercept(facts),
    ...judgeTests(facts),
    ...judgeLevels(facts),
    ...judgeInfluence(facts),
  ];
}

function judgeStandards(request: CurveRequest, points: readonly CurvePoint[]): Flag[] {
  const flags: Flag[] = [];
  const zero = points.find((point) => point.role === 'standard' && point.concentration === 0);
  if (request.blank?.use === 'subtract' && zero)
    flags.push(flag('ZERO_STANDARD_WITH_SUBTRACT', { name: zero.name }));
  for (const point of points) {
    const { asRead, name } = point;
    if (asRead.censored && point.excludedBecause === 'censored') {
      flags.push(flag('STANDARD_CENSORED', { name, detail: asRead.censored.text }));
    }
    const limit = request.absorbanceLimit;
    const highest = highestAsRead(asRead);
    if (point.excludedBecause === undefined && highest > limit) {
      flags.push(flag('STANDARD_OVER_LIMIT', { name, value: highest, limit }));
    }
  }
  return flags;
}

function judgeLeftOut({ points, range, request }: FittedCurve): Flag[] {
  const flags: Flag[] = [];
  const requested = points.filter((point) => point.excludedBecause === 'request');
  const atZero = points.filter((point) => point.excludedBecause === 'zeroWithReciprocalWeights');
  const holds = `${significantText(range.min, 6)} to ${significantText(range.max, 6)} ${request.unit}`;
  if (requested.length > 0) flags.push(flag('STANDARD_LEFT_OUT', { value: requested.length, detail: holds }));
  if (atZero.length > 0)
    flags.push(flag('ZERO_STANDARD_LEFT_OUT', { value: atZero.length, name: atZero[0]?.name }));
  return flags;
}

function judgeSlope({ fit, request, data }: FittedCurve): Flag[] {
  const flags: Flag[] = [];
  const nu = fit.degreesOfFreedom;
  if (nu < FEW_DEGREES_OF_FREEDOM)
    flags.push(flag('FEW_DEGREES_OF_FREEDOM', { value: nu, limit: FEW_DEGREES_OF_FREEDOM }));
  const largest = Math.max(...data.y.map(Math.abs));
  if (fit.residualSd <= 1e-13 * largest) flags.push(flag('NO_SCATTER'));
  const slope = coefficientOf(fit, 1).value;
  if (slope < 0) flags.push(flag('SLOPE_NEGATIVE', { value: slope }));
  if (fit.model !== 'quadratic') {
    const g = slopeLooseness(fit, coverageFactor(request.confidence, nu));
    if (g >= 1) flags.push(flag('SLOPE_NOT_PROVEN', { value: g, limit: 1 }));
    else if (g > LOOSE_G) flags.push(flag('SLOPE_LOOSE', { value: g, limit: LOOSE_G }));
  }
  return flags;
}

/** A line through zero whose points ask for an intercept. */
function judgeIntercept({ curve, tests }: CurveFacts): Flag[] {
  const { fit, data, range } = curve;
  if (fit.model !== 'proportional' || tests.intercept.reason !== undefined || tests.intercept.passed)
    return [];
  const a = coefficientOf(fitModel('linear', data), 0).value;
  const lowestOff = (100 * a) / (range.min * coefficientOf(fit, 1).value);
  const detail = `about ${significantText(lowestOff, 2)} % at the lowest standard`;
  return [flag('INTERCEPT_NOT_ZERO', { value: a, limit: Math.abs(tests.intercept.statistic), detail })];
}

function judgeTests({ curve, tests }: CurveFacts): Flag[] {
  const fallen = (code: FlagCode, answer: TestAnswer): Flag[] =>
    answer.reason !== undefined || answer.passed
      ? []
      : [flag(code, { value: answer.statistic, limit: answer.critical })];
  return [
    ...fallen('LACK_OF_FIT', tests.lackOfFit),
    // A quadratic is the answer to a bend.
    ...(curve.fit.model === 'quadratic' ? [] : fallen('CURVATURE', tests.mandel)),
    ...fallen('VARIANCE_UNEVEN', tests.homogeneity),
  ];
}

function judgeLevels({ curve, levels, criticalValue }: CurveFacts): Flag[] {
  const flags: Flag[] = [];
  const { unit } = curve.request;
  for (const level of levels) {
    const limit =
      level.concentration === curve.range.min ? BACK_CALCULATION_LIMIT.lowest : BACK_CALCULATION_LIMIT.others;
    const value = level.relativeErrorPercent;
    if (value !== null && Math.abs(value) > limit) {
      const detail = significantText(level.concentration, 6);
      flags.push(flag('STANDARD_BACK_CALCULATES_OFF', { value, limit, unit, detail }));
    }
  }
  if (criticalValue > curve.range.min) {
    flags.push(flag('CRITICAL_OVER_LOWEST', { value: criticalValue, limit: curve.range.min, unit }));
  }
  return flags;
}

function judgeInfluence({ points }: CurveFacts): Flag[] {
  return points.flatMap((point) => {
    const value = point.cooksDistance ?? 0;
    return value > INFLUENCE_LIMIT
      ? [flag('INFLUENTIAL_POINT', { name: point.name, value, limit: INFLUENCE_LIMIT })]
      : [];
  });
}
