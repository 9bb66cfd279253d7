import { describe, expect, test } from 'vitest';
import { decodeText } from '@/lib/readers/decode-text';
import { readFile } from '@/lib/readers/read-file';
import { splitLines, lineText } from '@/lib/readers/text-lines';

const TEXT = 'Wellenl\u00e4nge (nm);A\r\n500;0,1\r\n502;0,2\r\n504;0,3\r\n';
const utf8 = new TextEncoder().encode(TEXT);
const sixteen = (little: boolean): number[] =>
  Array.from(TEXT).flatMap((letter) => (little ? [letter.charCodeAt(0), 0] : [0, letter.charCodeAt(0)]));

describe('one table in every encoding', () => {
  test.each([
    ['UTF-8', utf8],
    ['UTF-8 with its mark', Uint8Array.from([0xef, 0xbb, 0xbf, ...utf8])],
    ['windows-1252', Uint8Array.from(Array.from(TEXT, (letter) => letter.charCodeAt(0)))],
    ['UTF-16 LE with its mark', Uint8Array.from([0xff, 0xfe, ...sixteen(true)])],
    ['UTF-16 BE with its mark', Uint8Array.from([0xfe, 0xff, ...sixteen(false)])],
    ['UTF-16 LE', Uint8Array.from(sixteen(true))],
    ['UTF-16 BE', Uint8Array.from(sixteen(false))],
    ['UTF-8 with Ctrl-Z and NULs behind it', Uint8Array.from([...utf8, 0x1a, 0, 0, 0])],
  ])('%s', (_, bytes) => {
    expect(decodeText(bytes).text).toBe(TEXT);
    expect(Array.from(readFile(bytes, 'a.csv').spectra[0]?.y ?? [])).toEqual([0.1, 0.2, 0.3]);
  });
});

test('windows-1252 has its own signs between 0x80 and 0x9f', () => {
  // The Unicode Consortium's mapping of CP1252: 80 -> 20AC, 96 -> 2013, 99 -> 2122.
  expect(decodeText(Uint8Array.from([0x80, 0x96, 0x99, 0xe9])).text).toBe('\u20ac\u2013\u2122\u00e9');
});

test('lines end in CRLF, LF, LFCR or CR, mixed in one file', () => {
  const lines = splitLines('a\nb\r\nc\n\rd\re');
  expect(Array.from({ length: lines.count }, (_, i) => lineText(lines, i))).toEqual([
    'a',
    'b',
    'c',
    'd',
    'e',
  ]);
});
