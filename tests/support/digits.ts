import { expect } from 'vitest';

/** NIST's log relative error: the number of correct significant digits of `actual` against `certified`. */
export function correctDigits(actual: number, certified: number): number {
  if (actual === certified) return 15.95;
  const error = Math.abs(actual - certified);
  return -Math.log10(certified === 0 ? error : error / Math.abs(certified));
}

export function expectDigits(actual: number, certified: number | string, digits: number): void {
  const reference = Number(certified);
  expect(
    correctDigits(actual, reference),
    `${actual} agrees with ${reference} to fewer than ${digits} digits`,
  ).toBeGreaterThanOrEqual(digits);
}
