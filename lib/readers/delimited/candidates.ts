import { COMMA, gapReason, parseNumber, POINT, singleGroup } from '../number-cell';
import type { TextLines } from '../text-lines';
import type { Delimiter, ReadOptions } from '../types';
import { splitCells } from './split-cells';

/** One way to read a table: a delimiter together with a decimal mark. */
export interface Dialect {
  readonly delimiter: Delimiter;
  readonly decimalMark: '.' | ',';
}

export const markCode = (dialect: Dialect): number => (dialect.decimalMark === ',' ? COMMA : POINT);

/** What the lines of each shape are under one dialect. */
export interface ShapeViews {
  readonly fields: Int32Array;
  readonly numbers: Int32Array;
  /** Cells with digits and a mark or delimiter of another dialect left inside. */
  readonly messy: Int32Array;
  /** Which cells are text: rows of one table agree in it. */
  readonly mask: Int32Array;
  readonly isRow: Uint8Array;
  readonly isEmpty: Uint8Array;
  /** Characters looked at. */
  readonly looked: number;
}

const DELIMITERS: readonly Delimiter[] = ['tab', ';', '|', ',', 'blank', 'fixed'];

/** The dialects worth trying: those whose delimiter and mark occur at all, narrowed by the person's word. */
export function candidateDialects(text: string, options: ReadOptions): Dialect[] {
  const occurs: Record<Delimiter, boolean> = {
    tab: text.includes('\t'),
    ';': text.includes(';'),
    '|': text.includes('|'),
    ',': text.includes(','),
    blank: true,
    fixed: /[\d.][+-][\d.]/.test(text),
  };
  const marks = text.includes(',') ? (['.', ','] as const) : (['.'] as const);
  const dialects: Dialect[] = [];
  for (const delimiter of options.delimiter ? [options.delimiter] : DELIMITERS) {
    if (!options.delimiter && !occurs[delimiter]) continue;
    for (const decimalMark of options.decimalMark ? [options.decimalMark] : marks)
      dialects.push({ delimiter, decimalMark });
  }
  return dialects;
}

/** Look at one line of each shape as a dialect would read it. */
export function viewShapes(lines: TextLines, dialect: Dialect, minNumbers: number): ShapeViews {
  const n = lines.shapeLine.length;
  const looked = lines.shapeLine.reduce(
    (sum, line) => sum + (lines.end[line] ?? 0) - (lines.start[line] ?? 0),
    0,
  );
  const views: ShapeViews = {
    looked,
    fields: new Int32Array(n),
    numbers: new Int32Array(n),
    messy: new Int32Array(n),
    mask: new Int32Array(n),
    isRow: new Uint8Array(n),
    isEmpty: new Uint8Array(n),
  };
  const bounds: number[] = [];
  for (let shape = 0; shape < n; shape++) viewShape(lines, dialect, shape, views, bounds, minNumbers);
  return views;
}

function viewShape(
  lines: TextLines,
  dialect: Dialect,
  shape: number,
  views: ShapeViews,
  bounds: number[],
  minNumbers: number,
): void {
  const { text } = lines;
  const line = lines.shapeLine[shape] ?? 0;
  const fields = splitCells(text, lines.start[line] ?? 0, lines.end[line] ?? 0, dialect.delimiter, bounds);
  const mark = markCode(dialect);
  let numbers = 0;
  let missing = 0;
  let filled = 0;
  let messy = 0;
  let mask = 17;
  for (let cell = 0; cell < fields; cell++) {
    const [start = 0, end = 0] = [bounds[2 * cell], bounds[2 * cell + 1]];
    if (
      !Number.isNaN(parseNumber(text, start, end, mark)) ||
      (end - start < 12 && !Number.isNaN(singleGroup(text.slice(start, end), mark)))
    ) {
      numbers += 1;
      filled += 1;
      mask = Math.imul(mask, 31);
      continue;
    }
    const content = text.slice(start, Math.min(end, start + 60));
    const word = content.trim();
    if (word !== '') filled += 1;
    const isGap = gapReason(word) !== 'unreadable';
    if (isGap) missing += 1;
    else if (/\d/.test(word) && /[\d"'][\s,;|]+[-+.\d"']|[.,]\d/.test(word)) messy += 1;
    mask = (Math.imul(mask, 31) + (isGap ? 0 : 1)) | 0;
  }
  views.fields[shape] = fields;
  views.numbers[shape] = numbers;
  views.messy[shape] = messy;
  views.mask[shape] = mask;
  views.isEmpty[shape] = filled === 0 ? 1 : 0;
  const enough = numbers >= minNumbers || (numbers >= 1 && missing >= 1 && minNumbers > 1);
  views.isRow[shape] = fields >= minNumbers && enough ? 1 : 0;
}
