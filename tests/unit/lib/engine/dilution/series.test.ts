import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { prepareSeries, type SeriesRequest, stockSolution, type StockRequest } from '@/lib/engine';
import { productOf, type Quantity, relativeU } from '@/lib/engine/uncertainty/quantity';
import { expectDigits } from '../../../../support/digits';
import { reference } from '../requests';

describe('a stock made up from a weighed substance', () => {
  // Reference: EURACHEM/CITAC CG 4, example A1, unrounded budget (fixtures/reference/eurachem-cg4/SOURCE.md).
  test('agrees with example A1', () => {
    const { A1stock } = reference<{
      A1stock: StockRequest & {
        c: number;
        u: number;
        uOfMass: number;
        uOfPurity: number;
        uOfVolumeParts: number[];
      };
    }>('eurachem-cg4');
    const stock = stockSolution(A1stock);
    // Published in mg/L to five decimals and six digits.
    expect((1000 * stock.value).toFixed(5)).toBe(A1stock.c.toFixed(5));
    expect((1000 * stock.u).toFixed(6)).toBe(A1stock.u.toFixed(6));
    const part = (source: string) => 1000 * (stock.parts.find((item) => item.source === source)?.u ?? NaN);
    expect(part('mass').toFixed(5)).toBe(A1stock.uOfMass.toFixed(5));
    expect(part('purity').toFixed(7)).toBe(A1stock.uOfPurity.toFixed(7));
    expectDigits(part('volume'), Math.hypot(...A1stock.uOfVolumeParts), 5);
    expectDigits(stock.relativeU, stock.u / stock.value, 14);
  });

  test('is certain when nothing else was entered', () => {
    expect(stockSolution({ massG: 1, purity: 1, volumeMl: 1000 })).toMatchObject({
      value: 1,
      u: 0,
      relativeU: 0,
    });
  });

  test.each<[string, string, Partial<StockRequest>]>([
    ['MASS_NOT_POSITIVE', '/massG', { massG: 0 }],
    ['MASS_NOT_POSITIVE', '/purity', { purity: 0 }],
    ['VOLUME_NOT_POSITIVE', '/volumeMl', { volumeMl: -1 }],
    ['UNCERTAINTY_NEGATIVE', '/massUG', { massUG: -1 }],
    ['UNCERTAINTY_NEGATIVE', '/purityHalfWidth', { purityHalfWidth: -1 }],
  ])('refuses %s at %s', (code, pointer, changes) => {
    expect(() => stockSolution({ massG: 1, purity: 1, volumeMl: 1, ...changes })).toThrow(
      expect.objectContaining({ code, pointer }),
    );
  });
});

// Reference: EURACHEM/CITAC CG 4, example A2, c = 1000 m P / (M V_T) with a repeatability factor of 1 ± 0.0005.
test('a product of powers agrees with example A2', () => {
  const { A2 } = reference<{
    A2: Record<'m' | 'P' | 'M' | 'VT' | 'repeatability', { value: number; u: number }> & {
      c: number;
      u: number;
    };
  }>('eurachem-cg4');
  const of = (label: string, { value, u }: { value: number; u: number }, power: 1 | -1): Quantity => ({
    id: label,
    label,
    symbol: label,
    unit: '',
    value,
    power,
    spreads: [{ shape: 'normal', u }],
    source: 'example',
  });
  const quantities = [
    of('m', A2.m, 1),
    of('P', A2.P, 1),
    of('M', A2.M, -1),
    of('V_T', A2.VT, -1),
    of('repeatability', A2.repeatability, 1),
  ];
  const c = 1000 * productOf(quantities);
  // The published figure is cut after twelve decimals.
  expectDigits(c, A2.c, 10);
  // u(M) has four digits.
  expectDigits(c * relativeU(quantities), A2.u, 7);
});

const exact = { concentration: 100, relativeU: 0.002 };
const series = (solutions: SeriesRequest['solutions'], stock = exact) => prepareSeries({ stock, solutions });

describe('standards from one stock', () => {
  // By hand: 1 and 2 mL (u 0.005 and 0.008) in one named flask of 100 mL (±0.1 triangular), stock 0.2 %.
  const flask = { toleranceMl: 0.1, piece: 'flask F' };
  const made = series([
    { name: 'S1', from: 'stock', dilution: [{ takenMl: 1, toMl: 100, takenUMl: 0.005, toWare: flask }] },
    { name: 'S2', from: 'stock', dilution: [{ takenMl: 2, toMl: 100, takenUMl: 0.008, toWare: flask }] },
  ]);
  const rFlask = 0.1 / Math.sqrt(6) / 100;

  test('have concentration and uncertainty', () => {
    expect(made.standards.map((item) => item.concentration)).toEqual([1, 2]);
    expectDigits(made.standards[0]?.u ?? NaN, Math.hypot(0.002, rFlask, 0.005), 13);
    expectDigits(made.standards[1]?.u ?? NaN, 2 * Math.hypot(0.002, rFlask, 0.004), 13);
    expectDigits(made.standards[1]?.ownRelativeU ?? NaN, 0.004, 13);
  });

  test('have the covariance of what they share', () => {
    expectDigits(made.covariance[0]?.[1] ?? NaN, 2 * (0.002 ** 2 + rFlask ** 2), 13);
    expect(made.covariance[1]?.[0]).toBe(made.covariance[0]?.[1]);
    const [s1, s2] = made.standards.map((item) => item.u);
    expectDigits(
      made.correlation[0]?.[1] ?? NaN,
      (made.covariance[0]?.[1] ?? NaN) / ((s1 ?? NaN) * (s2 ?? NaN)),
      13,
    );
    expect(made.correlation[1]?.[1]).toBe(1);
  });

  test('tell apart what all have in common, counted once', () => {
    expect(made.shared.map((item) => item.source)).toEqual(['stock', 'flask F, used 2 times']);
    expectDigits(made.sharedRelativeU, Math.hypot(0.002, rFlask), 13);
  });
});

