import { couldBeGrouped, parseDecimal } from '@/lib/schemas/decimal';
import { cellContent, type GridColumn } from './grid-cell';

/** What a paste did, for the sentence under the grid. */
export interface PasteSummary {
  readonly cells: number;
  readonly rows: number;
  /** Cells whose decimal comma was read as a point. */
  readonly commas: number;
  /** Cells that could be 1.234 or 1234; they are kept as they came. */
  readonly asked: number;
  readonly headingsLeftOut: boolean;
  readonly columnsLeftOut: number;
  readonly rowsLeftOut: number;
}

const isNumber = (text: string) => parseDecimal(text).ok || couldBeGrouped(text);

/** One line between marks; a cell in quotes may hold a mark, and a doubled quote inside it is one. */
function splitLine(line: string, mark: string): string[] {
  const cells = [''];
  let quoted = false;
  for (let index = 0; index < line.length; index += 1) {
    const letter = line[index] ?? '';
    const last = cells.length - 1;
    if (letter === '"' && quoted && line[index + 1] === '"') {
      cells[last] += '"';
      index += 1;
    } else if (letter === '"' && (quoted || cells[last] === '')) quoted = !quoted;
    else if (letter === mark && !quoted) cells.push('');
    else cells[last] += letter;
  }
  return cells.map((cell) => cell.trim());
}

/**
 * Text from a spreadsheet as rows of cells. Cells stand between tabs, else between semicolons, else, when
 * every line is nothing but numbers, between blanks. Commas never part cells: they may be decimal marks.
 */
export function parseBlock(text: string): string[][] {
  const lines = text.replace(/(\r\n|\n|\r)$/, '').split(/\r\n|\n|\r/);
  const mark = ['\t', ';'].find((candidate) => text.includes(candidate));
  if (mark) return lines.map((line) => splitLine(line, mark));
  const byBlanks = lines.map((line) => line.trim().split(/\s+/));
  const numeric = byBlanks.every((cells) => cells.every((cell) => cell === '' || isNumber(cell)));
  return numeric ? byBlanks : lines.map((line) => [line.trim()]);
}

/** A first line of words over a column of numbers is a line of headings, not a standard. */
function startsWithHeadings(block: readonly string[][], columns: readonly GridColumn[]): boolean {
  const [first, second] = block;
  if (!first || !second) return false;
  return columns.some((column, index) => {
    const [head = '', next = ''] = [first[index], second[index]];
    if (column.kind !== 'decimal') return false;
    return cellContent(column, head).state === 'bad' && !couldBeGrouped(head) && isNumber(next);
  });
}

export interface ReadBlock {
  readonly cells: readonly (readonly string[])[];
  readonly commas: number;
  readonly asked: number;
  readonly headingsLeftOut: boolean;
}

/** The cells of a pasted block as they enter the columns from the one at the cursor on. */
export function readBlock(text: string, columns: readonly GridColumn[]): ReadBlock {
  const block = parseBlock(text);
  const headingsLeftOut = startsWithHeadings(block, columns);
  let commas = 0;
  let asked = 0;
  const cells = block.slice(headingsLeftOut ? 1 : 0).map((line) =>
    line.map((cell, index) => {
      if (columns[index]?.kind === 'text' || columns[index]?.readOnly) return cell;
      if (couldBeGrouped(cell)) asked += 1;
      if (!cell.includes(',') || !parseDecimal(cell).ok) return cell;
      commas += 1;
      return cell.replace(',', '.');
    }),
  );
  return { cells, commas, asked, headingsLeftOut };
}

const count = (n: number, one: string, many = `${one}s`) => `${n} ${n === 1 ? one : many}`;

/** "24 cells in 8 rows; decimal commas read as points". */
export function pasteWords(summary: PasteSummary): string {
  const words = [`${count(summary.cells, 'cell')} in ${count(summary.rows, 'row')}`];
  if (summary.headingsLeftOut) words.push('the line of headings left out');
  if (summary.commas > 0) words.push('decimal commas read as points');
  if (summary.columnsLeftOut > 0)
    words.push(`${count(summary.columnsLeftOut, 'column')} did not fit and stayed out`);
  if (summary.rowsLeftOut > 0) words.push(`${count(summary.rowsLeftOut, 'row')} did not fit and stayed out`);
  if (summary.asked > 0)
    words.push(`${count(summary.asked, 'cell')} may hold a decimal comma or a thousands mark`);
  return words.join('; ');
}
