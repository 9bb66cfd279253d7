import { isBlank } from './number-cell';

/** Where the lines of a text lie, and which of them look alike. */
export interface TextLines {
  readonly text: string;
  readonly count: number;
  readonly start: Int32Array;
  readonly end: Int32Array;
  /** Lines with the same characters but for the digits share a shape; what is decided for one holds for all. */
  readonly shape: Int32Array;
  /** The first line of each shape. */
  readonly shapeLine: readonly number[];
}

const LF = 10;
const CR = 13;

/**
 * Split on CRLF, LFCR, LF or CR, in one pass that also gives every line its shape: runs of digits count as one
 * digit, runs of blanks as one blank. A table of ten thousand rows has a handful of shapes, so that trying
 * every delimiter and decimal mark on the whole table costs little more than trying them on a few lines.
 */
export function splitLines(text: string): TextLines {
  let capacity = 1024;
  let start = new Int32Array(capacity);
  let end = new Int32Array(capacity);
  let shape = new Int32Array(capacity);
  const shapes = new Map<number, number>();
  const shapeLine: number[] = [];
  const length = text.length;
  let count = 0;
  let at = 0;
  while (at < length) {
    if (count === capacity) {
      capacity *= 2;
      start = grown(start, capacity);
      end = grown(end, capacity);
      shape = grown(shape, capacity);
    }
    start[count] = at;
    let h1 = 0x811c9dc5;
    let h2 = 7;
    let before = 0;
    let code = 0;
    for (; at < length; at++) {
      code = text.charCodeAt(at);
      if (code === LF || code === CR) break;
      const kind = code >= 48 && code <= 57 ? 48 : code !== 9 && isBlank(code) ? 32 : code;
      if (kind === before && (kind === 48 || kind === 32)) continue;
      before = kind;
      h1 = Math.imul(h1 ^ kind, 0x01000193);
      h2 = (Math.imul(h2, 31) + kind) | 0;
    }
    end[count] = at;
    const key = (h1 >>> 0) * 0x200000 + (h2 & 0x1fffff);
    let id = shapes.get(key);
    if (id === undefined) {
      id = shapeLine.length;
      shapes.set(key, id);
      shapeLine.push(count);
    }
    shape[count] = id;
    count += 1;
    if (at < length) {
      const next = at + 1 < length ? text.charCodeAt(at + 1) : 0;
      at += (code === CR && next === LF) || (code === LF && next === CR) ? 2 : 1;
    }
  }
  return { text, count, start, end, shape, shapeLine };
}

function grown(old: Int32Array<ArrayBuffer>, capacity: number): Int32Array<ArrayBuffer> {
  const bigger = new Int32Array(capacity);
  bigger.set(old);
  return bigger;
}

/** The text of one line. */
export function lineText(lines: TextLines, line: number): string {
  return lines.text.slice(lines.start[line] ?? 0, lines.end[line] ?? 0);
}

/** The text of the lines [from, to), as it stands in the file. */
export function linesText(lines: TextLines, from: number, to: number): string {
  if (to <= from) return '';
  return lines.text.slice(lines.start[from] ?? 0, lines.end[to - 1] ?? 0);
}
