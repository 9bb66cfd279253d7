import { describe, expect, test } from 'vitest';
import { readFile } from '@/lib/readers/read-file';
import type { ReadResult } from '@/lib/readers/types';

const HEAD = [
  '##TITLE=hand-made',
  '##JCAMP-DX=4.24',
  '##DATA TYPE=UV/VIS SPECTRUM',
  '##XUNITS=NANOMETERS',
  '##YUNITS=ABSORBANCE',
  '##XFACTOR=1',
  '##YFACTOR=1',
];

function read(table: readonly string[], header: readonly string[] = [], end = '##END='): ReadResult {
  const text = [...HEAD, ...header, '##XYDATA=(X++(Y..Y))', ...table, end].join('\n');
  return readFile(new TextEncoder().encode(text), 'hand.jdx');
}

const y = (result: ReadResult): (number | null)[] =>
  Array.from(result.spectra[0]?.y ?? [], (value) => (Number.isNaN(value) ? null : value));
const x = (result: ReadResult): number[] => Array.from(result.spectra[0]?.x ?? []);
const codes = (result: ReadResult): string[] =>
  [...result.warnings, ...(result.spectra[0]?.warnings ?? [])].map((warning) => warning.code);
const grid = (first: number, last: number, n: number): string[] => [
  `##FIRSTX=${first}`,
  `##LASTX=${last}`,
  `##NPOINTS=${n}`,
];

describe('packed forms, decoded by hand', () => {
  // The same ordinates, packed by hand with the digit tables of JCAMP-DX 4.24, section 5.
  const same = [1, 2, 3, 3, 2, 1, 0, -1, -2, -3];
  test.each([
    ['AFFN', '400 1 2 3 3 2 1 0 -1 -2 -3'],
    ['PAC', '400+1+2+3+3+2+1+0-1-2-3'],
    ['SQZ', '400ABCCBA@abc'],
    ['DIF', '400AJJ%jjjjjj'],
    ['DIF and DUP', '400AJT%jX'],
  ])('%s', (_, line) => {
    expect(y(read([line], grid(400, 409, 10)))).toEqual(same);
  });

  test('a number of more digits carries them after its packed first', () => {
    expect(y(read(['400A23J45j7'], grid(400, 402, 3)))).toEqual([123, 268, 251]);
    expect(y(read(['400b0K0'], grid(400, 401, 2)))).toEqual([-20, 0]);
  });

  test('a line after differences starts with a check, which is no point', () => {
    expect(y(read(['400AJJ', '402CJJ', '404E'], grid(400, 404, 5)))).toEqual([1, 2, 3, 4, 5]);
  });

  test('a failing check is told with its line, keeps the decoded point, and heals what follows', () => {
    const result = read(['400AJJ', '402DJJ', '404F'], grid(400, 404, 5));
    expect(y(result)).toEqual([1, 2, 3, 5, 6]);
    expect(result.spectra[0]?.warnings.find((warning) => warning.code === 'Y_CHECK')?.line).toBe(
      HEAD.length + 6,
    );
  });

  test('E with a sign is an exponent; E alone is one when no other letter stands in the table', () => {
    expect(y(read(['400 1.5E-1 2.5e+1'], grid(400, 401, 2)))).toEqual([0.15, 25]);
    expect(y(read(['400 1.5E1 2.5'], grid(400, 401, 2)))).toEqual([15, 2.5]);
    expect(y(read(['400AE1'], grid(400, 401, 2)))).toEqual([1, 51]);
  });

  test('a question mark is a gap that keeps its place', () => {
    const result = read(['400 1 ? 3'], grid(400, 402, 3));
    expect(y(result)).toEqual([1, null, 3]);
    expect(result.spectra[0]?.gaps).toEqual([{ index: 1, reason: 'missing', text: '?' }]);
  });
});

describe('x', () => {
  const lines = ['400 1 2 3', '406 4 5 6'];
  test('the header gives it, and the lines agree', () => {
    expect(x(read(lines, grid(400, 410, 6)))).toEqual([400, 402, 404, 406, 408, 410]);
  });

  test('a wrong count, a wrong step or no last x: the data lines decide, with a warning', () => {
    const want = [400, 402, 404, 406, 408, 410];
    const wrongCount = read(lines, grid(400, 410, 60));
    expect([x(wrongCount), codes(wrongCount).includes('NPOINTS')]).toEqual([want, true]);
    const wrongStep = read(lines, [...grid(400, 410, 6), '##DELTAX=-2']);
    expect([x(wrongStep), codes(wrongStep).includes('DELTAX')]).toEqual([want, true]);
    const noLast = read(lines, ['##FIRSTX=400', '##NPOINTS=6']);
    expect([x(noLast), codes(noLast).includes('X_FROM_LINES')]).toEqual([want, true]);
    const wrongLast = read(lines, ['##FIRSTX=400', '##LASTX=900', '##NPOINTS=6']);
    expect([x(wrongLast), codes(wrongLast).includes('X_HEADER_WRONG')]).toEqual([want, true]);
  });

  test('a line that lost a number leaves gaps, and the lines after it stay where they are', () => {
    const table = Array.from({ length: 12 }, (_, k) => `${400 + 3 * k} 1 2 3`);
    table[5] = '415 1 23';
    const result = read(table, grid(400, 435, 36));
    expect(x(result).length).toBe(36);
    expect(y(result).slice(15, 20)).toEqual([null, null, null, 1, 2]);
    expect(codes(result)).toContain('X_CHECK');
  });
});

test('header checks warn and never rescale', () => {
  const result = read(['400 1 2 3'], [...grid(400, 402, 3), '##FIRSTY=0.001', '##MAXY=3']);
  expect(y(result)).toEqual([1, 2, 3]);
  expect(codes(result)).toContain('FIRSTY');
  expect(codes(result)).not.toContain('MAXY');
});

test('##END without its sign, a missing end, and a repeat that no table could hold', () => {
  expect(codes(read(['400 1 2 3'], grid(400, 402, 3), '##END'))).toEqual([]);
  expect(codes(read(['400 1 2 3'], grid(400, 402, 3), ''))).toContain('MISSING_END');
  expect(codes(read(['400AZ99999999'], grid(400, 402, 3)))).toContain('DUP_TOO_LONG');
});

test('a table in seconds is no spectrum; the person may say otherwise', () => {
  const text = [
    ...HEAD.map((line) => line.replace('NANOMETERS', 'SECONDS')),
    ...grid(400, 402, 3),
    '##XYDATA=(X++(Y..Y))',
    '400 1 2 3',
    '##END=',
  ].join('\n');
  const bytes = new TextEncoder().encode(text);
  expect(() => readFile(bytes, 'a.jdx')).toThrow(/no UV-Vis spectrum/);
  expect(readFile(bytes, 'a.jdx', { xUnit: 'nm' }).spectra.length).toBe(1);
});
