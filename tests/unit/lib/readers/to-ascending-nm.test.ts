import { expect, test } from 'vitest';
import { toAscendingNm, toNm } from '@/lib/readers/to-ascending-nm';
import type { ReadSpectrum } from '@/lib/readers/types';

function spectrum(change: Partial<ReadSpectrum>): ReadSpectrum {
  return {
    name: '',
    x: Float64Array.of(400, 500),
    y: Float64Array.of(0.1, 0.2),
    xUnit: 'nm',
    xUnitGuessed: false,
    signal: 'absorbance',
    signalGuessed: false,
    signalText: 'A',
    signalScale: 1,
    gaps: [],
    block: 0,
    line: 1,
    header: {},
    warnings: [],
    ...change,
  };
}

test('each unit of x becomes nm', () => {
  expect([toNm(20_000, '1/cm'), toNm(0.5, 'um'), toNm(5000, 'angstrom')]).toEqual([500, 500, 500]);
  // hc/e = 1239.841984 eV nm (CODATA 2018).
  expect(toNm(2, 'eV')).toBeCloseTo(619.920992, 6);
});

test('falling wavenumbers come out as rising nm with their own readings', () => {
  const { wavelengthNm, absorbance } = toAscendingNm(
    spectrum({ x: Float64Array.of(20_000, 25_000), xUnit: '1/cm' }),
  );
  expect(Array.from(wavelengthNm)).toEqual([400, 500]);
  expect(Array.from(absorbance)).toEqual([0.2, 0.1]);
});

test('transmittance becomes absorbance; none at all is a gap above range', () => {
  const percent = toAscendingNm(
    spectrum({
      x: Float64Array.of(400, 500, 600),
      y: Float64Array.of(10, 0, -0.2),
      signal: 'percentTransmittance',
    }),
  );
  expect(Array.from(percent.absorbance)).toEqual([1, NaN, NaN]);
  expect(percent.gapReasons).toEqual({ 1: 'aboveRange', 2: 'aboveRange' });
  expect(percent.warnings.map((warning) => warning.code)).toEqual(['TRANSMITTANCE_NOT_POSITIVE']);
  const fraction = toAscendingNm(spectrum({ y: Float64Array.of(1, 0.01), signal: 'transmittance' }));
  expect(Array.from(fraction.absorbance, Math.abs)).toEqual([0, 2]);
});

test('negative absorbance stays; mAU are a thousandth; gaps keep their reason where they move to', () => {
  const shown = toAscendingNm(
    spectrum({
      x: Float64Array.of(700, 500, 600),
      y: Float64Array.of(-250, NaN, 1000),
      signalScale: 0.001,
      gaps: [{ index: 1, reason: 'aboveRange', text: 'OVER' }],
    }),
  );
  expect(Array.from(shown.wavelengthNm)).toEqual([500, 600, 700]);
  expect(Array.from(shown.absorbance)).toEqual([NaN, 1, -0.25]);
  expect(shown.gapReasons).toEqual({ 0: 'aboveRange' });
});
