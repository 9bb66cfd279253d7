import { withTrueMinus } from './number';
import { roundPair, shortDigits } from './round';

/** A value with its standard uncertainty in brackets, in parts: mantissa(bracket) × 10^exponent. */
export interface ShortQuantity {
  readonly mantissa: string;
  /** u in units of the mantissa's last place; empty when u is zero. */
  readonly bracket: string;
  /** Null when there is no power of ten to set. */
  readonly exponent: number | null;
  /** In one line, for text without typography: "0.1981(7)", "1.111(4) × 10^4". */
  readonly text: string;
}

/**
 * A value with its standard uncertainty, u to one digit or, when that would be a 1, two: 0.1981(7), 0.0044(14).
 * A power of ten is split off where the digits of u would lie left of the point, at 10^6 and above, below 10^-3.
 */
export function formatShort(value: number, u: number): ShortQuantity {
  const pair = roundPair(value, u, u === 0 ? 1 : shortDigits(u));
  const mantissa = withTrueMinus(pair.value);
  const bracket = u === 0 ? '' : pair.spread.replace(/^0*\.?0*/, '').replace('.', '');
  const core = bracket === '' ? mantissa : `${mantissa}(${bracket})`;
  return { mantissa, bracket, exponent: pair.exponent, text: withPower(core, pair.exponent) };
}

/** A value with its expanded uncertainty, in parts: (value ± spread) × 10^exponent. */
export interface PlusMinusQuantity {
  readonly value: string;
  readonly spread: string;
  readonly exponent: number | null;
  readonly text: string;
}

/**
 * A value with its expanded uncertainty, U to two significant digits as in every report text: 0.875 ± 0.021. With
 * `digits` 1 for places where room is short: 0.88 ± 0.02.
 */
export function formatPlusMinus(value: number, expanded: number, digits: 1 | 2 = 2): PlusMinusQuantity {
  const pair = roundPair(value, expanded, digits);
  const shown = withTrueMinus(pair.value);
  const core = `${shown} \u00b1 ${pair.spread}`;
  return {
    value: shown,
    spread: pair.spread,
    exponent: pair.exponent,
    text: withPower(pair.exponent === null ? core : `(${core})`, pair.exponent),
  };
}

function withPower(core: string, exponent: number | null): string {
  return exponent === null ? core : `${core} \u00d7 10^${withTrueMinus(String(exponent))}`;
}
