import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { spectrumFixtures } from '../../../../fixtures/generate/write-spectra';
import { readFile, readWith, type ReadAnswers } from '@/lib/readers/read-file';
import { ReaderError, type ReadResult } from '@/lib/readers/types';
import { sharedFile } from '../../../support/shared';

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
const read = (text: string, answers: ReadAnswers = {}): ReadResult =>
  readWith(bytesOf(text), 'file.csv', answers);
const about = (result: ReadResult): string[] => result.guesses.map((guess) => guess.about);
const points = (result: ReadResult, spectrum = 0): number[][] => {
  const { x, y } = result.spectra[spectrum] ?? { x: [], y: [] };
  return [Array.from(x), Array.from(y)];
};

/** x from 400 by 10, y = 0.1, 0.2, 0.3, …: written by hand so that every answer shows in the numbers. */
const NAMED = 'Wavelength (nm),Abs\n400,0.1\n410,0.2\n420,0.3\n430,0.4\n';
const BARE = NAMED.slice(NAMED.indexOf('\n') + 1);

describe('what had to be guessed', () => {
  test('nothing, where the file says everything', () => {
    expect(read(NAMED).guesses).toEqual([]);
    expect(read(NAMED).dialect).toBe(
      'Comma between columns, decimal point, spectra in columns, 1 spectrum of 4 points, x in nm from 400 to 430, UTF-8',
    );
  });

  test('units that no word names, one sentence each', () => {
    expect(read(BARE).guesses).toEqual([
      { about: 'xUnit', sentence: 'The file gives no unit of x; x from 400 to 430 is taken as nm' },
      { about: 'signal', sentence: 'The file does not say what was measured; it is taken as absorbance' },
    ]);
  });

  test('an answer is no guess any more', () => {
    expect(about(read(BARE, { xUnit: 'nm' }))).toEqual(['signal']);
    expect(read(BARE, { xUnit: 'nm', signal: 'absorbance' }).guesses).toEqual([]);
  });

  test('which column is x, when two could be', () => {
    const two = BARE.split('\n')
      .filter(Boolean)
      .concat(['440,0.5', '450,0.6', '460,0.7', '470,0.8', '480,0.9', '490,1', '500,1.1'])
      .map((row, i) => `${row},${500 + i}`)
      .join('\n');
    expect(about(read(two))).toContain('xColumn');
    expect(about(read(two, { xColumn: 0 }))).not.toContain('xColumn');
  });

  test('whether columns are pairs, when no heading says so', () => {
    const pairs = BARE.split('\n')
      .filter(Boolean)
      .map((row) => `${row},${row}`)
      .join('\n');
    expect(about(read(pairs))).toContain('orientation');
    expect(about(read(pairs, { orientation: 'pairs' }))).not.toContain('orientation');
    expect(read(pairs, { orientation: 'columns' }).spectra.length).toBe(3);
  });

  test('many spectra share one sentence', () => {
    const wide = `nm,${Array.from({ length: 30 }, (_, i) => `S${i}`).join(',')}\n${[400, 410, 420]
      .map((x) => `${x},${Array.from({ length: 30 }, (_, i) => `0.${i + 1}`).join(',')}`)
      .join('\n')}\n`;
    expect(about(read(wide))).toEqual(['signal']);
  });
});

