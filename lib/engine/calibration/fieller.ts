import { type Fit, fittedVarianceAt, slopeVariance } from '../regression/fit';

export interface FiellerAnswer {
  /** In the measured solution; null when unbounded. */
  readonly interval: readonly [number, number] | null;
  /** g = t² V_bb / b². */
  readonly g: number;
}

/** g = t² V_bb / b²: how far the slope is from being told from zero. */
export function slopeLooseness(fit: Fit, t: number): number {
  const [, b = 0] = fit.beta;
  return (t * t * slopeVariance(fit)) / (b * b);
}

/**
 * Fieller's interval for a concentration read back through a line: the roots x of
 *
 *     (y0 - a - b x)² = t² [u²(y0) + V_aa + 2 x V_ab + x² V_bb]
 *
 * with u²(y0) fixed at its estimate; unbounded when g = t² V_bb / b² ≥ 1. Solved in x - x̄, where V_ab = 0.
 *
 * @source Fieller (1954); checked against Graybill & Iyer, Regression Analysis (1994), the thermometer
 */
export function fiellerInterval(fit: Fit, y0: number, varianceY0: number, t: number): FiellerAnswer {
  const [b0 = 0, b = 0] = fit.beta;
  const g = slopeLooseness(fit, t);
  if (g >= 1) return { interval: null, g };
  const d = y0 - b0;
  const varianceAtCentre = varianceY0 + fittedVarianceAt(fit, fit.centre);
  const middle = d / (b * (1 - g));
  const root = Math.sqrt((1 - g) * varianceAtCentre + (d * d * slopeVariance(fit)) / (b * b));
  const half = (t * root) / (Math.abs(b) * (1 - g));
  return { interval: [fit.centre + middle - half, fit.centre + middle + half], g };
}
