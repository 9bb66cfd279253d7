import { describe, expect, test } from 'vitest';
import { GRID_NM, asText, inventedUnits } from '../../../../../fixtures/generate/invented-spectrum';
import { readFile } from '@/lib/readers/read-file';
import type { ReadOptions, ReadResult } from '@/lib/readers/types';

const ONE = inventedUnits(1, 51).map(asText);
const TWO = inventedUnits(0.5, 52).map(asText);
const THREE = inventedUnits(0.25, 53).map(asText);
const comma = (text: string): string => text.replace('.', ',');

const read = (lines: readonly string[], options?: ReadOptions): ReadResult =>
  readFile(new TextEncoder().encode(lines.join('\n')), 'my file.csv', options);
const table = (
  head: readonly string[],
  separator: string,
  row: (i: number) => readonly (string | number | undefined)[],
): string[] => [...head, ...GRID_NM.map((_, i) => row(i).join(separator))];

/** Names, and whether x and y are those of the invented spectra in this order. */
function expectSpectra(
  result: ReadResult,
  names: readonly string[],
  ys: readonly (readonly string[])[],
): void {
  expect(result.spectra.map((spectrum) => spectrum.name)).toEqual(names);
  ys.forEach((y, k) => {
    expect(Array.from(result.spectra[k]?.x ?? [])).toEqual(GRID_NM.slice(0, y.length));
    expect(Array.from(result.spectra[k]?.y ?? [])).toEqual(y.map(Number));
  });
}

describe('delimiter and decimal mark', () => {
  test('quoted decimal commas between commas', () => {
    expectSpectra(
      read(table(['"Wavelength (nm)","Abs"'], ',', (i) => [`"${GRID_NM[i]},0"`, `"${comma(ONE[i] ?? '')}"`])),
      ['my file'],
      [ONE],
    );
  });

  test('a column grouped by threes is read; one grouped cell among others is not', () => {
    const grouped = read(
      table(['Wavenumber (cm-1);A'], ';', (i) => [
        `${30 - (i >> 5)},${String(999 - (i % 32)).padStart(3, '0')}`,
        ONE[i],
      ]),
    );
    expect(grouped.spectra[0]?.x[0]).toBe(30_999);
    const lone = read(table(['nm;A'], ';', (i) => [GRID_NM[i], i === 7 ? '1,234' : ONE[i]]));
    expect(lone.spectra[0]?.gaps).toEqual([{ index: 7, reason: 'unreadable', text: '1,234' }]);
  });

  test('numbers in the lines before and after are never read as points', () => {
    const preamble = ['Date\t2027-03-01', 'Slit\t8,000000E-3', 'Range\t205\t800', '#DATA'];
    const result = read([
      ...preamble,
      ...table([], '\t', (i) => [GRID_NM[i], comma(ONE[i] ?? '')]),
      '',
      '<Scan rate (nm/min)>\t209,0',
    ]);
    expectSpectra(result, ['my file'], [ONE]);
    expect(result.headerText).toContain('8,000000E-3');
    expect(result.trailerText).toContain('209,0');
  });
});

