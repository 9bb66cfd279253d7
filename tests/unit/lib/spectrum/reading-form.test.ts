import { describe, expect, test } from 'vitest';
import type { ReadSpectrum } from '@/lib/readers/types';
import { pathLengthFromHeader } from '@/lib/spectrum/path-length';
import { readingForm } from '@/lib/spectrum/reading-form';
import { spectrumWarnings } from '@/lib/spectrum/spectrum-warnings';

function spectrum(part: Partial<ReadSpectrum> & { x: Float64Array; y: Float64Array }): ReadSpectrum {
  return {
    name: 'A',
    xUnit: 'nm',
    xUnitGuessed: false,
    signal: 'absorbance',
    signalGuessed: false,
    signalText: '',
    signalScale: 1,
    gaps: [],
    block: 0,
    line: 1,
    header: {},
    warnings: [],
    ...part,
  };
}
const f64 = (...values: number[]) => Float64Array.from(values);

describe('readingForm', () => {
  test('turns a falling axis round and keeps the words of a gap at its place', () => {
    const gaps = [{ index: 1, reason: 'aboveRange' as const, text: 'OVER' }];
    const form = readingForm(spectrum({ x: f64(502, 501, 500), y: f64(0.3, NaN, 0.1), gaps }));
    expect(form.wavelengthNm).toEqual([500, 501, 502]);
    expect(form.absorbance).toEqual([0.1, null, 0.3]);
    expect(form.gaps).toEqual([{ index: 1, wavelengthNm: 501, reason: 'aboveRange', text: 'OVER' }]);
  });

  // A = 2 - log10(%T): 10 % is 1, 1 % is 2, by the definition of absorbance
  test('gives absorbance of per cent transmittance; no light is a gap above range', () => {
    const form = readingForm(
      spectrum({ x: f64(400, 401, 402), y: f64(10, 1, 0), signal: 'percentTransmittance' }),
    );
    expect(form.absorbance).toEqual([1, 2, null]);
    expect(form.gaps).toMatchObject([{ index: 2, reason: 'aboveRange' }]);
  });

  test('averages what was read twice at one wavelength, and a gap among them stays a gap', () => {
    const form = readingForm(spectrum({ x: f64(500, 500, 501, 501), y: f64(0.25, 0.75, 0.5, NaN) }));
    expect(form.wavelengthNm).toEqual([500, 501]);
    expect(form.absorbance).toEqual([0.5, null]);
    expect(form.repeatedWavelengths).toBe(2);
  });

  test('leaves a point without a finite wavelength out: 0 1/cm is nowhere', () => {
    const form = readingForm(spectrum({ x: f64(0, 20000), y: f64(0.1, 0.2), xUnit: '1/cm' }));
    expect(form.wavelengthNm).toEqual([500]); // 1e7 / 20000
  });
});

describe('spectrumWarnings', () => {
  const warnings = (...y: number[]) =>
    spectrumWarnings(readingForm(spectrum({ x: f64(...y.map((_, i) => 500 + i)), y: f64(...y) })), true);

  test('says where a spectrum is above 2, and is silent at 2', () => {
    expect(warnings(1.9, 2.1, 2.4, 1.0)).toMatchObject([
      {
        code: 'ABOVE_ABSORBANCE_LIMIT',
        value: 2.4,
        message: expect.stringContaining('between 501 and 502 nm'),
      },
    ]);
    expect(warnings(1.9, 2, 1.0)).toEqual([]);
  });
});

describe('pathLengthFromHeader', () => {
  // JCAMP-DX 4.24 gives PATHLENGTH in centimetres
  test.each([
    [{ PATHLENGTH: '1.0' }, 'jcamp-dx', 10],
    [{ PATHLENGTH: '0.1 cm' }, 'jcamp-dx', 1],
    [{ 'Path length (mm)': '50' }, 'delimited', 50],
    [{ 'Cell path': '10 mm' }, 'delimited', 10],
    [{ 'Path length': '10' }, 'delimited', null], // no unit: not guessed
    [{ PATHLENGTH: '0' }, 'jcamp-dx', null],
    [{ PATHLENGTH: 'cuvette 3' }, 'jcamp-dx', null],
    [{ Sample: '10 mm' }, 'delimited', null],
  ])('of %j by %s is %s', (header, reader, expected) => {
    expect(pathLengthFromHeader(header as unknown as Record<string, string>, reader)).toBe(expected);
  });
});
