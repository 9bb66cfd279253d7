import { SimpleLinearRegression } from 'ml-regression-simple-linear';
import { dot, type Fit, type FitData, finishFit, weightedMean } from './fit';

/**
 * Straight line with free intercept, weighted least squares.
 *
 *     b = Σ w (x - x̄)(y - ȳ) / Sxx        a = ȳ - b x̄        Sxx = Σ w (x - x̄)²
 *     s² = Σ w r² / (n - 2)      s_b = s / √Sxx      s_a = s √(1/n + x̄²/Sxx)      cov(a, b) = -x̄ s² / Sxx
 *
 * with weighted means and Σw = n. The caller has checked that n ≥ 3 and that x has spread.
 *
 * @source IUPAC 1998 (Danzer, Currie), in our own words; checked against NIST StRD Norris
 */
export function fitLine(data: FitData): Fit {
  const { x, y, w } = data;
  const meanX = weightedMean(x, w);
  const meanY = weightedMean(y, w);
  const dx = x.map((value) => value - meanX);
  const dy = y.map((value) => value - meanY);
  const sxx = dx.reduce((sum, d, i) => sum + (w[i] ?? 0) * d * d, 0);
  const slope = slopeOfCentred(dx, dy, w, sxx);
  // One step of refinement: the residuals are small, so what is left of their mean is known to many digits.
  const rest = weightedMean(
    dy.map((d, i) => d - slope * (dx[i] ?? 0)),
    w,
  );
  const offset = meanY + rest;
  return finishFit(data, {
    model: 'linear',
    centre: meanX,
    scale: 1,
    beta: [offset, slope],
    betaInverse: [
      [1 / w.reduce((sum, value) => sum + value, 0), 0],
      [0, 1 / sxx],
    ],
    coefficients: [offset - slope * meanX, slope],
    transform: [
      [1, -meanX],
      [0, 1],
    ],
  });
}

/**
 * The slope of centred data. Unweighted, it is SimpleLinearRegression's. That class sums x, x² and xy in one
 * pass: with x about 1e9 every digit of the slope is lost, so it is only given deviations from the means, whose
 * sums vanish. It knows no weights and no uncertainties; those we take ourselves, beside it.
 */
function slopeOfCentred(
  dx: readonly number[],
  dy: readonly number[],
  w: readonly number[],
  sxx: number,
): number {
  if (w.every((value) => value === 1)) return new SimpleLinearRegression([...dx], [...dy]).slope;
  return (
    dot(
      w.map((wi, i) => wi * (dx[i] ?? 0)),
      dy,
    ) / sxx
  );
}
