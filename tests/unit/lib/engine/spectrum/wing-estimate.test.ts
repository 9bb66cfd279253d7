import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { estimateFromWing, type SpectrumPoints, strayAbsorbance, type WingRequest } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';

const GRID = Array.from({ length: 151 }, (_, i) => 400 + 2 * i);
const band = (nm: number) => 0.2 * Math.exp(-(((nm - 510) / 45) ** 2));
const scan = (concentration: number, stray = 0, perPath = 1): SpectrumPoints => ({
  wavelengthNm: GRID,
  absorbance: GRID.map((nm) => strayAbsorbance(concentration * perPath * band(nm), stray)),
});
const ask = (changes: Partial<WingRequest> = {}): WingRequest => ({
  sample: scan(24.3),
  samplePathLengthMm: 10,
  standard: scan(2),
  standardPathLengthMm: 10,
  standardConcentration: 2,
  ...changes,
});
const found = (request: WingRequest) => {
  const estimate = estimateFromWing(request);
  if (estimate.reason !== undefined) throw new Error(estimate.reason);
  return estimate;
};

describe('an estimate from the wing of a band', () => {
  // By construction: both scans are one band times a known concentration.
  test('finds the concentration of a band of known shape', () => {
    fc.assert(
      fc.property(fc.double({ min: 3, max: 80, noNaN: true }), (c) => {
        const estimate = found(ask({ sample: scan(c) }));
        expectDigits(estimate.concentration, c, 11);
        expect(estimate.relativeSpread).toBeLessThan(1e-9);
      }),
    );
  });

  test('is little moved by stray light that cuts the top off', () => {
    const sample = scan(24.3, 0.002);
    expect(Math.max(...sample.absorbance.map(Number))).toBeLessThan(2.7);
    const estimate = found(ask({ sample }));
    expect(Math.abs(estimate.concentration / 24.3 - 1)).toBeLessThan(0.03);
    expect(estimate.fromNm).toBeLessThan(510);
    expect(estimate.toNm).toBeGreaterThan(510);
    expect(estimate.points).toBeGreaterThan(10);
  });

  test('counts the path of both cells', () => {
    const estimate = found(
      ask({
        sample: scan(24.3, 0, 0.5),
        samplePathLengthMm: 5,
        standard: scan(2, 0, 2),
        standardPathLengthMm: 20,
      }),
    );
    expectDigits(estimate.concentration, 24.3, 11);
  });

  test('reads the standard between its points, and leaves out gaps and what lies beside it', () => {
    const standard = {
      wavelengthNm: GRID.slice(20, 130).map((nm) => nm + 1),
      absorbance: GRID.slice(20, 130).map((nm) => 2 * band(nm + 1)),
    };
    const estimate = found(ask({ standard }));
    expect(Math.abs(estimate.concentration / 24.3 - 1)).toBeLessThan(0.01);
    const sample = {
      ...scan(24.3),
      absorbance: scan(24.3).absorbance.map((a, i) => (i % 3 === 0 ? null : a)),
    };
    expectDigits(found(ask({ sample })).concentration, 24.3, 11);
    const holes = { ...scan(2), absorbance: scan(2).absorbance.map((a, i) => (i % 3 === 0 ? null : a)) };
    expectDigits(found(ask({ standard: holes })).concentration, 24.3, 11);
  });

  test('says why there is none', () => {
    expect(estimateFromWing(ask({ from: 1.49, to: 1.5 }))).toEqual({
      reason: expect.stringMatching(/at least 3 points/),
    });
    expect(estimateFromWing(ask({ standard: scan(0.001) }))).toHaveProperty('reason');
  });

  test.each<[string, Partial<WingRequest>]>([
    ['PATH_LENGTH_NOT_POSITIVE', { samplePathLengthMm: 0 }],
    ['PATH_LENGTH_NOT_POSITIVE', { standardPathLengthMm: -1 }],
    ['CONCENTRATION_NEGATIVE', { standardConcentration: 0 }],
    ['SPECTRUM_EMPTY', { sample: { wavelengthNm: [], absorbance: [] } }],
    ['LENGTH_MISMATCH', { standard: { wavelengthNm: [1], absorbance: [] } }],
  ])('refuses %s', (code, changes) => {
    expect(() => estimateFromWing(ask(changes))).toThrow(expect.objectContaining({ code }));
  });
});
