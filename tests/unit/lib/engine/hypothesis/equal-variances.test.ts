import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type TestAnswer } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';
import { reference, request } from '../requests';

interface Case {
  readonly x: readonly number[];
  readonly groups: readonly (readonly number[])[];
  readonly levene: { F: number; p: number };
  readonly cochran: { C: number; p: number; critical: number };
  readonly standardised: readonly number[];
}
// Reference: scipy (fixtures/reference/curve-judgements/SOURCE.md).
const { ranks: _ranks, ...cases } = reference<Record<string, Case>>('curve-judgements');

const curveOf = (
  x: readonly number[],
  groups: readonly (readonly number[])[],
  changes: Partial<CurveRequest> = {},
) =>
  calculateStandardCurve(
    request({
      standards: x.map((concentration, i) => ({ concentration, readings: [...(groups[i] ?? [])] })),
      ...changes,
    }),
  ).curve;
const made = (answer: TestAnswer | undefined) => {
  if (answer === undefined || answer.reason !== undefined) throw new Error(answer?.reason ?? 'no answer');
  return answer;
};

describe.each(Object.entries(cases))('%s', (_name, { x, groups, levene, cochran, standardised }) => {
  const curve = curveOf(x, groups);

  test("Levene's test from medians agrees with scipy", () => {
    const answer = made(curve.tests.levene);
    expectDigits(answer.statistic, levene.F, 9);
    expectDigits(answer.p, levene.p, 9);
    expect(answer.passed).toBe(levene.p >= 0.05);
  });

  test("Cochran's test agrees with scipy", () => {
    const answer = made(curve.tests.cochran);
    expectDigits(answer.statistic, cochran.C, 10);
    expectDigits(answer.critical, cochran.critical, 9);
    expectDigits(answer.p, cochran.p, 8);
    expect(answer.passed).toBe(cochran.C <= cochran.critical);
  });

  test('standardised residuals agree with the hat matrix', () => {
    // Of the order of one, so absolute: a residual of nothing has no digits.
    curve.points.forEach((point, i) =>
      expect(Math.abs((point.standardisedResidual ?? NaN) - (standardised[i] ?? NaN))).toBeLessThan(1e-11),
    );
  });
});

test('CG 4 A5: C = 0.8866 against 0.684, and the level is named', () => {
  const answer = made(curveOf(cases.A5?.x ?? [], cases.A5?.groups ?? []).tests.cochran);
  expect(answer.statistic.toFixed(4)).toBe('0.8866');
  expect(answer.critical.toFixed(3)).toBe('0.684');
  expect(answer.verdict).toMatch(
    /^The level 0\.9 mg\/L scatters more than all the others \(C 0\.8866, limit 0\.6838/,
  );
});

test('a level that holds all the scatter has p = 0', () => {
  const answer = made(
    curveOf(
      [1, 2, 4],
      [
        [0.1, 0.1],
        [0.2, 0.2],
        [0.4, 0.41],
      ],
    ).tests.cochran,
  );
  expect(answer).toMatchObject({ statistic: 1, p: 0, passed: false });
});

// Property: weights of one factor per level scale its variance, so weights 1/s² make all levels alike.
test('weights from replicates settle what Cochran found', () => {
  const wide = [0.79, 0.81, 0.8, 0.83];
  const narrow = [0.1, 0.101, 0.1005, 0.0998];
  const groups = [narrow, narrow.map((y) => y + 0.1), narrow.map((y) => y + 0.3), wide];
  expect(made(curveOf([1, 2, 4, 8], groups).tests.cochran).passed).toBe(false);
  const settled = made(curveOf([1, 2, 4, 8], groups, { weighting: 'replicates' }).tests.cochran);
  expectDigits(settled.statistic, 1 / 4, 12);
  expect(settled.passed).toBe(true);
});

describe('a test of variances that cannot be made has its reason', () => {
  const same = [0.1, 0.1, 0.1];
  test.each<['cochran' | 'levene', string, readonly (readonly number[])[]]>([
    ['cochran', 'single readings', [[0.1], [0.2], [0.41]]],
    [
      'cochran',
      'uneven numbers',
      [
        [0.1, 0.11],
        [0.2, 0.21, 0.2],
        [0.41, 0.4],
      ],
    ],
    [
      'cochran',
      'identical readings',
      [
        [0.1, 0.1],
        [0.2, 0.2],
        [0.41, 0.41],
      ],
    ],
    [
      'levene',
      'two readings a level',
      [
        [0.1, 0.11],
        [0.2, 0.21],
        [0.41, 0.4],
      ],
    ],
    [
      'levene',
      'three at one level only',
      [
        [0.1, 0.11, 0.12],
        [0.2, 0.21],
        [0.41, 0.4],
      ],
    ],
    ['levene', 'identical readings', [same, same.map((y) => y + 0.1), same.map((y) => y + 0.31)]],
  ])('%s: %s', (name, _what, groups) => {
    expect(curveOf([1, 2, 4], groups).tests[name]?.reason).toMatch(/needs .*\.$/);
  });
});
