import { type Fit, type FitData, finishFit, residualSquaresOf } from './fit';
import { momentsOf } from './moments';

/**
 * Straight line through zero, weighted least squares: b = Σ w x y / Σ w x², s² = Σ w r² / (n - 1),
 * s_b = s / √(Σ w x²). r² is the uncentred one. The caller has checked that n ≥ 2 and that some x ≠ 0.
 *
 * @source checked against NIST StRD NoInt1 and NoInt2
 */
export function fitProportional(data: FitData): Fit {
  const { x, y, w } = data;
  let squares = 0;
  let products = 0;
  for (let i = 0; i < x.length; i += 1) {
    const wx = (w[i] as number) * (x[i] as number);
    squares += wx * (x[i] as number);
    products += wx * (y[i] as number);
  }
  const slope = products / squares;
  const shape = { centre: 0, scale: 1, beta: [0, slope] };
  return finishFit({
    model: 'proportional',
    ...shape,
    betaInverse: [
      [0, 0],
      [0, 1 / squares],
    ],
    coefficients: [0, slope],
    transform: [
      [1, 0],
      [0, 1],
    ],
    moments: momentsOf(data),
    residualSquares: residualSquaresOf(data, shape),
  });
}
