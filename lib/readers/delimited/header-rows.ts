import { isWavelengthWord, signalFromText, xUnitFromText } from '../header-words';
import { parseNumber } from '../number-cell';
import { lineText, type TextLines } from '../text-lines';
import { markCode, type Dialect } from './candidates';
import { cellTexts, plainCell } from './split-cells';

/** What the lines above a table say of its columns. */
export interface TableHeading {
  /** Words over each column: name and unit; empty where there are none. */
  readonly labels: readonly string[];
  /** Names in a row above the labels: over every column, or over every second one. */
  readonly names: readonly string[];
  /** A line above the labels with a single cell, or nothing. */
  readonly title: string;
  /** The first heading line, from 0; the table's first row when there is none. */
  readonly firstLine: number;
}

const FURTHEST = 15;
/** Ways in which a heading's cells may be parted. */
const WAYS = 5;
const LONGEST_HEADING = 200_000;

/**
 * Find the heading of a table: going up from its first row, the nearest line with a cell for every column; below it
 * may stand a row of units, above it a row of names or a title. Comment signs before a heading are no part of it.
 */
export function findHeading(
  lines: TextLines,
  dialect: Dialect,
  firstRow: number,
  columns: number,
  above: number,
): TableHeading {
  const none: TableHeading = {
    labels: Array<string>(columns).fill(''),
    names: [],
    title: '',
    firstLine: firstRow,
  };
  const found = nearestHeading(lines, dialect, firstRow, columns, above);
  if (!found) return { ...none, ...titleAbove(lines, dialect, firstRow, above) };
  let { line, cells } = found;
  let labels = cells;
  if (isUnitRow(cells)) {
    const upper = headingCells(lines, dialect, line - 1, columns);
    const overAll = upper?.every((label, i) => label !== '' || (cells[i] ?? '') === '');
    if (line - 1 > above && upper && overAll && !isUnitRow(upper)) {
      labels = upper.map((label, i) =>
        [label, cells[i]].filter((word) => word && !/^[-\u2013]$/.test(word)).join(' '),
      );
      line -= 1;
      cells = upper;
    }
  }
  const up = line - 1 > above ? nameRow(lines, dialect, line - 1, columns, labels) : undefined;
  if (up) return { labels, names: up, title: '', firstLine: line - 1 };
  const { title, firstLine } = titleAbove(lines, dialect, line, above);
  return { labels, names: [], title, firstLine: title === '' ? line : firstLine };
}

/** The characters that the search for a heading may look at: some lines above a table, each split in a few ways. */
export function headingSteps(lines: TextLines, firstRow: number, above: number): number {
  let looked = 0;
  for (let line = Math.max(above + 1, firstRow - FURTHEST - 2); line < firstRow; line++)
    looked += WAYS * Math.min((lines.end[line] ?? 0) - (lines.start[line] ?? 0), LONGEST_HEADING);
  return looked;
}

function nearestHeading(
  lines: TextLines,
  dialect: Dialect,
  firstRow: number,
  columns: number,
  above: number,
): { line: number; cells: string[] } | undefined {
  let fallback: { line: number; cells: string[] } | undefined;
  let filled = 0;
  for (let line = firstRow - 1; line > above && firstRow - line <= FURTHEST; line--) {
    const cells = headingCells(lines, dialect, line, columns);
    const text = lineText(lines, line).trim();
    if (text === '') {
      if (fallback) break;
      continue;
    }
    filled += 1;
    if (!cells) continue;
    if (cells.some((cell) => isWavelengthWord(cell) || xUnitFromText(cell) !== undefined))
      return { line, cells };
    if (!fallback && filled === 1) fallback = { line, cells };
  }
  return fallback;
}

/** A line's cells when it has one for every column and is no row of numbers. */
export function headingCells(
  lines: TextLines,
  dialect: Dialect,
  line: number,
  columns: number,
): string[] | undefined {
  if (line < 0) return undefined;
  const raw = lineText(lines, line);
  if (raw.length > LONGEST_HEADING || raw.trim() === '') return undefined;
  const text = uncommented(raw);
  const commented = text.length !== raw.length;
  const ways = [...splittings(text, dialect, commented)];
  for (const cells of ways) {
    const fitted = fitToColumns(cells, columns);
    if (fitted && !allNumbers(fitted, dialect)) return fitted;
  }
  // A heading may leave out the column of row numbers.
  const short = ways.find((cells) => cells.length === columns - 1 && cells.every((cell) => cell !== ''));
  return short && columns > 2 && !commented && !allNumbers(short, dialect) ? ['', ...short] : undefined;
}

