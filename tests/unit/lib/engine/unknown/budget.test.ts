import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type UnknownRequest } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';
import { request, standardsOf, unknown } from '../requests';

function read(
  more: Partial<UnknownRequest> = {},
  changes: Partial<CurveRequest> = {},
  readings = [0.4032, 0.404],
) {
  const answer = calculateStandardCurve(request({ unknowns: [unknown(readings, more)], ...changes }));
  const [result] = answer.unknowns;
  if (!result) throw new Error('no result');
  return { ...result, curve: answer.curve };
}
const line = (result: { budget: readonly { source: string; u: number }[] }, source: string) =>
  result.budget.find((item) => item.source === source)?.u;

describe('the budget', () => {
  test('is curve and readings alone when nothing else was entered', () => {
    const result = read({ dilution: [{ takenMl: 10, toMl: 50 }] });
    expect(result.budget.map((item) => [item.source, item.sharesS])).toEqual([
      ['curve', true],
      ['readings', true],
    ]);
    expectDigits(
      result.budget.reduce((sum, item) => sum + item.share, 0),
      1,
      14,
    );
    expect(result.concentration?.degreesOfFreedom).toBe(8);
    expectDigits(result.concentration?.u ?? NaN, 5 * (result.measured?.u ?? NaN), 14);
  });

  // By hand: relative parts 0.05/5, 0.1/50 of the result; tolerance/√6 for a flask given by its ware.
  test('has a line for each volume with an uncertainty', () => {
    const result = read({
      dilution: [{ takenMl: 5, toMl: 50, takenUMl: 0.05, toWare: { toleranceMl: 0.06 } }],
    });
    const value = result.concentration?.value ?? NaN;
    expectDigits(line(result, 'dilution 1, volume taken') ?? NaN, value * 0.01, 13);
    expectDigits(line(result, 'dilution 1, made up to') ?? NaN, (value * 0.06) / Math.sqrt(6) / 50, 13);
    expectDigits(result.dilutionFactor.u, 10 * Math.hypot(0.01, 0.06 / Math.sqrt(6) / 50), 13);
  });

  test('counts what the standards share once', () => {
    const result = read({}, { standardsRelativeU: 0.005 });
    expectDigits(line(result, 'standards') ?? NaN, 0.005 * (result.concentration?.value ?? NaN), 13);
  });

  // Welch-Satterthwaite by hand: one component with 8 degrees of freedom and one of Type B.
  test('widens the degrees of freedom by its Type B lines', () => {
    const result = read({}, { standardsRelativeU: 0.005 });
    const c = result.concentration;
    const typeB = line(result, 'standards') ?? NaN;
    const typeA2 = (c?.u ?? NaN) ** 2 - typeB ** 2;
    expectDigits(c?.degreesOfFreedom ?? NaN, (8 * (c?.u ?? NaN) ** 4) / typeA2 ** 2, 9);
    expect(c?.interval[1]).toBe((c?.value ?? NaN) + (c?.U ?? NaN));
    expectDigits(c?.U ?? NaN, (c?.k ?? NaN) * (c?.u ?? NaN), 15);
  });

  test('one cell cancels, two cells are a line each', () => {
    const one = read({}, { pathLengthUMm: 0.05 });
    expect(one.budget).toHaveLength(2);
    const two = read({ pathLengthMm: 20, pathLengthUMm: 0.04 }, { pathLengthUMm: 0.05 }, [0.8032, 0.804]);
    const scale = (two.absorbance ?? NaN) / two.curve.slope.value;
    expectDigits(line(two, 'path length of the unknown') ?? NaN, scale * 0.002, 13);
    expectDigits(line(two, 'path length of the standards') ?? NaN, scale * 0.005, 13);
  });

  // A reading in a cell twice as long has half the standard deviation per 10 mm.
  test('the path factor halves the readings line in a cell of 20 mm', () => {
    const short = read({}, {}, [0.4032, 0.404]);
    const long = read({ pathLengthMm: 20 }, {}, [0.8064, 0.808]);
    expectDigits(2 * (line(long, 'readings') ?? NaN), line(short, 'readings') ?? NaN, 12);
  });

  test('a perfect curve with a perfect reading has no uncertainty and its own degrees of freedom', () => {
    const perfect = read({}, { standards: standardsOf([1, 2, 3, 4], [0.1, 0.2, 0.3, 0.4]) }, [0.25]);
    expect(perfect.concentration?.u).toBeLessThan(1e-14);
    const typeB = read(
      {},
      { standardsRelativeU: 0.01, standards: standardsOf([1, 2, 4, 8], [0.125, 0.25, 0.5, 1]) },
      [0.25],
    );
    expect(typeB.concentration?.degreesOfFreedom).toBeNull();
    expectDigits(typeB.concentration?.k ?? NaN, 1.959963984540054, 12);
  });
});

