import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, learnVarianceFunction, type LevelScatter } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';
import { reference, request } from '../requests';

interface Problem {
  readonly levels: readonly LevelScatter[];
  readonly s0: number;
  readonly k: number;
}

describe('the variance function that replicates teach', () => {
  // Reference: scipy's minimiser and mpmath's root of the scores (fixtures/reference/variance-function/SOURCE.md).
  const problems = reference<readonly Problem[]>('variance-function').map((problem, i) => ({
    ...problem,
    i,
  }));
  test.each(problems)('problem $i: s0 $s0, k $k', ({ levels, s0, k }) => {
    const found = learnVarianceFunction(levels);
    expect(found?.degreesOfFreedom).toBe(levels.reduce((sum, level) => sum + level.degreesOfFreedom, 0));
    for (const [ours, theirs] of [
      [found?.s0, s0],
      [found?.k, k],
    ] as const) {
      if (theirs === 0) expect(ours).toBe(0);
      else expectDigits(ours ?? NaN, theirs, 8);
    }
  });

  const of = (variance: (y: number) => number, degreesOfFreedom = 4) =>
    learnVarianceFunction(
      [0.1, 0.2, 0.4, 0.8].map((meanY) => ({ meanY, variance: variance(meanY), degreesOfFreedom })),
    );

  // Known cases: variances that follow a law exactly give the law back.
  test('constant variances give k = 0, and no sign of growth', () => {
    const found = of(() => 4e-6);
    expectDigits(found?.s0 ?? NaN, 0.002, 12);
    expect(found).toMatchObject({ k: 0, pConstant: 0.5, adviceOnly: false, degreesOfFreedom: 16 });
  });

  test('variances in proportion to y² give s0 = 0', () => {
    const found = of((y) => (0.01 * y) ** 2);
    expect(found?.s0).toBe(0);
    expectDigits(found?.k ?? NaN, 0.01, 12);
  });

  test('a law with both terms gives both', () => {
    const found = of((y) => 0.001 ** 2 + (0.01 * y) ** 2);
    expectDigits(found?.s0 ?? NaN, 0.001, 9);
    expectDigits(found?.k ?? NaN, 0.01, 9);
  });

  // Property: another unit of y scales s0 and leaves k.
  test('y times 1000 scales s0 and leaves k', () => {
    const { levels = [], s0 = NaN, k = NaN } = problems[0] ?? {};
    const found = learnVarianceFunction(
      levels.map((level) => ({ ...level, meanY: 1e3 * level.meanY, variance: 1e6 * level.variance })),
    );
    expectDigits(found?.s0 ?? NaN, 1e3 * s0, 8);
    expectDigits(found?.k ?? NaN, k, 8);
  });

  test('is advice only below ten degrees of freedom', () => {
    expect(of((y) => y * y, 2)?.adviceOnly).toBe(true);
    expect(
      learnVarianceFunction([1, 2].map((meanY) => ({ meanY, variance: meanY, degreesOfFreedom: 5 })))
        ?.adviceOnly,
    ).toBe(false);
  });

  test('a level without scatter at y = 0 leaves nothing to learn; elsewhere it teaches', () => {
    const still = { variance: 0, degreesOfFreedom: 3 };
    const wide = { meanY: 1, variance: 1e-4, degreesOfFreedom: 3 };
    expect(learnVarianceFunction([{ ...still, meanY: 0 }, wide])).toBeNull();
    expect(learnVarianceFunction([{ ...still, meanY: 0.1 }, wide])?.s0).toBe(0);
    // A level at zero that scatters is s0 itself.
    expect(learnVarianceFunction([{ meanY: 0, variance: 1e-6, degreesOfFreedom: 3 }, wide])).toMatchObject({
      s0: expect.closeTo(1e-3, 9) as number,
      k: expect.closeTo(Math.sqrt(1e-4 - 1e-6), 9) as number,
    });
  });

  test.each([
    ['one level', [{ meanY: 0.1, variance: 1e-6, degreesOfFreedom: 3 }]],
    ['levels of the same y', [0.1, 0.1].map((meanY) => ({ meanY, variance: 1e-6, degreesOfFreedom: 3 }))],
    ['no scatter at all', [0.1, 0.2].map((meanY) => ({ meanY, variance: 0, degreesOfFreedom: 3 }))],
  ])('%s teach nothing', (_what, levels) => {
    expect(learnVarianceFunction(levels)).toBeNull();
  });

  test('stands among the judgements of a curve, or why it cannot', () => {
    const { curve } = calculateStandardCurve(request());
    expect(curve.judgements?.varianceFunction).toMatchObject({ degreesOfFreedom: 5, adviceOnly: true });
    const single = request().standards.map((standard) => ({
      ...standard,
      readings: standard.readings.slice(0, 1),
    }));
    expect(calculateStandardCurve(request({ standards: single })).curve.judgements?.varianceFunction).toEqual(
      {
        reason: expect.stringMatching(/learned from replicates/) as string,
      },
    );
  });

  // The path enters once, with the weight: readings at 50 mm scatter five times less per 10 mm.
  test('is learned from absorbances as read', () => {
    const at = (pathLengthMm: number) =>
      calculateStandardCurve(
        request({
          standards: [0.01, 0.02, 0.04].map((concentration) => ({
            concentration,
            pathLengthMm,
            readings: [concentration * pathLengthMm * 0.1, concentration * pathLengthMm * 0.1 + 0.002],
          })),
        }),
      ).curve.judgements?.varianceFunction;
    expect(at(50)).toMatchObject({ s0: expect.closeTo(Math.SQRT2 * 0.001, 9) as number, k: 0 });
    expect(at(10)).toMatchObject({ s0: expect.closeTo(Math.SQRT2 * 0.001, 9) as number, k: 0 });
  });
});
