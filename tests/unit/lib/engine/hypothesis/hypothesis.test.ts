import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type TestAnswer } from '@/lib/engine';
import { fitQuadratic } from '@/lib/engine/regression/fit-quadratic';
import { expectDigits } from '../../../../support/digits';
import { reference, request, standardsOf } from '../requests';

const testsOf = (changes: Partial<CurveRequest>) => calculateStandardCurve(request(changes)).curve.tests;
const made = (answer: TestAnswer | undefined) => {
  if (answer?.reason !== undefined || answer === undefined) throw new Error(answer?.reason ?? 'no answer');
  return answer;
};

describe('EURACHEM/CITAC CG 4, example A5', () => {
  // Computed with scipy from the published data (fixtures/reference/eurachem-cg4/SOURCE.md, ownChecks).
  const { A5, ownChecks } = reference<{
    A5: { c: number[]; A: number[] };
    ownChecks: { varianceRatio: number; varianceRatioLimit: number; lackOfFitF: number; lackOfFitP: number };
  }>('eurachem-cg4');
  const { curve } = calculateStandardCurve(request({ standards: standardsOf(A5.c, A5.A) }));

  test('lack of fit: F(3, 10) = 4.885, p = 0.024', () => {
    const answer = made(curve.tests.lackOfFit);
    expect(answer).toMatchObject({ df1: 3, df2: 10, passed: false });
    expect(answer.statistic.toFixed(3)).toBe(ownChecks.lackOfFitF.toFixed(3));
    expect(answer.p.toFixed(3)).toBe(ownChecks.lackOfFitP.toFixed(3));
    expect(answer.critical.toFixed(3)).toBe('3.708');
  });

  test('variances of the extreme levels: 211.0 against 99.0', () => {
    const answer = made(curve.tests.homogeneity);
    expect(answer.statistic.toFixed(1)).toBe(ownChecks.varianceRatio.toFixed(1));
    expect(answer.critical.toFixed(1)).toBe(ownChecks.varianceRatioLimit.toFixed(1));
    expect(answer.passed).toBe(false);
  });

  test('both are flagged and the published numbers still stand', () => {
    const codes = curve.flags.map((flag) => flag.code);
    expect(codes).toContain('LACK_OF_FIT');
    expect(codes).toContain('VARIANCE_UNEVEN');
    expect(curve.slope.value.toFixed(4)).toBe('0.2410');
  });
});

describe('Mandel', () => {
  // Computed with scipy from Miller and Miller's eleven points (fixtures/reference/miller-miller/SOURCE.md).
  const { fluorescein, fluorescein11 } =
    reference<Record<string, { x: number[]; y: number[]; mandelF: number }>>('miller-miller');
  const of = (data: { x: number[]; y: number[] } | undefined) =>
    calculateStandardCurve(
      request({ absorbanceLimit: 100, standards: standardsOf(data?.x ?? [], data?.y ?? []) }),
    ).curve;

  test('finds the bend of the eleven points: F(1, 8) = 16.0986', () => {
    const curve = of(fluorescein11);
    const answer = made(curve.tests.mandel);
    expect(answer).toMatchObject({ df1: 1, df2: 8, passed: false });
    expect(answer.statistic.toFixed(4)).toBe(fluorescein11?.mandelF.toFixed(4));
    expect(answer.critical.toFixed(2)).toBe('11.26');
    // Both residual standard deviations, computed with numpy.
    expect(curve.residualSd.toFixed(6)).toBe('1.484206');
    const { x = [], y = [] } = fluorescein11 ?? {};
    expect(fitQuadratic({ x, y, w: x.map(() => 1) }).residualSd.toFixed(6)).toBe('0.907026');
    expect(curve.flags.map((flag) => flag.code)).toContain('CURVATURE');
  });

  test('finds none in the first seven', () => {
    const curve = of(fluorescein);
    expect(made(curve.tests.mandel).passed).toBe(true);
    expect(curve.flags.map((flag) => flag.code)).not.toContain('CURVATURE');
  });
});

describe('the intercept', () => {
  test('is compared with its own uncertainty', () => {
    const { curve } = calculateStandardCurve(request());
    const answer = made(curve.tests.intercept);
    expectDigits(answer.statistic, curve.intercept.value / curve.intercept.u, 13);
    expect(answer.df1).toBe(8);
  });

  test('of a line through zero is that of the free line', () => {
    const free = made(testsOf({}).intercept);
    expect(made(testsOf({ model: 'proportional' }).intercept)).toEqual(free);
  });
});

describe('a test that cannot be made has its reason', () => {
  const single = standardsOf([1, 2, 4, 6], [0.1, 0.21, 0.4, 0.6]);
  test.each<[keyof ReturnType<typeof testsOf>, Partial<CurveRequest>]>([
    ['lackOfFit', { standards: single }],
    [
      'lackOfFit',
      {
        standards: [1, 2].map((c) => ({ concentration: c, readings: [c, c + 0.01] })),
        model: 'proportional',
        absorbanceLimit: 9,
        blank: undefined,
      },
    ],
    ['homogeneity', { standards: single }],
    ['homogeneity', { standards: [1, 2, 3].map((c) => ({ concentration: c, readings: [c / 10, c / 10] })) }],
    ['mandel', { standards: standardsOf([1, 2, 3], [0.1, 0.21, 0.3]) }],
    ['intercept', { model: 'proportional', standards: standardsOf([1, 2], [0.1, 0.21]) }],
    ['intercept', { standards: standardsOf([1, 2, 4, 8], [0.125, 0.25, 0.5, 1]) }],
  ])('%s: %j', (name, changes) => {
    const answer = testsOf(changes)[name];
    if (name === 'lackOfFit' && changes.model === 'proportional') {
      expect(made(answer).df1).toBe(1);
      return;
    }
    expect(answer?.reason).toMatch(/\.$/);
  });
});

// Property: weights scale out of every F ratio.
test('weights that are all the same change no test', () => {
  const weighted = request().standards.map((s) => ({ ...s, weight: 7 }));
  const plain = testsOf({});
  const same = testsOf({ weighting: 'given', standards: weighted });
  for (const name of ['lackOfFit', 'mandel', 'homogeneity', 'intercept'] as const) {
    expectDigits(made(same[name]).statistic, made(plain[name]).statistic, 9);
  }
});
