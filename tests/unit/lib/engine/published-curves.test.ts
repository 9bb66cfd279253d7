import { describe, expect, test } from 'vitest';
import { calculateStandardCurve } from '@/lib/engine';
import { expectDigits } from '../../../support/digits';
import { reference, request, standardsOf, unknown } from './requests';

/** Intensities and temperatures stand in for absorbances, so the limit is out of the way. */
const wide = { absorbanceLimit: 1e6 };

describe('EURACHEM/CITAC CG 4, example A5', () => {
  // fixtures/reference/eurachem-cg4/SOURCE.md: the printed digits.
  const { A5 } = reference<{ A5: { c: number[]; A: number[]; sample_A: number[] } }>('eurachem-cg4');
  const { curve, unknowns } = calculateStandardCurve(
    request({ standards: standardsOf(A5.c, A5.A), unknowns: [unknown(A5.sample_A)] }),
  );

  test('gives the printed line', () => {
    expect(curve.slope.value.toFixed(4)).toBe('0.2410');
    expect(curve.slope.u.toFixed(4)).toBe('0.0050');
    expect(curve.intercept.value.toFixed(4)).toBe('0.0087');
    expect(curve.intercept.u.toFixed(4)).toBe('0.0029');
    expect(curve.residualSd.toFixed(6)).toBe('0.005486');
    expect(Math.sqrt(curve.rSquared).toFixed(3)).toBe('0.997');
    expect(curve).toMatchObject({ n: 15, degreesOfFreedom: 13 });
    expectDigits(curve.meanConcentration, 0.5, 14);
    expectDigits(curve.sxx, 1.2, 14);
    const correlation = (curve.covariance[0]?.[1] ?? NaN) / (curve.slope.u * curve.intercept.u);
    expect(correlation.toFixed(5)).toBe('-0.87039');
  });

  test('reads the sample as 0.260 with u 0.018', () => {
    const [sample] = unknowns;
    expect(sample?.measured?.value.toFixed(3)).toBe('0.260');
    expect(sample?.measured?.u.toFixed(3)).toBe('0.018');
    expect(sample?.concentration?.degreesOfFreedom).toBe(13);
  });
});

describe('Miller and Miller, the fluorescein line', () => {
  // fixtures/reference/miller-miller/SOURCE.md: printed, and unrounded by numpy from the same data.
  const { fluorescein: printed, fluoresceinUnrounded: more } = reference<{
    fluorescein: {
      x: number[];
      y: number[];
      inverse: { y0: number; x0: number; s_x0: number; ci95: number }[];
    };
    fluoresceinUnrounded: Record<string, number> & {
      x0: number[];
      sX0: number[];
      ci95: number[];
      fieller13_5: number[];
    };
  }>('miller-miller');
  const { curve, unknowns } = calculateStandardCurve(
    request({
      ...wide,
      standards: standardsOf(printed.x, printed.y),
      unknowns: printed.inverse.map(({ y0 }) => unknown([y0])),
    }),
  );

  test('gives the line', () => {
    expectDigits(curve.slope.value, more.slope ?? NaN, 9);
    expectDigits(curve.intercept.value, more.intercept ?? NaN, 9);
    expectDigits(curve.residualSd, more.residualSd ?? NaN, 9);
    expectDigits(curve.slope.u, more.sdSlope ?? NaN, 9);
    expectDigits(curve.intercept.u, more.sdIntercept ?? NaN, 9);
    expectDigits(Math.sqrt(curve.rSquared), more.r ?? NaN, 9);
  });

  test.each([0, 1, 2])('reads signal %i back as printed', (i) => {
    const { x0, s_x0, ci95 } = printed.inverse[i] ?? { x0: NaN, s_x0: NaN, ci95: NaN };
    const result = unknowns[i];
    expect(result?.measured?.value.toFixed(2)).toBe(x0.toFixed(2));
    expect(result?.measured?.u.toFixed(2)).toBe(s_x0.toFixed(2));
    expect(result?.concentration?.U.toFixed(2)).toBe(ci95.toFixed(2));
    expectDigits(result?.measured?.value ?? NaN, more.x0[i] ?? NaN, 6);
    expectDigits(result?.concentration?.U ?? NaN, more.ci95[i] ?? NaN, 5);
  });

  test('has the Fieller interval of scipy', () => {
    const fieller = unknowns[1]?.fieller ?? [NaN, NaN];
    expect(fieller.map((end) => end.toFixed(4))).toEqual(more.fieller13_5.map((end) => end.toFixed(4)));
  });
});

