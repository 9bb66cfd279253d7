import { describe, expect, test } from 'vitest';
import { meaningOf } from '@/lib/batch/meaning';
import { exampleBatch, typedSample } from '../../../support/example-batch';

function meant(readings: readonly (number | string)[]) {
  const [one] = exampleBatch([typedSample('sample', readings)]).determinations;
  if (!one) throw new Error('one determination was made');
  return {
    ...meaningOf(one.result, { min: 0.5, max: 4 }, 'mg/L'),
    digits: one.result.concentration,
    result: one.result,
  };
}

describe('each row of the table of report texts (measurement model, section 6)', () => {
  test('above the absorbance limit: no number, the light and the advice', () => {
    const { tone, sentence, digits, code } = meant([2.413, 2.3987]);
    expect(tone).toBe('stop');
    // T = 10^-2.40585 = 0.39 %
    expect(sentence).toMatch(/^0\.39 % of the light gets through\. Dilute at least 1 in \d+/);
    expect(digits).toBeNull();
    expect(code).toBe('READING_OVER_LIMIT');
  });
  test('censored above range: no number, dilute', () => {
    const { tone, sentence, digits } = meant(['OVER', 1.9]);
    expect([tone, digits]).toEqual(['stop', null]);
    expect(sentence).toBe('The instrument gave no number. Dilute at least 1 in 10, then read again');
  });
  test('above the top standard: no number, dilute', () => {
    const { tone, sentence, digits, result } = meant([0.95, 0.951]);
    expect([tone, digits]).toEqual(['stop', null]);
    expect(sentence).toMatch(/^Above the top standard \(4 mg\/L\)\. Dilute 1 in \d/);
    expect(result.computed).toBeGreaterThan(4);
  });
  test('within the standards', () => {
    const { tone, sentence, digits, others } = meant([0.4021, 0.4013]);
    expect([tone, sentence, others]).toEqual(['order', 'Within the standards', []]);
    expect(digits?.value).toBeCloseTo(2.006, 3);
  });
  test('detected, below the lowest standard', () => {
    const { tone, sentence, digits } = meant([0.0611, 0.0598]);
    expect(tone).toBe('decide');
    expect(sentence).toBe('Detected, below the lowest standard (0.5 mg/L)');
    expect(digits).not.toBeNull();
  });
  test('below the critical value, negative too', () => {
    for (const readings of [[0.0015], [-0.0012]]) {
      const { tone, sentence, digits } = meant(readings);
      expect([tone, sentence, digits]).toEqual(['decide', 'Not told from a blank', null]);
    }
  });
  test('a flag beside a value asks for a look', () => {
    const { tone, others } = meant([0.4021, 0.43]);
    expect(tone).toBe('decide');
    expect(others.map((flag) => flag.code)).toEqual(['REPLICATES_APART']);
  });
});
