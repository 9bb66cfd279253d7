import { describe, expect, test } from 'vitest';
import type { Fit } from '@/lib/engine/regression/fit';
import { fitLine } from '@/lib/engine/regression/fit-line';
import { fitProportional } from '@/lib/engine/regression/fit-proportional';
import { fitQuadratic } from '@/lib/engine/regression/fit-quadratic';
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

describe.each([
  ['Norris', fitLine],
  ['NoInt1', fitProportional],
  ['NoInt2', fitProportional],
  ['Pontius', fitQuadratic],
] as const)('NIST %s', (name, fitOf) => {
  const { x, y, certified } = strd[name];
  const fit = fitOf({ x, y, w: ones(x) });
  const known = Object.entries(certified).filter(([field]) => field in CERTIFIED);
  test.each(known)('agrees on %s to 12 digits', (field, value) => {
    expectDigits(CERTIFIED[field]?.(fit) ?? NaN, value, 12);
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
