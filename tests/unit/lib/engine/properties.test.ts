import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  calculateStandardCurve,
  curveBand,
  type CurveRequest,
  type Reading,
  type Weighting,
} from '@/lib/engine';
import { tQuantile } from '@/lib/engine/stats/student-t';
import { expectDigits } from '../../../support/digits';
import { request, standardsOf, unknown } from './requests';

/**
 * A believable curve: rising absorbances at rising concentrations, and one unknown among them. The scatter goes up
 * and down by turns and never vanishes, so that uncertainties are not rounding errors.
 */
const curves = fc
  .record({
    slope: fc.double({ min: 0.02, max: 0.3, noNaN: true }),
    intercept: fc.double({ min: -0.01, max: 0.05, noNaN: true }),
    steps: fc.array(fc.double({ min: 0.2, max: 1, noNaN: true }), { minLength: 5, maxLength: 8 }),
    noise: fc.array(fc.double({ min: 0.0005, max: 0.004, noNaN: true }), { minLength: 18, maxLength: 18 }),
    weighting: fc.constantFrom<Weighting>('none', '1/x', '1/x2'),
  })
  .map(({ slope, intercept, steps, noise, weighting }): CurveRequest => {
    let concentration = 0;
    const standards = steps.map((step, i) => {
      concentration += step;
      const at = (k: number) =>
        intercept + slope * concentration + (k === i % 2 ? 1 : -1) * (noise[2 * i + k] ?? 0);
      return { concentration, readings: [at(0), at(1)] };
    });
    const middle = intercept + slope * (concentration / 2);
    return request({
      weighting,
      absorbanceLimit: 10,
      standards,
      unknowns: [unknown([middle + (noise[16] ?? 0) / 4, middle + (noise[17] ?? 0) / 4])],
    });
  });

const check = (property: (asked: CurveRequest) => void) =>
  fc.assert(fc.property(curves, property), { seed: 20261201, numRuns: 60 });

const first = (asked: CurveRequest) => {
  const { curve, unknowns } = calculateStandardCurve(asked);
  const [result] = unknowns;
  if (!result) throw new Error('no result');
  return { curve, result, c: result.measured?.value ?? NaN, u: result.measured?.u ?? NaN };
};

