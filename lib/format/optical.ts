import { significantText, toDecimals } from './round';

const ABSORBANCE_DECIMALS = 4;

const trueMinus = (text: string) => text.replace('-', '\u2212');

/** An absorbance as read, to the fourth decimal: 0.0994. */
export function absorbanceText(absorbance: number): string {
  return trueMinus(toDecimals(absorbance, ABSORBANCE_DECIMALS));
}

/** T = 10^-A in per cent: one decimal, and two significant digits below one per cent: 79.5 %, 0.39 %. */
export function lightThroughText(absorbance: number): string {
  const percent = 100 * 10 ** -absorbance;
  return `${percent >= 1 ? toDecimals(percent, 1) : significantText(percent, 2)} %`;
}

/** A wavelength without trailing zeros: 510, 509.5. */
export function nmText(nm: number): string {
  return String(Number(toDecimals(nm, 2)));
}

/** "400–700 nm", or "510 nm" when both ends are the same. */
export function nmRangeText(fromNm: number, toNm: number): string {
  const [from, to] = [nmText(fromNm), nmText(toNm)];
  return from === to ? `${from} nm` : `${from}\u2013${to} nm`;
}

/** 512 bytes, 3.4 kB, 12 MB. */
export function sizeText(bytes: number): string {
  if (bytes < 1000) return `${bytes} ${bytes === 1 ? 'byte' : 'bytes'}`;
  const [value, unit] = bytes < 1e6 ? [bytes / 1e3, 'kB'] : [bytes / 1e6, 'MB'];
  return `${value < 10 ? toDecimals(value, 1) : toDecimals(value, 0)} ${unit}`;
}
