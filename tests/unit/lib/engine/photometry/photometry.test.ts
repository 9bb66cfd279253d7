import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { peakSeenThroughSlit, slopeLoss } from '@/lib/engine/photometry/bandwidth';
import {
  LEAST_PHOTOMETRIC_ERROR_AT,
  photometricErrorPercent,
} from '@/lib/engine/photometry/photometric-error';
import { strayAbsorbance, strayBias, strayCeiling, strayPlateau } from '@/lib/engine/photometry/stray-light';
import { expectDigits } from '../../../../support/digits';

describe('stray light', () => {
  // The formula evaluated by hand calculator and by numpy: A true 1, 2, 3, 4 at each stray fraction.
  test.each([
    [0.0001, ['0.9996', '1.9957', '2.9587', '3.6990']],
    [0.001, ['0.9961', '1.9590', '2.6994', '2.9590']],
    [0.01, ['0.9629', '1.7033', '1.9629', '2.0000']],
  ])('at a fraction of %s shows %j', (stray, shown) => {
    expect([1, 2, 3, 4].map((a) => strayAbsorbance(a, stray).toFixed(4))).toEqual(shown);
  });

  // Table of biases computed independently (numpy), per cent of A at A 0.5, 1, 1.5, 2, 2.5, 3, then ceiling, plateau.
  test.each([
    [0.0001, ['-0.02', '-0.04', '-0.09', '-0.21', '-0.54', '-1.38'], '2.83', '4.00'],
    [0.0003, ['-0.06', '-0.12', '-0.26', '-0.64', '-1.57', '-3.79'], '2.25', '3.52'],
    [0.0005, ['-0.09', '-0.19', '-0.44', '-1.05', '-2.54', '-5.86'], '1.97', '3.30'],
    [0.001, ['-0.19', '-0.39', '-0.87', '-2.05', '-4.76', '-10.02'], '1.58', '3.00'],
  ])('at a fraction of %s biases by %j %%, ceiling %s, plateau %s', (stray, percents, ceiling, plateau) => {
    expect([0.5, 1, 1.5, 2, 2.5, 3].map((a) => strayBias(a, stray).biasPercent.toFixed(2))).toEqual(percents);
    expect(strayCeiling(stray)?.trueAbsorbance.toFixed(2)).toBe(ceiling);
    expect(strayPlateau(stray).toFixed(2)).toBe(plateau);
  });

  test('the ceiling is where the bias is what was asked', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 5e-3, noNaN: true }),
        fc.constantFrom(1, 2, 5),
        (stray, percent) => {
          const ceiling = strayCeiling(stray, percent);
          if (!ceiling) throw new Error('a ceiling was expected');
          expectDigits(strayBias(ceiling.trueAbsorbance, stray).biasPercent, -percent, 7);
          expect(ceiling.shownAbsorbance).toBeLessThan(ceiling.trueAbsorbance);
          expect(ceiling.shownAbsorbance).toBeLessThan(strayPlateau(stray));
        },
      ),
    );
  });

  test('has no ceiling where every absorbance is off by more, and none to fear without stray light', () => {
    expect(strayCeiling(0.02)).toBeNull();
    expect(strayCeiling(0)).toEqual({ trueAbsorbance: Infinity, shownAbsorbance: Infinity });
    expect(strayPlateau(0)).toBe(Infinity);
    expectDigits(strayAbsorbance(1.234, 0), 1.234, 14);
  });

  test('at zero gives the limit of the relative bias', () => {
    expectDigits(strayBias(0, 0.01).biasPercent, strayBias(1e-6, 0.01).biasPercent, 5);
    expect(strayBias(0, 0.01).bias).toBe(0);
  });

  test('refuses a fraction below zero and a bias that is none', () => {
    expect(() => strayAbsorbance(1, -0.1)).toThrow(expect.objectContaining({ code: 'UNCERTAINTY_NEGATIVE' }));
    expect(() => strayPlateau(NaN)).toThrow(expect.objectContaining({ code: 'NOT_FINITE' }));
    expect(() => strayCeiling(0.001, 0)).toThrow(expect.objectContaining({ code: 'LIMIT_NOT_POSITIVE' }));
  });
});

describe('the photometric error', () => {
  // Twyman and Lothian's optimum (typed from memory): A 0.4343, T 36.8 %, 2.718 % for ΔT = 0.01. The others follow.
  test.each([
    [0.1, '5.47'],
    [0.2, '3.44'],
    [0.4343, '2.72'],
    [1, '4.34'],
    [1.5, '9.16'],
  ])('at A %s is %s %% for an error of 1 %%T', (absorbance, percent) => {
    expect(photometricErrorPercent(absorbance, 0.01).toFixed(2)).toBe(percent);
  });

  test('is least at log10 e, where it is e per cent', () => {
    expectDigits(photometricErrorPercent(LEAST_PHOTOMETRIC_ERROR_AT, 0.01), Math.E, 14);
    expect(photometricErrorPercent(2, 0.01).toFixed(1)).toBe('21.7');
    for (const a of [0.42, 0.45])
      expect(photometricErrorPercent(a, 0.01)).toBeGreaterThan(
        photometricErrorPercent(LEAST_PHOTOMETRIC_ERROR_AT, 0.01),
      );
  });
});

describe('the bandwidth', () => {
  // Gaussian band, triangular slit, by numerical integration (scipy): 0.9954, 0.9819, 0.8987.
  test.each([
    [0.1, '0.9954'],
    [0.2, '0.9819'],
    [0.5, '0.8987'],
  ])('a slit of %s of the band shows %s of the peak', (ratio, seen) => {
    expect(peakSeenThroughSlit(ratio).toFixed(4)).toBe(seen);
  });

  test('joins its series', () => {
    expect(peakSeenThroughSlit(0)).toBe(1);
    expectDigits(1 - peakSeenThroughSlit(1.0001e-3), 1 - peakSeenThroughSlit(0.9999e-3), 3);
  });

  // Published in a discussion of slits over sloping bands (2006): 0.1, 0.2, 0.5 across the slit.
  test.each([
    [0.1, '0.00096'],
    [0.2, '0.00383'],
    [-0.5, '0.02373'],
  ])('a slope of %s across the slit reads low by %s', (change, loss) => {
    expect(slopeLoss(change).toFixed(5)).toBe(loss);
  });

  test('loses nothing on the flat', () => {
    expect(slopeLoss(0)).toBe(0);
    expectDigits(slopeLoss(8.6e-5), slopeLoss(8.8e-5) * (8.6 / 8.8) ** 2, 4);
  });
});
