import { type Fit, type FitData, finishFit } from './fit';

/**
 * Straight line through zero, weighted least squares: b = Σ w x y / Σ w x², s² = Σ w r² / (n - 1),
 * s_b = s / √(Σ w x²). r² is the uncentred one. The caller has checked that n ≥ 2 and that some x ≠ 0.
 *
 * @source checked against NIST StRD NoInt1 and NoInt2
 */
export function fitProportional(data: FitData): Fit {
  const { x, y, w } = data;
  const squares = x.reduce((sum, value, i) => sum + (w[i] ?? 0) * value * value, 0);
  const products = x.reduce((sum, value, i) => sum + (w[i] ?? 0) * value * (y[i] ?? 0), 0);
  const slope = products / squares;
  return finishFit(data, {
    model: 'proportional',
    centre: 0,
    scale: 1,
    beta: [0, slope],
    betaInverse: [
      [0, 0],
      [0, 1 / squares],
    ],
    coefficients: [0, slope],
    transform: [
      [1, 0],
      [0, 1],
    ],
  });
}
