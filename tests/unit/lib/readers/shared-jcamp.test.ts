import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { readFile } from '@/lib/readers/read-file';
import { ReaderError, type ReadResult } from '@/lib/readers/types';
import { sharedFile } from '../../../support/shared';

interface Expected {
  bad: string;
  spectra: { n: number; x: number[]; y: (number | null)[] }[];
}

const expectedFile = sharedFile('spectra/jcamp-dx/expected.json');
const expected = expectedFile
  ? (JSON.parse(readFileSync(expectedFile, 'utf8')) as Record<string, Expected>)
  : {};

/** What must be said of each faulty file: a code of a warning, or of the refusal. */
const SAID: Record<string, string> = {
  'b01_npoints_too_large.jdx': 'NPOINTS',
  'b02_ycheck_corrupt.jdx': 'Y_CHECK',
  'b04_truncated.jdx': 'MISSING_END',
  'b05_no_title.jdx': 'NO_TITLE',
  'b07_yfactor_missing.jdx': 'YFACTOR_MISSING',
  'b08_yfactor_zero.jdx': 'YFACTOR_ZERO',
  'b10_empty_table.jdx': 'EMPTY_TABLE',
  'b11_html_page.jdx': 'HTML',
  'b13_decimal_comma_pairs.jdx': 'DECIMAL_COMMA',
  'b14_nan_text.jdx': 'GAPS',
  'b16_link_second_block_cut.jdx': 'MISSING_END',
  'b17_illegal_character.jdx': 'ILLEGAL_CHARACTER',
  'b19_empty_file.jdx': 'EMPTY',
  'b20_binary.jdx': 'BINARY',
};

function bytesOf(name: string): Uint8Array {
  const file = sharedFile(`spectra/jcamp-dx/${name}`);
  return file ? readFileSync(file) : new Uint8Array();
}

function codesOf(name: string): string[] {
  let result: ReadResult;
  try {
    result = readFile(bytesOf(name), name);
  } catch (error) {
    if (error instanceof ReaderError) return [error.code];
    throw error;
  }
  return [...result.warnings, ...result.spectra.flatMap((spectrum) => spectrum.warnings)].map(
    (warning) => warning.code,
  );
}

describe.runIf(expectedFile !== null)('JCAMP-DX files made from real spectra', () => {
  test.each(Object.keys(expected).filter((name) => (expected[name]?.spectra.length ?? 0) > 0))(
    '%s gives every ordinate',
    (name) => {
      const { spectra } = readFile(bytesOf(name), name);
      const wanted = expected[name]?.spectra ?? [];
      expect(spectra.length).toBe(wanted.length);
      wanted.forEach((want, i) => {
        const got = spectra[i];
        expect(Array.from(got?.y ?? [])).toEqual(want.y);
        // The listed abscissae are rounded to 1e-4 by their source.
        const worst = want.x.reduce((most, x, k) => Math.max(most, Math.abs(x - (got?.x[k] ?? NaN))), 0);
        expect(worst).toBeLessThan(1e-4);
      });
    },
  );

  test.each(Object.keys(expected).filter((name) => expected[name]?.bad !== ''))(
    '%s says what is wrong',
    (name) => {
      expect(codesOf(name)).toContain(SAID[name]);
    },
  );

  test('the first block of a file cut in the second is whole', () => {
    const { spectra } = readFile(bytesOf('b16_link_second_block_cut.jdx'), 'b16.jdx');
    expect(spectra[0]?.x.length).toBe(601);
    expect(spectra[0]?.gaps).toEqual([]);
  });

  test('units are told apart', () => {
    const unit = (name: string): string => {
      const [spectrum] = readFile(bytesOf(name), name).spectra;
      return `${spectrum?.xUnit} ${spectrum?.signal}`;
    };
    expect(unit('g14_transmittance_percent_unlabelled.jdx')).toBe('nm percentTransmittance');
    expect(unit('g15_percent_transmittance.jdx')).toBe('nm percentTransmittance');
    expect(unit('g18_wavenumber_desc_difdup.jdx')).toBe('1/cm absorbance');
  });
});

test('the JCAMP-DX files are known to this test', () => {
  if (!expectedFile) return;
  const faulty = Object.keys(expected).filter((name) => expected[name]?.bad !== '');
  expect(faulty.filter((name) => SAID[name] === undefined)).toEqual([]);
});
