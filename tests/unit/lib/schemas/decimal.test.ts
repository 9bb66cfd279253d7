import { describe, expect, test } from 'vitest';
import { decimal, optionalDecimal, parseDecimal } from '@/lib/schemas/decimal';

describe('parseDecimal', () => {
  test.each([
    ['0.5', 0.5],
    ['0,5', 0.5],
    [' 12 ', 12],
    ['-0.25', -0.25],
    ['\u22120,25', -0.25],
    ['.5', 0.5],
    ['5.', 5],
    ['1.5e-3', 0.0015],
    ['1,5E3', 1500],
    ['0,123', 0.123],
    ['1234,5', 1234.5],
  ])('reads %j as %d', (text, value) => {
    expect(parseDecimal(text)).toEqual({ ok: true, value });
  });

  test('asks about 1,234 and names both readings', () => {
    const parsed = parseDecimal('1,234');
    expect(parsed.ok).toBe(false);
    expect(parsed).toMatchObject({ message: expect.stringMatching(/1\.234.*1234/) as string });
  });

  test.each(['', '   ', 'abc', '1.2.3', '1,2,3', '1 234', '0x10', 'NaN', 'Infinity', '1e999', '--1', '1e'])(
    'refuses %j with a sentence',
    (text) => {
      expect(parseDecimal(text)).toMatchObject({ ok: false, message: expect.stringMatching(/\w/) as string });
    },
  );
});

test('a blank field is an error, never zero; an optional one is null', () => {
  expect(decimal.safeParse('').success).toBe(false);
  expect(optionalDecimal.parse('')).toBeNull();
  expect(optionalDecimal.parse('0,2')).toBe(0.2);
  expect(optionalDecimal.safeParse('x').success).toBe(false);
});
