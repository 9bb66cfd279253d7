import type { Question } from '../types';
import { columnNames } from './column-names';
import type { LayoutContext } from './layout-context';
import { rowOrdinates } from './rows-layout';
import type { Series } from './series';

/** A table has to be at least this long, in one direction, to hold spectra without their x. */
const LONG = 20;

/** Whether a table without x may hold spectra all the same: long rows or columns of numbers. */
export function mayLackX(context: LayoutContext): boolean {
  const numeric = context.columns.filter((column) => column.numbers > 0.5 * column.rows).length;
  const headed = context.heading.labels.some((label) => /[A-Za-z]{4}/.test(label) && label.length > 3);
  if (
    context.columns.length <= 2 &&
    context.columns.some((column) => column.direction !== 0 && column.rows > 2)
  )
    return false;
  return numeric >= LONG || (numeric >= 1 && numeric <= 2 && context.table.rows.length >= LONG && !headed);
}

/** Only the person can say where x begins and how it goes on. */
export function questionForX(context: LayoutContext): Question {
  const rows = asRows(context);
  const count = rows ? context.columns.length : context.table.rows.length;
  return {
    code: 'NO_X',
    message: `The file holds no wavelengths. Give the first wavelength and the step for ${count} points in each ${rows ? 'row' : 'column'}.`,
    choices: [
      { label: 'Each row is a spectrum', options: { orientation: 'rows' } },
      { label: 'Each column is a spectrum', options: { orientation: 'columns' } },
    ],
  };
}

function asRows(context: LayoutContext): boolean {
  const { orientation } = context.options;
  if (orientation === 'rows' || orientation === 'columns') return orientation === 'rows';
  return context.columns.length > LONG;
}

/** The spectra of a table whose x the person has given as a first value and a step. */
export function seriesOnGrid(context: LayoutContext, firstX: number, stepX: number): Series[] {
  const { table, columns, heading, fileName } = context;
  const numeric = columns.flatMap((column, i) => (column.numbers > 0.5 * column.rows ? [i] : []));
  const chosen = context.options.yColumns ?? numeric;
  const grid = (n: number): Float64Array => Float64Array.from({ length: n }, (_, i) => firstX + i * stepX);
  if (asRows(context)) {
    return table.rows.map((line, row) => ({
      name: textOf(context, row) || fileName,
      xLabel: '',
      yLabel: '',
      x: grid(chosen.length),
      ...rowOrdinates(context, row, chosen),
      line,
      header: {},
      warnings: [],
    }));
  }
  const names = columnNames(chosen, heading, context.header, fileName, false);
  return chosen.map((column, k) => {
    const cells = table.columns[column];
    const gaps = [...(cells?.odd ?? [])].map(([index, odd]) => ({ index, ...odd }));
    return {
      name: names[k] ?? '',
      xLabel: '',
      yLabel: heading.labels[column] ?? '',
      x: grid(table.rows.length),
      y: cells?.values ?? new Float64Array(),
      gaps,
      line: table.rows[0] ?? 0,
      header: {},
      warnings: [],
    };
  });
}

function textOf(context: LayoutContext, row: number): string {
  for (const column of context.table.columns) {
    const odd = column.odd.get(row);
    if (odd?.reason === 'unreadable') return odd.text.replace(/^"|"$/g, '');
  }
  return '';
}
