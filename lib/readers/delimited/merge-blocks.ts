import { parseNumber } from '../number-cell';
import { isWavelengthWord } from '../header-words';
import { lineText, type TextLines } from '../text-lines';
import type { Block } from './blocks';
import { markCode } from './candidates';
import type { Decision } from './decide-dialect';
import { splitCells } from './split-cells';

/** Lines between two parts of one table: a damaged row or two, or a remark. */
const MOST_BETWEEN = 3;

/** A table, with the lines inside it that are no rows of it. */
export interface MergedBlock extends Block {
  readonly strays: readonly number[];
}

/** The same while it grows: rows are appended in place, so that many damaged lines cost no copying. */
interface GrowingBlock {
  rows: number[];
  fields: number;
  numbers: number;
  messy: number;
  breaks: number[];
  strays: number[];
  /** Cells that stand in the file, whatever the table's width has become. */
  cells: number;
}

/** The first cell of a line as a number: x, or the row's index, in any table that has one. */
type FirstNumber = (line: number) => number;

/**
 * Join blocks that are one table with damaged lines inside: few lines between, and x going on as before. A damaged
 * line that still begins with its x becomes a row; the others are kept apart to be told of.
 */
export function mergeBlocks(
  lines: TextLines,
  decision: Decision,
  onSteps?: (steps: number) => void,
): MergedBlock[] {
  const merged: GrowingBlock[] = [];
  const xOf = firstNumbers(lines, decision, onSteps);
  for (const block of decision.blocks) {
    onSteps?.(block.rows.length);
    const before = merged[merged.length - 1];
    const between = before ? linesBetween(lines, decision, xOf, before, block) : undefined;
    if (before && between && goesOn(xOf, before, block)) append(before, block, between);
    else merged.push(grown(block));
  }
  return merged;
}

function grown(block: Block): GrowingBlock {
  const cells = block.rows.length * block.fields;
  return { ...block, rows: [...block.rows], breaks: [...block.breaks], strays: [], cells };
}

/** Each line is looked at once, however many parts it is compared with. */
function firstNumbers(
  lines: TextLines,
  { dialect }: Decision,
  onSteps?: (steps: number) => void,
): FirstNumber {
  const known = new Map<number, number>();
  const bounds: number[] = [];
  return (line) => {
    const before = known.get(line);
    if (before !== undefined) return before;
    const [start, end] = [lines.start[line] ?? 0, lines.end[line] ?? 0];
    onSteps?.(end - start);
    const count = splitCells(lines.text, start, end, dialect.delimiter, bounds);
    const x = count === 0 ? NaN : parseNumber(lines.text, bounds[0] ?? 0, bounds[1] ?? 0, markCode(dialect));
    known.set(line, x);
    return x;
  };
}

interface Between {
  readonly rows: number[];
  readonly strays: number[];
}

function linesBetween(
  lines: TextLines,
  decision: Decision,
  xOf: FirstNumber,
  before: Block,
  block: Block,
): Between | undefined {
  const last = before.rows[before.rows.length - 1] ?? 0;
  const first = block.rows[0] ?? 0;
  if (first - last > 20) return undefined;
  const between: Between = { rows: [], strays: [] };
  let filled = 0;
  for (let line = last + 1; line < first; line++) {
    const shape = lines.shape[line] ?? 0;
    if (decision.views.isEmpty[shape] === 1) continue;
    filled += 1;
    if (filled > MOST_BETWEEN || isWavelengthWord(lineText(lines, line))) return undefined;
    if (Number.isNaN(xOf(line))) between.strays.push(line);
    else between.rows.push(line);
  }
  return between;
}

function goesOn(xOf: FirstNumber, before: GrowingBlock, block: Block): boolean {
  if (block.fields > 2 * before.fields || before.fields > 2 * block.fields) return false;
  if (mostlyEmpty(before, block)) return false;
  const at = (line: number | undefined): number => (line === undefined ? NaN : xOf(line));
  const long = before.rows.length >= 2 ? before : block;
  const start = at(long.rows[0]);
  const step = (at(long.rows[long.rows.length - 1]) - start) / (long.rows.length - 1);
  const jump = at(block.rows[0]) - at(before.rows[before.rows.length - 1]);
  const within =
    block.rows.length < 2 || (at(block.rows[block.rows.length - 1]) - at(block.rows[0])) * step > 0;
  return within && jump * step > 0 && Math.abs(jump) <= 12 * Math.abs(step);
}

/** Rows of ever more cells are no one table: joined, nearly all of it would be empty. */
function mostlyEmpty(before: GrowingBlock, block: Block): boolean {
  const cells = Math.max(before.fields, block.fields) * (before.rows.length + block.rows.length);
  return cells > 4 * (before.cells + block.rows.length * block.fields);
}

function append(before: GrowingBlock, block: Block, between: Between): void {
  const both = before.rows.length >= 3 && block.rows.length >= 3;
  const longer = before.rows.length >= block.rows.length ? before.fields : block.fields;
  before.fields = both ? Math.max(before.fields, block.fields) : longer;
  for (const row of between.rows) before.rows.push(row);
  for (const row of block.rows) before.rows.push(row);
  for (const stray of between.strays) before.strays.push(stray);
  before.cells += block.rows.length * block.fields + between.rows.length;
  before.numbers += block.numbers;
  before.messy += block.messy;
}
