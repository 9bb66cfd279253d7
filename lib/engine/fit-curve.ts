import { type Blanks, prepareBlanks } from './blanks';
import { EngineError } from './errors';
import { type CurvePoint, NORMAL_PATH_MM, preparePoints, responseOf } from './prepare-points';
import { type Fit, type FitData, slopeAt } from './regression/fit';
import { fitLine } from './regression/fit-line';
import { fitProportional } from './regression/fit-proportional';
import { fitQuadratic } from './regression/fit-quadratic';
import type { CurveRequest, Model } from './types';
import { type VarianceRule, varianceRule } from './weighting/variance-rule';

/** A curve with everything the readings of unknowns need from it. */
export interface FittedCurve {
  readonly request: CurveRequest;
  readonly blanks: Blanks;
  readonly points: readonly CurvePoint[];
  /** The points that take part, in the order of `data`. */
  readonly active: readonly CurvePoint[];
  readonly data: FitData;
  readonly rule: VarianceRule;
  /** Factor that brings Σw to n. */
  readonly weightScale: number;
  readonly fit: Fit;
  /** Lowest non-zero and highest fitted standard. */
  readonly range: { readonly min: number; readonly max: number };
  /** Weight of one reading of an unknown, in the scale of the points'. */
  weightAt(x: number, y: number, pathLengthMm: number, givenWeight?: number): number;
}

export function fitModel(model: Model, data: FitData): Fit {
  if (model === 'quadratic') return fitQuadratic(data);
  return model === 'linear' ? fitLine(data) : fitProportional(data);
}

/** (l / 10 mm)²: a normalised reading has standard deviation s·(10 mm / l). */
function pathFactor(pathLengthMm: number): number {
  return (pathLengthMm / NORMAL_PATH_MM) ** 2;
}

/**
 * Fit the curve of a request that passed its checks.
 *
 * @throws EngineError for what only the points show: TOO_FEW_STANDARDS, STANDARDS_COINCIDE, QUADRATIC_LEVELS,
 *   ZERO_SLOPE, CURVE_TURNS, and those of the weightings
 */
export function fitCurve(request: CurveRequest): FittedCurve {
  const blanks = prepareBlanks(request);
  const points = preparePoints(request, blanks);
  const active = points.filter((point) => point.excludedBecause === undefined);
  requireLevels(request.model, active);
  const x = active.map((point) => point.concentration);
  const y = active.map(responseOf);
  const scaled = (variances: readonly number[]) => {
    // One variance for each point.
    const raw = variances.map((v, i) => pathFactor((active[i] as CurvePoint).pathLengthMm) / v);
    const scale = raw.every((w) => w === raw[0])
      ? 1 / (raw[0] as number)
      : raw.length / raw.reduce((sum, w) => sum + w, 0);
    return { w: raw.map((w) => w * scale), scale };
  };
  const unweighted = () => fitModel(request.model, { x, y, w: scaled(active.map(() => 1)).w });
  const rule = varianceRule(request, active, unweighted);
  const { w, scale } = scaled(rule.ofPoints);
  const data = { x, y, w };
  const fit = fitModel(request.model, data);
  const range = { min: Math.min(...x.filter((value) => value > 0)), max: Math.max(...x) };
  requireUsable(fit, range.max, Math.max(...y.map(Math.abs)));
  return {
    request,
    blanks,
    points,
    active,
    data,
    rule,
    weightScale: scale,
    fit,
    range,
    weightAt: (at, response, pathLengthMm, givenWeight) =>
      (scale * pathFactor(pathLengthMm)) / rule.at(at, response, givenWeight),
  };
}

const LEVELS_NEEDED = { linear: 3, proportional: 2, quadratic: 6 } as const;

function requireLevels(model: Model, active: readonly CurvePoint[]): void {
  const levels = new Set(active.map((point) => point.concentration));
  const needed = LEVELS_NEEDED[model];
  const fitted = active.length === 0 ? 'none' : `${levels.size}`;
  if (levels.size === 1 && active.length >= needed) {
    throw new EngineError(
      'STANDARDS_COINCIDE',
      `a ${model} curve needs ${needed} distinct concentrations, got ${active.length} readings at the same one`,
      '/standards',
    );
  }
  if (levels.size < needed) {
    throw new EngineError(
      model === 'quadratic' ? 'QUADRATIC_LEVELS' : 'TOO_FEW_STANDARDS',
      `a ${model} curve needs at least ${needed} distinct concentrations, got ${fitted}`,
      '/standards',
    );
  }
}

function requireUsable(fit: Fit, top: number, largestY: number): void {
  const low = slopeAt(fit, 0);
  const high = slopeAt(fit, top);
  // Equal readings leave a slope of rounding errors instead of an exact zero.
  if (Math.max(Math.abs(low), Math.abs(high)) * top <= 1e-13 * largestY) {
    throw new EngineError(
      'ZERO_SLOPE',
      'the readings do not change with concentration, so nothing can be read back',
      '/standards',
    );
  }
  if (fit.model === 'quadratic' && low * high <= 0) {
    throw new EngineError(
      'CURVE_TURNS',
      'the quadratic turns round inside the range of the standards, so one absorbance would mean two concentrations; use a shorter range',
      '/model',
    );
  }
}
