import { dot, type Fit, type FitData, finishFit, residualSquaresOf, valueAt } from './fit';
import { momentsOf } from './moments';
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
  const moments = momentsOf(data);
  const centre = moments.meanX;
  const dx = x.map((value) => value - centre);
  const scale = dx.reduce((largest, d) => Math.max(largest, Math.abs(d)), 0);
  const root = w.map(Math.sqrt);
  const t = dx.map((d, i) => ((root[i] as number) * d) / scale);
  const qr = householder([root, t, t.map((value, i) => (value * (dx[i] as number)) / scale)]);
  const first = leastSquares(
    qr,
    y.map((value, i) => value * (root[i] as number)),
  );
  const about = { centre, scale, beta: first };
  const rest = y.map((value, i) => (value - valueAt(about, x[i] as number)) * (root[i] as number));
  const correction = leastSquares(qr, rest);
  const beta = first.map((value, i) => value + (correction[i] as number));
  const m = centre / scale;
  const transform = [
    [1, -m, m * m],
    [0, 1 / scale, (-2 * m) / scale],
    [0, 0, 1 / (scale * scale)],
  ];
  return finishFit({
    model: 'quadratic',
    centre,
    scale,
    beta,
    betaInverse: inverseOfRtR(qr),
    coefficients: transform.map((row) => dot(row, beta)),
    transform,
    moments,
    residualSquares: residualSquaresOf(data, { centre, scale, beta }),
  });
}
