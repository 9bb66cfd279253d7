import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { qr } from '@/lib/engine/matrices';
import type { Fit } from '@/lib/engine/regression/fit';
import { fitLine } from '@/lib/engine/regression/fit-line';
import { fitProportional } from '@/lib/engine/regression/fit-proportional';
import { fitQuadratic } from '@/lib/engine/regression/fit-quadratic';
import { householder } from '@/lib/engine/regression/qr';
import { expectDigits } from '../../../../support/digits';
import { reference } from '../requests';

interface StrdSet {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly certified: Readonly<Record<string, string>>;
}

// Reference: NIST StRD, linear least squares, certified to 15 digits (fixtures/reference/nist-strd/SOURCE.md).
const strd = reference<Record<'Norris' | 'Pontius' | 'NoInt1' | 'NoInt2', StrdSet>>('nist-strd');

const ones = (x: readonly unknown[]) => x.map(() => 1);
const sd = (fit: Fit, i: number) => Math.sqrt(fit.covariance[i]?.[i] ?? NaN);

/** Our names for what NIST certifies. */
const CERTIFIED: Readonly<Record<string, (fit: Fit) => number>> = {
  B0: (fit) => fit.coefficients[0] ?? NaN,
  B1: (fit) => fit.coefficients[1] ?? NaN,
  B2: (fit) => fit.coefficients[2] ?? NaN,
  sdB0: (fit) => sd(fit, 0),
  sdB1: (fit) => sd(fit, 1),
  sdB2: (fit) => sd(fit, 2),
  residual_sd: (fit) => fit.residualSd,
  R2: (fit) => fit.rSquared,
  SSE: (fit) => fit.residualSquares,
};

const SETS = [
  ['Norris', fitLine],
  ['NoInt1', fitProportional],
  ['NoInt2', fitProportional],
  ['Pontius', fitQuadratic],
] as const;

describe.each(SETS)('NIST %s', (name, fitOf) => {
  const { x, y, certified } = strd[name];
  const fit = fitOf({ x, y, w: ones(x) });
  const known = Object.entries(certified).filter(([field]) => field in CERTIFIED);
  test.each(known)('agrees on %s to 12 digits', (field, value) => {
    expectDigits(CERTIFIED[field]?.(fit) ?? NaN, value, 12);
  });
});

/** x in another unit: the values NIST certifies scale with it. */
const UNIT_POWER: Readonly<Record<string, number>> = { B1: -1, sdB1: -1, B2: -2, sdB2: -2 };

describe.each(SETS)('NIST %s with x in another unit', (name, fitOf) => {
  const { x, y, certified } = strd[name];
  const known = Object.entries(certified).filter(([field]) => field in CERTIFIED);
  const cases = [1e6, 1e-6].flatMap((factor) => known.map(([field, value]) => ({ factor, field, value })));
  test.each(cases)('x times $factor: $field', ({ factor, field, value }) => {
    const fit = fitOf({ x: x.map((at) => at * factor), y, w: ones(x) });
    // The products round, and the intercept of Norris, 0.06 % of the range of y, feels it most.
    const digits = name === 'Norris' && field === 'B0' ? 11.5 : 12;
    expectDigits(CERTIFIED[field]?.(fit) ?? NaN, Number(value) * factor ** (UNIT_POWER[field] ?? 0), digits);
  });
});

// Reference: fractions in Python on the very doubles (fixtures/reference/exact-rational/SOURCE.md).
const exact = reference<Record<string, Record<string, string>>>('exact-rational');

describe.each(SETS)('%s against exact rational arithmetic', (name, fitOf) => {
  const { x, y } = strd[name];
  const changed: Readonly<Record<string, { x: readonly number[]; w: readonly number[] }>> = {
    plus1e9: { x: x.map((at) => at + 1e9), w: ones(x) },
    times1e6: { x: x.map((at) => at * 1e6), w: ones(x) },
    'times1e-6': { x: x.map((at) => at * 1e-6), w: ones(x) },
    weighted: { x, w: x.map((_, i) => 1 / 3 + (i % 7) * 2) },
  };
  const cases = Object.keys(changed).flatMap((change) =>
    Object.entries(exact[`${name} ${change}`] ?? {}).map(([field, value]) => ({ change, field, value })),
  );
  test.each(cases)('$change: $field to 12 digits', ({ change, field, value }) => {
    const data = changed[change] ?? { x: [], w: [] };
    expectDigits(CERTIFIED[field]?.(fitOf({ ...data, y })) ?? NaN, value, 12);
  });
});

