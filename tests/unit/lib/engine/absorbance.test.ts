import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { absorbanceOf, transmittanceOf } from '@/lib/engine';
import { absorbanceAsRead, highestAsRead } from '@/lib/engine/absorbance';
import { expectDigits } from '../../../support/digits';

describe('absorbanceOf', () => {
  // Identity A = -log10 T: 100, 50, 10, 1 and 0.1 %T; 36.8 %T is printed as 0.43415 in photometry texts.
  test.each([
    [100, 0],
    [50, 0.3010299956639812],
    [10, 1],
    [1, 2],
    [0.1, 3],
  ])('%d per cent transmittance is absorbance %d', (percent, absorbance) => {
    expectDigits((absorbanceOf(percent, 'percentTransmittance').value ?? NaN) + 1, absorbance + 1, 15);
    expectDigits((absorbanceOf(percent / 100, 'transmittance').value ?? NaN) + 1, absorbance + 1, 15);
  });

  test('takes an absorbance as it is, zero and negative too', () => {
    expect(absorbanceOf(-0.002, 'absorbance')).toEqual({ value: -0.002 });
  });

  // Property: there and back is the same light.
  test('undoes transmittanceOf', () => {
    fc.assert(
      fc.property(fc.double({ min: -1, max: 5, noNaN: true }), (a) => {
        expectDigits((absorbanceOf(transmittanceOf(a), 'transmittance').value ?? NaN) + 10, a + 10, 14);
      }),
      { seed: 7 },
    );
  });

  test.each([
    ['OVER', 'absorbance', 'aboveRange', undefined],
    ['over range', 'absorbance', 'aboveRange', undefined],
    ['****', 'absorbance', 'aboveRange', undefined],
    ['+++', 'absorbance', 'aboveRange', undefined],
    ['>3.5', 'absorbance', 'aboveRange', 3.5],
    ['> 3,5', 'absorbance', 'aboveRange', 3.5],
    ['3.500*', 'absorbance', 'aboveRange', 3.5],
    ['<0.01', 'absorbance', 'belowRange', undefined],
    ['\u22653.5', 'absorbance', 'aboveRange', 3.5],
    ['>dark', 'absorbance', 'unreadable', undefined],
    ['<0', 'transmittance', 'aboveRange', undefined],
    ['<0.01', 'transmittance', 'aboveRange', 2],
    ['0.1*', 'percentTransmittance', 'aboveRange', 3],
    ['0 *', 'transmittance', 'aboveRange', undefined],
    ['----', 'absorbance', 'belowRange', undefined],
    ['<1', 'percentTransmittance', 'aboveRange', 2],
    ['>110', 'percentTransmittance', 'belowRange', undefined],
    ['', 'absorbance', 'empty', undefined],
    ['   ', 'absorbance', 'empty', undefined],
    ['lamp off', 'absorbance', 'unreadable', undefined],
    ['1,234', 'absorbance', 'unreadable', undefined],
    ['NaN', 'absorbance', 'unreadable', undefined],
  ] as const)('%s as %s is censored: %s', (text, signal, reason, atLeast) => {
    const { value, censored } = absorbanceOf(text, signal);
    expect(value).toBeNull();
    expect(censored?.reason).toBe(reason);
    expect(censored?.atLeast).toBe(atLeast);
    expect(censored?.text).toBe(text.trim());
  });

  test.each([
    ['0.35', 0.35],
    ['0,35', 0.35],
    ['-0.002', -0.002],
    ['\u22120.002', -0.002],
    ['3.5e-1', 0.35],
  ])('text that spells a number, %s, is that number', (text, value) => {
    expect(absorbanceOf(text, 'absorbance').value).toBe(value);
  });

  test.each([0, -0.5])('a light fraction of %d has a reason and no number', (fraction) => {
    expect(absorbanceOf(fraction, 'transmittance')).toEqual({
      value: null,
      censored: { reason: 'noLight', text: String(fraction) },
    });
  });

  test.each([NaN, Infinity, -Infinity])('refuses %d', (reading) => {
    expect(() => absorbanceOf(reading, 'absorbance')).toThrow(
      expect.objectContaining({ code: 'NOT_FINITE' }),
    );
  });
});

describe('a reading at two wavelengths', () => {
  // Identity: A(main) - A(minus), each converted by itself; 10 %T and 50 %T make 1 - 0.30103.
  test('is the difference of two absorbances, whatever the signal', () => {
    const { value, two } = absorbanceOf({ main: 10, minus: 50 }, 'percentTransmittance');
    expectDigits(value ?? NaN, 1 - Math.log10(2), 14);
    expectDigits(two?.main ?? NaN, 1, 15);
    expect(absorbanceOf({ main: 0.75, minus: 0.25 }, 'absorbance')).toEqual({
      value: 0.5,
      two: { main: 0.75, minus: 0.25 },
    });
  });

  test('shows the first absorbance and the higher of the two, not the difference', () => {
    const item = absorbanceOf({ main: 2.3, minus: 2.5 }, 'absorbance');
    expect([absorbanceAsRead(item), highestAsRead(item)]).toEqual([2.3, 2.5]);
    expect(highestAsRead({ value: null })).toBe(-Infinity);
  });

  test('has no number when no light came at one of them', () => {
    expect(absorbanceOf({ main: 0, minus: 50 }, 'percentTransmittance').censored?.reason).toBe('noLight');
    expect(absorbanceOf({ main: 50, minus: 0 }, 'percentTransmittance').censored?.reason).toBe('noLight');
  });
});
