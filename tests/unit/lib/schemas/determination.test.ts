import { describe, expect, test } from 'vitest';
import { addSpectrumSamples, addTypedSamples, changeConditions } from '@/lib/schemas/determination';

const ID = '6f8d1c70-1111-4222-8333-444455556666';
const ROW = {
  sample: 'Weir 3',
  readings: ['0.4021', '0,4013', ''],
  pathLengthMm: '10',
  dilution: '10 in 100',
};

const parse = (samples: unknown) =>
  addTypedSamples.safeParse({ batchId: ID, submissionKey: ID, samples: JSON.stringify(samples) });

function issues(samples: unknown): Record<string, string> {
  const parsed = parse(samples);
  if (parsed.success) throw new Error('these rows were taken');
  return Object.fromEntries(parsed.error.issues.map((issue) => [issue.path.join('.'), issue.message]));
}

test('typed rows: numbers with point or comma, empty cells are no readings, dilution as steps', () => {
  const parsed = parse([ROW]);
  expect(parsed.data?.samples).toEqual([
    {
      sample: 'Weir 3',
      pathLengthMm: 10,
      dilution: [{ takenMl: 10, toMl: 100 }],
      readings: [0.4021, 0.4013].map((value) => ({ value, gapReason: null, gapText: null })),
    },
  ]);
});

describe('nonsense gets its sentence at its cell', () => {
  test('every cell of a row by itself', () => {
    const bad = { sample: ' ', readings: ['0.4', 'abc'], pathLengthMm: '0', dilution: '100 in 10' };
    expect(issues([ROW, bad])).toEqual({
      'samples.1.sample': 'Name the sample',
      'samples.1.readings.1': expect.stringContaining('"abc" is not a reading') as string,
      'samples.1.pathLengthMm': 'A path length must be above zero',
      'samples.1.dilution': expect.stringContaining(
        'the end volume is smaller than what was taken',
      ) as string,
    });
  });
  test('a sample without a reading', () => {
    expect(issues([{ ...ROW, readings: ['', ' '] }])).toEqual({
      'samples.0.readings.0': 'Enter at least one reading',
    });
  });
  test('no row at all', () => {
    expect(issues([])).toEqual({ samples: 'Enter at least one sample with its reading' });
  });
  test('text that is no JSON', () => {
    const parsed = addTypedSamples.safeParse({ batchId: ID, submissionKey: ID, samples: '{' });
    expect(parsed.error?.issues[0]?.message).toContain('could not be read');
  });
});

test('a number that a browser sends as a result is not taken: it does not even pass the door', () => {
  const parsed = parse([{ ...ROW, result: { concentration: { value: 999 } }, concentration: 999 }]);
  expect(parsed.data?.samples[0]).not.toHaveProperty('result');
  expect(JSON.stringify(parsed.data)).not.toContain('999');
});

test('a sample from spectra needs one', () => {
  const samples = JSON.stringify([{ sample: 'S01', spectrumIds: [], pathLengthMm: '10', dilution: '' }]);
  const parsed = addSpectrumSamples.safeParse({ batchId: ID, submissionKey: ID, samples });
  expect(parsed.error?.issues[0]?.message).toBe('Choose at least one spectrum');
});

test('a change needs its reason and the version it was made from', () => {
  const parsed = changeConditions.safeParse({ ...ROW, determinationId: ID, version: '', reason: ' ' });
  const fields = parsed.error?.issues.map((issue) => issue.path.join('.'));
  expect(fields).toEqual(['version', 'reason']);
});
