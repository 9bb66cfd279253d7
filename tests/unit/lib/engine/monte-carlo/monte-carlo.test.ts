import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, monteCarlo } from '@/lib/engine';
import { agreementOf } from '@/lib/engine/monte-carlo/agreement';
import { cholesky } from '@/lib/engine/monte-carlo/curve-core';
import { expectDigits } from '../../../../support/digits';
import { request, standardsOf, unknown } from '../requests';

const OPTIONS = { trials: 100_000, seed: 42 };
const run = (asked: CurveRequest, options = OPTIONS) => {
  const answer = monteCarlo(asked, 0, options);
  if (!answer) throw new Error('no answer');
  return answer;
};
const result = (asked: CurveRequest) => calculateStandardCurve(asked).unknowns[0]?.concentration;

describe('the Monte Carlo run beside a budget', () => {
  // The budget itself is checked elsewhere; where the model is all but linear the two must agree (JCGM 101, clause 8).
  const quadratic = request({
    model: 'quadratic',
    standards: [0.5, 1, 2, 4, 6, 8].map((c) => ({
      concentration: c,
      readings: [0.1 * c - 0.001 * c * c + 0.001, 0.1 * c - 0.001 * c * c - 0.0008],
    })),
    unknowns: [unknown([0.351, 0.3523])],
  });
  test.each<[string, CurveRequest]>([
    ['a line', request({ unknowns: [unknown([0.4032, 0.404])] })],
    ['a line through zero', request({ model: 'proportional', unknowns: [unknown([0.4032, 0.404])] })],
    [
      'a line through zero with its blank',
      request({
        model: 'proportional',
        blank: { readings: [0.003, 0.0045], use: 'subtract' },
        unknowns: [unknown([0.4032, 0.404])],
      }),
    ],
    ['a quadratic', quadratic],
    ['weights', request({ weighting: '1/x', unknowns: [unknown([0.2032, 0.204])] })],
    [
      'everything else',
      request({
        standardsRelativeU: 0.004,
        pathLengthUMm: 0.02,
        recovery: { value: 0.95, u: 0.006 },
        unknowns: [
          unknown([0.8032, 0.804], {
            pathLengthMm: 20,
            pathLengthUMm: 0.05,
            dilution: [
              {
                takenMl: 5,
                toMl: 50,
                takenWare: { toleranceMl: 0.015, piece: 'P' },
                toWare: { toleranceMl: 0.06, temperatureRangeK: 4, repeatabilityMl: 0.02 },
              },
              { takenMl: 5, toMl: 25, takenWare: { toleranceMl: 0.015, piece: 'P' } },
            ],
          }),
        ],
      }),
    ],
  ])('agrees for %s', (_name, asked) => {
    const answer = run(asked);
    const c = result(asked);
    expect(answer.agreement.verdict).toBe('agree');
    expect(Math.abs(answer.mean - (c?.value ?? NaN))).toBeLessThan(0.05 * (c?.u ?? NaN));
    expect(answer.failed).toBe(0);
    expect(answer.unit).toBe('mg/L');
  });

  // s with ν degrees of freedom makes a scaled t: its standard deviation is u √(ν/(ν - 2)), its interval ± t u.
  test('draws line and reading jointly as a scaled t', () => {
    const asked = request({ unknowns: [unknown([0.4032, 0.404])] });
    const c = result(asked);
    const answer = run(asked, { trials: 400_000, seed: 3 });
    expect(Math.abs(answer.u / ((c?.u ?? NaN) * Math.sqrt(8 / 6)) - 1)).toBeLessThan(0.01);
    expect(Math.abs((answer.interval[1] - answer.interval[0]) / (2 * (c?.U ?? NaN)) - 1)).toBeLessThan(0.01);
  });

  test('draws readings that disagree with their own degrees of freedom', () => {
    const asked = request({ unknowns: [unknown([0.39, 0.41, 0.404])] });
    const answer = run(asked, { trials: 200_000, seed: 5 });
    // t(0.975; 2) = 4.303 (tables) of the mean of three, all but alone.
    const half =
      (4.303 * Math.sqrt(((0.39 - 0.4013) ** 2 + (0.41 - 0.4013) ** 2 + (0.404 - 0.4013) ** 2) / 6)) / 0.1;
    expect(Math.abs((answer.interval[1] - answer.interval[0]) / 2 / half - 1)).toBeLessThan(0.03);
  });

  // A slope known to a third: the quotient is lopsided, as Fieller's interval is, and the usual one is not.
  test('differs where the slope is loose, and lies near Fieller', () => {
    const asked = request({
      standards: standardsOf([1, 2, 3, 4, 5, 6], [0.12, 0.17, 0.33, 0.36, 0.55, 0.57]),
      unknowns: [unknown([0.55])],
    });
    const answer = run(asked, { trials: 400_000, seed: 9 });
    const [low = NaN, high = NaN] = calculateStandardCurve(asked).unknowns[0]?.fieller ?? [];
    expect(answer.agreement.verdict).toBe('differ');
    expect(Math.abs(answer.interval[0] / low - 1)).toBeLessThan(0.02);
    expect(Math.abs(answer.interval[1] / high - 1)).toBeLessThan(0.02);
    expect(answer.agreement.sentence).toMatch(/prefer the interval of the trials/);
  });

  test('says when the run is too short to decide', () => {
    const short = run(request({ unknowns: [unknown([0.4032, 0.404])] }), { trials: 100, seed: 1 });
    expect(short.agreement.verdict).toBe('undecided');
    expect(short.agreement.sentence).toMatch(/^100 trials\. The run is too short to decide/);
  });

  test('is the same for the same seed', () => {
    const asked = request({ unknowns: [unknown([0.4])] });
    expect(run(asked, { trials: 2000, seed: 8 })).toEqual(run(asked, { trials: 2000, seed: 8 }));
  });

  test('has nothing to draw about without a concentration', () => {
    expect(monteCarlo(request({ unknowns: [unknown(['OVER'])] }), 0, OPTIONS)).toBeNull();
  });

  test('refuses an unknown that is not there and numbers of trials that make no run', () => {
    const asked = request({ unknowns: [unknown([0.4])] });
    expect(() => monteCarlo(asked, 1, OPTIONS)).toThrow(expect.objectContaining({ code: 'UNKNOWN_MISSING' }));
    for (const trials of [0, 99, 1000.5, 1e9])
      expect(() => monteCarlo(asked, 0, { trials, seed: 1 })).toThrow(
        expect.objectContaining({ code: 'TRIALS_OUT_OF_RANGE', pointer: '/trials' }),
      );
  });
});

