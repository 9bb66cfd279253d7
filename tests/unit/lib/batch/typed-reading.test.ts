import { describe, expect, test } from 'vitest';
import { groupReplicates } from '@/lib/batch/group-replicates';
import { typedReading } from '@/lib/batch/typed-reading';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { unknownOf } from '@/lib/batch/unknown-request';

describe('a typed reading', () => {
  test.each([
    ['0.4021', 0.4021],
    ['0,4021', 0.4021],
    [' \u22120.0012 ', -0.0012],
    ['1e-3', 0.001],
  ])('%j is a number', (text, value) => {
    expect(typedReading(text)).toEqual({ ok: true, reading: { value, gapReason: null, gapText: null } });
  });
  test.each(['OVER', '>3.5', 'over range', '***'])('%j is kept as above range', (text) => {
    expect(typedReading(text)).toEqual({
      ok: true,
      reading: { value: null, gapReason: 'aboveRange', gapText: text },
    });
  });
  test.each([
    ['', 'Enter the reading'],
    ['abc', 'is not a reading'],
    ['NaN', 'is not a reading'],
    ['0.1.2', 'is not a reading'],
    ['1,234', 'Is this 1.234 or 1234?'],
    ['1e999', 'too large'],
  ])('%j is refused', (text, message) => {
    const typed = typedReading(text);
    expect(typed.ok).toBe(false);
    if (!typed.ok) expect(typed.message).toContain(message);
  });
});

describe('readings in the signal of the curve', () => {
  const sample = (
    value: number | null,
    signal: 'absorbance' | 'percentTransmittance',
    gapText: string | null = null,
  ) => ({
    sample: 'x',
    pathLengthMm: 10,
    dilution: [],
    readings: [{ value, gapText, signal }],
  });
  test('the same signal passes unchanged', () => {
    expect(unknownOf(sample(39.8, 'percentTransmittance'), 'percentTransmittance').readings).toEqual([39.8]);
  });
  test('an absorbance off a spectrum becomes per cent T: T = 100 × 10^-A', () => {
    expect(unknownOf(sample(1, 'absorbance'), 'percentTransmittance').readings).toEqual([10]);
  });
  test('per cent T becomes an absorbance: A = -log10(T/100)', () => {
    expect(unknownOf(sample(1, 'percentTransmittance'), 'absorbance').readings).toEqual([2]);
  });
  test('no light in another signal stays without a number', () => {
    expect(unknownOf(sample(0, 'percentTransmittance'), 'absorbance').readings).toEqual(['OVER']);
  });
  test('a gap is handed on as the text that stood there', () => {
    expect(unknownOf(sample(null, 'absorbance', '>3.5'), 'absorbance').readings).toEqual(['>3.5']);
  });
});

test('replicates are put together by name, in the order in which samples come', () => {
  const names = [
    'S02 (1)',
    'S01 (1)',
    'S02 (2)',
    'S01 (2)',
    'S03',
    'S04 #1',
    'S04 #2',
    'S05_rep1',
    'S05_rep2',
    'Run-12',
  ];
  const groups = groupReplicates(names.map((name) => ({ id: name, name })));
  expect(groups.map(({ sample, spectrumIds }) => [sample, spectrumIds.length])).toEqual([
    ['S02', 2],
    ['S01', 2],
    ['S03', 1],
    ['S04', 2],
    ['S05', 2],
    ['Run-12', 1],
  ]);
});

test('a unit with its basis', () => {
  expect([unitWithBasis('mg/L', 'Fe'), unitWithBasis('mg/L', 'as N'), unitWithBasis('mmol/L', '')]).toEqual([
    'mg/L as Fe',
    'mg/L as N',
    'mmol/L',
  ]);
});
