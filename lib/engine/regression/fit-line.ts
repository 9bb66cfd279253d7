import { SimpleLinearRegression } from 'ml-regression-simple-linear';
import { type Fit, type FitData, finishFit } from './fit';
import { type Moments, momentsOf } from './moments';

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
  const moments = momentsOf(data);
  const { meanX, weight, sxx } = moments;
  const slope = slopeOf(data, moments);
  const { rest, squares } = residualsOf(data, moments, slope);
  const offset = moments.meanY + rest;
  return finishFit({
    model: 'linear',
    centre: meanX,
    scale: 1,
    beta: [offset, slope],
    betaInverse: [
      [1 / weight, 0],
      [0, 1 / sxx],
    ],
    coefficients: [offset - slope * meanX, slope],
    transform: [
      [1, -meanX],
      [0, 1],
    ],
    moments,
    residualSquares: squares,
  });
}

/** Above it the copies that the package needs cost more than all our sums: 10,000 points take twice as long. */
const PACKAGE_POINTS = 1000;

/**
 * The slope of centred data. Unweighted, it is SimpleLinearRegression's. That class sums x, x² and xy in one
 * pass: with x about 1e9 every digit of the slope is lost, so it is only given deviations from the means, whose
 * sums vanish. It knows no weights and no uncertainties; those we take ourselves, beside it, and the slope of
 * weighted and of very long data too.
 */
function slopeOf({ x, y }: FitData, { n, meanX, meanY, sxx, sxy, unweighted }: Moments): number {
  if (!unweighted || n > PACKAGE_POINTS) return sxy / sxx;
  return new SimpleLinearRegression(
    x.map((value) => value - meanX),
    y.map((value) => value - meanY),
  ).slope;
}

/**
 * What is left of the mean after the slope, and the residuals' Σ w r² without it. Residuals are small, so the rest
 * is known to many digits: one step of refinement for the offset.
 */
function residualsOf({ x, y, w }: FitData, { meanX, meanY, weight }: Moments, slope: number) {
  let sum = 0;
  let squares = 0;
  for (let i = 0; i < x.length; i += 1) {
    const r = (y[i] as number) - meanY - slope * ((x[i] as number) - meanX);
    const wr = (w[i] as number) * r;
    sum += wr;
    squares += wr * r;
  }
  const rest = sum / weight;
  return { rest, squares: Math.max(0, squares - weight * rest * rest) };
}
