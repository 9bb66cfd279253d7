import type { TextLines } from '../text-lines';
import { dataEnd } from './records';

/** How the numbers of a data table are written. */
export interface TableProfile {
  /** E and e are exponents: no other letter stands in the table, so they cannot be packed digits. */
  readonly exponents: boolean;
  /** Commas are decimal marks: tight between digits, beside other separators, and no point anywhere. */
  readonly decimalComma: boolean;
  readonly packed: boolean;
  readonly bytes: number;
}

const isDigit = (code: number): boolean => code >= 48 && code <= 57;

/** Look once over the whole table before its first number is read. */
export function tableProfile(lines: TextLines, from: number, to: number): TableProfile {
  const { text } = lines;
  let packedLetters = 0;
  let exponentLetters = 0;
  let points = 0;
  let tightCommas = 0;
  let looseCommas = 0;
  let otherSeparators = 0;
  for (let line = from; line < to; line++) {
    const end = dataEnd(lines, line);
    for (let i = lines.start[line] ?? 0; i < end; i++) {
      const code = text.charCodeAt(i);
      if (isDigit(code)) continue;
      const before = i > 0 ? text.charCodeAt(i - 1) : 0;
      const after = i + 1 < end ? text.charCodeAt(i + 1) : 0;
      if (code === 46) points += 1;
      else if (code === 44) {
        if (isDigit(before) && isDigit(after)) tightCommas += 1;
        else looseCommas += 1;
      } else if ((code === 32 || code === 9 || code === 59) && (isDigit(before) || before === 44)) {
        if (after !== 0 && after !== 10 && after !== 13) otherSeparators += 1;
      } else if (code === 69 || code === 101) {
        const signed = after === 43 || after === 45;
        if (!signed) exponentLetters += 1;
      } else if (
        (code === 37 || code === 64 || (code >= 65 && code <= 90) || (code >= 97 && code <= 115)) &&
        !inWord(text, i, end)
      ) {
        packedLetters += 1;
      }
    }
  }
  const bytes = to > from ? (lines.end[to - 1] ?? 0) - (lines.start[from] ?? 0) : 0;
  return {
    exponents: packedLetters === 0,
    decimalComma:
      tightCommas > 0 && looseCommas === 0 && points === 0 && otherSeparators > 0 && packedLetters === 0,
    packed: packedLetters + exponentLetters > 0 && packedLetters > 0,
    bytes,
  };
}

/** NaN, Inf and OVER are words of their own, not packed digits, when blanks or separators stand around them. */
export const GAP_WORD = /^(?:nan|[+-]?inf(?:inity)?|over(?:flow)?|ovrflw|n\/a|null|---?)(?=[\s,;]|$)/i;

function inWord(text: string, at: number, end: number): boolean {
  let start = at;
  while (start > 0 && at - start < 8 && /[a-z/]/i.test(text.charAt(start - 1))) start -= 1;
  if (start > 0 && isDigit(text.charCodeAt(start - 1))) return false;
  return GAP_WORD.test(text.slice(start, Math.min(end, start + 12)));
}
