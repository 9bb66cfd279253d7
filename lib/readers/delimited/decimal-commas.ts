import { lineText, type TextLines } from '../text-lines';
import type { Question, ReadOptions } from '../types';
import type { Decision } from './decide-dialect';

/** A comma-separated table whose commas may be decimal marks as well, and the same text with the two told apart. */
export interface CommaDoubt {
  /** Line for line the same file with semicolons between the cells. */
  readonly text: string;
  readonly question: Question;
}

const MOST_FIELDS = 60;

/**
 * Recognise "800,0,001675": commas between the cells and, unquoted, inside the numbers. No point stands anywhere; every
 * second cell is digits only, of one length or with leading zeros, as decimals are and whole numbers are not.
 */
export function commaDoubt(
  lines: TextLines,
  decision: Decision,
  options: ReadOptions,
): CommaDoubt | undefined {
  const { dialect, best } = decision;
  const wanted = options.delimiter === ',' && options.decimalMark === ',';
  if (dialect.delimiter !== ',' || (options.decimalMark === '.' && !wanted)) return undefined;
  if (best.fields < 3 || best.fields > MOST_FIELDS || best.rows.length < 3) return undefined;
  const fractions = fractionColumns(best.fields);
  const table = best.rows.map((row) => lineText(lines, row).replace(/,\s*$/, '').split(','));
  if (
    table.some(
      (cells) => cells.length !== best.fields || cells.some((cell) => !/^\s*[-+\u2212]?\d+\s*$/.test(cell)),
    )
  )
    return undefined;
  if (
    !fractions.every((column) => isFraction(table, column)) ||
    !fractions.some((column) => hasLeadingZeros(table, column))
  ) {
    if (!wanted) return undefined;
  }
  const rows = new Set(best.rows);
  const text = Array.from({ length: lines.count }, (_, line) => {
    const plain = lineText(lines, line);
    return rows.has(line) ? joinFractions(plain, fractions) : plain.replace(/,/g, ';');
  }).join('\n');
  const question: Question = {
    code: 'DECIMAL_COMMA',
    message: `The commas part the columns, and it seems that they are decimal marks as well (line ${(best.rows[0] ?? 0) + 1}: ${lineText(lines, best.rows[0] ?? 0).slice(0, 60)}). How is it to be read?`,
    choices: [
      {
        label: `Decimal comma: ${best.fields - fractions.length} columns`,
        options: { delimiter: ',', decimalMark: ',' },
      },
      { label: `Whole numbers: ${best.fields} columns`, options: { delimiter: ',', decimalMark: '.' } },
    ],
  };
  return { text, question };
}

/** The columns that would be decimals: every second one from the end; x is a whole number when their count is odd. */
function fractionColumns(fields: number): number[] {
  const columns: number[] = [];
  for (let column = fields - 1; column > 0; column -= 2) columns.unshift(column);
  return columns;
}

function isFraction(table: readonly (readonly string[])[], column: number): boolean {
  return table.every((cells) => /^\d+$/.test((cells[column] ?? '').trim()));
}

function hasLeadingZeros(table: readonly (readonly string[])[], column: number): boolean {
  return table.some((cells) => /^0\d/.test((cells[column] ?? '').trim()));
}

function joinFractions(line: string, fractions: readonly number[]): string {
  const cells = line.replace(/,\s*$/, '').split(',');
  let joined = cells[0] ?? '';
  for (let column = 1; column < cells.length; column++)
    joined += (fractions.includes(column) ? ',' : ';') + (cells[column] ?? '').trim();
  return joined;
}
