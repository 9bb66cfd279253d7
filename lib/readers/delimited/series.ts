import type { Gap, ReaderWarning } from '../types';
import type { NumberColumn } from './number-table';

/** One spectrum as a layout found it: still with the words of the file, before units are judged. */
export interface Series {
  readonly name: string;
  readonly xLabel: string;
  readonly yLabel: string;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly gaps: readonly Gap[];
  /** Line of the first point, from 0. */
  readonly line: number;
  readonly header: Readonly<Record<string, string>>;
  readonly warnings: readonly ReaderWarning[];
}

/** The points of two columns at the rows given: rows without x cannot be placed, rows without y are gaps. */
export function seriesPoints(
  x: NumberColumn,
  y: NumberColumn,
  rows: readonly number[] | undefined,
  lines: readonly number[],
): Pick<Series, 'x' | 'y' | 'gaps' | 'warnings'> {
  if (!rows && x.odd.size === 0 && y.odd.size === 0)
    return { x: x.values, y: y.values, gaps: [], warnings: [] };
  const places = rows ?? Array.from(x.values.keys());
  const kept = places.filter((row) => !Number.isNaN(x.values[row] ?? NaN));
  const lost = places.filter((row) => Number.isNaN(x.values[row] ?? NaN) && !isBlankCell(x, row));
  const gaps: Gap[] = [];
  kept.forEach((row, index) => {
    const odd = y.odd.get(row);
    if (odd) gaps.push({ index, reason: odd.reason, text: odd.text });
  });
  const warnings: ReaderWarning[] = [];
  const [first] = lost;
  if (first !== undefined) {
    const line = (lines[first] ?? 0) + 1;
    const shown = lost.slice(0, 5).map((row) => (lines[row] ?? 0) + 1);
    const message = `${lost.length} ${lost.length === 1 ? 'row has' : 'rows have'} no readable x and cannot be placed (line ${shown.join(', ')}${lost.length > 5 ? ', …' : ''})`;
    warnings.push({ code: 'ROW_WITHOUT_X', message, line, value: lost.length });
  }
  return { x: pick(x.values, kept), y: pick(y.values, kept), gaps, warnings };
}

function isBlankCell(column: NumberColumn, row: number): boolean {
  return column.odd.get(row)?.text === '';
}

function pick(values: Float64Array, rows: readonly number[]): Float64Array {
  const picked = new Float64Array(rows.length);
  rows.forEach((row, i) => {
    picked[i] = values[row] ?? NaN;
  });
  return picked;
}
