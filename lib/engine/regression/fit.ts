import type { Model } from '../types';

/** What a fit needs: x and y of the points that take part, and their weights scaled to Σw = n. */
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

/** ∂f/∂β at x, about the centre. */
export function gradientAt(fit: Fit, x: number): readonly number[] {
  const t = (x - fit.centre) / fit.scale;
  if (fit.model === 'quadratic') return [1, t, t * t];
  return fit.model === 'linear' ? [1, t] : [0, x];
}

export function valueAt(fit: Fit, x: number): number {
  return dot(gradientAt(fit, x), fit.beta);
}

/** df/dx. */
export function slopeAt(fit: Fit, x: number): number {
  const [, b1 = 0, b2 = 0] = fit.beta;
  return (b1 + (2 * b2 * (x - fit.centre)) / fit.scale) / fit.scale;
}

/** gᵀ M g. */
export function quadraticForm(matrix: readonly (readonly number[])[], g: readonly number[]): number {
  return g.reduce((sum, gi, i) => sum + gi * dot(matrix[i] ?? [], g), 0);
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
  return a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0);
}

/** Weighted mean, taken again about its first value so that a large offset costs no digits. */
export function weightedMean(x: readonly number[], w: readonly number[]): number {
  const total = w.reduce((sum, value) => sum + value, 0);
  const first = dot(x, w) / total;
  return first + x.reduce((sum, value, i) => sum + (value - first) * (w[i] ?? 0), 0) / total;
}

interface Solved {
  readonly model: Model;
  readonly centre: number;
  readonly scale: number;
  readonly beta: readonly number[];
  readonly betaInverse: readonly (readonly number[])[];
  /** Uncentred coefficient k = Σ_j transform[k][j]·β_j. */
  readonly coefficients: readonly number[];
  readonly transform: readonly (readonly number[])[];
}

/** What follows from the coefficients alike for every model: residuals, s, V, r². */
export function finishFit(data: FitData, solved: Solved): Fit {
  const { x, y, w } = data;
  const n = x.length;
  const q = solved.model === 'quadratic' ? 3 : solved.model === 'linear' ? 2 : 1;
  const meanX = weightedMean(x, w);
  const meanY = weightedMean(y, w);
  const about = { model: solved.model, centre: solved.centre, scale: solved.scale } as Fit;
  const squares = (of: (i: number) => number) => w.reduce((sum, wi, i) => sum + wi * of(i) ** 2, 0);
  const residualSquares = squares((i) => (y[i] ?? 0) - dot(gradientAt(about, x[i] ?? 0), solved.beta));
  // A line through zero is compared with no line at all, so its total is about zero (NIST, NoInt1 and NoInt2).
  const total = squares((i) => (y[i] ?? 0) - (solved.model === 'proportional' ? 0 : meanY));
  const degreesOfFreedom = n - q;
  const s2 = residualSquares / degreesOfFreedom;
  const betaCovariance = solved.betaInverse.map((row) => row.map((value) => value * s2));
  return {
    model: solved.model,
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
    sxx: squares((i) => (x[i] ?? 0) - meanX),
  };
}

/** T M Tᵀ. */
function sandwich(t: readonly (readonly number[])[], m: readonly (readonly number[])[]): number[][] {
  return t.map((rowA) => t.map((rowB) => rowA.reduce((sum, a, i) => sum + a * dot(m[i] ?? [], rowB), 0)));
}