describe('every guess can be replaced', () => {
  test('delimiter and decimal mark', () => {
    const text = 'nm;Abs\n400;1,5\n410;2,5\n420;3,5\n';
    expect(points(read(text))).toEqual([
      [400, 410, 420],
      [1.5, 2.5, 3.5],
    ]);
    expect(() => read(text, { delimiter: ',' })).toThrow(/delimiter and decimal mark no row/);
    const both = '400,1,410,2\n410,1,420,3\n420,1,430,5\n';
    expect(points(read(both, { delimiter: ',', decimalMark: ',' }))).toEqual([
      [400.1, 410.1, 420.1],
      [410.2, 420.3, 430.5],
    ]);
  });

  test('header rows', () => {
    expect(points(read(BARE, { headerRows: 2 }))[0]).toEqual([420, 430]);
  });

  test('x column and y columns', () => {
    const text = 'a,b,c\n1,400,0.1\n2,410,0.2\n3,420,0.3\n4,430,0.4\n';
    expect(points(read(text, { xColumn: 1, yColumns: [2] }))).toEqual([
      [400, 410, 420, 430],
      [0.1, 0.2, 0.3, 0.4],
    ]);
    expect(read(text, { xColumn: 1, yColumns: [2] }).spectra.length).toBe(1);
    expect(points(read(text, { xColumn: 1, yColumns: [0] }))[1]).toEqual([1, 2, 3, 4]);
  });

  test('unit of x and what was measured', () => {
    const [spectrum] = read(BARE, { xUnit: '1/cm', signal: 'percentTransmittance' }).spectra;
    expect([spectrum?.xUnit, spectrum?.signal, spectrum?.signalScale]).toEqual([
      '1/cm',
      'percentTransmittance',
      1,
    ]);
    expect([spectrum?.xUnitGuessed, spectrum?.signalGuessed]).toEqual([false, false]);
  });

  test('the mean of equal x takes what can be averaged; a reading off the scale makes the point a gap', () => {
    const text = 'nm,Abs\n400,\n400,0.2\n400,0.4\n410,OVER\n410,0.3\n420,0.5\n430,0.6\n';
    const [spectrum] = read(text, { equalX: 'mean' }).spectra;
    expect(spectrum?.y[0]).toBeCloseTo(0.3, 12);
    expect(Array.from(spectrum?.y ?? []).slice(1)).toEqual([NaN, 0.5, 0.6]);
    expect(spectrum?.gaps).toEqual([{ index: 1, reason: 'aboveRange', text: 'OVER' }]);
  });

  test('the scale of a unit survives the answer that says the same', () => {
    const milli = 'Wavelength (nm),mAU\n400,100\n410,200\n420,300\n';
    expect(read(milli, { signal: 'absorbance' }).spectra[0]?.signalScale).toBe(0.001);
    expect(read(milli, { signal: 'transmittance' }).spectra[0]?.signalScale).toBe(1);
  });

  test('the row that holds the wavelengths', () => {
    const text =
      'name,first,second,third\nplate,400,410,420\nS1,0.1,0.2,0.3\nS2,0.4,0.5,0.6\nS3,0.7,0.8,0.9\n';
    const rows = read(text, { orientation: 'rows', xRow: 1 });
    expect(rows.spectra.map(({ name }) => name)).toEqual(['S1', 'S2', 'S3']);
    expect(points(rows, 1)).toEqual([
      [400, 410, 420],
      [0.4, 0.5, 0.6],
    ]);
  });

  test('first wavelength and step, in rows and in columns', () => {
    const text = Array.from({ length: 30 }, (_, i) => `${(i / 10).toFixed(1)} ${(i / 5).toFixed(1)}`).join(
      '\n',
    );
    const columns = read(text, { orientation: 'columns', firstX: 700, stepX: -2 });
    expect(columns.spectra.length).toBe(2);
    expect(points(columns, 1)[0]?.slice(0, 3)).toEqual([700, 698, 696]);
    expect(points(columns, 1)[1]?.slice(0, 3)).toEqual([0, 0.2, 0.4]);
    const rows = read(text, { orientation: 'rows', firstX: 500, stepX: 1 });
    expect([rows.spectra.length, rows.spectra[3]?.x.length]).toEqual([30, 2]);
    expect(points(rows, 3)).toEqual([
      [500, 501],
      [0.3, 0.6],
    ]);
  });

  test.each<[string, ReadAnswers, RegExp]>([
    ['a column that is not there', { xColumn: 7 }, /2 columns; there is no column 8/],
    ['readings that are not there', { yColumns: [4] }, /no column 5/],
    ['no readings', { yColumns: [] }, /at least one column/],
    ['x among the readings', { xColumn: 1, yColumns: [1] }, /both x and/],
    ['a first wavelength alone', { firstX: 400 }, /together/],
    ['a step of nothing', { firstX: 400, stepX: 0 }, /other than 0/],
    ['a header as long as the file', { headerRows: 99 }, /first 99 lines/],
    ['a row without wavelengths', { xRow: 0 }, /Line 1 holds no row of wavelengths/],
  ])('%s is refused in a sentence', (_, answers, sentence) => {
    expect(() => read(NAMED, answers)).toThrow(ReaderError);
    expect(() => read(NAMED, answers)).toThrow(sentence);
  });
});

