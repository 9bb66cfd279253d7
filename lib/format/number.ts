import { significantText, toDecimals } from './round';

/** The minus sign of print, which has the width of a plus. Plain text for computers keeps the ASCII one. */
export const TRUE_MINUS = '\u2212';

export function withTrueMinus(text: string): string {
  return text.replace(/^-/, TRUE_MINUS);
}

/** `x` to so many significant digits, trailing zeros kept up to the point: 0.1981, 1.200, 55845. */
export function formatNumber(x: number, digits: number): string {
  const exponent =
    x === 0
      ? 0
      : Number(
          Math.abs(x)
            .toExponential(digits - 1)
            .split('e')[1],
        );
  if (exponent < -5 || exponent > 9) return withTrueMinus(significantText(x, digits));
  return withTrueMinus(toDecimals(x, digits - 1 - exponent));
}

/** `x` with so many decimals. */
export function formatDecimals(x: number, decimals: number): string {
  return withTrueMinus(toDecimals(x, decimals));
}

/** A number that is a per cent already: 3.05 %. */
export function formatPercent(percent: number, decimals = 1): string {
  return `${formatDecimals(percent, decimals)} %`;
}

export interface PointAligned {
  /** Up to the point, and from the point on. */
  readonly before: string;
  readonly after: string;
  /** Characters to leave free on either side so that the points of the column stand below each other. */
  readonly padBefore: number;
  readonly padAfter: number;
}

/** Split the numbers of a column at their decimal points; what is no number stands left of the point. */
export function alignAtPoint(texts: readonly string[]): readonly PointAligned[] {
  const parts = texts.map((text) => {
    const point = text.indexOf('.');
    return point < 0
      ? { before: text, after: '' }
      : { before: text.slice(0, point), after: text.slice(point) };
  });
  const before = Math.max(0, ...parts.map((part) => part.before.length));
  const after = Math.max(0, ...parts.map((part) => part.after.length));
  return parts.map((part) => ({
    ...part,
    padBefore: before - part.before.length,
    padAfter: after - part.after.length,
  }));
}
