import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { readFile } from '@/lib/readers/read-file';
import { ReaderError, type ReadResult } from '@/lib/readers/types';
import { sharedFile } from '../../../support/shared';

interface Expected {
  kind: string;
  ask: string;
  spectra: { name: string; xUnit: string; yUnit: string; n: number; x: number[]; y: (number | null)[] }[];
}

const expectedFile = sharedFile('spectra/dialects/expected.json');
const expected = expectedFile
  ? (JSON.parse(readFileSync(expectedFile, 'utf8')) as Record<string, Expected>)
  : {};
const names = Object.keys(expected);

function read(name: string): ReadResult {
  const file = sharedFile(`spectra/dialects/${name}`);
  return readFile(file ? readFileSync(file) : new Uint8Array(), name);
}

const X_UNITS: Record<string, string> = { nm: 'nm', 'cm-1': '1/cm', um: 'um', Å: 'angstrom' };
const SIGNALS: Record<string, string> = {
  A: 'absorbance 1',
  mAU: 'absorbance 0.001',
  '%T': 'percentTransmittance 1',
  T: 'transmittance 1',
};

/** What must be asked of each file that leaves something open. */
const ASKED: Record<string, string> = {
  '09_ambiguous_comma_comma.csv': 'DECIMAL_COMMA',
  '46_odd_minus9999.csv': 'SENTINEL',
  '60_duplicate_x_conflict.csv': 'EQUAL_X',
  '61_forward_and_back.csv': 'TURN_ROUND',
  '76_two_tables_different_units.txt': 'TABLES',
};

describe.runIf(expectedFile !== null)('one set of real spectra in many dialects of text', () => {
  test.each(names.filter((name) => expected[name]?.kind === 'spectra'))('%s gives every x and y', (name) => {
    const { spectra } = read(name);
    const wanted = expected[name]?.spectra ?? [];
    expect(spectra.length).toBe(wanted.length);
    wanted.forEach((want, i) => {
      expect(Array.from(spectra[i]?.x ?? [])).toEqual(want.x);
      expect(Array.from(spectra[i]?.y ?? [], (y) => (Number.isNaN(y) ? null : y))).toEqual(want.y);
    });
  });

  test.each(names.filter((name) => expected[name]?.kind === 'spectra'))('%s has its units', (name) => {
    const { spectra } = read(name);
    (expected[name]?.spectra ?? []).forEach((want, i) => {
      const got = spectra[i];
      if (want.xUnit === 'nm?') expect([got?.xUnit, got?.xUnitGuessed]).toEqual(['nm', true]);
      else expect(got?.xUnit).toBe(X_UNITS[want.xUnit]);
      const signal = SIGNALS[want.yUnit];
      if (signal) expect(`${got?.signal} ${got?.signalScale}`).toBe(signal);
      else expect(got?.signalGuessed).toBe(true);
    });
  });

  test.each(names)('%s asks what only a person can say, and nothing else', (name) => {
    if (expected[name]?.kind === 'refuse') return;
    const codes = read(name).questions.map((question) => question.code);
    expect(codes).toEqual(ASKED[name] ? [ASKED[name]] : []);
  });

  test('names stand over pairs, columns, rows and blocks', () => {
    const namesOf = (name: string): string[] => read(name).spectra.map((spectrum) => spectrum.name);
    expect(namesOf('24_wide_columns.csv')).toEqual(['A1', 'A2', 'A3', 'D1', 'F1']);
    expect(namesOf('25_pairs.csv')).toEqual(
      ['A1', 'A2', 'A3', 'D1', 'F1'].map((name) => `Rhodamine ${name}`),
    );
    expect(namesOf('27_empty_second_pair.csv')).toEqual(['Data Set 1']);
    expect(namesOf('28_rows_header_wavelengths.csv')).toEqual(['A1', 'A2', 'A3', 'D1', 'F1']);
    expect(namesOf('31_stacked_blocks.txt')).toEqual(
      ['A1', 'A2', 'A3', 'D1', 'F1'].map((name) => `Rhodamine 6G ${name}`),
    );
    expect(namesOf('34_preamble_metadata.csv')).toEqual(['Rhodamine 6G 0,1 mM']);
    expect(namesOf('76_two_tables_different_units.txt')).toEqual(['k1', 'k2']);
  });

  test('a preamble is kept as header text and as records', () => {
    const { headerText, spectra } = read('34_preamble_metadata.csv');
    expect(headerText).toContain('Scan 800,0 to 200,0 nm');
    expect(spectra[0]?.header['Path length (mm)']).toBe('10');
  });

  test('lines after the table are kept as trailer', () => {
    expect(read('36_stats_rows_at_end.csv').trailerText).toContain('Max;0,105153');
  });

  test('an above-range word keeps its reason', () => {
    const reasons = (name: string): string[] => [
      ...new Set(read(name).spectra[0]?.gaps.map((gap) => gap.reason)),
    ];
    expect(reasons('37_odd_over.csv')).toEqual(['aboveRange']);
    expect(reasons('39_odd_inf.csv')).toEqual(['aboveRange']);
    expect(reasons('42_odd_ovrflw.csv')).toEqual(['aboveRange']);
    expect(reasons('43_odd_gt.csv')).toEqual(['aboveRange']);
    expect(reasons('40_odd_nan.csv')).toEqual(['missing']);
    expect(reasons('45_odd_dashes.csv')).toEqual(['missing']);
  });

  test.each(names.filter((name) => expected[name]?.kind === 'refuse'))(
    '%s is refused in a sentence',
    (name) => {
      expect(() => read(name)).toThrow(ReaderError);
      expect(() => read(name)).toThrow(/\.$/);
    },
  );

  test.each(names.filter((name) => ['plate', 'calibration'].includes(expected[name]?.kind ?? '')))(
    '%s is offered as what it is',
    (name) => {
      const { spectra, notASpectrum } = read(name);
      expect(spectra).toEqual([]);
      expect(notASpectrum?.kind).toBe(expected[name]?.kind);
      expect(notASpectrum?.rows.length).toBe(3);
    },
  );

  test('each answer to a question reads the file again', () => {
    const readWith = (name: string, choice: number): ReadResult => {
      const file = sharedFile(`spectra/dialects/${name}`);
      const bytes = file ? readFileSync(file) : new Uint8Array();
      return readFile(bytes, name, readFile(bytes, name).questions[0]?.choices[choice]?.options);
    };
    expect(readWith('61_forward_and_back.csv', 0).spectra.map((spectrum) => spectrum.x.length)).toEqual([
      301, 301,
    ]);
    expect(readWith('60_duplicate_x_conflict.csv', 1).spectra[0]?.y[5]).toBeCloseTo(
      (0.001828 + 0.011828) / 2,
      12,
    );
    expect(readWith('60_duplicate_x_conflict.csv', 2).spectra[0]?.x.length).toBe(309);
    expect(readWith('46_odd_minus9999.csv', 1).spectra[0]?.gaps).toEqual([]);
    expect(readWith('09_ambiguous_comma_comma.csv', 1).spectra.length).toBe(2);
    expect(readWith('76_two_tables_different_units.txt', 1).spectra[0]?.xUnit).toBe('um');
    expect(readWith('76_two_tables_different_units.txt', 2).spectra.length).toBe(4);
  });
});
