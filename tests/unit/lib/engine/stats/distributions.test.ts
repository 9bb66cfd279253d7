import { describe, expect, test } from 'vitest';
import { detectionDelta } from '@/lib/engine/stats/noncentral-t';
import { tQuantile } from '@/lib/engine/stats/student-t';
import { studentizedRangeCdf, studentizedRangeQuantile } from '@/lib/engine/stats/studentized-range';
import { expectDigits } from '../../../../support/digits';
import { reference } from '../requests';

interface Point {
  readonly count: number;
  readonly nu: number;
  readonly q: number;
}
const range = reference<{ q95: readonly Point[]; scipy: readonly Point[] }>('studentized-range');

describe('studentized range', () => {
  // Reference: Harter's table (1960), two decimals (fixtures/reference/studentized-range/SOURCE.md).
  test.each(range.q95)('q(0.95; $count, $nu) rounds to the printed $q', ({ count, nu, q }) => {
    expect(Math.abs(studentizedRangeQuantile(0.95, count, nu) - q)).toBeLessThanOrEqual(0.0051);
  });

  // Reference: scipy.stats.studentized_range.ppf, independent of our quadrature.
  test.each(range.scipy)('q(0.95; $count, $nu) agrees with scipy to 9 digits', ({ count, nu, q }) => {
    expectDigits(studentizedRangeQuantile(0.95, count, nu), q, 9);
  });

  // Identity: the range of two values is √2·|t|, so the closed form checks the quadrature.
  test.each([1, 2, 5, 12, 60])('the quadrature gives the closed form for two values, nu = %d', (nu) => {
    expectDigits(studentizedRangeCdf(Math.SQRT2 * tQuantile(0.975, nu), 2, nu), 0.95, 8);
  });
});

// Reference: the table of ISO 11843-1, alpha = beta = 0.05 (fixtures/reference/iso-11843-1/SOURCE.md).
test.each(Object.entries(reference<Record<string, number>>('iso-11843-1')))(
  'delta(%s; 0.05; 0.05) rounds to the printed %d',
  (nu, delta) => {
    expect(Math.abs(detectionDelta(Number(nu), 0.05, 0.05) - delta)).toBeLessThanOrEqual(0.00051);
  },
);

// Reference: scipy.stats.nct.cdf solved for the non-centrality, and mpmath; a small beta lies far out.
test.each([
  [5, 0.001, 5.637196767863738],
  [12, 0.01, 4.224470634467861],
])('delta(%d; 0.05; %d) agrees with scipy', (nu, beta, delta) => {
  expectDigits(detectionDelta(nu, 0.05, beta), delta, 8);
});

// Reference: scipy.stats.t.ppf(0.975, nu), fractional nu included; and the normal limit.
test.each([
  [1, 12.706204736432095],
  [2.5, 3.5746548442],
  [12, 2.1788128296634177],
  [Infinity, 1.959963984540054],
])('t(0.975; %d)', (nu, t) => {
  expectDigits(tQuantile(0.975, nu), t, 8);
});

// Reference: t_quantile of fixtures/reference/mpmath-judge/quantiles.py, fifty digits.
test.each([
  [0.975, 99999999, 1.9599640082627666781],
  [0.975, 1e8, 1.9599640082627664408],
  [0.975, 2e16, 1.9599639845400539742],
  [0.975, 1e20, 1.9599639845400538556],
  [0.505, 1e12, 0.012533469508072408153],
  [0.9999, 1e8, 3.7190166233483241525],
])('t(%d; %d), where it is all but normal', (probability, nu, t) => {
  expectDigits(tQuantile(probability, nu), t, 13);
});
