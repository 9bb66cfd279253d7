import { describe, expect, test } from 'vitest';
import { calculateStandardCurve } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';
import { request, resultOf as read, standardsOf } from '../requests';

const dilution = [{ takenMl: 10, toMl: 50 }];

// The table of measurement-model section 6, row by row.
describe('what a result says', () => {
  test('a reading above the limit is not quantified', () => {
    const result = read([2.2, 1.9], { dilution });
    expect(result.report).toMatch(/^not quantified: dilute at least 1 in \d+/);
    expect(result.advice).toContain('on top of the dilution already made');
    expect(result).toMatchObject({ concentration: null, fieller: null, reportCase: 'notQuantified' });
    expect(result.flags.map((flag) => flag.level)).toContain('stop');
  });

  test('a reading above range is not quantified and its mean is a bound', () => {
    const result = read([3.2, '>3.5']);
    expect(result.report).toBe('not quantified: dilute at least 1 in 10, then read again');
    expect(result).toMatchObject({
      measured: null,
      computed: null,
      absorbance: null,
      absorbanceAsRead: null,
    });
    expect(result.absorbanceAtLeast).toBeCloseTo(3.35, 12);
    expect(read([3.2, 'OVER']).absorbanceAtLeast).toBeNull();
  });

  test('no light is above range', () => {
    expect(
      read([0], {}, { signal: 'percentTransmittance', standards: standardsOf([1, 2, 3], [79, 63, 50]) })
        .reportCase,
    ).toBe('notQuantified');
  });

  test('without a number there is nothing to dilute', () => {
    expect(read(['']).report).toBe('not quantified: read again');
    expect(read(['']).advice).toBeUndefined();
  });

  test('above the top standard it names the standard, in the sample', () => {
    const result = read([1.2], { dilution });
    expect(result.report).toMatch(/^> 40 mg\/L; dilute 1 in \d+ \(1 part made up to \d+\), on top/);
    expect(result.concentration).toBeNull();
    expect(result.computed).toBeCloseTo(60, 0);
  });

  test('within the standards it is a value with its expanded uncertainty', () => {
    const result = read([0.4032, 0.404], { dilution });
    expect(result.report).toMatch(/^\d+\.\d+ ± \d\.\d+ mg\/L$/);
    expect(result.concentration?.value).toBe(result.computed);
    expect(result.flags).toEqual([]);
  });

  test('below the lowest standard but detected it says so', () => {
    expect(read([0.06]).report).toMatch(/^0\.5\d+ ± 0\.\d+ mg\/L, detected, below the lowest standard$/);
  });

  test('below the critical value it is less than the lowest standard, negative too', () => {
    expect(read([0.005], { dilution }).report).toBe('< 5 mg/L');
    const negative = read([-0.02]);
    expect(negative.report).toBe('< 1 mg/L');
    expect(negative.concentration).toBeNull();
    expect(negative.computed).toBeLessThan(0);
  });

  test('a standard reads back as itself at both ends of a perfect curve', () => {
    const perfect = { standards: standardsOf([0.1, 0.3, 0.7], [0.02, 0.06, 0.14]) };
    expect(read([0.14], {}, perfect).reportCase).toBe('value');
    expect(read([0.02], {}, perfect).reportCase).toBe('value');
  });
});

describe('dilution advice', () => {
  // Middle of the range 0.104 to 0.805: A about 0.454, c about 4.5 mg/L; 22 mg/L needs 1 in 5.
  test('aims at the middle of the curve', () => {
    const standards = standardsOf([0, 2, 4, 6, 8], [0, 0.2, 0.401, 0.6, 0.8]);
    const result = read([1.96], {}, { standards });
    expect(result.advice).toBe('1 in 5 (1 part made up to 5)');
    expect(result.dilutionAdvice?.expectedAbsorbance).toBeCloseTo(0.392, 2);
  });

  // A curve up to A 1.9 has its middle at 0.95; the aim is capped at 0.6 as read.
  test('aims at most at 0.6 as read, in the cell that was used', () => {
    const standards = standardsOf([0, 2, 4, 6, 8], [0, 0.475, 0.95, 1.426, 1.9]);
    const steep = read([1.95], {}, { standards });
    expect(steep.dilutionAdvice?.factor).toBe(4);
    expect(steep.dilutionAdvice?.expectedAbsorbance).toBeLessThanOrEqual(0.6);
    const long = read([1.95], { pathLengthMm: 5 }, { standards });
    expect(long.dilutionAdvice?.expectedAbsorbance).toBeLessThanOrEqual(0.6);
  });

  test.each([[['OVER']], [[3.28, 3.286]], [[3.1]]])(
    'a censored or plateau reading %j gives at least 1 in 10',
    (readings) => {
      expect(read(readings).advice).toBe('at least 1 in 10, then read again');
    },
  );

  test('a reading above the limit but below the plateau is a lower bound', () => {
    expect(read([2.4]).advice).toMatch(/^at least 1 in 5 \(1 part made up to 5\), then read again$/);
  });
});

describe('replicates that disagree', () => {
  const sdOf = (a: number, b: number) => Math.abs(a - b) / Math.SQRT2;

  test('take their own standard deviation, with its degrees of freedom', () => {
    const result = read([0.4, 0.42]);
    const { curve } = calculateStandardCurve(request());
    const readings = result.budget.find((line) => line.source === 'readings');
    expectDigits(readings?.u ?? NaN, sdOf(0.4, 0.42) / Math.SQRT2 / curve.slope.value, 12);
    expect(readings?.sharesS).toBeUndefined();
    expect(result.concentration?.degreesOfFreedom).toBeLessThan(1.2);
    expect(result.flags.map((flag) => flag.code)).toEqual(['REPLICATES_APART']);
  });

  // Limit for two readings: √2·t(0.975; 8)·s.
  test('disagree beyond q(0.95; p, n - q)·s', () => {
    const { curve } = calculateStandardCurve(request());
    const limit = Math.SQRT2 * 2.306004135 * curve.residualSd;
    expect(read([0.4, 0.4 + limit * 1.001]).flags).toHaveLength(1);
    expect(read([0.4, 0.4 + limit * 0.999]).flags).toHaveLength(0);
  });

  test('keep the larger s of the curve when the limit set in the method is the tighter one', () => {
    const result = read([0.4, 0.4005], {}, { replicateLimit: 0.0001 });
    expect(result.flags.map((flag) => flag.code)).toEqual(['REPLICATES_APART']);
    expect(result.concentration?.degreesOfFreedom).toBeCloseTo(8, 9);
  });
});
