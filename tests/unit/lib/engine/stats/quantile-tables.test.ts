import { describe, expect, test } from 'vitest';
import { cochranCritical } from '@/lib/engine/hypothesis/cochran';
import { dixonCritical } from '@/lib/engine/hypothesis/dixon';
import { grubbsCritical } from '@/lib/engine/hypothesis/grubbs';
import { fQuantile, fUpperP } from '@/lib/engine/stats/f-distribution';
import { tQuantile } from '@/lib/engine/stats/student-t';
import { reference } from '../requests';

// Reference: published tables (fixtures/reference/quantile-tables/SOURCE.md says which, and what was typed from memory).
const tables = reference<{
  Grubbs_two_sided: { n: number[]; '0.05': number[]; '0.01': number[] };
  'Grubbs_one_sided_0.05': { n: number[]; G: number[] };
  Dixon_Q10_two_tailed: { n: number[]; '0.05': number[]; '0.01': number[] };
  'Cochran_C_0.05': { k: number[]; n2: number[]; n3: number[]; n4: number[]; n5: number[] };
  t: { nu: number[]; '0.95': number[]; '0.975': number[]; '0.995': number[] };
  F: [number, number, number, number][];
}>('quantile-tables');

const printed = (value: number, table: number | undefined) =>
  expect(value.toFixed(3)).toBe(table?.toFixed(3));

describe('tables, as printed to three decimals', () => {
  const { Grubbs_two_sided: two, 'Grubbs_one_sided_0.05': one, 'Cochran_C_0.05': c } = tables;
  test.each(two.n.map((n, i) => [n, two['0.05'][i], two['0.01'][i]]))(
    'Grubbs, %d values',
    (n = NaN, g95, g99) => {
      printed(grubbsCritical(n, 0.95), g95);
      printed(grubbsCritical(n, 0.99), g99);
    },
  );

  // One-sided at 5 % is two-sided at 10 %.
  test.each(one.n.map((n, i) => [n, one.G[i]]))('Grubbs one-sided, %d values', (n = NaN, g) => {
    printed(grubbsCritical(n, 0.9), g);
  });

  test.each(tables.Dixon_Q10_two_tailed.n.map((n, i) => [n, i]))('Dixon, %d values', (n = NaN, i = NaN) => {
    expect(dixonCritical(n, 0.95)).toBe(tables.Dixon_Q10_two_tailed['0.05'][i]);
    expect(dixonCritical(n, 0.99)).toBe(tables.Dixon_Q10_two_tailed['0.01'][i]);
  });

  test.each([2, 11])('Dixon has no value for %d values', (n) => {
    expect(dixonCritical(n, 0.95)).toBeNull();
  });

  test.each(c.k.map((k, i) => [k, c.n2[i], c.n3[i], c.n4[i], c.n5[i]]))(
    'Cochran, %d levels',
    (k = NaN, ...row) => {
      // Half a unit of the last digit and a little: the table rounds 0.5725 up or down as it was computed.
      row.forEach((value, j) =>
        expect(Math.abs(cochranCritical(k, j + 2, 0.95) - (value ?? NaN))).toBeLessThan(0.00061),
      );
    },
  );

  test.each(tables.t.nu.map((nu, i) => [nu, i]))('t, %d degrees of freedom', (nu = NaN, i = NaN) => {
    printed(tQuantile(0.95, nu), tables.t['0.95'][i]);
    printed(tQuantile(0.975, nu), tables.t['0.975'][i]);
    printed(tQuantile(0.995, nu), tables.t['0.995'][i]);
  });

  test.each(tables.F)('F(%d; %d, %d) = %d', (level, df1, df2, value) => {
    printed(fQuantile(level, df1, df2), value);
  });
});

// Identity: the quantile is where the upper tail holds what is left; below zero everything lies above.
test('the upper tail of F belongs to its quantile', () => {
  expect(fUpperP(fQuantile(0.99, 3, 10), 3, 10)).toBeCloseTo(0.01, 12);
  expect(fUpperP(0, 3, 10)).toBe(1);
});

// Quantiles are kept once found; forgetting them all must change none.
test('quantiles are the same after more of them than are kept', () => {
  const [t, f] = [tQuantile(0.975, 7), fQuantile(0.95, 2, 7)];
  for (let nu = 1; nu <= 600; nu += 1) {
    tQuantile(0.9, nu);
    fQuantile(0.9, 1, nu);
  }
  expect([tQuantile(0.975, 7), fQuantile(0.95, 2, 7)]).toEqual([t, f]);
});
