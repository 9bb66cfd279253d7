import type { GapReason } from './types';

export const POINT = 46;
export const COMMA = 44;

const POWERS = Float64Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));
/** Most significant digits that a double holds exactly, whatever they are. */
const EXACT_DIGITS = 15;

/** Blanks of every width, including the no-break and narrow ones that stand in exported tables. */
export function isBlank(code: number): boolean {
  return (
    code <= 32 || code === 0xa0 || code === 0x202f || code === 0xfeff || (code >= 0x2000 && code <= 0x200b)
  );
}

function isMinus(code: number): boolean {
  return code === 45 || code === 0x2212 || code === 0x2013;
}

/**
 * The number in text[start, end), or NaN when it is none. `mark` is the decimal mark's character code.
 *
 * Blanks and quotes around it are ignored; E and D exponents, ".5", "5." and the minus sign U+2212 are taken.
 * Up to 15 digits m and a power of ten up to 22 the value is m / 10^k or m · 10^k: both operands are exact
 * doubles and IEEE division rounds once, so the bits are those of Number() (W. D. Clinger, PLDI 1990).
 */
export function parseNumber(text: string, start: number, end: number, mark: number): number {
  let i = start;
  let last = end;
  while (i < last && skippable(text.charCodeAt(i))) i += 1;
  while (last > i && skippable(text.charCodeAt(last - 1))) last -= 1;
  if (i === last) return NaN;
  const from = i;
  let code = text.charCodeAt(i);
  const negative = isMinus(code);
  if (negative || code === 43) i += 1;

  let mantissa = 0;
  let digits = 0;
  let seen = 0;
  let decimals = 0;
  let marked = false;
  for (; i < last; i++) {
    code = text.charCodeAt(i);
    if (code >= 48 && code <= 57) {
      seen += 1;
      if (marked) decimals += 1;
      if (digits > 0 || code !== 48) digits += 1;
      if (digits <= EXACT_DIGITS) mantissa = mantissa * 10 + (code - 48);
    } else if (code === mark && !marked) marked = true;
    else break;
  }
  if (seen === 0) return NaN;
  let exponent = 0;
  if (i < last) {
    exponent = exponentAt(text, i, last);
    if (Number.isNaN(exponent)) return groupedNumber(text.slice(from, last), mark);
  }
  const power = exponent - decimals;
  if (digits > EXACT_DIGITS || power > 22 || power < -22) return slowNumber(text.slice(from, last), mark);
  const size = power < 0 ? mantissa / (POWERS[-power] ?? NaN) : mantissa * (POWERS[power] ?? NaN);
  return negative ? -size : size;
}

function skippable(code: number): boolean {
  return code === 34 || code === 39 || isBlank(code);
}

function exponentAt(text: string, at: number, end: number): number {
  const letter = text.charCodeAt(at) | 32;
  if (letter !== 101 && letter !== 100) return NaN;
  let i = at + 1;
  const sign = i < end ? text.charCodeAt(i) : 0;
  const negative = isMinus(sign);
  if (negative || sign === 43) i += 1;
  if (i >= end || end - i > 4) return NaN;
  let value = 0;
  for (; i < end; i++) {
    const code = text.charCodeAt(i);
    if (code < 48 || code > 57) return NaN;
    value = value * 10 + (code - 48);
  }
  return negative ? -value : value;
}

function slowNumber(cell: string, mark: number): number {
  const plain = mark === COMMA ? cell.replace(',', '.') : cell;
  const value = Number(plain.replace(/[\u2212\u2013]/g, '-').replace(/[dD]/, 'e'));
  // "1e999" is no reading of anything.
  return Number.isFinite(value) ? value : NaN;
}

/** Numbers grouped by threes. One lone group ("1,234") may be a decimal mark as well and is not taken. */
function groupedNumber(cell: string, mark: number): number {
  if (cell.length > 40) return NaN;
  const byPoint = mark === POINT;
  const grouped = byPoint
    ? /^[+\-\u2212]?\d{1,3}(?:(?:,\d{3})+\.\d+|(?:,\d{3}){2,}|(?:[\u00a0\u202f ']\d{3})+(?:\.\d+)?)$/
    : /^[+\-\u2212]?\d{1,3}(?:(?:\.\d{3})+,\d+|(?:\.\d{3}){2,}|(?:[\u00a0\u202f ']\d{3})+(?:,\d+)?)$/;
  if (!grouped.test(cell)) return NaN;
  return slowNumber(cell.replace(byPoint ? /[,\u00a0\u202f ']/g : /[.\u00a0\u202f ']/g, ''), mark);
}

/**
 * A number of one group of three ("12,500" beside a decimal point), or NaN. Alone it may as well be a decimal, so that it
 * is to be taken only where a whole column is written so.
 */
export function singleGroup(cell: string, mark: number): number {
  const grouped = mark === POINT ? /^[1-9]\d{0,2},\d{3}$/ : /^[1-9]\d{0,2}\.\d{3}$/;
  const word = cell.replace(/^["'\s]+|["'\s]+$/g, '');
  return word.length < 12 && grouped.test(word) ? Number(word.replace(/[.,]/, '')) : NaN;
}

const MISSING =
  /^(?:|n\/?a|#n\/a|#?nan|null|none|nil|n\.?d\.?|-{1,4}|[\u2013\u2014]|\*{1,3}|\?{1,3}|\.|missing|blank|#value!|#div\/0!|#ref!)$/i;
const ABOVE =
  /^(?:over(?:flow|range| range)?|ov(?:r?fl)w?|ovrflw|ovr|sat(?:\.|urated)?|\+?inf(?:inity)?|1\.#inf|>\s*[\d.,]*|\*{4,}|#{3,})$/i;
const BELOW = /^(?:under(?:flow|range| range)?|undr|-inf(?:inity)?|-1\.#inf|<\s*-?[\d.,]*)$/i;

/** Why a cell without a number holds none; `unreadable` when its words are not among those in use. */
export function gapReason(cell: string): GapReason {
  if (cell.length > 24) return 'unreadable';
  const word = cell.replace(/^["'\s\u00a0\u202f]+|["'\s\u00a0\u202f]+$/g, '');
  if (MISSING.test(word)) return 'missing';
  if (ABOVE.test(word)) return 'aboveRange';
  if (BELOW.test(word)) return 'belowRange';
  return 'unreadable';
}
