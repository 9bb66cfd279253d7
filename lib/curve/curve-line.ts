import type { CurveResult } from '@/lib/engine';
import { tQuantile } from '@/lib/engine/stats/student-t';

/** The fitted line over a grid of concentrations, with the band of the line and the band of single readings. */
export interface DrawnLine {
  readonly concentration: number[];
  readonly fitted: number[];
  readonly confidence?: { readonly low: number[]; readonly high: number[] };
  readonly prediction?: { readonly low: number[]; readonly high: number[] };
}

const STEPS = 60;
const BEYOND_TOP = 1.05;

/** g = ∂f/∂β at x. */
const gradient = (x: number, terms: number) => [1, x, x * x].slice(0, terms);

function valueAt({ intercept, slope, quadratic }: CurveResult, x: number): number {
  return intercept.value + slope.value * x + (quadratic?.value ?? 0) * x * x;
}

/** gᵀVg. */
function variance(covariance: CurveResult['covariance'], x: number): number {
  const g = gradient(x, covariance.length);
  return covariance.reduce(
    (sum, row, i) => sum + row.reduce((inner, v, j) => inner + (g[i] ?? 0) * v * (g[j] ?? 0), 0),
    0,
  );
}

/**
 * Weight of one reading at x in the scale of the fit; null when the weighting does not give one by x alone.
 * The scale is taken from a fitted point: w ∝ 1/v(x), and below the lowest point v is that point's.
 */
function weightAt({ weighting, points, range }: CurveResult, x: number): number | null {
  const power = { none: 0, '1/x': 1, '1/x2': 2 }[weighting as 'none'];
  const known = points.find((point) => point.weight > 0 && (power === 0 || point.concentration > 0));
  if (power === undefined || !known) return null;
  return known.weight * (known.concentration / Math.max(x, range.min)) ** power;
}

/**
 * The curve to draw: f(x), f(x) ± t·√(gᵀVg) for the line and f(x) ± t·√(gᵀVg + s²/w(x)) for one reading.
 *
 * @source the general forms of ISO 8466-1 and NIST/SEMATECH e-Handbook 4.5.2.2, in our own words
 */
export function drawnLine(curve: CurveResult): DrawnLine {
  const end = curve.range.max * BEYOND_TOP;
  const concentration = Array.from({ length: STEPS + 1 }, (_, index) => (end * index) / STEPS);
  const fitted = concentration.map((x) => valueAt(curve, x));
  if (curve.degreesOfFreedom < 1 || !(curve.residualSd > 0)) return { concentration, fitted };
  const t = tQuantile(1 - (1 - curve.confidence) / 2, curve.degreesOfFreedom);
  const band = (halfWidth: (x: number) => number) => ({
    low: concentration.map((x, index) => (fitted[index] ?? NaN) - halfWidth(x)),
    high: concentration.map((x, index) => (fitted[index] ?? NaN) + halfWidth(x)),
  });
  const confidence = band((x) => t * Math.sqrt(variance(curve.covariance, x)));
  if (weightAt(curve, end) === null) return { concentration, fitted, confidence };
  const ofOne = (x: number) => curve.residualSd ** 2 / (weightAt(curve, x) ?? NaN);
  const prediction = band((x) => t * Math.sqrt(variance(curve.covariance, x) + ofOne(x)));
  return { concentration, fitted, confidence, prediction };
}
