import { gapReason, parseNumber, singleGroup } from '../number-cell';
import type { TextLines } from '../text-lines';
import type { GapReason } from '../types';
import { markCode, type Dialect } from './candidates';
import type { MergedBlock } from './merge-blocks';
import { splitCells } from './split-cells';

/** A cell that holds no number. */
export interface OddCell {
  readonly reason: GapReason;
  readonly text: string;
}

/** One column of a table: its numbers, NaN where a cell holds none, and what stands there instead. */
export interface NumberColumn {
  readonly values: Float64Array;
  readonly odd: ReadonlyMap<number, OddCell>;
  readonly numbers: number;
  /** Cells with words that are no word for a missing reading. */
  readonly texts: number;
}

export interface NumberTable {
  /** Line of each row, from 0. */
  readonly rows: readonly number[];
  readonly columns: readonly NumberColumn[];
  /** Rows with more or fewer cells than the table has columns. */
  readonly ragged: readonly number[];
}

interface OpenColumn {
  values: Float64Array;
  odd: Map<number, OddCell>;
  numbers: number;
  texts: number;
}

/** Read every cell of a block as the dialect says. */
export function readNumbers(
  lines: TextLines,
  block: MergedBlock,
  dialect: Dialect,
  onSteps?: (steps: number) => void,
): NumberTable {
  const { rows, fields } = block;
  const columns: OpenColumn[] = Array.from({ length: fields }, () => ({
    values: new Float64Array(rows.length),
    odd: new Map(),
    numbers: 0,
    texts: 0,
  }));
  const ragged: number[] = [];
  const cutAt = dialect.delimiter === 'fixed' ? fieldEnds(lines, block, dialect, onSteps) : undefined;
  const mark = markCode(dialect);
  const bounds: number[] = [];
  let looked = 0;
  for (let row = 0; row < rows.length; row++) {
    const line = rows[row] ?? 0;
    const start = lines.start[line] ?? 0;
    const end = lines.end[line] ?? 0;
    looked += end - start + fields;
    const count = cutAt
      ? splitAt(start, end, cutAt, bounds)
      : splitCells(lines.text, start, end, dialect.delimiter, bounds);
    if (count !== fields) ragged.push(line);
    for (let cell = 0; cell < fields; cell++) {
      const column = columns[cell];
      if (column) readCell(lines.text, cell < count ? bounds : undefined, cell, mark, column, row);
    }
  }
  for (const column of columns) takeGroups(column, mark);
  onSteps?.(looked);
  return { rows, columns, ragged };
}

/** Numbers with one group of three are numbers where every cell of the column is one, or too small to need a group. */
function takeGroups(column: OpenColumn, mark: number): void {
  if (column.texts === 0) return;
  const grouped = new Map<number, number>();
  for (const [row, odd] of column.odd) {
    if (odd.reason !== 'unreadable') continue;
    const value = singleGroup(odd.text, mark);
    if (Number.isNaN(value)) return;
    grouped.set(row, value);
  }
  if (!column.values.every((value) => Number.isNaN(value) || (value < 1000 && Number.isInteger(value))))
    return;
  for (const [row, value] of grouped) {
    column.values[row] = value;
    column.odd.delete(row);
  }
  column.numbers += grouped.size;
  column.texts = 0;
}

function readCell(
  text: string,
  bounds: readonly number[] | undefined,
  cell: number,
  mark: number,
  column: OpenColumn,
  row: number,
): void {
  const start = bounds?.[2 * cell] ?? 0;
  const end = bounds?.[2 * cell + 1] ?? 0;
  const value = parseNumber(text, start, end, mark);
  column.values[row] = value;
  if (!Number.isNaN(value)) {
    column.numbers += 1;
    return;
  }
  const content = text.slice(start, Math.min(end, start + 80)).trim();
  const reason = gapReason(content);
  if (reason === 'unreadable') column.texts += 1;
  column.odd.set(row, { reason, text: content });
}

/**
 * Where the fields of a fixed-width table end, counted from the line's start: numbers are set flush right, so that
 * their ends stand one below the other, whether or not a number fills its field.
 */
function fieldEnds(
  lines: TextLines,
  block: MergedBlock,
  dialect: Dialect,
  onSteps?: (steps: number) => void,
): number[] | undefined {
  const bounds: number[] = [];
  let ends: number[] | undefined;
  for (const line of block.rows) {
    const start = lines.start[line] ?? 0;
    const end = lines.end[line] ?? 0;
    onSteps?.(end - start);
    const count = splitCells(lines.text, start, end, dialect.delimiter, bounds);
    if (count !== block.fields) continue;
    const these = Array.from({ length: count }, (_, cell) => (bounds[2 * cell + 1] ?? 0) - start);
    if (ends && these.some((end, i) => end !== ends?.[i])) return undefined;
    ends = these;
  }
  return ends;
}

function splitAt(start: number, end: number, ends: readonly number[], out: number[]): number {
  let from = start;
  for (let cell = 0; cell < ends.length; cell++) {
    const to = cell === ends.length - 1 ? end : Math.min(end, start + (ends[cell] ?? 0));
    out[2 * cell] = from;
    out[2 * cell + 1] = Math.max(from, to);
    from = Math.max(from, to);
  }
  return ends.length;
}
