import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type Reading } from '@/lib/engine';
import { request, unknown } from './requests';

/** Every reading as a pair whose second wavelength reads `minus` more than nothing. */
const paired = (asked: CurveRequest, minus: number): CurveRequest => {
  const pair = (reading: Reading) => ({ main: Number(reading) + minus, minus });
  return {
    ...asked,
    standards: asked.standards.map((one) => ({ ...one, readings: one.readings.map(pair) })),
    unknowns: asked.unknowns.map((one) => ({ ...one, readings: one.readings.map(pair) })),
  };
};

const codes = (flags: readonly { code: string }[]) => flags.map(({ code }) => code);

describe('readings at two wavelengths', () => {
  // The offset 0.25 is a power of two, so that main - minus gives the plain reading back but for rounding.
  const plain = request({ unknowns: [unknown([0.5021, 0.5034])] });

  test('calculate as their differences', () => {
    const was = calculateStandardCurve(plain);
    const is = calculateStandardCurve(paired(plain, 0.25));
    expect(is.curve.slope.value).toBeCloseTo(was.curve.slope.value, 13);
    expect(is.unknowns[0]?.concentration?.value).toBeCloseTo(
      was.unknowns[0]?.concentration?.value ?? NaN,
      11,
    );
    expect(is.unknowns[0]?.report).toBe(was.unknowns[0]?.report);
  });

  test('show the first wavelength as read', () => {
    const { curve, unknowns } = calculateStandardCurve(paired(plain, 0.25));
    expect(curve.points[0]?.absorbanceAsRead).toBeCloseTo(0.3542, 12);
    expect(curve.points[0]?.absorbance).toBeCloseTo(0.1042, 12);
    expect(unknowns[0]?.absorbanceAsRead).toBeCloseTo(0.75275, 12);
    expect(unknowns[0]?.absorbance).toBeCloseTo(0.50275, 12);
  });

  test('are held against the absorbance limit as they came, for standards and unknowns', () => {
    const { curve, unknowns } = calculateStandardCurve(paired(plain, 1.75));
    const over = curve.flags.filter(({ code }) => code === 'STANDARD_OVER_LIMIT');
    // 0.4049 + 1.75 and everything above it exceed 2; the differences reach only 0.8052.
    expect(over).toHaveLength(6);
    expect(over[0]?.value).toBeCloseTo(2.1549, 12);
    expect(codes(unknowns[0]?.flags ?? [])).toContain('READING_OVER_LIMIT');
    expect(unknowns[0]?.report).toMatch(/^not quantified: dilute/);
    expect(unknowns[0]?.concentration).toBeNull();
  });

  test('show both readings and their difference in the working', () => {
    const { unknowns } = calculateStandardCurve(paired(plain, 0.25));
    const line = unknowns[0]?.working.find(({ id }) => id === 'unknown.reading.1.reading');
    expect(line).toMatchObject({ formula: 'A = A_1 - A_2', substituted: 'A = 0.7521 - 0.25' });
    expect(line?.inputs).toEqual(['unknown.reading.1.main', 'unknown.reading.1.minus']);
  });

  test('in per cent transmittance are converted one by one', () => {
    const percent = (absorbance: number) => 100 * 10 ** -absorbance;
    const asked = request({
      signal: 'percentTransmittance',
      standards: [1, 2, 4, 6].map((c) => ({
        concentration: c,
        readings: [{ main: percent(0.1 * c + 0.05 + 0.001 * (c % 3)), minus: percent(0.05) }],
      })),
      unknowns: [
        unknown([
          { main: percent(0.35), minus: percent(0.05) },
          { main: 0, minus: 50 },
        ]),
      ],
    });
    const { curve, unknowns } = calculateStandardCurve(asked);
    expect(curve.points[0]?.absorbance).toBeCloseTo(0.101, 12);
    expect(unknowns[0]?.report).toMatch(/^not quantified/);
    const line = unknowns[0]?.working.find(({ id }) => id === 'unknown.reading.1.reading');
    expect(line?.formula).toBe('A = -log10(%T_1 / 100) + log10(%T_2 / 100)');
  });
});
