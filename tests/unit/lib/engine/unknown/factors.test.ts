import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  type AnyDilutionStep,
  calculateStandardCurve,
  type CurveRequest,
  type UnknownRequest,
} from '@/lib/engine';
import { dilutionFactor } from '@/lib/engine/unknown/dilution-factor';
import { expectDigits } from '../../../../support/digits';
import { request, resultOf, unknown } from '../requests';

const read = (more: Partial<UnknownRequest> = {}, changes: Partial<CurveRequest> = {}) =>
  resultOf([0.4032, 0.404], more, changes);
const lineOf = (result: ReturnType<typeof read>, source: string) => {
  const found = result.budget.find((line) => line.source === source);
  if (!found) throw new Error(`no line ${source}`);
  return found;
};

describe('every line of the budget', () => {
  const full = read(
    {
      pathLengthMm: 20,
      pathLengthUMm: 0.04,
      recovery: { value: 0.95, u: 0.01 },
      dilution: [
        { takenMl: 5, toMl: 50, takenUMl: 0.01, toWare: { toleranceMl: 0.06, repeatabilityMl: 0.02 } },
        { takenG: 2, toG: 20, takenUG: 0.001, toUG: 0.002 },
      ],
    },
    {
      standardsRelativeU: 0.004,
      standardsShared: [{ source: 'purity', relativeU: 0.002 }],
      pathLengthUMm: 0.02,
    },
  );

  test('is there by name', () => {
    expect(full.budget.map((line) => line.source)).toEqual([
      'curve',
      'readings',
      'standards',
      'purity',
      'dilution 1, volume taken',
      'dilution 1, made up to',
      'dilution 2, mass taken',
      'dilution 2, made up to (mass)',
      'recovery',
      'path length of the unknown',
      'path length of the standards',
    ]);
  });

  // Law of propagation: each contribution is the size of its sensitivity times its input.
  test('is its sensitivity times its input', () => {
    for (const line of full.budget)
      expectDigits(line.u, Math.abs(line.sensitivity ?? NaN) * (line.inputU ?? NaN), 12);
    expectDigits(Math.hypot(...full.budget.map((line) => line.u)), full.concentration?.u ?? NaN, 13);
  });

  test('says its degrees of freedom, none for Type B', () => {
    expect(lineOf(full, 'curve').degreesOfFreedom).toBe(8);
    expect(lineOf(full, 'recovery').degreesOfFreedom).toBeNull();
  });

  // By moving the input itself: the difference quotient is the sensitivity.
  test.each<[string, number, (step: number) => ReturnType<typeof read>]>([
    [
      'dilution 1, volume taken',
      1e-5,
      (d) => read({ dilution: [{ takenMl: 5 + d, toMl: 50, takenUMl: 0.01 }] }),
    ],
    ['dilution 1, made up to', 1e-4, (d) => read({ dilution: [{ takenMl: 5, toMl: 50 + d, toUMl: 0.01 }] })],
    ['dilution 1, mass taken', 1e-5, (d) => read({ dilution: [{ takenG: 5 + d, toG: 50, takenUG: 0.01 }] })],
    ['recovery', 1e-6, (d) => read({ recovery: { value: 0.9 + d, u: 0.01 } })],
    ['path length of the unknown', 1e-4, (d) => read({ pathLengthMm: 10 + d, pathLengthUMm: 0.01 })],
  ])('has the sensitivity of %s', (source, step, at) => {
    const difference =
      ((at(step).concentration?.value ?? NaN) - (at(-step).concentration?.value ?? NaN)) / (2 * step);
    expectDigits(lineOf(at(0), source).sensitivity ?? NaN, difference, 7);
  });
});

