import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type StandardRequest } from '@/lib/engine';
import { dixon } from '@/lib/engine/hypothesis/dixon';
import { grubbs, largestResidualCritical, largestResidualP } from '@/lib/engine/hypothesis/grubbs';
import { expectDigits } from '../../../../support/digits';
import { request } from '../requests';

const outliersOf = (standards: readonly StandardRequest[], changes = {}) =>
  calculateStandardCurve(request({ standards, ...changes })).curve.judgements?.outliers ?? [];

describe('Dixon', () => {
  // Reference: the usual textbook example, Q = 0.455, typed from memory; and gap over range by hand.
  test.each([
    [
      'low',
      [0.189, 0.167, 0.187, 0.183, 0.186, 0.182, 0.181, 0.184, 0.181, 0.177],
      1,
      (0.177 - 0.167) / (0.189 - 0.167),
    ],
    ['high', [0.403, 0.41, 0.401, 0.38, 0.5], 4, (0.5 - 0.41) / (0.5 - 0.38)],
  ])('finds the %s value', (_which, values, at, statistic) => {
    const found = dixon(values, 0.95);
    expect(found?.at).toBe(at);
    expectDigits(found?.statistic ?? NaN, statistic, 12);
  });

  test('has nothing to say of eleven values', () => {
    expect(dixon([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 30], 0.95)).toBeNull();
  });
});

describe('Grubbs', () => {
  // Reference: NIST/SEMATECH e-Handbook, 1.3.5.17.1 (uranium masses), typed from memory: G = 2.4688, critical 2.032 one-sided.
  const masses = [199.31, 199.53, 200.19, 200.82, 201.92, 201.95, 202.18, 245.57];
  test('finds the outlier of the handbook', () => {
    const found = grubbs(masses, 0.95);
    expect(found.at).toBe(7);
    expect(found.statistic.toFixed(4)).toBe('2.4688');
    expect(found.critical.toFixed(3)).toBe('2.127');
    expect(grubbs(masses, 0.9).critical.toFixed(3)).toBe('2.032');
  });

  // Identity: p at the critical value is what is left of the confidence.
  test.each([
    [8, 7, 0.95],
    [14, 12, 0.99],
  ])('p of the limit of %d residuals with %d degrees of freedom at %d', (n, nu, confidence) => {
    expectDigits(largestResidualP(largestResidualCritical(n, nu, confidence), n, nu), 1 - confidence, 9);
  });

  test('a residual that holds all the scatter has p = 0, a small one no more than 1', () => {
    expect(largestResidualP(Math.sqrt(5), 7, 5)).toBe(0);
    expect(largestResidualP(0.1, 7, 5)).toBe(1);
  });
});

describe('outliers of a curve', () => {
  const clean = [
    { name: 'S1', concentration: 1, readings: [0.101, 0.1, 0.102] },
    { name: 'S2', concentration: 2, readings: [0.2, 0.2015, 0.2005] },
    { name: 'S3', concentration: 4, readings: [0.4, 0.401, 0.399] },
    { name: 'S4', concentration: 8, readings: [0.8, 0.801, 0.7995] },
  ];

  test('a clean curve has none', () => {
    expect(outliersOf(clean)).toEqual([]);
  });

  test('one far reading is found by all three, as advice only', () => {
    const far = { name: 'S3', concentration: 4, readings: [0.4, 0.4004, 0.3996, 0.4001, 0.46] };
    const found = outliersOf(clean.map((standard) => (standard.name === 'S3' ? far : standard)));
    expect(
      found.map(({ test, among, name, replicate, confidence }) => [test, among, name, replicate, confidence]),
    ).toEqual([
      ['Grubbs', 'replicates', 'S3', 5, 0.99],
      ['Dixon', 'replicates', 'S3', 5, 0.99],
      ['Grubbs', 'residuals', 'S3', 5, 0.99],
    ]);
    expect(found[0]?.sentence).toMatch(
      /^Reading 5 of S3 lies far from the other readings of 4 \(Grubbs's test 1\.\d+, limit 1\.764 at 99 %, 5 readings\)\. A test alone is no reason/,
    );
    expect(found[2]?.sentence).toContain('far from the curve (Largest standardised residual 3.');
    // It stays in the fit.
    const { curve } = calculateStandardCurve(
      request({ standards: clean.map((standard) => (standard.name === 'S3' ? far : standard)) }),
    );
    expect(curve.n).toBe(14);
  });

  test('a straggler is named at 95 %', () => {
    // Grubbs 1.715 to 1.764 for five values (table), which the fifth lies between.
    const straggling = { name: 'S4', concentration: 8, readings: [0.8, 0.801, 0.7985, 0.802, 0.812] };
    const [first] = outliersOf(clean.map((standard) => (standard.name === 'S4' ? straggling : standard)));
    expect(first?.confidence).toBe(0.95);
    expect(first?.statistic).toBeGreaterThan(1.715);
    expect(first?.statistic).toBeLessThan(1.764);
  });

  test.each([
    [
      'readings of different weight',
      [
        { concentration: 4, readings: [0.4, 0.4001, 0.4002] },
        { concentration: 4, readings: [0.6], pathLengthMm: 50 },
      ],
    ],
    ['identical readings', [{ concentration: 4, readings: [0.4, 0.4, 0.4] }]],
  ])('%s are not compared within their level', (_what, level) => {
    const found = outliersOf([...clean.filter(({ name }) => name !== 'S3'), ...level]);
    expect(found.filter(({ among, concentration }) => among === 'replicates' && concentration === 4)).toEqual(
      [],
    );
  });

  test('one degree of freedom says nothing of residuals', () => {
    expect(
      outliersOf(
        [1, 2, 4].map((concentration, i) => ({
          concentration,
          readings: [0.1 * concentration + (i % 2) * 0.05],
        })),
      ),
    ).toEqual([]);
  });
});

describe('the intercept beside half the lowest standard', () => {
  const sizeOf = (offset: number, changes = {}) =>
    calculateStandardCurve(
      request({
        standards: [1, 2, 4, 6].map((c, i) => ({
          concentration: c,
          readings: [offset + 0.1 * c + 1e-4 * (i % 2)],
        })),
        ...changes,
      }),
    ).curve.judgements?.interceptSize;

  test('passes below it and falls above it', () => {
    expect(sizeOf(0.04)).toMatchObject({ halfLowest: 0.5, passed: true });
    const large = sizeOf(0.06);
    expect(large?.passed).toBe(false);
    expect(large?.verdict).toMatch(
      /^The intercept stands for 0\.6\d* mg\/L, more than half the lowest standard \(0\.5 mg\/L\)\.$/,
    );
  });

  test('a line through zero has none', () => {
    expect(sizeOf(0.001, { model: 'proportional' })).toBeNull();
  });
});
