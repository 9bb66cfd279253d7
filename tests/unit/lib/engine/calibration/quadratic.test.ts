import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest } from '@/lib/engine';
import { fitQuadratic } from '@/lib/engine/regression/fit-quadratic';
import { invert } from '@/lib/engine/calibration/invert';
import { expectDigits } from '../../../../support/digits';
import { request, standardsOf, unknown } from '../requests';

const x = [0, 0.5, 1, 2, 3, 4, 5];
const bend = (c: number) => 0.01 + 0.2 * c - 0.01 * c * c;
const scatter = [0.0004, -0.0006, 0.0003, 0.0005, -0.0007, 0.0002, -0.0001];
const bent = (changes: Partial<CurveRequest> = {}) =>
  calculateStandardCurve(
    request({
      model: 'quadratic',
      standards: standardsOf(
        x,
        x.map((c, i) => bend(c) + (scatter[i] ?? 0)),
      ),
      ...changes,
    }),
  );

describe('a quadratic curve', () => {
  // By construction: the coefficients that made the points.
  test('recovers an exact quadratic', () => {
    const { curve, unknowns } = bent({
      standards: standardsOf(x, x.map(bend)),
      unknowns: [unknown([bend(2.5)])],
    });
    expectDigits(curve.intercept.value, 0.01, 11);
    expectDigits(curve.slope.value, 0.2, 12);
    expectDigits(curve.quadratic?.value ?? NaN, -0.01, 11);
    expectDigits(unknowns[0]?.measured?.value ?? NaN, 2.5, 12);
    expect(curve.covariance).toHaveLength(3);
  });

  // The delta method by brute force: move each coefficient, invert again, and propagate V through the differences.
  test('has the uncertainty of the delta method', () => {
    const { curve, unknowns } = bent({ unknowns: [unknown([0.35, 0.3502])] });
    const beta = [curve.intercept.value, curve.slope.value, curve.quadratic?.value ?? NaN];
    const y0 = unknowns[0]?.absorbance ?? NaN;
    const root = ([a = NaN, b = NaN, d = NaN]: number[], y: number) =>
      (-b + Math.sqrt(b * b - 4 * d * (a - y))) / (2 * d);
    const step = 1e-6;
    const slopes = beta.map((_, i) => {
      const moved = (sign: number) => beta.map((value, j) => (i === j ? value + sign * step : value));
      return (root(moved(1), y0) - root(moved(-1), y0)) / (2 * step);
    });
    const ofY = (root(beta, y0 + step) - root(beta, y0 - step)) / (2 * step);
    const ofCurve = curve.covariance.reduce(
      (sum, row, i) => sum + row.reduce((part, v, j) => part + v * (slopes[i] ?? 0) * (slopes[j] ?? 0), 0),
      0,
    );
    expectDigits(unknowns[0]?.measured?.value ?? NaN, root(beta, y0), 11);
    expectDigits(unknowns[0]?.measured?.u ?? NaN, Math.sqrt(ofCurve + (ofY * curve.residualSd) ** 2 / 2), 5);
    expect(unknowns[0]?.fieller).toBeNull();
  });

  test('says when its absorbance is never reached', () => {
    const { unknowns } = bent({ unknowns: [unknown([1.5]), unknown([0.76])] });
    expect(unknowns[0]).toMatchObject({ measured: null, reportCase: 'notQuantified' });
    expect(unknowns[0]?.flags.map((flag) => flag.code)).toContain('CURVE_GIVES_NO_ROOT');
    expect(unknowns[1]?.flags.map((flag) => flag.code)).not.toContain('CURVE_GIVES_NO_ROOT');
  });

  test('finds the root on its own branch when it falls, and when it is almost straight', () => {
    const w = x.map(() => 1);
    const falling = fitQuadratic({ x, y: x.map((c) => 1 - bend(c)), w });
    expectDigits(invert(falling, 1 - bend(3)) ?? NaN, 3, 11);
    const straight = fitQuadratic({ x, y: x.map((c) => 0.2 * c + 1e-15 * c * c), w });
    expectDigits(invert(straight, 0.5) ?? NaN, 2.5, 12);
  });

  test('records a working that leads to its result', () => {
    const { curve, unknowns } = bent({ unknowns: [unknown([0.35])] });
    const ids = [...curve.working, ...(unknowns[0]?.working ?? [])].map((step) => step.id);
    expect(ids).toEqual(
      expect.arrayContaining(['curve.quadratic', 'unknown.slope', 'unknown.U', 'unknown.report']),
    );
  });
});