function fitToColumns(cells: string[], columns: number): string[] | undefined {
  if (columns < 1 || cells.length < columns) return undefined;
  return cells.slice(columns).every((cell) => cell === '') ? cells.slice(0, columns) : undefined;
}

function* splittings(text: string, dialect: Dialect, commented: boolean): Generator<string[]> {
  if (dialect.delimiter !== 'blank' && dialect.delimiter !== 'fixed') {
    yield cellTexts(text, 0, text.length, dialect.delimiter);
    if (!commented) return;
  }
  const line = text.trim();
  if (line.includes('\t')) yield line.split('\t').map(plainCell);
  if (/\s{2,}/.test(line)) yield line.split(/\s{2,}|\t/).map(plainCell);
  yield (line.match(/"[^"]*"|[^\s([]+(?:\s?[([][^)\]]{0,40}[)\]])?|[([][^)\]]{0,40}[)\]]/g) ?? []).map(
    plainCell,
  );
  const listed = line.split(/[,;]/).map((cell) => cell.replace(/^.*:/, '').trim());
  if (listed.every((cell) => /^[^\s=]+(?: [^\s=]+)?$/.test(cell)) && isWavelengthWord(listed[0] ?? ''))
    yield listed;
}

/** A line without the signs that mark it as a comment. "%T" begins with no such sign. */
export function uncommented(line: string): string {
  return line.replace(/^\s*(?:#+|!+|\/\/+|%+(?=\s)|;+(?=\s)|\*+(?=\s)|'(?=\s))\s*/, '');
}

function allNumbers(cells: readonly string[], dialect: Dialect): boolean {
  const mark = markCode(dialect);
  return cells.every((cell) => cell === '' || !Number.isNaN(parseNumber(cell, 0, cell.length, mark)));
}

function isUnitRow(cells: readonly string[]): boolean {
  let units = 0;
  for (const cell of cells) {
    if (cell === '' || /^[-\u2013]$/.test(cell)) continue;
    const bare = cell.replace(/^[([]|[)\]]$/g, '').trim();
    if (bare.length > 8 || isWavelengthWord(bare)) return false;
    if (
      /^[([].*[)\]]$/.test(cell) ||
      xUnitFromText(bare) !== undefined ||
      signalFromText(bare) ||
      /^(?:none|a\.?u\.?|1|-)$/i.test(bare)
    )
      units += 1;
    else return false;
  }
  return units > 0;
}

/** A row of sample names over the labels: over every column but x, or over the first of every pair. */
function nameRow(
  lines: TextLines,
  dialect: Dialect,
  line: number,
  columns: number,
  labels: readonly string[],
): string[] | undefined {
  if (dialect.delimiter === 'blank' || dialect.delimiter === 'fixed') return undefined;
  const cells = headingCells(lines, dialect, line, columns);
  if (!cells) return undefined;
  const filled = cells.flatMap((cell, i) => (cell === '' ? [] : [i]));
  if (filled.length < 2 && columns > 2 && !(filled.length === 1 && columns >= 4)) return undefined;
  if (columns <= 2) return undefined;
  const everySecond =
    filled.every((i) => i % 2 === (filled[0] ?? 0) % 2) && filled.length >= 1 && cells.length >= 4;
  const overY = labels.every(
    (label, i) => label === '' || isWavelengthWord(label) || i === 0 || cells[i] !== '',
  );
  return everySecond || overY ? cells : undefined;
}

function titleAbove(
  lines: TextLines,
  dialect: Dialect,
  line: number,
  above: number,
): { title: string; firstLine: number } {
  const none = { title: '', firstLine: line };
  if (line - 1 <= above || line < 1) return none;
  const raw = lineText(lines, line - 1);
  if (raw.length > 400) return none;
  const text = uncommented(raw);
  const delimiter =
    dialect.delimiter === 'blank' || dialect.delimiter === 'fixed' ? 'tab' : dialect.delimiter;
  const cells = cellTexts(text, 0, text.length, delimiter).filter((cell) => cell !== '');
  const [title = ''] = cells;
  if (cells.length !== 1 || title.length > 120 || !isTitle(title)) return none;
  return { title, firstLine: line - 1 };
}

/** A line that names what was measured: words, and none of those that only mark where data begin. */
function isTitle(text: string): boolean {
  if (!/[A-Za-z\u00c0-\u024f]{3}/.test(text) || /^[/'([]|=/.test(text)) return false;
  return !/^(?:begin\w*|end\w*|points?|data|xydata|x\s*y\s*data|spectrum|spectra|results?|raw data|wavelengths?|values)\b[\s:]*$/i.test(
    text,
  );
}