describe('layouts', () => {
  test('pairs of unequal length, with or without the delimiters behind them', () => {
    const head = ['A1,,A2,', 'nm,Abs,nm,Abs'];
    const full = read(
      table(head, ',', (i) => [GRID_NM[i], ONE[i], i < 60 ? GRID_NM[i] : '', i < 60 ? TWO[i] : '']),
    );
    expectSpectra(full, ['A1', 'A2'], [ONE, TWO.slice(0, 60)]);
    const cut = read(
      table(head, ',', (i) => (i < 60 ? [GRID_NM[i], ONE[i], GRID_NM[i], TWO[i]] : [GRID_NM[i], ONE[i]])),
    );
    expectSpectra(cut, ['A1', 'A2'], [ONE, TWO.slice(0, 60)]);
    const trailing = read(
      table(['Sample A,,Sample B,,', 'Wavelength (nm),Abs,Wavelength (nm),Abs,'], ',', (i) => [
        GRID_NM[i],
        ONE[i],
        GRID_NM[i],
        TWO[i],
        '',
      ]),
    );
    expectSpectra(trailing, ['Sample A', 'Sample B'], [ONE, TWO]);
  });

  test.each([
    ['words around', (nm: number) => `Lambda ${nm} nm`],
    ['a letter before', (nm: number) => `A${nm}`],
    ['plain', (nm: number) => `${nm}`],
  ])('spectra in rows, wavelengths in the heading: %s', (_, word) => {
    const rows = [ONE, TWO, THREE].map((y, k) => ['W0' + k, 1.5 * k, ...y].join(','));
    expectSpectra(
      read([['Well', 'mg/L', ...GRID_NM.map(word)].join(','), ...rows]),
      ['W00', 'W01', 'W02'],
      [ONE, TWO, THREE],
    );
  });

  test('one reading a row, sorted by wavelength or numbered', () => {
    const byWavelength = GRID_NM.flatMap((nm, i) =>
      [ONE, TWO, THREE].map((y, k) => `${nm},S${k >> 1},${k},${y[i]}`),
    );
    expectSpectra(
      read(['wavelength,sample,replicate,absorbance', ...byWavelength]),
      ['S0 0', 'S0 1', 'S1 2'],
      [ONE, TWO, THREE],
    );
    const numbered = [ONE, TWO].flatMap((y, k) => GRID_NM.map((nm, i) => `${k + 1};${nm};${y[i]}`));
    expectSpectra(read(['scan;nm;A', ...numbered]), ['1', '2'], [ONE, TWO]);
  });

  test('blank lines between tables part them without a question', () => {
    const block = (y: readonly string[]): string[] => [...GRID_NM.map((nm, i) => `${nm} ${y[i]}`), '', ''];
    const result = read([...block(ONE), ...block(TWO)]);
    expectSpectra(result, ['my file', 'my file (2)'], [ONE, TWO]);
    expect(result.questions).toEqual([]);
  });

  test('row numbers in a column without a heading are not x', () => {
    expectSpectra(
      read(table(['"nm" "A"'], ' ', (i) => [`"${i + 1}"`, GRID_NM[i], ONE[i]])),
      ['my file'],
      [ONE],
    );
  });

  test('columns declared in a comment block', () => {
    const head = [
      '# %ECSV 1.0',
      '# datatype:',
      '# - {name: wavelength, unit: Angstrom, datatype: float64}',
      '# - {name: absorbance, datatype: float64}',
      'wavelength absorbance',
    ];
    const [spectrum] = read(table(head, ' ', (i) => [10 * (GRID_NM[i] ?? 0), ONE[i]])).spectra;
    expect([spectrum?.xUnit, spectrum?.xUnitGuessed, spectrum?.signal]).toEqual([
      'angstrom',
      false,
      'absorbance',
    ]);
  });
});

describe('damage', () => {
  test('damaged rows become gaps or are told of, and the rest stays in place', () => {
    const rows = table(['nm,A'], ',', (i) => [GRID_NM[i], ONE[i]]);
    rows[41] = `${GRID_NM[40]},0.1x`;
    rows[51] = `5_50,${ONE[50]}`;
    rows[61] = `${GRID_NM[60]}`;
    const result = read(rows);
    const [spectrum] = result.spectra;
    expect(spectrum?.x.length).toBe(GRID_NM.length - 1);
    expect(spectrum?.gaps.map((gap) => [spectrum.x[gap.index], gap.reason])).toEqual([
      [GRID_NM[40], 'unreadable'],
      [GRID_NM[60], 'missing'],
    ]);
    expect(spectrum?.y[spectrum.x.indexOf(GRID_NM[100] ?? 0)]).toBe(Number(ONE[100]));
    expect(result.warnings.find((warning) => warning.code === 'STRAY_LINE')?.line).toBe(52);
  });

  test('a remark inside the table does not part it', () => {
    const rows = table(['nm,A'], ',', (i) => [GRID_NM[i], ONE[i]]);
    rows.splice(90, 0, '# lamp change');
    expectSpectra(read(rows), ['my file'], [ONE]);
  });
});

describe("the person's word", () => {
  test('first wavelength and step for a table without x', () => {
    const bare = [ONE, TWO].map((y) => y.join(' '));
    expect(read(bare).questions.map((question) => question.code)).toEqual(['NO_X']);
    expectSpectra(read(bare, { firstX: 350, stepX: 2 }), ['my file', 'my file (2)'], [ONE, TWO]);
    expectSpectra(read(ONE, { firstX: 350, stepX: 2 }), ['my file'], [ONE]);
  });

  test('x column, y columns, unit and signal', () => {
    const rows = table(['a,b,c'], ',', (i) => [ONE[i], TWO[i], GRID_NM[i]]);
    const [spectrum, none] = read(rows, {
      xColumn: 2,
      yColumns: [1],
      xUnit: 'nm',
      signal: 'transmittance',
    }).spectra;
    expect([Array.from(spectrum?.x ?? []), spectrum?.xUnitGuessed, spectrum?.signal, none]).toEqual([
      GRID_NM,
      false,
      'transmittance',
      undefined,
    ]);
  });

  test('an ambiguous unit is asked for', () => {
    const rows = Array.from({ length: 50 }, (_, i) => `${1000 + 10 * i},${0.1 + 0.001 * i}`);
    const [question] = read(rows).questions;
    expect(question?.code).toBe('X_UNIT');
    expect(question?.choices.map((choice) => choice.options.xUnit)).toContain('nm');
  });
});