describe('properties of a standard curve', () => {
  test('units scale: concentrations a thousand times larger give results a thousand times larger', () => {
    check((asked) => {
      const was = first(asked);
      const is = first({
        ...asked,
        standards: asked.standards.map((s) => ({ ...s, concentration: 1000 * s.concentration })),
      });
      expectDigits(is.c, 1000 * was.c, 9);
      expectDigits(is.u, 1000 * was.u, 9);
      expectDigits(is.curve.residualSd, was.curve.residualSd, 9);
    });
  });

  test('the order of standards and readings does not matter', () => {
    check((asked) => {
      const was = first(asked);
      const reversed = [...asked.standards]
        .reverse()
        .map((s) => ({ ...s, readings: [...s.readings].reverse() }));
      const is = first({ ...asked, standards: reversed });
      expectDigits(is.c, was.c, 10);
      expectDigits(is.u, was.u, 9);
    });
  });

  test('a constant added to every absorbance moves the intercept and nothing else', () => {
    check((asked) => {
      const was = first(asked);
      const add = (readings: readonly Reading[]) => readings.map((reading) => Number(reading) + 0.25);
      const is = first({
        ...asked,
        standards: asked.standards.map((s) => ({ ...s, readings: add(s.readings) })),
        unknowns: asked.unknowns.map((item) => ({ ...item, readings: add(item.readings) })),
      });
      expectDigits(is.curve.slope.value, was.curve.slope.value, 10);
      expect(Math.abs(is.curve.intercept.value - was.curve.intercept.value - 0.25)).toBeLessThan(1e-12);
      expectDigits(is.c, was.c, 9);
      expectDigits(is.u, was.u, 8);
    });
  });

  test('uncertainties are never negative, and every interval holds its value', () => {
    check((asked) => {
      const { result } = first({
        ...asked,
        standardsRelativeU: 0.004,
        unknowns: asked.unknowns.map((item) => ({
          ...item,
          dilution: [{ takenMl: 10, toMl: 50, takenUMl: 0.02, toUMl: 0.04 }],
        })),
      });
      const { concentration, fieller, budget } = result;
      if (!concentration) throw new Error('this unknown lies among its standards');
      const { value, u, U, k, interval } = concentration;
      expect(Math.min(u, U, k, ...budget.map((line) => line.u))).toBeGreaterThanOrEqual(0);
      expect(interval[0]).toBeLessThanOrEqual(value);
      expect(interval[1]).toBeGreaterThanOrEqual(value);
      if (fieller) expect(fieller[0] <= value && value <= fieller[1]).toBe(true);
    });
  });

  // As g = t² V_bb / b² tends to 0, so does the distance between Fieller's ends and c ± t u(c): of the order of g.
  test("Fieller's interval tends to the usual one as the slope becomes sure", () => {
    check((asked) => {
      const gap = (scatter: number) => {
        const centre = (readings: readonly Reading[]) => (Number(readings[0]) + Number(readings[1])) / 2;
        const calmed = asked.standards.map((s) => ({
          ...s,
          readings: s.readings.map((r) => centre(s.readings) + scatter * (Number(r) - centre(s.readings))),
        }));
        const { curve, result } = first({ ...asked, weighting: 'none', standards: calmed });
        const { concentration, fieller } = result;
        if (!concentration || !fieller) return null;
        const half = tQuantile(0.975, curve.degreesOfFreedom) * concentration.u;
        const g = (tQuantile(0.975, curve.degreesOfFreedom) * (curve.slope.u / curve.slope.value)) ** 2;
        const off = Math.abs(fieller[1] - (concentration.value + half));
        return { g, relative: off / half };
      };
      const [rough, calm] = [gap(1), gap(0.01)];
      if (!rough || !calm) throw new Error('the slope of these curves is sure');
      expect(rough.relative).toBeLessThan(10 * Math.sqrt(rough.g) + 1e-9);
      expect(calm.relative).toBeLessThan(10 * Math.sqrt(calm.g) + 1e-9);
    });
  });

  test('an exact dilution split in two steps changes nothing', () => {
    check((asked) => {
      const dilute = (dilution: { takenMl: number; toMl: number }[]) =>
        first({ ...asked, unknowns: asked.unknowns.map((item) => ({ ...item, dilution })) }).result;
      const one = dilute([{ takenMl: 1, toMl: 20 }]);
      const two = dilute([
        { takenMl: 10, toMl: 50 },
        { takenMl: 25, toMl: 100 },
      ]);
      expect(two.concentration).toEqual(one.concentration);
      expect(two.report).toBe(one.report);
    });
  });

  test('a path twice as long with readings twice as high is the same curve', () => {
    check((asked) => {
      const twice = (readings: readonly Reading[]) => readings.map((reading) => 2 * Number(reading));
      const was = first(asked);
      const is = first({
        ...asked,
        pathLengthMm: 20,
        absorbanceLimit: 20,
        standards: asked.standards.map((s) => ({ ...s, readings: twice(s.readings) })),
        unknowns: asked.unknowns.map((item) => ({ ...item, readings: twice(item.readings) })),
      });
      expectDigits(is.c, was.c, 11);
      expectDigits(is.u, was.u, 10);
      expectDigits(is.curve.slope.value, was.curve.slope.value, 11);
    });
  });

  test('a standard left out is the same fit as one never there, and stays in sight', () => {
    check((asked) => {
      const without = first({ ...asked, standards: asked.standards.slice(0, -1) });
      const last = asked.standards.length - 1;
      const out = first({
        ...asked,
        standards: asked.standards.map((s, i) => (i === last ? { ...s, excluded: true } : s)),
      });
      expect(out.curve.slope).toEqual(without.curve.slope);
      expect(out.curve.range).toEqual(without.curve.range);
      const shown = out.curve.points.filter((point) => point.excluded);
      expect(shown.map((point) => point.weight)).toEqual([0, 0]);
      expect(shown.every((point) => point.residual !== null && point.leverage === null)).toBe(true);
    });
  });

  test('leverages add up to the number of parameters and weights to n', () => {
    check((asked) => {
      const { points, n } = first(asked).curve;
      expectDigits(
        points.reduce((sum, point) => sum + (point.leverage ?? 0), 0),
        2,
        11,
      );
      expectDigits(
        points.reduce((sum, point) => sum + point.weight, 0),
        n,
        12,
      );
    });
  });

  test('the answer survives JSON unchanged, and asking twice gives the same', () => {
    check((asked) => {
      const answer = calculateStandardCurve(asked);
      expect(JSON.parse(JSON.stringify(answer))).toEqual(answer);
      expect(calculateStandardCurve(asked)).toEqual(answer);
    });
  });

  test('the band holds the curve and is narrowest at the mean concentration', () => {
    check((asked) => {
      const { curve } = first(asked);
      const at = [curve.range.min, curve.meanConcentration, curve.range.max];
      const [low, middle, high] = curveBand(curve, at).map((point) => point.high - point.low);
      expect(middle ?? NaN).toBeLessThanOrEqual(Math.min(low ?? NaN, high ?? NaN));
    });
  });
});

test('one reading of a standard left out', () => {
  const standards = request().standards.map((s, i) => (i === 0 ? { ...s, excludedReadings: [1] } : s));
  const { curve } = calculateStandardCurve(request({ standards }));
  expect(curve.n).toBe(9);
  expect(
    curve.points.filter((point) => point.excluded).map((point) => [point.standardIndex, point.replicate]),
  ).toEqual([[0, 2]]);
  expect(curve.range.min).toBe(1);
});

test.each<[string, Partial<CurveRequest>]>([
  ['points exactly on a line', { standards: standardsOf([1, 2, 4, 8], [0.125, 0.25, 0.5, 1]) }],
  [
    'an exact line forced through zero',
    { model: 'proportional', standards: standardsOf([1, 2, 4, 8], [0.25, 0.375, 0.625, 1.125]) },
  ],
  ['a slope that is not proven', { standards: standardsOf([1, 2, 3, 4], [0.1, 0.3, 0.15, 0.35]) }],
  ['nothing but a censored unknown', { unknowns: [unknown(['OVER'])] }],
  ['three points', { standards: standardsOf([1, 2, 3], [0.1, 0.21, 0.3]) }],
])('the answer for %s holds no number that JSON cannot carry', (_name, changes) => {
  const answer = calculateStandardCurve(request({ unknowns: [unknown([0.3])], ...changes }));
  expect(JSON.parse(JSON.stringify(answer))).toEqual(answer);
});
