import { describe, expect, test } from 'vitest';
import { alignAtPoint, formatNumber, formatPercent } from '@/lib/format/number';
import { formatPlusMinus, formatShort } from '@/lib/format/quantity';
import { plusMinusText, roundPair, significantText, toDecimals } from '@/lib/format/round';

describe('formatShort', () => {
  test.each([
    [0.1980724596, 0.00072, '0.1981(7)'],
    [0.1980724596, 0.00025, '0.1981(3)'],
    [0.1980724596, 0.000143, '0.19807(14)'],
    [0.004354, 0.0000962, '0.004354(96)'],
    [11061.36, 13.9, '11061(14)'],
    [11106, 40.2, '1.111(4) \u00d7 10^4'],
    [-0.002799, 0.00496, '\u22120.003(5)'],
    [1.23e-5, 4e-7, '1.23(4) \u00d7 10^\u22125'],
    [12.3, 1.24, '12.3(12)'],
    [0.5, 0, '0.500000'],
  ])('%d with u %d is %s', (value, u, text) => {
    expect(formatShort(value, u).text).toBe(text);
  });

  test('gives its parts for a page that sets the exponent itself', () => {
    expect(formatShort(11106, 40.2)).toMatchObject({ mantissa: '1.111', bracket: '4', exponent: 4 });
  });
});

describe('formatPlusMinus', () => {
  test.each([
    [0.8748873, 0.0210749, '0.875 \u00b1 0.021'],
    [48.54239, 0.219394, '48.54 \u00b1 0.22'],
    [1.502, 0.0104217, '1.502 \u00b1 0.010'],
    [0.9962, 0.0996, '1.00 \u00b1 0.10'],
    [1.234e-5, 4.2e-7, '(1.234 \u00b1 0.042) \u00d7 10^\u22125'],
    [-0.0201, 0.0216, '\u22120.020 \u00b1 0.022'],
  ])('%d with U %d is %s', (value, expanded, text) => {
    expect(formatPlusMinus(value, expanded).text).toBe(text);
  });

  test('has a shorter form', () => {
    expect(formatPlusMinus(2.0091, 0.0423, 1).text).toBe('2.01 \u00b1 0.04');
  });

  test('is the text of reports, but for the minus sign', () => {
    expect(plusMinusText(0.8748873, 0.0210749)).toBe(formatPlusMinus(0.8748873, 0.0210749).text);
    expect(plusMinusText(1.234e-5, 4.2e-7)).toBe('(1.234 \u00b1 0.042) \u00d7 10^-5');
  });
});

describe('rounding', () => {
  test('never prints minus zero', () => {
    expect(toDecimals(-0.001, 2)).toBe('0.00');
    expect(formatNumber(-0, 3)).toBe('0.00');
  });

  test('rounds to tens and hundreds', () => {
    expect(toDecimals(1264, -1)).toBe('1260');
    expect(toDecimals(1264, -2)).toBe('1300');
  });

  test('carries: 0.0996 to two digits is 0.10 at the second decimal', () => {
    expect(roundPair(1.2345, 0.0996, 2)).toMatchObject({ value: '1.23', spread: '0.10', decimals: 2 });
  });

  test.each([
    [333.3333, 4, '333.3'],
    [8, 4, '8'],
    [0.1 + 0.2, 4, '0.3'],
    [1.2e-7, 4, '1.2e-7'],
  ])('%d to %d digits is %s', (x, digits, text) => {
    expect(significantText(x, digits)).toBe(text);
  });
});

describe('numbers for pages', () => {
  test.each([
    [0.19807, 4, '0.1981'],
    [1.2, 4, '1.200'],
    [55845, 5, '55845'],
    [-2.5, 2, '\u22122.5'],
    [1.2e-9, 2, '1.2e-9'],
  ])('%d to %d digits is %s', (x, digits, text) => {
    expect(formatNumber(x, digits)).toBe(text);
  });

  test('per cent', () => {
    expect(formatPercent(3.0466)).toBe('3.0 %');
    expect(formatPercent(-0.61, 2)).toBe('\u22120.61 %');
  });

  test('aligns a column at its points', () => {
    expect(alignAtPoint(['1.25', '10', '0.125', ''])).toEqual([
      { before: '1', after: '.25', padBefore: 1, padAfter: 1 },
      { before: '10', after: '', padBefore: 0, padAfter: 4 },
      { before: '0', after: '.125', padBefore: 1, padAfter: 0 },
      { before: '', after: '', padBefore: 2, padAfter: 4 },
    ]);
  });
});
