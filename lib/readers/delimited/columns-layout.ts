import type { ReaderWarning } from '../types';
import { columnNames } from './column-names';
import type { LayoutContext } from './layout-context';
import { seriesPoints, type Series } from './series';

/** One x column and one spectrum in each other column of numbers. */
export function columnSeries(context: LayoutContext, xColumn: number): Series[] {
  const { table, heading, columns, options } = context;
  const chosen = (options.yColumns ?? columns.map((_, i) => i)).filter(
    (i) => i !== xColumn && isOrdinate(context, i),
  );
  const names = columnNames(chosen, heading, context.header, context.fileName, false);
  const x = table.columns[xColumn];
  if (!x) return [];
  return chosen.flatMap((column, k) => {
    const y = table.columns[column];
    if (!y) return [];
    return [
      {
        name: names[k] ?? '',
        xLabel: heading.labels[xColumn] ?? '',
        yLabel: heading.labels[column] ?? '',
        ...seriesPoints(x, y, undefined, table.rows),
        line: table.rows[0] ?? 0,
        header: {},
      },
    ];
  });
}

/** A column of y: numbers, or gaps where a few numbers are; not texts, not row numbers before x, not empty. */
function isOrdinate(context: LayoutContext, column: number): boolean {
  const facts = context.columns[column];
  const cells = context.table.columns[column];
  if (!facts || !cells) return false;
  if (context.options.yColumns?.includes(column)) return true;
  if (cells.numbers === 0) return overRangeOnly(context, column);
  if (facts.isIndex && facts.rows > 2 && (context.heading.labels[column] ?? '') === '' && column === 0)
    return false;
  return cells.texts <= cells.numbers;
}

/** A spectrum that is over range from end to end is still a spectrum; an empty column is none. */
function overRangeOnly(context: LayoutContext, column: number): boolean {
  const cells = context.table.columns[column];
  if (!cells || cells.texts > 0 || cells.odd.size === 0) return false;
  for (const odd of cells.odd.values()) if (odd.reason !== 'aboveRange') return false;
  return true;
}

/** Columns of a pair each: x, y, x, y; pairs may be of different length, or empty. */
export function pairSeries(context: LayoutContext): { series: Series[]; warnings: ReaderWarning[] } {
  const { table, heading } = context;
  const ordinates: number[] = [];
  const warnings: ReaderWarning[] = [];
  for (let column = 1; column < table.columns.length; column += 2) {
    const [x, y] = [table.columns[column - 1], table.columns[column]];
    if (!x || !y) continue;
    if (x.numbers === 0 && y.numbers === 0) {
      const message = `Columns ${column} and ${column + 1} are empty and were left out`;
      warnings.push({ code: 'EMPTY_COLUMN', message });
    } else if (context.options.yColumns?.includes(column) ?? true) ordinates.push(column);
  }
  const names = columnNames(ordinates, heading, context.header, context.fileName, true);
  const series = ordinates.flatMap((column, k) => {
    const [x, y] = [table.columns[column - 1], table.columns[column]];
    if (!x || !y) return [];
    return [
      {
        name: names[k] ?? '',
        xLabel: heading.labels[column - 1] ?? '',
        yLabel: heading.labels[column] ?? '',
        ...seriesPoints(x, y, undefined, table.rows),
        line: table.rows[0] ?? 0,
        header: {},
      },
    ];
  });
  return { series, warnings };
}
