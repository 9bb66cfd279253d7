import { describe, expect, test } from 'vitest';
import { judgementLines, unmadeTests } from '@/lib/curve/judgement-lines';
import { calculateStandardCurve } from '@/lib/engine';
import { reference, request, standardsOf } from '../engine/requests';

const linesOf = (changes: Parameters<typeof request>[0]) =>
  judgementLines(calculateStandardCurve(request(changes)).curve);
const line = (lines: ReturnType<typeof judgementLines>, key: string) => lines.find((one) => one.key === key);

describe('judgementLines', () => {
  test('says what matters first, and r² nowhere', () => {
    const lines = linesOf({});
    const keys = lines.map(({ key }) => key);
    expect(keys.slice(0, 4)).toEqual(['backCalculation', 'residuals', 'lackOfFit', 'mandel']);
    expect(keys.indexOf('intercept')).toBeLessThan(keys.indexOf('range'));
    expect(lines.map(({ sentence }) => sentence).join(' ')).not.toMatch(/r²|r\^2/);
  });

  // EURACHEM/CITAC CG 4, A5: F 4.885 for lack of fit and a variance ratio of 211 are computed from its data elsewhere.
  test('shows of a published curve what its figures hide', () => {
    const { A5 } = reference<{ A5: { c: number[]; A: number[] } }>('eurachem-cg4');
    const lines = linesOf({ standards: standardsOf(A5.c, A5.A) });
    expect(line(lines, 'lackOfFit')).toMatchObject({ tone: 'decide' });
    expect(line(lines, 'lackOfFit')?.sentence).toContain('4.885');
    expect(line(lines, 'homogeneity')?.sentence).toContain('211');
    expect(line(lines, 'backCalculation')?.sentence).toContain('0.1 mg/L');
  });

  test('a standard that reads back badly is to be decided on', () => {
    const off = standardsOf([1, 2, 4, 6, 8], [0.16, 0.2, 0.4, 0.6, 0.8]);
    expect(line(linesOf({ standards: off }), 'backCalculation')?.tone).toBe('decide');
    expect(line(linesOf({}), 'backCalculation')?.tone).toBe('order');
  });

  test('says which tests could not be made, and why', () => {
    const single = standardsOf([1, 2, 4, 6, 8], [0.1, 0.2, 0.41, 0.6, 0.8]);
    const unmade = unmadeTests(calculateStandardCurve(request({ standards: single })).curve);
    expect(unmade.map(({ name }) => name)).toContain('Lack of fit');
    expect(unmade.every(({ reason }) => reason.length > 10)).toBe(true);
  });
});