describe('a recovery', () => {
  test('divides the result, its bounds and its intervals', () => {
    const plain = read();
    const with80 = read({ recovery: { value: 0.8, u: 0 } });
    expectDigits(with80.concentration?.value ?? NaN, (plain.concentration?.value ?? NaN) / 0.8, 14);
    expectDigits(with80.fieller?.[1] ?? NaN, (plain.fieller?.[1] ?? NaN) / 0.8, 14);
    expect(with80.measured).toEqual(plain.measured);
    expect(with80.recovery).toEqual({ value: 0.8, u: 0 });
    expect(with80.dilutionFactor.value).toBe(1);
    expect(with80.working.find((step) => step.id === 'unknown.result')?.formula).toBe('C = c * F / R');
    const low = calculateStandardCurve(
      request({ recovery: { value: 0.8, u: 0 }, unknowns: [unknown([0.0045])] }),
    );
    expect(low.unknowns[0]?.report).toBe('< 1.25 mg/L');
  });

  test('of the unknown comes before that of the request', () => {
    const both = read({ recovery: { value: 0.5, u: 0 } }, { recovery: { value: 0.9, u: 0.1 } });
    expect(both.recovery?.value).toBe(0.5);
    expect(both.budget.map((line) => line.source)).toEqual(['curve', 'readings']);
  });
});

describe('a dilution', () => {
  test('by mass counts in volumes when the densities are given', () => {
    const step = {
      takenG: 2,
      toG: 20,
      densities: { takenGPerMl: 1.2, toGPerMl: 1, takenUGPerMl: 0.012, toUGPerMl: 0.001 },
    };
    const factor = dilutionFactor([step]);
    expectDigits(factor.value, 20 / 1 / (2 / 1.2), 14);
    expectDigits(factor.u / factor.value, Math.hypot(0.01, 0.001), 12);
    expectDigits(dilutionFactor([{ takenG: 2, toG: 20 }]).value, 10, 15);
  });

  // By hand: one pipette of 5 mL used twice is wrong both times alike, so that its relative error doubles.
  test('counts the tolerance of one piece used twice once, with its sign', () => {
    const ware = { toleranceMl: 0.015 };
    const step: AnyDilutionStep = { takenMl: 5, toMl: 50, takenWare: { ...ware, piece: 'pipette P5' } };
    const apart: AnyDilutionStep = { takenMl: 5, toMl: 50, takenWare: ware };
    const relative = 0.015 / Math.sqrt(6) / 5;
    expectDigits(dilutionFactor([step, step]).u / 100, 2 * relative, 12);
    expectDigits(dilutionFactor([apart, apart]).u / 100, Math.SQRT2 * relative, 12);
    const result = read({ dilution: [step, step] });
    expectDigits(
      lineOf(result, 'pipette P5, used 2 times').u,
      2 * relative * (result.concentration?.value ?? NaN),
      12,
    );
    expect(read({ dilution: [step] }).budget.at(-1)?.source).toBe('pipette P5, used once');
  });

  test('by one piece for taking and filling cancels its tolerance', () => {
    const ware = { toleranceMl: 0.02, repeatabilityMl: 0.01, piece: 'pipette P10' };
    const factor = dilutionFactor([{ takenMl: 10, toMl: 10, takenWare: ware, toWare: ware }]);
    expectDigits(factor.u, Math.SQRT2 * 0.001, 12);
  });

  test('in two steps with exact glassware is the same as in one', () => {
    const volume = fc.double({ min: 1, max: 50, noNaN: true });
    fc.assert(
      fc.property(volume, volume, (a, b) => {
        const two = read({
          dilution: [
            { takenMl: 1, toMl: a },
            { takenMl: 1, toMl: b },
          ],
        });
        const one = read({ dilution: [{ takenMl: 1, toMl: a * b }] });
        expectDigits(two.concentration?.value ?? NaN, one.concentration?.value ?? NaN, 13);
        expectDigits(two.concentration?.u ?? NaN, one.concentration?.u ?? NaN, 13);
      }),
      { numRuns: 30 },
    );
  });
});

test('what the standards share by name enters the molar absorptivity too', () => {
  const base = { formulaMass: 55.845 };
  const named = calculateStandardCurve(
    request({
      ...base,
      standardsShared: [
        { source: 'stock', relativeU: 0.003 },
        { source: 'purity', relativeU: 0.004 },
      ],
    }),
  );
  const summed = calculateStandardCurve(request({ ...base, standardsRelativeU: 0.005 }));
  expectDigits(named.curve.molarAbsorptivity?.u ?? NaN, summed.curve.molarAbsorptivity?.u ?? NaN, 13);
});
