import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type StandardRequest } from '@/lib/engine';
import { rankCorrelation } from '@/lib/engine/weighting/rank-correlation';
import { expectDigits } from '../../../../support/digits';
import { reference, request } from '../requests';

// Reference: scipy.stats.spearmanr, with ties (fixtures/reference/curve-judgements/SOURCE.md).
test.each(reference<{ ranks: { a: number[]; b: number[]; rho: number }[] }>('curve-judgements').ranks)(
  'rank correlation agrees with scipy: $rho',
  ({ a, b, rho }) => {
    expectDigits(rankCorrelation(a, b), rho, 10);
  },
);

test.each([
  [
    [1, 1, 1],
    [1, 2, 3],
  ],
  [
    [1, 2, 3],
    [2, 2, 2],
  ],
])('a list of ties correlates with nothing', (a, b) => {
  expect(rankCorrelation(a, b)).toBe(0);
});

const LEVELS = [1, 2, 4, 8, 16];
/** Readings about 0.05 c whose scatter is `sd` of the absorbance, the same shape at every level. */
const replicated = (sd: (y: number) => number, shape: readonly number[]): StandardRequest[] =>
  LEVELS.map((concentration) => {
    const y = 0.05 * concentration;
    return { concentration, readings: shape.map((z) => y + sd(y) * z) };
  });
const adviceOf = (standards: readonly StandardRequest[], changes: Partial<CurveRequest> = {}) =>
  calculateStandardCurve(request({ standards, ...changes })).curve.judgements?.weighting;

describe('advice from replicates', () => {
  const four = [-1, -0.3, 0.2, 1.1];

  test('none, when the scatter is the same all along', () => {
    const advice = adviceOf(replicated(() => 0.001, four));
    expect(advice).toMatchObject({ advised: 'none', basis: 'replicates', agrees: true });
    expect(advice?.sentence).toMatch(
      /^No weights are called for: over 15 degrees of freedom .* \(p 0\.5\)\.$/,
    );
  });

  test('1/y², when it is proportional', () => {
    const standards = replicated((y) => 0.02 * y, four);
    const advice = adviceOf(standards);
    expect(advice).toMatchObject({ advised: '1/y2', agrees: false, inUse: 'none' });
    expect(advice?.sentence).toMatch(/grows 16 times .* in proportion to the absorbance \(1\.8 % of it\)\.$/);
    expect(adviceOf(standards, { weighting: '1/y2' })?.agrees).toBe(true);
    expect(adviceOf(standards, { weighting: '1/x2' })?.agrees).toBe(true);
    expect(adviceOf(standards, { weighting: '1/y' })?.agrees).toBe(false);
  });

  test('a variance function, when both terms count', () => {
    const advice = adviceOf(replicated((y) => Math.hypot(0.002, 0.02 * y), four));
    expect(advice).toMatchObject({ advised: 'varianceFunction', agrees: false });
    expect(advice?.sentence).toMatch(/^A variance function with s0 = 0\.0018 and k = 0\.018 is called for/);
  });

  test('1/x with a warning, when it grows over few degrees of freedom', () => {
    const standards = replicated((y) => 0.03 * y, [-1, 1]);
    const advice = adviceOf(standards);
    expect(advice).toMatchObject({ advised: '1/x', agrees: false });
    expect(advice?.sentence).toMatch(/fewer than 10 degrees of freedom do not say by which law\.$/);
    expect(adviceOf(standards, { weighting: '1/y' })?.agrees).toBe(true);
  });

  test('none with a warning, when few show no growth', () => {
    expect(adviceOf(replicated(() => 0.001, [-1, 1]))?.sentence).toMatch(
      /fewer than 10 can hide a growth\.$/,
    );
  });
});

describe('advice from residuals, without replicates', () => {
  const sized = (sizes: readonly number[]): StandardRequest[] =>
    sizes.map((size, i) => ({
      concentration: i + 1,
      readings: [0.05 * (i + 1) + (i % 2 === 0 ? size : -size)],
    }));
  const growing = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10].map((k) => 2e-4 * k * k);

  test('nothing can be said of five readings', () => {
    expect(adviceOf(sized([1e-3, 2e-3, 1e-3, 2e-3, 1e-3]))).toMatchObject({
      advised: null,
      basis: 'nothing',
      agrees: true,
    });
  });

  test('the weights in use, when the residuals have no trend', () => {
    const advice = adviceOf(sized([1, 2, 1.5, 1, 2, 1.2, 2, 1, 1.7, 1.3].map((k) => k * 1e-3)));
    expect(advice).toMatchObject({ advised: 'none', basis: 'residuals', agrees: true });
    expect(advice?.sentence).toMatch(/^The weights in use suit/);
  });

  test('1/x, when they grow, and 1/x² when they grow under it', () => {
    expect(adviceOf(sized(growing))).toMatchObject({ advised: '1/x', agrees: false });
    const steep = sized(growing.map((size) => size * size * 20));
    expect(adviceOf(steep, { weighting: '1/x' })).toMatchObject({ advised: '1/x2', agrees: false });
  });

  test('weaker weights, when they shrink; without weights, a look at the low standards', () => {
    const shrinking = sized([...growing].reverse().map((size) => size / 4));
    expect(adviceOf(shrinking, { weighting: '1/x' })).toMatchObject({ advised: 'none', agrees: false });
    const plain = adviceOf(shrinking);
    expect(plain).toMatchObject({ advised: null, agrees: true });
    expect(plain?.sentence).toMatch(/^Look at the low standards/);
  });
});
