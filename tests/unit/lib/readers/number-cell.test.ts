import { expect, test } from 'vitest';
import { seededUniform } from '../../../../fixtures/generate/seeded-noise';
import { COMMA, gapReason, parseNumber, POINT } from '@/lib/readers/number-cell';

const point = (cell: string): number => parseNumber(cell, 0, cell.length, POINT);
const comma = (cell: string): number => parseNumber(cell, 0, cell.length, COMMA);

test('20,000 random numbers have the very bits of Number()', () => {
  const uniform = seededUniform(7);
  for (let i = 0; i < 20_000; i++) {
    const digits = String(Math.floor(uniform() * 10 ** Math.floor(1 + uniform() * 16)));
    const cut = Math.floor(uniform() * (digits.length + 1));
    const mantissa = `${digits.slice(0, cut)}${uniform() < 0.7 ? '.' : ''}${digits.slice(cut)}`;
    const exponent = uniform() < 0.4 ? `e${Math.floor(uniform() * 60 - 30)}` : '';
    const text = `${uniform() < 0.3 ? '-' : ''}${mantissa}${exponent}`;
    expect([text, point(text)]).toEqual([text, Number(text)]);
  }
});

test('numbers as files write them', () => {
  expect([point('.5'), point('5.'), point(' 0.25 '), point('"800"'), point('+3')]).toEqual([
    0.5, 5, 0.25, 800, 3,
  ]);
  expect([point('1.5D-3'), point('1.5d+2'), point('6.079E-19')]).toEqual([0.0015, 150, 6.079e-19]);
  expect([point('\u22120.5'), point('800\u00a0'), comma('\u22120,25')]).toEqual([-0.5, 800, -0.25]);
  expect(Object.is(point('-0'), -0)).toBe(true);
  expect([comma('0,001675'), comma('8,000000E-3'), comma('205')]).toEqual([0.001675, 0.008, 205]);
});

test('groups of three are taken only where they cannot be decimals', () => {
  expect([point('12,345.5'), point('1,234,567'), comma('12.345,5'), point('12\u202f345.5')]).toEqual([
    12345.5, 1234567, 12345.5, 12345.5,
  ]);
  expect([point('1,234'), comma('1.234'), point('0,5')]).toEqual([NaN, NaN, NaN]);
});

test('what is no number is NaN, never part of one', () => {
  for (const cell of [
    '',
    ' ',
    '-',
    '.',
    'e5',
    '1.2.3',
    '5 nm',
    '0x10',
    '1e',
    '1e999',
    'Infinity',
    '12a',
    '--5',
    '1-2',
  ])
    expect([cell, point(cell)]).toEqual([cell, NaN]);
});

test('words in place of a number keep their reason', () => {
  for (const word of ['OVER', 'ovrflw', 'OVERFLOW', 'SAT', 'Inf', '+Inf', '>3.5', '> 3,5', '****', '#####'])
    expect([word, gapReason(word)]).toEqual([word, 'aboveRange']);
  for (const word of ['<0', '-Inf', 'UNDER', '< 0.001'])
    expect([word, gapReason(word)]).toEqual([word, 'belowRange']);
  for (const word of ['', 'NaN', 'NA', 'N/A', '#N/A', 'null', '-', '---', '*', '***', '?', 'n.d.'])
    expect([word, gapReason(word)]).toEqual([word, 'missing']);
  for (const word of ['0.1x', 'lamp', '12 34', 'overall'])
    expect([word, gapReason(word)]).toEqual([word, 'unreadable']);
});
