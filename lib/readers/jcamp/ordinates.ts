import { isBlank, parseNumber } from '../number-cell';
import type { TextLines } from '../text-lines';
import type { Gap, GapReason, ReaderWarning } from '../types';
import { NumberList } from './number-list';
import {
  differenceDigit,
  duplicate,
  halfUnit,
  isNumberStart,
  packedNumber,
  squeezed,
  startsToken,
} from './packed-digits';
import { dataEnd } from './records';
import { GAP_WORD, type TableProfile } from './table-profile';

/** One line of a table (X++(Y..Y)): its abscissa as written and the place of its first new ordinate. */
export interface TableLine {
  readonly line: number;
  readonly abscissa: number;
  /** Half a unit of the last digit that the abscissa is written with. */
  readonly rounding: number;
  readonly firstIndex: number;
  /** The line begins with a y-check, which repeats the ordinate before `firstIndex`. */
  readonly checked: boolean;
  readonly damaged: boolean;
}

export interface Ordinates {
  /** As written, before YFACTOR; NaN is a gap. */
  readonly raw: NumberList;
  readonly gaps: Map<number, Omit<Gap, 'index'>>;
  readonly lines: TableLine[];
  readonly warnings: ReaderWarning[];
}

/** A run of equal ordinates may make a table longer than its text, but not without end. */
export const POINTS_PER_BYTE = 32;

/**
 * Decode the ordinates of (X++(Y..Y)) in any of the forms AFFN, PAC, SQZ, DIF, DUP, mixed as they come.
 *
 * SQZ  @ABCDEFGHI abcdefghi   first digit with its sign
 * DIF  %JKLMNOPQR jklmnopqr   first digit of the difference to the ordinate before
 * DUP  STUVWXYZs              how often the ordinate (or difference) before stands, itself included
 *
 * After a line that ends in difference form the next line's first ordinate repeats the last one: a y-check. The
 * decoded point stays as it is; the check is the base of the differences that follow, so that damage stays on
 * its line.
 *
 * @source J. G. Grasselli, JCAMP-DX for IR, Appl. Spectrosc. 42 (1988) 151, section 5; version 4.24
 */
export function decodeOrdinates(
  lines: TextLines,
  from: number,
  to: number,
  profile: TableProfile,
): Ordinates {
  const decoder = new OrdinateDecoder(lines, profile);
  for (let line = from; line < to; line++) decoder.readLine(line);
  return decoder.result();
}

type Form = 'none' | 'absolute' | 'difference' | 'gap';

class OrdinateDecoder {
  private readonly raw = new NumberList();
  private readonly gaps = new Map<number, Omit<Gap, 'index'>>();
  private readonly tableLines: TableLine[] = [];
  private readonly warnings: ReaderWarning[] = [];
  private readonly mark: number;
  private readonly most: number;
  private value = NaN;
  private difference = 0;
  private form: Form = 'none';
  private gapNow: Omit<Gap, 'index'> = { reason: 'missing', text: '?' };
  private checkDue = false;
  private damaged = false;

  constructor(
    private readonly lines: TextLines,
    private readonly profile: TableProfile,
  ) {
    this.mark = profile.decimalComma ? 44 : 46;
    this.most = 1024 + POINTS_PER_BYTE * profile.bytes;
  }

  result(): Ordinates {
    return { raw: this.raw, gaps: this.gaps, lines: this.tableLines, warnings: this.warnings };
  }

  readLine(line: number): void {
    const { text } = this.lines;
    const end = dataEnd(this.lines, line);
    let at = this.lines.start[line] ?? 0;
    while (at < end && isBlank(text.charCodeAt(at))) at += 1;
    if (at >= end) return;
    const stop = this.numberEnd(at, end);
    const abscissa = parseNumber(text, at, stop, this.mark);
    if (stop === at || Number.isNaN(abscissa)) {
      this.warn(
        'TABLE_LINE',
        `Line ${line + 1} lies inside the table but has no abscissa; it was left out`,
        line,
      );
      this.checkDue = this.form === 'difference';
      return;
    }
    this.checkDue = this.form === 'difference';
    this.damaged = false;
    const checked = this.checkDue;
    const firstIndex = this.raw.length;
    this.readOrdinates(stop, end, line);
    const rounding = halfUnit(text, at, stop, this.mark);
    this.tableLines.push({ line, abscissa, rounding, firstIndex, checked, damaged: this.damaged });
  }

  private readOrdinates(from: number, end: number, line: number): void {
    const { text } = this.lines;
    let at = from;
    let glued = false;
    while (at < end) {
      const code = text.charCodeAt(at);
      if (isBlank(code) || code === 59 || (code === 44 && this.mark !== 44)) {
        at += 1;
        glued = false;
        continue;
      }
      const next = this.readToken(code, at, end, line);
      if (next > at) {
        at = next;
        glued = true;
        continue;
      }
      at = this.readDamage(at, end, line, glued);
      glued = false;
    }
  }

