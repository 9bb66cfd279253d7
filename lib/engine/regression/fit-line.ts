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
  const slope = slopeOf(moments);
  const { rest, squares } = residualsOf(moments, data.w, slope);
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

/**
 * The slope of centred data. Unweighted, it is SimpleLinearRegression's. That class sums x, x² and xy in one
 * pass: with x about 1e9 every digit of the slope is lost, so it is only given deviations from the means, whose
 * sums vanish. It knows no weights and no uncertainties; those we take ourselves, beside it.
 */
function slopeOf({ dx, dy, sxx, sxy, unweighted }: Moments): number {
  // The package types its arrays as writable; it does not write to them.
  return unweighted ? new SimpleLinearRegression(dx as number[], dy as number[]).slope : sxy / sxx;
}

/**
 * What is left of the mean after the slope, and the residuals' Σ w r² without it. Residuals are small, so the rest
 * is known to many digits: one step of refinement for the offset.
 */
function residualsOf({ dx, dy, weight }: Moments, w: FitData['w'], slope: number) {
  let sum = 0;
  let squares = 0;
  for (let i = 0; i < dx.length; i += 1) {
    const r = (dy[i] as number) - slope * (dx[i] as number);
    const wr = (w[i] as number) * r;
    sum += wr;
    squares += wr * r;
  }
  const rest = sum / weight;
  return { rest, squares: Math.max(0, squares - weight * rest * rest) };
}