describe('the blank in the budget', () => {
  const subtract = { blank: { readings: [0.003, 0.005], use: 'subtract' as const } };

  test('with a free intercept it cancels: no line, the same concentration and uncertainty', () => {
    const without = read();
    const withBlank = read({}, subtract);
    expect(withBlank.budget.map((item) => item.source)).toEqual(['curve', 'readings']);
    expectDigits(withBlank.measured?.value ?? NaN, without.measured?.value ?? NaN, 12);
    expectDigits(withBlank.measured?.u ?? NaN, without.measured?.u ?? NaN, 12);
  });

  // Own derivation: δ in every reading moves y0 by -δ and b by -δ Σx/Σx²; checked by moving the blank itself.
  test('through zero it enters once, by what a wrong blank would do to the result', () => {
    const result = read({}, { ...subtract, model: 'proportional' });
    const shifted = read(
      {},
      { model: 'proportional', blank: { use: 'subtract', readings: [0.003 + 1e-6, 0.005 + 1e-6] } },
    );
    const sensitivity = ((shifted.measured?.value ?? NaN) - (result.measured?.value ?? NaN)) / 1e-6;
    const uBlank = result.curve.residualSd / Math.SQRT2;
    expectDigits(line(result, 'blank') ?? NaN, Math.abs(sensitivity) * uBlank, 4);
    expect(result.budget.find((item) => item.source === 'blank')?.sharesS).toBe(true);
  });

  test('as a level it is a point at zero for each reading', () => {
    const { curve } = read({}, { blank: { readings: [0.003, 0.005], use: 'level' } });
    expect(curve.n).toBe(12);
    expect(
      curve.points.slice(0, 2).map((point) => [point.role, point.concentration, point.replicate]),
    ).toEqual([
      ['blank', 0, 1],
      ['blank', 0, 2],
    ]);
    expect(curve.range).toEqual({ min: 1, max: 8 });
  });
});

describe('molar absorptivity', () => {
  // By hand: 0.1 per (mg/L) and 10 mm × 55.845 g/mol × 1000 = 5584.5 L/(mol cm).
  const standards = standardsOf([1, 2, 4, 8], [0.1, 0.2, 0.4, 0.8]);
  test.each([
    [{ unit: 'mg/L', formulaMass: 55.845 }, 5584.5],
    [{ unit: 'g/L', formulaMass: 55.845 }, 5.5845],
    [{ unit: 'mol/L', formulaMass: 55.845 }, 0.1],
    [{ unit: 'mmol/L', formulaMass: 55.845 }, 100],
    [{ unit: '\u00b5mol/L', formulaMass: 55.845 }, 1e5],
  ] as const)('%j', (changes, epsilon) => {
    expectDigits(
      calculateStandardCurve(request({ standards, ...changes })).curve.molarAbsorptivity?.value ?? NaN,
      epsilon,
      12,
    );
  });

  test('holds slope, standards and path in its uncertainty, and says when only the slope is known', () => {
    const only = calculateStandardCurve(request({ formulaMass: 55.845 })).curve;
    expectDigits(
      (only.molarAbsorptivity?.u ?? NaN) / (only.molarAbsorptivity?.value ?? NaN),
      only.slope.u / only.slope.value,
      13,
    );
    expect(only.molarAbsorptivity?.covers).toMatch(/only the slope/i);
    const path = calculateStandardCurve(request({ formulaMass: 55.845, pathLengthUMm: 0.02 })).curve;
    expect(path.molarAbsorptivity?.covers).toMatch(/slope and the path length, but not the standards/);
    const all = calculateStandardCurve(
      request({ formulaMass: 55.845, standardsRelativeU: 0.01, pathLengthUMm: 0.02 }),
    ).curve;
    const relative = Math.hypot(only.slope.u / only.slope.value, 0.01, 0.002);
    expectDigits((all.molarAbsorptivity?.u ?? NaN) / (all.molarAbsorptivity?.value ?? NaN), relative, 13);
  });

  test('is not claimed without a formula mass, nor for a path that is an assumption', () => {
    expect(calculateStandardCurve(request()).curve.molarAbsorptivity).toBeUndefined();
    const assumed = request({ unit: 'mmol/L', formulaMass: 479.02, pathLengthKnown: false });
    expect(calculateStandardCurve(assumed).curve.molarAbsorptivity).toBeUndefined();
  });
});
