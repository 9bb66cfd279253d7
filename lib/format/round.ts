/*
 * The rounding core: the one place where a number loses digits. It depends on nothing, so that the engine may
 * use it for the texts it writes (reports, flags) and pages round by the same rule.
 * Ties: the exact binary value decides, and an exact tie goes away from zero (Number.prototype.toFixed).
 */

/** Places after the decimal point at which `spread` shows `digits` significant digits; negative for tens, hundreds ... */
export function decimalsFor(spread: number, digits: number): number {
  const exponent = Number(
    Math.abs(spread)
      .toExponential(digits - 1)
      .split('e')[1],
  );
  return digits - 1 - exponent;
}

/** `x` with so many decimals, as plain text with an ASCII minus; never "-0". Negative decimals round to tens. */
export function toDecimals(x: number, decimals: number): string {
  const text =
    decimals >= 0
      ? x.toFixed(Math.min(decimals, 100))
      : String(Number((x / 10 ** -decimals).toFixed(0)) * 10 ** -decimals);
  return /^-[0.]*$/.test(text) ? text.slice(1) : text;
}

export function roundTo(x: number, decimals: number): number {
  return Number(toDecimals(x, decimals));
}

/** `x` to so many significant digits without trailing zeros: 0.5, 333.3, 1.2e-7. */
export function significantText(x: number, digits: number): string {
  return String(Number(x.toPrecision(digits)));
}

/** Two digits when the leading digit is 1 (or one digit would round up to it), else one: 0.014, 0.0096, 0.04. */
export function shortDigits(spread: number): 1 | 2 {
  const leading = Math.abs(spread).toExponential(6).charAt(0);
  const rounded = Math.abs(spread).toExponential(0).charAt(0);
  return leading === '1' || rounded === '1' ? 2 : 1;
}

/** A value and its spread at the same decimal place; both are multiplied by 10^exponent when there is one. */
export interface RoundedPair {
  readonly value: string;
  readonly spread: string;
  readonly decimals: number;
  readonly exponent: number | null;
}

const WITHOUT_SPREAD_DIGITS = 6;

/**
 * Round a value by its spread: the spread keeps `digits` significant digits and the value ends at the same
 * place. A power of ten is split off when the place would lie left of the point, at 10^6 and above, and below 10^-3.
 */
export function roundPair(value: number, spread: number, digits: number): RoundedPair {
  const largest = Math.max(Math.abs(value), Math.abs(spread));
  const magnitude = largest > 0 ? Number(largest.toExponential(6).split('e')[1]) : 0;
  const place = spread === 0 ? WITHOUT_SPREAD_DIGITS - 1 - magnitude : decimalsFor(spread, digits);
  const exponent = place < 0 || magnitude >= 6 || magnitude < -3 ? magnitude : null;
  const scale = 10 ** (exponent ?? 0);
  const decimals = Math.max(0, place + (exponent ?? 0));
  return {
    value: toDecimals(value / scale, decimals),
    spread: toDecimals(spread / scale, decimals),
    decimals,
    exponent,
  };
}

/** "0.875 ± 0.021" or "(1.23 ± 0.04) × 10^-5": U to two significant digits, for text without typography. */
export function plusMinusText(value: number, expanded: number): string {
  const pair = roundPair(value, expanded, 2);
  const core = `${pair.value} ± ${pair.spread}`;
  return pair.exponent === null ? core : `(${core}) × 10^${pair.exponent}`;
}
