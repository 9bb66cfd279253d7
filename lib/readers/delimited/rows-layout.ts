import { refused } from '../check-answers';
import { isWavelengthWord, xUnitFromText } from '../header-words';
import { X_RANGES } from '../inspect/guesses';
import { parseNumber } from '../number-cell';
import { lineText } from '../text-lines';
import type { Gap, XUnit } from '../types';
import { markCode } from './candidates';
import type { LayoutContext } from './layout-context';
import type { Series } from './series';
import { cellTexts } from './split-cells';

/** Wavelengths in a heading row: which columns they stand over. */
export interface HeadingAxis {
  readonly line: number;
  readonly columns: readonly number[];
  readonly x: Float64Array;
  readonly unitText: string;
}

const SHORTEST_AXIS = 10;
const ROWS_ABOVE = 4;

/**
 * Look for wavelengths in a heading row: a run of at least ten numbers, plain or within words ("Lambda 220 nm",
 * "A528", "X350.5"), that rises or falls throughout and can be an axis. The table's own first row may be that heading, unless a
 * column is named as x.
 */
export function findHeadingAxis(context: LayoutContext, xIsNamed: boolean): HeadingAxis | undefined {
  const { block, lines, options } = context;
  if (options.xRow !== undefined) return axisGiven(context, options.xRow);
  if (block.fields < SHORTEST_AXIS) return undefined;
  const first = block.rows[0] ?? 0;
  const candidates: number[] = [];
  for (let line = first - 1; line > context.above && candidates.length < ROWS_ABOVE; line--) {
    if (lineText(lines, line).trim() !== '') candidates.push(line);
  }
  if (block.rows.length > 1 && !xIsNamed) candidates.push(first);
  for (const line of candidates) {
    const axis = axisOf(context, line, SHORTEST_AXIS);
    if (axis) return axis;
  }
  return undefined;
}

/** The line that the person names. @throws ReaderError ANSWERS */
function axisGiven(context: LayoutContext, line: number): HeadingAxis {
  const axis = line < context.lines.count ? axisOf(context, line, 2) : undefined;
  if (axis) return axis;
  throw refused(
    `Line ${line + 1} holds no row of wavelengths that rise or fall over the columns of the table.`,
  );
}

function axisOf(context: LayoutContext, line: number, shortest: number): HeadingAxis | undefined {
  const { lines, dialect, block } = context;
  context.options.onSteps?.((lines.end[line] ?? 0) - (lines.start[line] ?? 0));
  const cells = cellTexts(lines.text, lines.start[line] ?? 0, lines.end[line] ?? 0, dialect.delimiter);
  const shift = cells.length === block.fields - 1 ? 1 : 0;
  const numbers = cells.map((cell) => numberInWords(cell, markCode(dialect)));
  const run = longestRun(numbers);
  if (run.to - run.from < shortest || run.to - run.from < 0.5 * (block.fields - 9)) return undefined;
  const x = Float64Array.from(numbers.slice(run.from, run.to));
  if (context.options.xRow === undefined && countsColumns(x)) return undefined;
  const unitText =
    cells
      .slice(0, run.from + 1)
      .find((cell) => xUnitFromText(cell) !== undefined || isWavelengthWord(cell)) ?? '';
  if (!fitsSomeRange(x, context.options.xUnit ? undefined : xUnitFromText(unitText))) return undefined;
  const columns = Array.from(x.keys(), (i) => run.from + i + shift).filter((column) => column < block.fields);
  return { line, columns, x: x.slice(0, columns.length), unitText };
}

/** 1, 2, 3, … over the columns of a plate are no photon energies. */
function countsColumns(x: Float64Array): boolean {
  return (x[0] === 0 || x[0] === 1) && x.every((value, i) => i === 0 || value - (x[i - 1] ?? NaN) === 1);
}

function numberInWords(cell: string, mark: number): number {
  const plain = parseNumber(cell, 0, cell.length, mark);
  if (!Number.isNaN(plain) || cell.length > 40) return plain;
  const found = /^[^\d]*?(\d+(?:[.,]\d+)?)[^\d]*$/.exec(cell)?.[1];
  return found === undefined ? NaN : parseNumber(found, 0, found.length, found.includes(',') ? 44 : 46);
}

