import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { readFile } from '@/lib/readers/read-file';
import { sharedFile } from '../../../support/shared';

/** Every x and y of the one spectrum that all six documents hold, from the list beside the text dialects. */
const listed = sharedFile('spectra/dialects/expected.json');
const first = sharedFile('spectra/animl/a1_individual.animl');

interface Listed {
  readonly spectra: readonly { readonly x: readonly number[]; readonly y: readonly number[] }[];
}

const wanted = listed
  ? (JSON.parse(readFileSync(listed, 'utf8')) as Record<string, Listed>)['01_comma.csv']?.spectra[0]
  : undefined;

function read(name: string) {
  const file = sharedFile(`spectra/animl/${name}`);
  const { spectra, questions, guesses } = readFile(file ? readFileSync(file) : new Uint8Array(), name);
  expect([spectra.length, questions, guesses]).toEqual([1, [], []]);
  const [spectrum] = spectra;
  expect([spectrum?.xUnit, spectrum?.signal, spectrum?.name]).toEqual([
    'nm',
    'absorbance',
    'Rhodamine 6G in methanol',
  ]);
  expect(Array.from(spectrum?.x ?? [])).toEqual(wanted?.x);
  return { y: Array.from(spectrum?.y ?? []), warnings: spectrum?.warnings ?? [], gaps: spectrum?.gaps ?? [] };
}

describe.runIf(first !== null && wanted !== undefined)('six AnIML documents of one real spectrum', () => {
  const y = wanted?.y ?? [];

  test.each(['a1_individual.animl', 'a2_autoinc_individual.animl', 'a3_autoinc_encoded64.animl'])(
    '%s gives every x and y and warns of nothing',
    (name) => {
      expect(read(name)).toEqual({ y, warnings: [], gaps: [] });
    },
  );

  test('a4_encoded32.animl gives the nearest numbers of single precision', () => {
    expect(read('a4_encoded32.animl')).toEqual({ y: y.map(Math.fround), warnings: [], gaps: [] });
  });

  test('a5_sparse.animl has gaps at the indices its name of the step gives, and nothing else is moved', () => {
    const sparse = read('a5_sparse.animl');
    expect(sparse.y).toEqual(y.map((value, i) => (i >= 100 && i <= 149 ? NaN : value)));
    expect(sparse.gaps.length).toBe(50);
    expect(sparse.warnings.map(({ code }) => code)).toEqual(['GAPS']);
  });

  test('a6_bad_length.animl says that five ordinates are missing', () => {
    const short = read('a6_bad_length.animl');
    expect(short.y).toEqual(y.map((value, i) => (i >= 296 ? NaN : value)));
    expect(short.warnings.map(({ code }) => code)).toEqual(['LENGTH', 'GAPS']);
    expect(short.warnings[0]?.message).toContain('declares 301 values');
    expect(short.warnings[0]?.value).toBe(296);
  });
});