describe('fitLine', () => {
  // Property: the slope of y = 2x stays 2 however far from zero the x lie; one-pass sums lose every digit here.
  test('keeps y = 2x at an offset of 1e9', () => {
    const x = [0, 1, 2, 3, 4].map((value) => value + 1e9);
    const fit = fitLine({ x, y: x.map((value) => 2 * value), w: ones(x) });
    expect(fit.coefficients).toEqual([0, 2]);
    expect(fit.residualSd).toBe(0);
  });

  test('keeps the slope when x alone carries the offset', () => {
    const x = [0, 1, 2, 3, 4].map((value) => value + 1e9);
    expect(fitLine({ x, y: [0, 2, 4, 6, 8], w: ones(x) }).coefficients[1]).toBe(2);
  });

  // Property: weights that are all the same are no weights.
  test('takes the package and its own sums to the same line', () => {
    const { x, y } = strd.Norris;
    const plain = fitLine({ x, y, w: ones(x) });
    const weighted = fitLine({ x, y, w: x.map((_, i) => (i === 0 ? 1 + 1e-15 : 1)) });
    expectDigits(weighted.coefficients[1] ?? NaN, plain.coefficients[1] ?? NaN, 13);
    expectDigits(weighted.coefficients[0] ?? NaN, plain.coefficients[0] ?? NaN, 10);
  });
});

// Property: a line through every point again as often gives the same coefficients; the long one goes without the package.
test('many points give the slope that few give', () => {
  const { x, y } = strd.Norris;
  const times = (values: readonly number[]) => Array.from({ length: 40 }, () => values).flat();
  const few = fitLine({ x, y, w: ones(x) });
  const many = fitLine({ x: times(x), y: times(y), w: ones(times(x)) });
  expect(many.n).toBe(1440);
  expectDigits(many.coefficients[1] ?? NaN, few.coefficients[1] ?? NaN, 13);
  expectDigits(many.coefficients[0] ?? NaN, few.coefficients[0] ?? NaN, 11);
  expectDigits(many.residualSquares, 40 * few.residualSquares, 12);
});

describe('the orthogonal decomposition', () => {
  // Property: nothing to turn, nothing turned.
  test('leaves a column of zeros as it is', () => {
    const { r } = householder([
      [0, 0, 0],
      [0, 3, 4],
    ]);
    expect(r.map((row) => row.map(Math.abs))).toEqual([
      [0, 0],
      [0, 5],
    ]);
  });

  // Second opinion: mathjs, on random weighted problems of a constant, a slope and a bend.
  test('agrees with that of mathjs to 12 digits in the fitted parabola', () => {
    const number = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(fc.tuple(number, number, fc.double({ min: 0.1, max: 10, noNaN: true })), {
          minLength: 6,
          maxLength: 20,
        }),
        (rows) => {
          const x = rows.map(([jitter], i) => 3 * i + jitter);
          const y = rows.map(([, noise], i) => 1 + 0.5 * i + noise);
          const w = rows.map(([, , weight]) => weight);
          const fit = fitQuadratic({ x, y, w });
          const design = x.map((value, i) => {
            const t = (value - fit.centre) / fit.scale;
            return [1, t, t * t].map((term) => term * Math.sqrt(w[i] ?? NaN));
          });
          const { Q, R } = qr(design);
          const right = y.map((value, i) => value * Math.sqrt(w[i] ?? NaN));
          const beta = solveUpper(R as number[][], Q as number[][], right);
          const size = Math.max(...beta.map(Math.abs));
          beta.forEach((value, k) =>
            expect(Math.abs(value - (fit.beta[k] ?? NaN)) / size).toBeLessThan(1e-12),
          );
        },
      ),
      { seed: 20270114, numRuns: 50 },
    );
  });
});

/** R β = (Qᵀ y) of the first three rows, from the last upwards. */
function solveUpper(r: number[][], q: number[][], y: readonly number[]): number[] {
  const rotated = [0, 1, 2].map((k) => q.reduce((sum, row, i) => sum + (row[k] ?? NaN) * (y[i] ?? NaN), 0));
  const beta = [0, 0, 0];
  for (const k of [2, 1, 0]) {
    const rest = [2, 1, 0]
      .filter((j) => j > k)
      .reduce((sum, j) => sum + (r[k]?.[j] ?? NaN) * (beta[j] ?? 0), 0);
    beta[k] = ((rotated[k] ?? NaN) - rest) / (r[k]?.[k] ?? NaN);
  }
  return beta;
}