/** The longest stretch that strictly rises or falls. */
function longestRun(numbers: readonly number[]): { from: number; to: number } {
  let best = { from: 0, to: 0 };
  let from = 0;
  let sign = 0;
  for (let i = 0; i <= numbers.length; i++) {
    const [here = NaN, before = NaN] = [numbers[i], numbers[i - 1]];
    const step = Math.sign(here - before);
    if (i > from && step !== 0 && !Number.isNaN(step) && (sign === 0 || step === sign)) {
      sign = step;
      continue;
    }
    if (i > 0 && i - from > best.to - best.from) best = { from, to: i };
    const turns = i > from && !Number.isNaN(step) && step !== 0;
    from = turns ? i - 1 : i;
    sign = turns ? step : 0;
  }
  return best;
}

function fitsSomeRange(x: Float64Array, unit: XUnit | undefined): boolean {
  const low = Math.min(x[0] ?? 0, x[x.length - 1] ?? 0);
  const high = Math.max(x[0] ?? 0, x[x.length - 1] ?? 0);
  const units = unit ? [unit] : (Object.keys(X_RANGES) as XUnit[]);
  return units.some((name) => low >= X_RANGES[name][0] && high <= X_RANGES[name][1]);
}

/** One spectrum in each row; the cells before the axis are its name and further facts. */
export function rowSeries(context: LayoutContext, axis: HeadingAxis): Series[] {
  const { table, lines, dialect } = context;
  const heads = cellTexts(
    lines.text,
    lines.start[axis.line] ?? 0,
    lines.end[axis.line] ?? 0,
    dialect.delimiter,
  );
  const leading = axis.columns[0] ?? 0;
  return table.rows.flatMap((line, row) => {
    if (line === axis.line) return [];
    context.options.onSteps?.((lines.end[line] ?? 0) - (lines.start[line] ?? 0) + axis.columns.length);
    const facts = leadingFacts(context, line, leading, heads);
    const { y, gaps } = rowOrdinates(context, row, axis.columns);
    return [
      {
        name: facts.name || context.fileName,
        xLabel: axis.unitText,
        yLabel: '',
        x: axis.x.slice(),
        y,
        gaps,
        line,
        header: facts.header,
        warnings: [],
      },
    ];
  });
}

/** The ordinates of one row, in the columns given. */
export function rowOrdinates(
  context: LayoutContext,
  row: number,
  columns: readonly number[],
): { y: Float64Array; gaps: Gap[] } {
  const y = new Float64Array(columns.length);
  const gaps: Gap[] = [];
  columns.forEach((column, i) => {
    const cells = context.table.columns[column];
    y[i] = cells?.values[row] ?? NaN;
    const odd = cells?.odd.get(row);
    if (odd) gaps.push({ index: i, reason: odd.reason, text: odd.text });
  });
  return { y, gaps };
}

function leadingFacts(
  context: LayoutContext,
  line: number,
  leading: number,
  heads: readonly string[],
): { name: string; header: Record<string, string> } {
  const { lines, dialect } = context;
  const header: Record<string, string> = {};
  if (leading === 0) return { name: '', header };
  const cells = cellTexts(lines.text, lines.start[line] ?? 0, lines.end[line] ?? 0, dialect.delimiter).slice(
    0,
    leading,
  );
  cells.forEach((cell, i) => {
    if (cell !== '') header[heads[i] || `column ${i + 1}`] = cell;
  });
  const named = cells.findIndex(
    (cell, i) => cell !== '' && /sample|name|probe|well|id$|label|title/i.test(heads[i] ?? ''),
  );
  const text = cells.find((cell) => /[A-Za-z\u00c0-\u024f]/.test(cell));
  return {
    name: (named >= 0 ? cells[named] : undefined) ?? text ?? cells.find((cell) => cell !== '') ?? '',
    header,
  };
}
