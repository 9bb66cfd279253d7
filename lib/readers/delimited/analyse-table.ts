import type { TextLines } from '../text-lines';
import type { Guess, NotASpectrum, Orientation, Question, ReadOptions, ReaderWarning } from '../types';
import { checkColumns } from '../check-answers';
import { namesX } from '../header-words';
import { columnFacts } from './column-facts';
import { columnSeries, pairSeries } from './columns-layout';
import type { Decision } from './decide-dialect';
import { findX, isPaired } from './find-x';
import type { HeaderFacts } from './header-facts';
import { findHeading, headingSteps } from './header-rows';
import type { LayoutContext } from './layout-context';
import { layoutGuesses, ROWS_BY_FORM } from './layout-guesses';
import { findLongKeys, longSeries } from './long-layout';
import type { MergedBlock } from './merge-blocks';
import { notASpectrum } from './not-a-spectrum';
import { readNumbers } from './number-table';
import { findHeadingAxis, rowSeries } from './rows-layout';
import type { Series } from './series';
import { splitAtBreaks } from './split-at-breaks';
import { mayLackX, questionForX, seriesOnGrid } from './without-x';

export interface AnalysedTable {
  readonly context: LayoutContext;
  readonly orientation: Orientation;
  readonly xColumn?: number;
  readonly series: readonly Series[];
  readonly warnings: readonly ReaderWarning[];
  readonly questions: readonly Question[];
  readonly notASpectrum?: NotASpectrum;
  /** What the numbers alone decided of the layout. */
  readonly guesses: readonly Guess[];
}

/** Read one block and find its layout: spectra in columns, pairs, rows or a long list, or no spectra at all. */
export function analyseTable(
  lines: TextLines,
  decision: Decision,
  whole: MergedBlock,
  above: number,
  header: HeaderFacts,
  options: ReadOptions,
  fileName: string,
): AnalysedTable {
  const { dialect } = decision;
  const { block, labels } = withoutHeadRow(lines, decision, whole, options);
  checkColumns(options, block.fields);
  const table = readNumbers(lines, block, dialect, options.onSteps);
  options.onSteps?.(headingSteps(lines, block.rows[0] ?? 0, above));
  const found = findHeading(lines, dialect, block.rows[0] ?? 0, block.fields, above);
  const named = labels ?? found.labels;
  const declared = header.declared.length === block.fields ? header.declared : [];
  const heading = {
    ...found,
    labels:
      declared.length > 0 && !named.some((label) => /[A-Za-z]/.test(label))
        ? declared
        : named.map((label, i) => richer(label, declared[i])),
  };
  const columns = table.columns.map((column) => {
    options.onSteps?.(column.values.length);
    return columnFacts(column);
  });
  const context: LayoutContext = {
    lines,
    dialect,
    block,
    table,
    heading,
    columns,
    header,
    options,
    fileName,
    above,
  };
  const analysed = layOut(context);
  const guesses = layoutGuesses(context, analysed);
  return { ...analysed, guesses, warnings: [...analysed.warnings, ...tableWarnings(context)] };
}

/** A declared name with its unit says more than the same name alone. */
function richer(label: string, declared: string | undefined): string {
  return declared && declared.startsWith(label) ? declared : label;
}

/** A first row that lacks only its first cell is a heading of numbers ("", 0.1, 0.2), not a row. */
function withoutHeadRow(
  lines: TextLines,
  decision: Decision,
  block: MergedBlock,
  options: ReadOptions,
): { block: MergedBlock; labels?: string[] } {
  const [first, second] = block.rows;
  if (
    first === undefined ||
    second === undefined ||
    options.headerRows !== undefined ||
    decision.dialect.delimiter === 'blank'
  )
    return { block };
  const head = readNumbers(lines, { ...block, rows: [first, second] }, decision.dialect, options.onSteps);
  const x = head.columns[0];
  if (!x || x.odd.get(0)?.text !== '' || x.odd.has(1) || block.fields < 3) return { block };
  const labels = head.columns.map((column) => column.odd.get(0)?.text ?? String(column.values[0] ?? ''));
  return { block: { ...block, rows: block.rows.slice(1) }, labels };
}

function layOut(context: LayoutContext): AnalysedTable {
  const { options } = context;
  const none = { context, warnings: [], questions: [], series: [], guesses: [] };
  if (options.firstX !== undefined && options.stepX !== undefined && options.xColumn === undefined) {
    return {
      ...none,
      orientation: options.orientation ?? 'columns',
      series: seriesOnGrid(context, options.firstX, options.stepX),
    };
  }
  const xColumn = findX(context.table, context.columns, context.heading.labels, options);
  const asRows =
    options.orientation === 'rows' ||
    options.xRow !== undefined ||
    (options.orientation === undefined && prefersRows(context, xColumn));
  const label = context.heading.labels[xColumn ?? -1] ?? '';
  const axis = asRows ? findHeadingAxis(context, namesX(label)) : undefined;
  if (axis) {
    const stated =
      axis.unitText !== '' ||
      xColumn === undefined ||
      options.orientation === 'rows' ||
      options.xRow !== undefined;
    return {
      ...none,
      orientation: 'rows',
      series: rowSeries(context, axis),
      guesses: stated ? [] : [ROWS_BY_FORM],
    };
  }
  if (xColumn === undefined) {
    if (mayLackX(context))
      return {
        ...none,
        orientation: 'columns',
        questions: [questionForX(context)],
        notASpectrum: notASpectrum(context),
      };
    return { ...none, orientation: 'columns', notASpectrum: notASpectrum(context) };
  }
  if (
    options.orientation === 'pairs' ||
    (options.orientation === undefined && isPaired(context.columns, context.heading.labels, xColumn))
  ) {
    return { ...none, orientation: 'pairs', xColumn, ...pairSeries(context) };
  }
  const long = options.orientation === 'columns' ? undefined : findLongKeys(context, xColumn);
  if (long) return { ...none, orientation: 'long', xColumn, series: longSeries(context, xColumn, long) };
  const series = columnSeries(context, xColumn);
  if (series.length === 0)
    return { ...none, orientation: 'columns', xColumn, notASpectrum: notASpectrum(context) };
  return { ...none, orientation: 'columns', xColumn, series: splitAtBreaks(context, xColumn, series) };
}

/** Wavelengths in the heading win where no column is plainly x, or where there are few rows and many columns. */
function prefersRows(context: LayoutContext, xColumn: number | undefined): boolean {
  if (xColumn === undefined) return true;
  return context.table.rows.length < 10 && context.columns.length > 3 * context.table.rows.length;
}

function tableWarnings(context: LayoutContext): ReaderWarning[] {
  const warnings: ReaderWarning[] = [];
  const { ragged } = context.table;
  const [first] = ragged;
  if (first !== undefined && ragged.length < context.table.rows.length) {
    const message = `${ragged.length} ${ragged.length === 1 ? 'row has' : 'rows have'} more or fewer cells than the table has columns (first in line ${first + 1})`;
    warnings.push({ code: 'RAGGED_ROW', message, line: first + 1, value: ragged.length });
  }
  const { strays } = context.block;
  const [stray] = strays;
  if (stray !== undefined) {
    const message = `${strays.length} ${strays.length === 1 ? 'line inside the table is no row of it and was' : 'lines inside the table are no rows of it and were'} left out (first line ${stray + 1})`;
    warnings.push({ code: 'STRAY_LINE', message, line: stray + 1, value: strays.length });
  }
  return warnings;
}
