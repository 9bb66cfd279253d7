import { describe, expect, test } from 'vitest';
import { liveResults } from '@/lib/batch/live-results';
import {
  checkRow,
  filledIn,
  readingsInUse,
  rowsAsTyped,
  sampleGrid,
  textsOf,
  withReadingCount,
} from '@/lib/batch/sample-grid';
import { chosenSamples, liveSample, NOTHING_CHOSEN, sentSamples } from '@/lib/batch/spectrum-choice';
import type { SpectrumView } from '@/lib/views/spectrum';
import { EXAMPLE_CURVE, typedSample } from '../../../support/example-batch';

const row = (...cells: string[]) => ({ id: 'r0', cells });

describe('a row of the grid', () => {
  test('has as many readings as there are columns for, then dilution and path length', () => {
    const keys = sampleGrid(2, 'absorbance', 10).columns.map(({ key }) => key);
    expect(keys).toEqual(['sample', 'reading0', 'reading1', 'dilution', 'pathLengthMm']);
    expect(textsOf(row('a', '0.1', '0.2', '1+9', '50'), 2)).toEqual({
      sample: 'a',
      readings: ['0.1', '0.2'],
      dilution: '1+9',
      pathLengthMm: '50',
    });
  });
  test('an empty path length is that of the curve', () => {
    expect(filledIn(textsOf(row('a', '0.1', '', ''), 1), 10).pathLengthMm).toBe('10');
  });
  test('sentences stand at their columns', () => {
    const { problems, sample } = checkRow(textsOf(row('', 'abc', '100 in 10', '0'), 1), 'absorbance', 10);
    expect(sample).toBeNull();
    expect(Object.keys(problems).sort()).toEqual(['dilution', 'pathLengthMm', 'reading0', 'sample']);
  });
  test('a good row is what the engine is asked', () => {
    const { sample } = checkRow(textsOf(row('a', '0,4021', 'OVER', '10/100', ''), 2), 'absorbance', 10);
    expect(sample).toMatchObject({
      sample: 'a',
      pathLengthMm: 10,
      dilution: [{ takenMl: 10, toMl: 100 }],
      readings: [
        { value: 0.4021, signal: 'absorbance' },
        { value: null, gapText: 'OVER' },
      ],
    });
  });
  test('another number of readings keeps what was typed, and fewer than are used are not offered', () => {
    const rows = [row('a', '0.1', '0.2', '1+9', '50'), row('b', '0.3', '', '', '')];
    expect(withReadingCount(rows, 2, 3)).toEqual([
      ['a', '0.1', '0.2', '', '1+9', '50'],
      ['b', '0.3', '', '', '', ''],
    ]);
    expect(readingsInUse(rows, 2)).toBe(2);
    expect(readingsInUse([], 2)).toBe(1);
  });
  test('the cell that is being typed counts as far as it is typed', () => {
    const grid = { rows: [row('a', '0.1'), row('', '')], draft: '0.4', at: { row: 1, column: 1 } };
    expect(rowsAsTyped(grid).map(({ cells }) => cells)).toEqual([
      ['a', '0.1'],
      ['', '0.4'],
    ]);
  });
});

describe('results while typing', () => {
  test('a sample that the engine refuses leaves the others standing', () => {
    const refused = { ...typedSample('bad', [0.3]), pathLengthMm: 0 };
    const live = liveResults({ kind: 'curve', request: EXAMPLE_CURVE }, [
      typedSample('good', [0.4]),
      refused,
    ]);
    expect(live.map(({ ok, sample }) => [sample.sample, ok])).toEqual([
      ['good', true],
      ['bad', false],
    ]);
    const [, told] = live;
    expect(told && !told.ok && told.message).toMatch(/path length/i);
  });
  test('no samples, no calculation', () => {
    expect(liveResults({ kind: 'curve', request: EXAMPLE_CURVE }, [])).toEqual([]);
  });
});

describe('samples from spectra', () => {
  const spectrum = (id: string, name: string, pathLengthMm: number | null = null) =>
    ({ id, name, pathLengthMm }) as SpectrumView;
  const spectra = new Map(
    [spectrum('1', 'S01 (1)'), spectrum('2', 'S01 (2)'), spectrum('3', 'S02', 50)].map((one) => [
      one.id,
      one,
    ]),
  );
  const choice = { ...NOTHING_CHOSEN, spectrumIds: ['1', '2', '3'], dilutionOf: { S01: '1+9' } };

  test('replicates go together, the path of the file is taken, a name can be changed', () => {
    expect(sentSamples(chosenSamples(choice, spectra, 10))).toEqual([
      { sample: 'S01', dilution: '1+9', pathLengthMm: '10', spectrumIds: ['1', '2'] },
      { sample: 'S02', dilution: '', pathLengthMm: '50', spectrumIds: ['3'] },
    ]);
    const moved = chosenSamples({ ...choice, sampleOf: { 2: 'S02' } }, spectra, 10);
    expect(moved.map(({ sample, spectra: members }) => [sample, members.length])).toEqual([
      ['S01', 1],
      ['S02', 2],
    ]);
  });
  test('nothing is calculated before every spectrum of the sample is read', () => {
    const [sample] = chosenSamples(choice, spectra, 10);
    if (!sample) throw new Error('a sample was chosen');
    const one = { spectrumId: '1', value: 0.4, minusValue: null, gapText: null, atNm: 510, error: null };
    expect(liveSample(sample, new Map([['1', one]]))).toBeNull();
    const both = new Map([
      ['1', one],
      ['2', { ...one, spectrumId: '2', value: 0.401 }],
    ]);
    expect(liveSample(sample, both)?.readings.map(({ value }) => value)).toEqual([0.4, 0.401]);
    expect(liveSample({ ...sample, dilution: '1:10' }, both)).toBeNull();
  });
});
