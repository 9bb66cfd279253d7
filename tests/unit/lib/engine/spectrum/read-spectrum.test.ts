import { describe, expect, test } from 'vitest';
import { readSpectrum, type ReadingRule } from '@/lib/engine';

const spectrum = {
  wavelengthNm: [500, 501, 502, 505, 506, 507, 508],
  absorbance: [0.1, 0.2, 0.4, 0.7, null, 0.6, 0.2],
  gapReasons: { 4: 'OVER' },
};
const read = (rule: ReadingRule) => readSpectrum(spectrum, rule);

describe('readSpectrum', () => {
  test('reads at the point, and the nearest one within half a step', () => {
    expect(read({ kind: 'point', wavelengthNm: 501 })).toMatchObject({ value: 0.2, atNm: 501 });
    expect(read({ kind: 'point', wavelengthNm: 501.4 })).toMatchObject({ value: 0.2, atNm: 501 });
    expect(read({ kind: 'point', wavelengthNm: 501.00000001 })).toMatchObject({ value: 0.2, atNm: 501 });
  });

  test('reads at either end, and a spectrum of one point', () => {
    expect(read({ kind: 'point', wavelengthNm: 500 }).value).toBe(0.1);
    expect(read({ kind: 'point', wavelengthNm: 508 }).value).toBe(0.2);
    const single = { wavelengthNm: [510], absorbance: [0.3] };
    expect(readSpectrum(single, { kind: 'point', wavelengthNm: 510 }).value).toBe(0.3);
  });

  test('refuses the point in a hole of the spectrum and says what to use', () => {
    expect(() => read({ kind: 'point', wavelengthNm: 503.4 })).toThrow(/interpolated/);
  });

  // By hand: a third of the way from 0.4 to 0.7.
  test('interpolates linearly, and takes the point where there is one', () => {
    expect(read({ kind: 'interpolated', wavelengthNm: 503 }).value).toBeCloseTo(0.5, 14);
    expect(read({ kind: 'interpolated', wavelengthNm: 502 })).toMatchObject({ value: 0.4, atNm: 502 });
    expect(read({ kind: 'interpolated', wavelengthNm: 503 }).points.map((p) => p.wavelengthNm)).toEqual([
      502, 505,
    ]);
  });

  test('takes the mean of a band', () => {
    const mean = read({ kind: 'bandMean', wavelengthNm: 501, halfWidthNm: 1 });
    expect(mean.value).toBeCloseTo(0.7 / 3, 14);
    expect(mean).toMatchObject({ atNm: 501 });
    expect(mean.points).toHaveLength(3);
  });

  test('takes the highest point of a window', () => {
    expect(read({ kind: 'windowMaximum', fromNm: 507, toNm: 508 })).toMatchObject({ value: 0.6, atNm: 507 });
    expect(read({ kind: 'windowMaximum', fromNm: 500, toNm: 505 })).toMatchObject({ value: 0.7, atNm: 505 });
  });

  test('subtracts the reading at a second wavelength', () => {
    const net = read({ kind: 'point', wavelengthNm: 505, minusNm: 500.5 });
    expect(net.value).toBeCloseTo(0.55, 14);
    expect(net).toMatchObject({ mainValue: 0.7, atNm: 505 });
    expect(net.minusValue).toBeCloseTo(0.15, 14);
  });

  test.each<ReadingRule>([
    { kind: 'point', wavelengthNm: 506 },
    { kind: 'interpolated', wavelengthNm: 505.5 },
    { kind: 'bandMean', wavelengthNm: 506, halfWidthNm: 1 },
    { kind: 'windowMaximum', fromNm: 505, toNm: 508 },
    { kind: 'point', wavelengthNm: 500, minusNm: 506 },
  ])('a gap inside gives no value but its reason: %j', (rule) => {
    const { value, reason } = read(rule);
    expect(value).toBeNull();
    expect(reason).toContain('506 nm');
    expect(reason).toContain('OVER');
  });

  test.each<[ReadingRule, string]>([
    [{ kind: 'point', wavelengthNm: 499 }, 'WAVELENGTH_OUTSIDE'],
    [{ kind: 'interpolated', wavelengthNm: 508.01 }, 'WAVELENGTH_OUTSIDE'],
    [{ kind: 'bandMean', wavelengthNm: 500, halfWidthNm: 2 }, 'WAVELENGTH_OUTSIDE'],
    [{ kind: 'windowMaximum', fromNm: 500, toNm: 600 }, 'WAVELENGTH_OUTSIDE'],
    [{ kind: 'point', wavelengthNm: 500, minusNm: 700 }, 'WAVELENGTH_OUTSIDE'],
    [{ kind: 'point' }, 'WAVELENGTH_MISSING'],
    [{ kind: 'bandMean', wavelengthNm: 500 }, 'WAVELENGTH_MISSING'],
    [{ kind: 'windowMaximum', fromNm: 505, toNm: 501 }, 'BAND_REVERSED'],
    [{ kind: 'bandMean', wavelengthNm: 503.5, halfWidthNm: 0.5 }, 'BAND_EMPTY'],
    [{ kind: 'point', wavelengthNm: 503.5 }, 'NO_POINT_THERE'],
  ])('refuses %j with %s', (rule, code) => {
    expect(() => read(rule)).toThrow(expect.objectContaining({ code }));
  });

  test('refuses spectra that are none', () => {
    const rule = { kind: 'point', wavelengthNm: 1 } as const;
    const code = (name: string) => expect.objectContaining({ code: name });
    expect(() => readSpectrum({ wavelengthNm: [], absorbance: [] }, rule)).toThrow(code('SPECTRUM_EMPTY'));
    expect(() => readSpectrum({ wavelengthNm: [1], absorbance: [] }, rule)).toThrow(code('LENGTH_MISMATCH'));
    expect(() => readSpectrum({ wavelengthNm: [2, 1], absorbance: [1, 1] }, rule)).toThrow(
      code('SPECTRUM_NOT_ASCENDING'),
    );
  });
});
