import type { Model, ValueWithU } from '../types';
import type { Moments } from './moments';

/**
 * What a fit needs: x and y of the points that take part, and their weights scaled to Σw = n. The three are of one
 * length, which is why the loops of this folder read their members `as number`.
 */
export interface FitData {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly w: readonly number[];
}

/**
 * A fitted calibration function.
 *
 * It is held about a centre, t = (x - centre) / scale, y = β0 + β1 t (+ β2 t²), or y = β1 x for a line through
 * zero, and its variances are taken there: far from zero the uncentred covariance matrix says the variance of a
 * prediction as a small difference of large numbers. `coefficients` and `covariance` are the uncentred ones,
 * rows intercept, slope (and quadratic), for people.
 */
export interface Fit {
  readonly model: Model;
  readonly n: number;
  /** Fitted parameters. */
  readonly q: number;
  readonly degreesOfFreedom: number;
  readonly centre: number;
  readonly scale: number;
  /** About the centre; the proportional line has [0, b]. */
  readonly beta: readonly number[];
  /** s² (XᵀWX)⁻¹ about the centre. */
  readonly betaCovariance: readonly (readonly number[])[];
  /** (XᵀWX)⁻¹ about the centre, for leverages, which do not vanish with s. */
  readonly betaInverse: readonly (readonly number[])[];
  readonly coefficients: readonly number[];
  readonly covariance: readonly (readonly number[])[];
  /** Σ w r². */
  readonly residualSquares: number;
  /** s = √(Σ w r² / (n - q)). */
  readonly residualSd: number;
  readonly rSquared: number;
  /** Weighted mean of x and of y, and Σ w (x - x̄)². */
  readonly meanX: number;
  readonly meanY: number;
  readonly sxx: number;
}

/** Uncentred coefficient i (intercept, slope, quadratic) with its standard uncertainty. */
export function coefficientOf({ coefficients, covariance }: Fit, i: 0 | 1 | 2): ValueWithU {
  const row = covariance[i] as readonly number[];
  return { value: coefficients[i] as number, u: Math.sqrt(row[i] as number) };
}

/** Variance of the slope at the centre: of the slope itself, for a line. */
export function slopeVariance({ betaCovariance }: Fit): number {
  return (betaCovariance[1] as readonly number[])[1] as number;
}

/** ∂f/∂β at x, about the centre. */
export function gradientAt(fit: Fit, x: number): readonly number[] {
  const t = (x - fit.centre) / fit.scale;
  if (fit.model === 'quadratic') return [1, t, t * t];
  return fit.model === 'linear' ? [1, t] : [0, x];
}

/** What the value of a curve needs: y = β0 + β1 t (+ β2 t²), t = (x - centre) / scale. */
type Shape = Pick<Fit, 'centre' | 'scale' | 'beta'>;

export function valueAt({ centre, scale, beta }: Shape, x: number): number {
  const [b0 = 0, b1 = 0, b2 = 0] = beta;
  const t = (x - centre) / scale;
  return b0 + t * (b1 + t * b2);
}

/** df/dx. */
export function slopeAt(fit: Fit, x: number): number {
  const [, b1 = 0, b2 = 0] = fit.beta;
  return (b1 + (2 * b2 * (x - fit.centre)) / fit.scale) / fit.scale;
}

/** gᵀ M g. */
export function quadraticForm(matrix: readonly (readonly number[])[], g: readonly number[]): number {
  return g.reduce((sum, gi, i) => sum + gi * dot(matrix[i] as readonly number[], g), 0);
}

/** Variance of the fitted value at x, gᵀVg. */
export function fittedVarianceAt(fit: Fit, x: number): number {
  return Math.max(0, quadraticForm(fit.betaCovariance, gradientAt(fit, x)));
}

/** h at x for weight w: w gᵀ(XᵀWX)⁻¹g. */
export function leverageAt(fit: Fit, x: number, w: number): number {
  return w * quadraticForm(fit.betaInverse, gradientAt(fit, x));
}

export function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, value, i) => sum + value * (b[i] as number), 0);
}

/** A model solved about its centre, and the sums the solution came with. */
export interface Solved extends Shape {
  readonly model: Model;
  readonly betaInverse: readonly (readonly number[])[];
  /** Uncentred coefficient k = Σ_j transform[k][j]·β_j. */
  readonly coefficients: readonly number[];
  readonly transform: readonly (readonly number[])[];
  readonly moments: Moments;
  /** Σ w r². */
  readonly residualSquares: number;
}

const PARAMETERS = { proportional: 1, linear: 2, quadratic: 3 } as const;

/** What follows from the coefficients alike for every model: s, V, r². */
export function finishFit(solved: Solved): Fit {
  const { model, moments, residualSquares } = solved;
  const { n, meanX, meanY, sxx } = moments;
  const q = PARAMETERS[model];
  // A line through zero is compared with no line at all, so its total is about zero (NIST, NoInt1 and NoInt2).
  const total = moments.syy + (model === 'proportional' ? moments.weight * meanY * meanY : 0);
  const degreesOfFreedom = n - q;
  const s2 = residualSquares / degreesOfFreedom;
  const betaCovariance = solved.betaInverse.map((row) => row.map((value) => value * s2));
  return {
    model,
    n,
    q,
    degreesOfFreedom,
    centre: solved.centre,
    scale: solved.scale,
    beta: solved.beta,
    betaCovariance,
    betaInverse: solved.betaInverse,
    coefficients: solved.coefficients,
    covariance: sandwich(solved.transform, betaCovariance),
    residualSquares,
    residualSd: Math.sqrt(s2),
    rSquared: total === 0 ? 1 : 1 - residualSquares / total,
    meanX,
    meanY,
    sxx,
  };
}

/** Σ w (y - f(x))². */
export function residualSquaresOf({ x, y, w }: FitData, shape: Shape): number {
  let sum = 0;
  for (let i = 0; i < x.length; i += 1) {
    const r = (y[i] as number) - valueAt(shape, x[i] as number);
    sum += (w[i] as number) * r * r;
  }
  return sum;
}

/** T M Tᵀ. */
function sandwich(t: readonly (readonly number[])[], m: readonly (readonly number[])[]): number[][] {
  return t.map((rowA) =>
    t.map((rowB) => rowA.reduce((sum, a, i) => sum + a * dot(m[i] as readonly number[], rowB), 0)),
  );
}
