import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { readFile } from '@/lib/readers/read-file';
import { sharedFile } from '../../../support/shared';

const manifest = sharedFile('spectra/real/manifest.csv');

/** The manifest's lines, quoted cells and all, by column name. */
function manifestRows(): Record<string, string>[] {
  if (!manifest) return [];
  const [head = [], ...rows] = readFileSync(manifest, 'utf8')
    .trim()
    .split(/\r?\n/)
    .map((line) =>
      Array.from(line.matchAll(/("(?:[^"]|"")*"|[^,]*)(?:,|$)/g), (match) =>
        (match[1] ?? '').replace(/^"|"$/g, ''),
      ),
    );
  return rows.map((row) => Object.fromEntries(head.map((name, i) => [name, row[i] ?? ''])));
}

/** Tables in which x is no wavelength, by the manifest's notes. */
const NO_SPECTRA = ['edinburgh/X_calibration.csv', 'edinburgh/sodium_data.dat'];
/** Its check column counts from a row number that is no axis. */
const ROW_NUMBERED = 'cmaq/wavel-bins.dat';

function read(name: string) {
  const file = sharedFile(`spectra/real/${name}`);
  return readFile(file ? readFileSync(file) : new Uint8Array(), name);
}

describe.runIf(manifest !== null)('real files with open licences', () => {
  const rows = manifestRows();

  test.each(
    rows
      .filter((row) => ![...NO_SPECTRA, ROW_NUMBERED].includes(row.file ?? ''))
      .map((row) => [row.file ?? '', row] as const),
  )('%s gives its check value', (name, row) => {
    const { spectra } = read(name);
    expect(spectra.length).toBe(Number(row.spectra));
    const spectrum = spectra[Number(row.check_column) - 1];
    expect(spectrum?.x.length).toBe(Number(row.points));
    expect(spectrum?.x[0]).toBe(Number(row.x_first));
    expect(spectrum?.x.at(-1)).toBe(Number(row.x_last));
    expect(spectrum?.xUnit).toBe(row.x_unit);
    expect(spectrum?.y[spectrum.x.indexOf(Number(row.check_x))]).toBe(Number(row.check_value));
  });

  test.each(NO_SPECTRA)('%s is no spectrum and is offered as a table', (name) => {
    const { spectra, notASpectrum } = read(name);
    const row = rows.find((one) => one.file === name);
    expect(spectra).toEqual([]);
    expect(notASpectrum?.rows.length).toBe(Number(row?.points));
    const cells = notASpectrum?.rows.flat().map(Number);
    expect(cells?.some((cell) => Math.abs(cell - Number(row?.check_value)) < 1e-9 * Math.abs(cell))).toBe(
      true,
    );
  });

  test('row numbers are not taken for wavelengths', () => {
    const { spectra } = read(ROW_NUMBERED);
    expect(spectra[0]?.x[38]).toBe(291);
  });

  test('a header in windows-1252 is read as such', () => {
    expect(read('cmaq/HCHOM_06.txt').headerText).toContain('Evaluation – Data Sheet');
  });
});