  /** Read one ordinate or repeat count; returns its end, or `at` when nothing legal stands there. */
  private readToken(code: number, at: number, end: number, line: number): number {
    const { text } = this.lines;
    if (code === 63) {
      this.addGap('missing', '?');
      return at + 1;
    }
    if (isNumberStart(code)) {
      const word = code === 43 || code === 45 ? GAP_WORD.exec(text.slice(at, at + 12)) : null;
      if (word) return this.addWord(word[0], at);
      const stop = this.numberEnd(at, end);
      const number = parseNumber(text, at, stop, this.mark);
      if (Number.isNaN(number)) return at;
      this.addAbsolute(number, line);
      return stop;
    }
    const before = text.charCodeAt(at - 1);
    if (isBlank(before) || before === 44 || before === 59) {
      const word = GAP_WORD.exec(text.slice(at, at + 12));
      if (word) return this.addWord(word[0], at);
    }
    return this.readPacked(code, at, end, line);
  }

  private readPacked(code: number, at: number, end: number, line: number): number {
    const { text } = this.lines;
    const stop = this.digitsEnd(at + 1, end);
    const lead = squeezed(code);
    if (lead !== undefined) {
      this.addAbsolute(packedNumber(lead, text, at + 1, stop), line);
      return stop;
    }
    const change = differenceDigit(code);
    if (change !== undefined) {
      this.difference = packedNumber(change, text, at + 1, stop);
      this.checkDue = false;
      this.add(this.value + this.difference);
      this.form = 'difference';
      return stop;
    }
    const times = duplicate(code);
    if (times === undefined || this.form === 'none') return at;
    this.repeat(packedNumber(times, text, at + 1, stop) - 1, line);
    return stop;
  }

  private addAbsolute(number: number, line: number): void {
    this.form = 'absolute';
    if (!this.checkDue) {
      this.value = number;
      this.add(number);
      return;
    }
    this.checkDue = false;
    const expected = this.value;
    this.value = number;
    if (Number.isNaN(expected) || expected === number) return;
    const previous = this.tableLines[this.tableLines.length - 1];
    const since = previous ? ` and the points of line ${previous.line + 1} may be wrong` : '';
    this.warn(
      'Y_CHECK',
      `Line ${line + 1} begins with the check ${number}, but the ordinate before it was decoded as ${expected}: one of the two is damaged${since}`,
      line,
    );
  }

  private add(value: number): void {
    this.value = value;
    if (Number.isNaN(value)) this.gaps.set(this.raw.length, this.gapNow);
    this.raw.push(value);
  }

  private addGap(reason: GapReason, text: string): void {
    this.gapNow = { reason, text };
    this.checkDue = false;
    this.form = 'gap';
    this.add(NaN);
  }

  private addWord(word: string, at: number): number {
    const above = /^\+?(?:inf|ov)/i.test(word);
    this.addGap(above ? 'aboveRange' : 'missing', word);
    return at + word.length;
  }

  private repeat(more: number, line: number): void {
    this.checkDue = false;
    if (!(more >= 0) || this.raw.length + more > this.most) {
      this.warn(
        'DUP_TOO_LONG',
        `Line ${line + 1} repeats an ordinate ${more + 1} times, which the table is too short for; the count was not followed`,
        line,
      );
      this.damaged = true;
      return;
    }
    const step = this.form === 'difference' ? this.difference : 0;
    for (let i = 0; i < more; i++) this.add(this.value + step);
  }

  /** A character that no form knows: the ordinate it stands in, and all that builds on it, become gaps. */
  private readDamage(at: number, end: number, line: number, glued: boolean): number {
    const { text } = this.lines;
    let stop = at + 1;
    while (stop < end && !isBlank(text.charCodeAt(stop)) && !startsToken(text.charCodeAt(stop))) stop += 1;
    const seen = text.slice(at, Math.min(stop, at + 12));
    this.warn(
      'ILLEGAL_CHARACTER',
      `Line ${line + 1} holds "${seen}", which is no number in any form of this format; what depends on it became gaps`,
      line,
    );
    this.damaged = true;
    if (glued && this.raw.length > 0) {
      this.gapNow = { reason: 'unreadable', text: seen };
      this.gaps.set(this.raw.length - 1, this.gapNow);
      this.raw.set(this.raw.length - 1, NaN);
      this.value = NaN;
      this.form = 'gap';
    } else this.addGap('unreadable', seen);
    return stop;
  }

  private warn(code: string, message: string, line: number): void {
    if (this.warnings.length < 200) this.warnings.push({ code, message, line: line + 1 });
  }

  private digitsEnd(at: number, end: number): number {
    const { text } = this.lines;
    let stop = at;
    while (stop < end) {
      const code = text.charCodeAt(stop);
      if (!(code >= 48 && code <= 57) && code !== this.mark) break;
      stop += 1;
    }
    return stop;
  }

  private numberEnd(at: number, end: number): number {
    const { text } = this.lines;
    const signed = text.charCodeAt(at) === 43 || text.charCodeAt(at) === 45 ? 1 : 0;
    const stop = this.digitsEnd(at + signed, end);
    const letter = text.charCodeAt(stop) | 32;
    if (stop >= end || stop === at + signed || (letter !== 101 && letter !== 100)) return stop;
    const sign = text.charCodeAt(stop + 1);
    const isSigned = sign === 43 || sign === 45;
    if (!isSigned && (!this.profile.exponents || letter === 100)) return stop;
    const digits = stop + 1 + (isSigned ? 1 : 0);
    let last = digits;
    while (last < end && text.charCodeAt(last) >= 48 && text.charCodeAt(last) <= 57) last += 1;
    return last > digits ? last : stop;
  }
}