describe('agreement', () => {
  const simulated = {
    trials: 1000,
    failed: 0,
    mean: 10,
    u: 0.2,
    interval: [9.6, 10.4],
    intervalError: [0.001, 0.001],
    shortest: [9.6, 10.4],
  } as const;
  const budget = { value: 10, u: 0.2, U: 0.4, unit: 'mg/L' };

  // JCGM 101, 7.9.2: u = 0.2 = 2 × 10^-1, so δ = 0.05.
  test('at one digit of u', () => {
    const answer = agreementOf(budget, simulated);
    expectDigits(answer.tolerance, 0.05, 14);
    expect(answer.verdict).toBe('agree');
    expect(agreementOf({ ...budget, U: 0.4489 }, simulated).verdict).toBe('undecided');
    expect(agreementOf({ ...budget, U: 0.4525 }, simulated).verdict).toBe('differ');
    expect(agreementOf({ ...budget, u: 0.0097 }, simulated).tolerance).toBeCloseTo(0.005, 12);
  });

  test('is exact where nothing is uncertain', () => {
    const certain = { ...simulated, u: 0, interval: [10, 10], intervalError: [0, 0] } as const;
    expect(agreementOf({ ...budget, u: 0, U: 0 }, certain).verdict).toBe('agree');
  });

  test('tells of trials without a result', () => {
    expect(agreementOf(budget, { ...simulated, failed: 3 }).sentence).toMatch(
      /^1000 trials, 3 of them without a result\./,
    );
  });
});

// L Lᵀ = V by hand.
test('the triangular factor of a covariance', () => {
  expect(
    cholesky([
      [4, 2],
      [2, 10],
    ]),
  ).toEqual([[2], [1, 3]]);
  expect(
    cholesky([
      [0, 0],
      [0, 9],
    ]),
  ).toEqual([[0], [0, 3]]);
});