describe('standards made from one another', () => {
  // By hand: each made 1 in 10 from the one before; errors add up along the chain.
  const step = { takenMl: 10, toMl: 100, takenUMl: 0.02 };
  const made = series([
    { name: 'intermediate', from: 'stock', dilution: [step], isStandard: false },
    { name: 'S1', from: 'intermediate', dilution: [step] },
    { name: 'S2', from: 'S1', dilution: [step] },
  ]);

  test('inherit the errors of what they were made from', () => {
    expectDigits(made.standards[0]?.concentration ?? NaN, 1, 14);
    expectDigits(made.standards[1]?.concentration ?? NaN, 0.1, 14);
    expectDigits((made.standards[0]?.u ?? NaN) / 1, Math.hypot(0.002, 0.002, 0.002), 13);
    expectDigits((made.standards[1]?.u ?? NaN) / 0.1, Math.hypot(0.002, 0.002, 0.002, 0.002), 13);
  });

  test('share the intermediate and all before it', () => {
    expect(made.shared.map((item) => item.source)).toEqual([
      'stock',
      'intermediate: dilution 1, volume taken',
      'S1: dilution 1, volume taken',
    ]);
    expectDigits(made.covariance[0]?.[1] ?? NaN, 0.1 * 3 * 0.002 ** 2, 12);
  });
});

describe('series', () => {
  test('of certain solutions have no correlation', () => {
    const made = series(
      [
        { name: 'a', from: 'stock', dilution: [{ takenMl: 1, toMl: 10 }] },
        { name: 'b', from: 'stock', dilution: [] },
      ],
      { concentration: 5, relativeU: 0 },
    );
    expect(made.correlation).toEqual([
      [1, 0],
      [0, 1],
    ]);
    expect(made.standards.map((item) => item.concentration)).toEqual([0.5, 5]);
    expect(made.shared).toEqual([]);
  });

  test('have covariances that any sum of standards can have', () => {
    const volume = fc.double({ min: 0.5, max: 20, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(volume, { minLength: 2, maxLength: 5 }),
        fc.double({ min: 0, max: 0.05, noNaN: true }),
        (volumes, relativeU) => {
          const made = series(
            volumes.map((takenMl, i) => ({
              name: `S${i}`,
              from: i % 2 === 1 ? `S${i - 1}` : 'stock',
              dilution: [{ takenMl, toMl: 100, takenUMl: 0.01, toWare: { toleranceMl: 0.1, piece: 'F' } }],
            })),
            { concentration: 100, relativeU },
          );
          for (const row of made.correlation)
            for (const r of row) expect(Math.abs(r)).toBeLessThanOrEqual(1 + 1e-12);
          const total = made.covariance.flat().reduce((sum, value) => sum + value, 0);
          expect(total).toBeGreaterThanOrEqual(0);
        },
      ),
      { numRuns: 40 },
    );
  });

  test.each<[string, string, SeriesRequest]>([
    [
      'SERIES_BROKEN',
      '/solutions/0/from',
      { stock: exact, solutions: [{ name: 'a', from: 'b', dilution: [] }] },
    ],
    [
      'SERIES_BROKEN',
      '/solutions/0/from',
      { stock: exact, solutions: [{ name: 'stock', from: 'stock', dilution: [] }] },
    ],
    [
      'CONCENTRATION_NEGATIVE',
      '/stock/concentration',
      { stock: { concentration: 0, relativeU: 0 }, solutions: [] },
    ],
    [
      'UNCERTAINTY_NEGATIVE',
      '/stock/relativeU',
      { stock: { concentration: 1, relativeU: -1 }, solutions: [] },
    ],
    [
      'DILUTION_BELOW_TAKEN',
      '/solutions/0/dilution/0/toMl',
      { stock: exact, solutions: [{ name: 'a', from: 'stock', dilution: [{ takenMl: 2, toMl: 1 }] }] },
    ],
  ])('refuse %s at %s', (code, pointer, asked) => {
    expect(() => prepareSeries(asked)).toThrow(expect.objectContaining({ code, pointer }));
  });
});
