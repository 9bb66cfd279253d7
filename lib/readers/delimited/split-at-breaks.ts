import type { LayoutContext } from './layout-context';
import { seriesPoints, type Series } from './series';

/**
 * Blank lines inside a table part spectra when x begins anew after each of them; otherwise they mean nothing and the
 * table stays whole.
 */
export function splitAtBreaks(context: LayoutContext, xColumn: number, series: readonly Series[]): Series[] {
  const { block, table } = context;
  const x = table.columns[xColumn];
  if (!x || block.breaks.length === 0 || block.rows.length !== table.rows.length) return [...series];
  const starts = [0, ...block.breaks];
  if (!starts.every((start, k) => runsOneWay(x.values, start, starts[k + 1] ?? table.rows.length)))
    return [...series];
  if (!block.breaks.every((start) => restarts(x.values, start))) return [...series];
  const split: Series[] = [];
  const columnOf = new Map(table.columns.map((column) => [column.values, column]));
  const other = table.columns[context.columns.findIndex((_, i) => i !== xColumn)];
  starts.forEach((start, k) => {
    const rows = Array.from({ length: (starts[k + 1] ?? table.rows.length) - start }, (_, i) => start + i);
    for (const one of series) {
      context.options.onSteps?.(rows.length);
      const y = columnOf.get(one.y) ?? other;
      if (y)
        split.push({ ...one, ...seriesPoints(x, y, rows, table.rows), line: table.rows[start] ?? one.line });
    }
  });
  return split;
}

function runsOneWay(x: Float64Array, from: number, to: number): boolean {
  if (to - from < 3) return false;
  const sign = Math.sign((x[from + 1] ?? 0) - (x[from] ?? 0));
  for (let i = from + 1; i < to; i++) if (!(((x[i] ?? 0) - (x[i - 1] ?? 0)) * sign > 0)) return false;
  return true;
}

function restarts(x: Float64Array, at: number): boolean {
  const [before = 0, last = 0, first = 0] = [x[at - 2], x[at - 1], x[at]];
  return Math.sign(first - last) !== Math.sign(last - before);
}