describe('files of one shape', () => {
  const like = (name: string, shift: number, heading = 'nm'): string =>
    `Sample: ${name}\n${heading},${name}\n400,${shift}\n410,0.2\n420,0.3\n`;

  test('share a key, whatever their samples and numbers are', () => {
    const keys = Array.from({ length: 20 }, (_, i) => read(like(`S ${i}`, i / 10)).shape);
    expect(new Set(keys).size).toBe(1);
  });

  test('one answer serves twenty of them', () => {
    const files = Array.from({ length: 20 }, (_, i) => like(`S ${i}`, i / 10, 'x'));
    const [first = ''] = files;
    expect(about(read(first))).toEqual(['xUnit', 'signal']);
    const remembered = new Map([[read(first).shape, { xUnit: 'nm', signal: 'transmittance' } as const]]);
    for (const file of files) {
      const again = read(file, remembered.get(read(file).shape));
      expect([again.guesses, again.spectra[0]?.signal]).toEqual([[], 'transmittance']);
    }
  });

  test('keep their key when they are answered', () => {
    const { shape } = read(BARE);
    for (const answers of [
      { xUnit: 'um' },
      { headerRows: 1 },
      { orientation: 'columns' },
      { xColumn: 1, yColumns: [0] },
    ] as const)
      expect(read(BARE, answers).shape).toBe(shape);
  });

  test('have another when they differ in heading, columns, mark, order of size or questions', () => {
    const others = [
      NAMED,
      BARE,
      BARE.replace(/^(.*)$/gm, (row) => row && `${row},0.5`),
      BARE.replace(/,/g, ';'),
      BARE.replace(/,/g, ';').replace(/\./g, ','),
      'Operator: nobody\n' + BARE,
      BARE.replace(/^4/gm, '0.4'),
      `${BARE}400,0.7\n`,
      NAMED.replace('Abs', '%T'),
    ];
    expect(new Set(others.map((text) => read(text).shape)).size).toBe(others.length);
  });

  test('every spectrum of the fixtures has a key that its name does not change', () => {
    for (const { content, expect: wanted } of spectrumFixtures()) {
      if (wanted.refused) continue;
      const bytes = typeof content === 'string' ? bytesOf(content) : content;
      expect(readFile(bytes, 'a.csv').shape).toBe(readFile(bytes, 'another name.txt').shape);
    }
  });
});

describe('the ends of a table', () => {
  test('first and last rows as they stand, each once', () => {
    const rows = Array.from({ length: 8 }, (_, i) => `${400 + i},0.1${i}0`);
    const { preview } = read(`nm,Abs\n${rows.join('\n')}\n`);
    expect(preview.columns).toEqual(['nm', 'Abs']);
    expect(preview.first).toEqual(rows.slice(0, 5).map((row) => row.split(',')));
    expect(preview.last).toEqual(rows.slice(5).map((row) => row.split(',')));
    expect(preview.rows).toBe(8);
  });

  test('points of a packed format as numbers, gaps as the words that stood there', () => {
    const jcamp =
      '##TITLE=a\n##XUNITS=NM\n##YUNITS=A\n##XYPOINTS=(XY..XY)\n400 0.1\n410 OVER\n420 0.3\n##END=\n';
    expect(read(jcamp).preview.first).toEqual([
      ['400', '0.1'],
      ['410', 'OVER'],
      ['420', '0.3'],
    ]);
  });
});

/** What only a person can say of each file, by what the list beside the files says is to be asked. */
const ASKED: Record<string, { about: string; answers: ReadAnswers }> = {
  '09_ambiguous_comma_comma.csv': { about: 'decimalMark', answers: { delimiter: ',', decimalMark: ',' } },
  '10_no_header.csv': { about: 'xUnit', answers: { xUnit: 'nm', signal: 'absorbance' } },
  '46_odd_minus9999.csv': { about: 'missingValues', answers: { missingValues: [-9999] } },
  '60_duplicate_x_conflict.csv': { about: 'equalX', answers: { equalX: 'first' } },
  '61_forward_and_back.csv': { about: 'turnRound', answers: { turnRound: 'split' } },
  '76_two_tables_different_units.txt': { about: 'table', answers: { table: 0, signal: 'other' } },
};

const listed = sharedFile('spectra/dialects/expected.json');

describe.runIf(listed !== null)('the dialects that leave something open', () => {
  const expected = listed
    ? (JSON.parse(readFileSync(listed, 'utf8')) as Record<string, { ask: string }>)
    : {};
  const open = Object.keys(expected).filter((name) => expected[name]?.ask !== '');
  const from = (name: string): Uint8Array => {
    const file = sharedFile(`spectra/dialects/${name}`);
    return file ? readFileSync(file) : new Uint8Array();
  };

  test('are all known here', () => {
    expect(open.filter((name) => ASKED[name] === undefined)).toEqual([]);
  });

  test.each(open)('%s names its guess, and an answer ends it', (name) => {
    const wanted = ASKED[name];
    const first = readWith(from(name), name, {});
    expect(about(first)).toContain(wanted?.about);
    const again = readWith(from(name), name, wanted?.answers ?? {});
    expect([again.guesses, again.questions, again.shape]).toEqual([[], [], first.shape]);
  });
});