describe('Miller and Miller, the weighted line', () => {
  // fixtures/reference/miller-miller/SOURCE.md.
  const { weighted, weightedUnrounded: more } = reference<{
    weighted: { x: number[]; y: number[]; s: number[]; w_normalised_sum_n: number[] };
    weightedUnrounded: Record<string, number>;
  }>('miller-miller');
  const { curve, unknowns } = calculateStandardCurve(
    request({
      weighting: 'given',
      standards: weighted.x.map((concentration, i) => ({
        concentration,
        readings: [weighted.y[i] ?? NaN],
        weight: 1 / (weighted.s[i] ?? NaN) ** 2,
      })),
      unknowns: [unknown([0.1]), unknown([0.6])],
    }),
  );

  test('gives the coefficients and both concentrations', () => {
    expectDigits(curve.slope.value, more.slope ?? NaN, 9);
    expectDigits(curve.intercept.value, more.intercept ?? NaN, 9);
    expect(curve.residualSd.toFixed(7)).toBe((more.residualSd ?? NaN).toFixed(7));
    expectDigits(curve.sxx, more.sxx ?? NaN, 6);
    expect(unknowns[0]?.measured?.value.toFixed(2)).toBe('1.23');
    expect(unknowns[1]?.measured?.value.toFixed(2)).toBe('8.01');
    expectDigits(unknowns[0]?.measured?.value ?? NaN, more.x0At100 ?? NaN, 6);
  });

  // Printed beside it, typed from memory: the same data without weights.
  test('without weights gives the line and both concentrations printed beside it', () => {
    const plain = calculateStandardCurve(
      request({
        standards: standardsOf(weighted.x, weighted.y),
        unknowns: [unknown([0.1]), unknown([0.6])],
      }),
    );
    expect(plain.curve.slope.value.toFixed(4)).toBe('0.0725');
    expect(plain.curve.intercept.value.toFixed(4)).toBe('0.0133');
    expect(plain.unknowns.map((result) => result.measured?.value.toFixed(2))).toEqual(['1.20', '8.09']);
  });

  test('scales the weights to n, as printed', () => {
    const printed = weighted.w_normalised_sum_n;
    curve.points.forEach((point, i) =>
      expect(Math.abs(point.weight - (printed[i] ?? NaN))).toBeLessThan(0.0016),
    );
    expectDigits(
      curve.points.reduce((sum, point) => sum + point.weight, 0),
      6,
      14,
    );
  });
});

describe('Graybill and Iyer, the thermometer', () => {
  // fixtures/reference/graybill-iyer/SOURCE.md: estimate, lower, upper, level as published.
  const data = reference<{ x: number[]; y: number[]; y0_104: number[]; y0_100: number[] }>('graybill-iyer');
  test.each([
    [104, data.y0_104],
    [100, data.y0_100],
  ])('Fieller interval at %d', (y0, [estimate = NaN, low = NaN, high = NaN, confidence = NaN]) => {
    const { unknowns } = calculateStandardCurve(
      request({ ...wide, confidence, standards: standardsOf(data.x, data.y), unknowns: [unknown([y0])] }),
    );
    // Half a unit of the last printed digit.
    expect(Math.abs((unknowns[0]?.measured?.value ?? NaN) - estimate)).toBeLessThan(0.051);
    expect(unknowns[0]?.fieller?.[0].toFixed(low === 103.4 ? 1 : 2)).toBe(low.toFixed(low === 103.4 ? 1 : 2));
    expect(unknowns[0]?.fieller?.[1].toFixed(high === 104.6 ? 1 : 2)).toBe(
      high.toFixed(high === 104.6 ? 1 : 2),
    );
  });
});
