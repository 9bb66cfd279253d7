import { withTrueMinus } from './number';
import { significantText, toDecimals } from './round';

/** Above it a further digit would be below what a number of 53 bits carries. */
const DIGITS_CARRIED = 15;

/**
 * `x` written as a printed number is, so that the two can be compared by eye: the same decimals and one more where
 * the number carries it, or the same power of ten (0.4297E-03).
 */
export function formatLikePrinted(x: number, printed: string): string {
  const [mantissa = '', exponent] = printed.split('E');
  const decimals = mantissa.split('.')[1]?.length ?? 0;
  if (exponent !== undefined) return withTrueMinus(withExponent(x, decimals, exponent));
  const significant = mantissa.replace(/[^\d]/g, '').replace(/^0+/, '').length;
  const whole = decimals === 0 && Number.isInteger(x);
  return withTrueMinus(toDecimals(x, decimals + (whole || significant >= DIGITS_CARRIED ? 0 : 1)));
}

/** 0.ddd with a power of ten; as a plain number when it has another power than the printed one. */
function withExponent(x: number, digits: number, exponent: string): string {
  const [mantissa = '', power] = Math.abs(x)
    .toExponential(digits - 1)
    .split('e');
  if (Number(power) + 1 !== Number(exponent)) return significantText(x, digits);
  return `${x < 0 ? '-' : ''}0.${mantissa.replace('.', '')}E${exponent}`;
}
