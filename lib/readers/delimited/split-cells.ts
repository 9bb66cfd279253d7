import { isBlank } from '../number-cell';
import type { Delimiter } from '../types';

const QUOTE = 34;

export const DELIMITER_CODES: Record<Exclude<Delimiter, 'blank' | 'fixed'>, number> = {
  ',': 44,
  ';': 59,
  tab: 9,
  '|': 124,
};

/** Start and end of the cells of one line, written into `out` as pairs; returns how many cells there are. */
export function splitCells(
  text: string,
  start: number,
  end: number,
  delimiter: Delimiter,
  out: number[],
): number {
  if (delimiter === 'blank') return splitOnBlanks(text, start, end, out);
  if (delimiter === 'fixed') return splitTouching(text, start, end, out);
  return splitOn(text, start, end, DELIMITER_CODES[delimiter], out);
}

function splitOn(text: string, start: number, end: number, code: number, out: number[]): number {
  let count = 0;
  let from = start;
  let fresh = true;
  for (let i = start; i < end; i++) {
    const here = text.charCodeAt(i);
    if (here === code) {
      out[count++] = from;
      out[count++] = i;
      from = i + 1;
      fresh = true;
    } else if (fresh && here === QUOTE) {
      const close = closingQuote(text, i + 1, end, code);
      if (close > i) i = close;
      fresh = false;
    } else if (here !== 32) fresh = false;
  }
  out[count++] = from;
  out[count++] = end;
  return count / 2;
}

/** The quote that closes a cell: one that a delimiter or the line's end follows. */
function closingQuote(text: string, from: number, end: number, code: number): number {
  for (let i = from; i < end; i++) {
    if (text.charCodeAt(i) !== QUOTE) continue;
    if (text.charCodeAt(i + 1) === QUOTE && i + 1 < end) {
      i += 1;
      continue;
    }
    let after = i + 1;
    while (after < end && text.charCodeAt(after) === 32) after += 1;
    return after >= end || text.charCodeAt(after) === code ? i : -1;
  }
  return -1;
}

function splitOnBlanks(text: string, start: number, end: number, out: number[]): number {
  let count = 0;
  let i = start;
  while (i < end) {
    while (i < end && isBlank(text.charCodeAt(i))) i += 1;
    if (i >= end) break;
    out[count++] = i;
    if (text.charCodeAt(i) === QUOTE) {
      const close = text.indexOf('"', i + 1);
      i = close > i && close < end ? close + 1 : i + 1;
    }
    while (i < end && !isBlank(text.charCodeAt(i))) i += 1;
    out[count++] = i;
  }
  return count / 2;
}

/** Blanks, and a sign inside a token that no exponent letter stands before: numbers that fill their fields touch. */
function splitTouching(text: string, start: number, end: number, out: number[]): number {
  const tokens = splitOnBlanks(text, start, end, out);
  const bounds = out.slice(0, tokens * 2);
  let count = 0;
  for (let token = 0; token < tokens; token++) {
    const last = bounds[token * 2 + 1] ?? 0;
    let from = bounds[token * 2] ?? 0;
    for (let i = from + 1; i < last; i++) {
      const code = text.charCodeAt(i);
      if (code !== 45 && code !== 43) continue;
      const before = text.charCodeAt(i - 1);
      if (!(before >= 48 && before <= 57) && before !== 46) continue;
      out[count++] = from;
      out[count++] = i;
      from = i;
    }
    out[count++] = from;
    out[count++] = last;
  }
  return count / 2;
}

/** The cells of a line as trimmed text without their quotes: for headers and texts, not for numbers. */
export function cellTexts(text: string, start: number, end: number, delimiter: Delimiter): string[] {
  const bounds: number[] = [];
  const count = splitCells(text, start, end, delimiter, bounds);
  return Array.from({ length: count }, (_, i) =>
    plainCell(text.slice(bounds[2 * i] ?? 0, bounds[2 * i + 1] ?? 0)),
  );
}

export function plainCell(cell: string): string {
  const trimmed = cell.trim();
  const quoted = trimmed.length >= 2 && trimmed.startsWith('"') && trimmed.endsWith('"');
  return quoted ? trimmed.slice(1, -1).replace(/""/g, '"').trim() : trimmed;
}
