import { describe, expect, test } from 'vitest';
import { calculateStandardCurve } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';
import { reference, request, standardsOf, unknown } from '../requests';

describe('limits', () => {
  // 3.3 s/b and 10 s/b computed with numpy from Miller and Miller's line (fixtures/reference/miller-miller/SOURCE.md).
  test('ICH limits of the fluorescein line', () => {
    const { fluorescein, fluoresceinUnrounded: more } = reference<{
      fluorescein: { x: number[]; y: number[] };
      fluoresceinUnrounded: { dl3_3: number; ql10: number };
    }>('miller-miller');
    const { limits } = calculateStandardCurve(
      request({ absorbanceLimit: 100, standards: standardsOf(fluorescein.x, fluorescein.y) }),
    ).curve;
    expect(limits[0]).toMatchObject({ kind: 'detection' });
    expect(limits[0]?.value.toFixed(6)).toBe(more.dl3_3.toFixed(6));
    expect(limits[1]?.value.toFixed(6)).toBe(more.ql10.toFixed(6));
  });

  // The calibration of the demo laboratory; figures by an independent numpy/scipy script, in the sample (factor 2).
  const x = [0, 0, 0.1, 0.1, 0.25, 0.25, 0.5, 0.5, 1, 1, 2, 2, 4, 4];
  const y = [
    0.0034, 0.0041, 0.0249, 0.0255, 0.0544, 0.0511, 0.1031, 0.1036, 0.2015, 0.2031, 0.4022, 0.4019, 0.7957,
    0.7962,
  ];
  const { curve } = calculateStandardCurve(
    request({ standards: standardsOf(x, y), unknowns: [unknown([0.3, 0.3])] }),
  );
  const find = (name: string, basis = '') =>
    curve.limits.find((limit) => limit.name === name && limit.basis.includes(basis))?.value ?? NaN;

  test.each([
    ['ICH Q2 detection limit', 'intercept', '0.0145'],
    ['ICH Q2 detection limit', 'residual', '0.0416'],
    ['ISO 11843-2 critical value', '', '0.0177'],
    ['ISO 11843-2 minimum detectable value', '', '0.0347'],
    ['DIN 32645 detection limit', '', '0.0266'],
  ])('%s by %s is %s in the sample', (name, basis, value) => {
    expect((2 * find(name, basis)).toFixed(4)).toBe(value);
  });

  test('the critical value of the curve is the ISO one', () => {
    expect(find('ISO 11843-2 critical value')).toBe(curve.criticalValue);
  });

  // Definition: x_BG is three times the half-width of its own 99 % interval; t(0.995; 12) = 3.0545396 (tables).
  test('the quantification limit solves its equation', () => {
    const c = find('DIN 32645 quantification limit');
    const half =
      3.0545395894 *
      (curve.residualSd / curve.slope.value) *
      Math.sqrt(1 / 2 + 1 / 14 + (c - curve.meanConcentration) ** 2 / curve.sxx);
    expectDigits(c, 3 * half, 9);
  });

  // By hand: t(0.95; 1) = 6.313752, s_blank of 0.0034 and 0.0041.
  test('Currie rests on the blanks', () => {
    const sd = 0.0007 / Math.SQRT2;
    expectDigits(
      find('Currie critical level'),
      (6.313751514675 * sd * Math.sqrt(1.5)) / curve.slope.value,
      9,
    );
    expectDigits(find('Currie detection limit'), 2 * find('Currie critical level'), 15);
  });

  test('names without blanks are not there', () => {
    const names = calculateStandardCurve(request()).curve.limits.map((limit) => limit.name);
    expect(names).not.toContain('Currie critical level');
  });

  test('a slope too uncertain has no quantification limit', () => {
    const loose = request({ standards: standardsOf([1, 2, 3, 4], [0.1, 0.3, 0.15, 0.35]) });
    const names = calculateStandardCurve(loose).curve.limits.map((limit) => limit.name);
    expect(names).toContain('DIN 32645 detection limit');
    expect(names).not.toContain('DIN 32645 quantification limit');
  });
});
