import { describe, expect, test } from 'vitest';
import { agreement, agrees, printedDigits } from '@/lib/checks/digits';

// Examples counted by hand.
test.each([
  ['0.0050', 2],
  ['1.20', 3],
  ['-0.262323073774029', 15],
  ['0.429796848199937E-03', 15],
  ['19.0', 3],
  ['50', 2],
  ['0.00000', 5],
  ['0', 1],
])('%s has %d printed digits', (text, digits) => {
  expect(printedDigits(text)).toBe(digits);
});

test.each(['', '.', 'about 3', '1,5', '1e'])('"%s" is no printed number', (text) => {
  expect(() => printedDigits(text)).toThrow(RangeError);
});

describe('agreement', () => {
  test.each([
    [0.0178446, '0.018', 2],
    [5.5164, '5.516', 4],
    [5.5165, '5.516', 4],
    [-0.0004, '0.000', 3],
    [4.29796848199937e-4, '0.429796848199937E-03', 15],
  ])('%d rounds to the printed %s: all %d digits', (ours, published, digits) => {
    expect(agreement(ours, published)).toEqual({ digits, printed: digits, all: true });
  });

  // -log10 of 0.0006/5.516 is 3.96; of 0.17/0.83 is 0.69; of 9e-6/0.87038 is 4.99.
  test.each([
    [5.5166, '5.516', 3, 4],
    [1, '0.83', 0, 2],
    [-0.870389, '-0.87038', 4, 5],
  ])('%d against the printed %s: %d of %d', (ours, published, digits, printed) => {
    expect(agreement(ours, published)).toEqual({ digits, printed, all: false });
  });

  test('never all digits for a number that rounds to another one, however near', () => {
    expect(agreement(9.9996, '9.999')).toEqual({ digits: 3, printed: 4, all: false });
  });

  test.each([NaN, Infinity, -5.516, 0])('%d has no digit of 5.516', (ours) => {
    expect(agreement(ours, '5.516')).toEqual({ digits: 0, printed: 4, all: false });
  });

  test('beyond a printed zero the error itself counts', () => {
    expect(agreement(0.02, '0.0000')).toEqual({ digits: 1, printed: 4, all: false });
  });
});

test('the verdict asks for all printed digits, or for twelve', () => {
  expect(agrees(agreement(0.2601, '0.260'))).toBe(true);
  expect(agrees(agreement(0.2606, '0.260'))).toBe(false);
  expect(agrees(agreement(1.0000000000003, '1.00000000000000'))).toBe(true);
  expect(agrees(agreement(1.000000000003, '1.00000000000000'))).toBe(false);
});
