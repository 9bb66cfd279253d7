import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type Weighting } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';
import { request, unknown } from '../requests';

const four = [
  { concentration: 1, readings: [0.1042, 0.1036, 0.1029, 0.1044] },
  { concentration: 2, readings: [0.2031, 0.2046, 0.2062, 0.2018] },
  { concentration: 4, readings: [0.4049, 0.4028, 0.4071, 0.4006] },
  { concentration: 8, readings: [0.8027, 0.8052, 0.8111, 0.7975] },
];
const sample = [unknown([0.3055])];
const curveOf = (changes: Partial<CurveRequest>) =>
  calculateStandardCurve(request({ standards: four, unknowns: sample, ...changes }));
const unweighted = curveOf({}).curve;
const yhat = (x: number) => unweighted.intercept.value + unweighted.slope.value * x;
const variance = (values: readonly number[]) => {
  const mean = values.reduce((sum, v) => sum + v, 0) / values.length;
  return values.reduce((sum, v) => sum + (v - mean) ** 2, 0) / (values.length - 1);
};

/** The same curve with its weights worked out here and given one by one. */
const byHand = (v: (standard: (typeof four)[0]) => number) =>
  curveOf({ weighting: 'given', standards: four.map((s) => ({ ...s, weight: 1 / v(s) })) }).curve;

describe.each<[Weighting, (standard: (typeof four)[0]) => number]>([
  ['1/x', (s) => s.concentration],
  ['1/x2', (s) => s.concentration ** 2],
  ['1/y', (s) => yhat(s.concentration)],
  ['1/y2', (s) => yhat(s.concentration) ** 2],
  ['varianceFunction', (s) => 0.001 ** 2 + (0.005 * yhat(s.concentration)) ** 2],
  ['replicates', (s) => variance(s.readings)],
])('weighting %s', (weighting, v) => {
  const changes = { weighting, varianceFunction: { s0: 0.001, k: 0.005 } };

  // Definition: two passes, the second with v from the first; then the fit of given weights 1/v.
  test('is the fit with the weights of its definition', () => {
    const { curve } = curveOf(changes);
    const expected = byHand(v);
    expectDigits(curve.slope.value, expected.slope.value, 11);
    expectDigits(curve.intercept.u, expected.intercept.u, 10);
    expectDigits(curve.residualSd, expected.residualSd, 10);
    curve.points.forEach((point, i) => expectDigits(point.weight, expected.points[i]?.weight ?? NaN, 11));
  });
});

describe('the weight of an unknown', () => {
  const weightOf = (changes: Partial<CurveRequest>) => {
    const answer = curveOf(changes);
    return Number(answer.unknowns[0]?.working.find((step) => step.id === 'unknown.weight')?.value);
  };
  const scale = (v: (standard: (typeof four)[0]) => number) =>
    16 / four.reduce((sum, s) => sum + 4 / v(s), 0);
  const mean = (s: (typeof four)[0] | undefined) => (s?.readings ?? []).reduce((sum, r) => sum + r, 0) / 4;

  // By hand: between the levels 2 and 4 the variance is read linearly in y.
  test('is read linearly in y between levels under replicates', () => {
    const [low, high] = [four[1], four[2]];
    const part = (0.3055 - mean(low)) / (mean(high) - mean(low));
    const v = variance(low?.readings ?? []) * (1 - part) + variance(high?.readings ?? []) * part;
    expectDigits(weightOf({ weighting: 'replicates' }), scale((s) => variance(s.readings)) / v, 11);
  });

  test('is constant outside the levels', () => {
    const v = variance(four[3]?.readings ?? []);
    expectDigits(
      weightOf({ weighting: 'replicates', unknowns: [unknown([0.95])] }),
      scale((s) => variance(s.readings)) / v,
      11,
    );
  });

  test('is its own when it carries one under given', () => {
    const standards = four.map((s) => ({ ...s, weight: 2 }));
    expectDigits(
      weightOf({ weighting: 'given', standards, unknowns: [unknown([0.3055], { weight: 6 })] }),
      3,
      13,
    );
  });

  test('below the lowest standard is that standard under 1/x', () => {
    const [low, lower] = [0.06, 0.08].map((y) => weightOf({ weighting: '1/x', unknowns: [unknown([y])] }));
    expect(low).toBe(lower);
    expectDigits(
      low ?? NaN,
      scale((s) => s.concentration),
      12,
    );
  });

  test('carries the factor of its path', () => {
    const plain = weightOf({ weighting: '1/x', unknowns: [unknown([0.3055])] });
    const long = weightOf({ weighting: '1/x', unknowns: [unknown([1.5275], { pathLengthMm: 50 })] });
    expectDigits(long, 25 * plain, 11);
  });
});

describe('several path lengths in one fit', () => {
  // Property: with (l/10)² the fit of normalised readings is the fit of readings as read, weighted alike.
  test('weight each point by the square of its path', () => {
    const { curve } = calculateStandardCurve(
      request({
        standards: [
          { concentration: 0.2, readings: [0.101], pathLengthMm: 50 },
          { concentration: 0.5, readings: [0.2492], pathLengthMm: 50 },
          { concentration: 2, readings: [0.2031] },
          { concentration: 4, readings: [0.4028] },
        ],
      }),
    );
    const [first, , third] = curve.points;
    expectDigits((first?.weight ?? NaN) / (third?.weight ?? NaN), 25, 13);
    expectDigits(first?.absorbance ?? NaN, 0.0202, 13);
    expectDigits(
      curve.points.reduce((sum, point) => sum + point.weight, 0),
      4,
      14,
    );
  });
});

describe('a variance function without a constant part', () => {
  const proportional: Partial<CurveRequest> = {
    weighting: 'varianceFunction',
    varianceFunction: { s0: 0, k: 0.01 },
  };

  // Identity: v = (k y)² is 1/y² but for a factor, which weights do not keep.
  test('is the weighting 1/y²', () => {
    const [law, power] = [curveOf(proportional), curveOf({ weighting: '1/y2' })];
    expectDigits(law.curve.slope.value, power.curve.slope.value, 13);
    expectDigits(law.curve.residualSd, power.curve.residualSd, 12);
    expectDigits(law.unknowns[0]?.measured?.u ?? NaN, power.unknowns[0]?.measured?.u ?? NaN, 12);
  });

  test('is refused where a fitted absorbance is not above zero', () => {
    const below = four.map(({ concentration, readings }) => ({
      concentration,
      readings: readings.map((y) => y - 0.2),
    }));
    expect(() => curveOf({ ...proportional, standards: below })).toThrow(
      expect.objectContaining({ code: 'FITTED_NOT_POSITIVE', pointer: '/weighting' }),
    );
  });
});
