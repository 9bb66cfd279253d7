import { isBlank, parseNumber } from '../number-cell';
import type { TextLines } from '../text-lines';
import type { Gap, ReaderWarning } from '../types';
import { NumberList } from './number-list';
import { dataEnd } from './records';
import { GAP_WORD, type TableProfile } from './table-profile';

export interface Pairs {
  readonly x: NumberList;
  readonly y: NumberList;
  readonly gaps: Map<number, Omit<Gap, 'index'>>;
  readonly warnings: ReaderWarning[];
}

/**
 * Decode (XY..XY): numbers two by two, parted by comma, semicolon or blank. A pair does not cross a line, so that a
 * number too many or too few spoils its own line only.
 */
export function decodePairs(lines: TextLines, from: number, to: number, profile: TableProfile): Pairs {
  const pairs: Pairs = { x: new NumberList(), y: new NumberList(), gaps: new Map(), warnings: [] };
  const mark = profile.decimalComma ? 44 : 46;
  if (profile.decimalComma) {
    const message =
      'The numbers are written with decimal commas, which the format does not allow; they were read as such';
    pairs.warnings.push({ code: 'DECIMAL_COMMA', message, line: from + 1 });
  }
  for (let line = from; line < to; line++) readPairLine(lines, line, mark, pairs);
  return pairs;
}

function readPairLine(lines: TextLines, line: number, mark: number, pairs: Pairs): void {
  const { text } = lines;
  const end = dataEnd(lines, line);
  let at = lines.start[line] ?? 0;
  let x: number | undefined;
  while (at < end) {
    const code = text.charCodeAt(at);
    if (isBlank(code) || code === 59 || code === 40 || code === 41 || (code === 44 && mark !== 44)) {
      at += 1;
      continue;
    }
    let stop = at + 1;
    while (stop < end && !endsNumber(text.charCodeAt(stop), mark)) stop += 1;
    const number = parseNumber(text, at, stop, mark);
    if (x === undefined) {
      if (Number.isNaN(number)) {
        warn(
          pairs,
          'TABLE_LINE',
          `Line ${line + 1} holds "${text.slice(at, Math.min(stop, at + 20))}" where a wavelength is due; the rest of the line was left out`,
          line,
        );
        return;
      }
      x = number;
    } else {
      addPair(pairs, x, number, text.slice(at, Math.min(stop, at + 24)), line);
      x = undefined;
    }
    at = stop;
  }
  if (x !== undefined) {
    pairs.gaps.set(pairs.y.length, { reason: 'missing', text: '' });
    pairs.x.push(x);
    pairs.y.push(NaN);
    warn(
      pairs,
      'PAIR_INCOMPLETE',
      `Line ${line + 1} ends with ${x} and no ordinate; the point became a gap`,
      line,
    );
  }
}

function endsNumber(code: number, mark: number): boolean {
  return isBlank(code) || code === 59 || code === 41 || (code === 44 && mark !== 44);
}

function addPair(pairs: Pairs, x: number, y: number, text: string, line: number): void {
  if (Number.isNaN(y)) {
    const known = text === '?' || GAP_WORD.test(text);
    const reason = /^\+?(?:inf|ov)/i.test(text) ? 'aboveRange' : known ? 'missing' : 'unreadable';
    pairs.gaps.set(pairs.y.length, { reason, text });
    if (!known)
      warn(
        pairs,
        'ILLEGAL_CHARACTER',
        `Line ${line + 1} holds "${text}" where an ordinate is due; the point became a gap`,
        line,
      );
  }
  pairs.x.push(x);
  pairs.y.push(y);
}

function warn(pairs: Pairs, code: string, message: string, line: number): void {
  if (pairs.warnings.length < 200) pairs.warnings.push({ code, message, line: line + 1 });
}
