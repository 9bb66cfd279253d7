import { dot, type Fit, type FitData, finishFit, weightedMean } from './fit';
import { householder, inverseOfRtR, leastSquares } from './qr';

/**
 * Quadratic y = a + b x + d x², weighted least squares.
 *
 * Solved by QR in t = (x - x̄)/h with h the largest deviation, since the powers of a bare x are nearly parallel
 * (NIST StRD Pontius), and refined once on the residuals; a, b and d are then expanded from the centred
 * coefficients. The caller has checked that there are levels enough.
 *
 * @source ISO 8466-2, in our own words; checked against NIST StRD Pontius
 */
export function fitQuadratic(data: FitData): Fit {
  const { x, y, w } = data;
  const m = weightedMean(x, w);
  const h = Math.max(...x.map((value) => Math.abs(value - m)));
  const root = w.map(Math.sqrt);
  const basis = x.map((value) => {
    const t = (value - m) / h;
    return [1, t, t * t];
  });
  const weighted = basis.map((row, i) => row.map((value) => value * (root[i] ?? 0)));
  const qr = householder(weighted);
  const first = leastSquares(
    qr,
    y.map((value, i) => value * (root[i] ?? 0)),
  );
  const rest = y.map((value, i) => (value - dot(basis[i] ?? [], first)) * (root[i] ?? 0));
  const correction = leastSquares(qr, rest);
  const beta = first.map((value, i) => value + (correction[i] ?? 0));
  const transform = [
    [1, -m / h, (m / h) ** 2],
    [0, 1 / h, (-2 * m) / (h * h)],
    [0, 0, 1 / (h * h)],
  ];
  return finishFit(data, {
    model: 'quadratic',
    centre: m,
    scale: h,
    beta,
    betaInverse: inverseOfRtR(qr),
    coefficients: transform.map((row) => dot(row, beta)),
    transform,
  });
}
