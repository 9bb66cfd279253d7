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
}

/**
 * Join blocks that are one table with damaged lines inside: few lines between, and x going on as before. A damaged
 * line that still begins with its x becomes a row; the others are kept apart to be told of.
 */
export function mergeBlocks(lines: TextLines, decision: Decision): MergedBlock[] {
  const merged: GrowingBlock[] = [];
  for (const block of decision.blocks) {
    const before = merged[merged.length - 1];
    const between = before ? linesBetween(lines, decision, before, block) : undefined;
    if (before && between && goesOn(lines, decision, before, block)) append(before, block, between);
    else merged.push({ ...block, rows: [...block.rows], breaks: [...block.breaks], strays: [] });
  }
  return merged;
}

interface Between {
  readonly rows: number[];
  readonly strays: number[];
}

function linesBetween(
  lines: TextLines,
  decision: Decision,
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
    if (Number.isNaN(firstNumber(lines, decision, line))) between.strays.push(line);
    else between.rows.push(line);
  }
  return between;
}

/** The first cell of a line as a number: x, or the row's index, in any table that has one. */
function firstNumber(lines: TextLines, decision: Decision, line: number): number {
  const bounds: number[] = [];
  const count = splitCells(
    lines.text,
    lines.start[line] ?? 0,
    lines.end[line] ?? 0,
    decision.dialect.delimiter,
    bounds,
  );
  return count === 0
    ? NaN
    : parseNumber(lines.text, bounds[0] ?? 0, bounds[1] ?? 0, markCode(decision.dialect));
}

function goesOn(lines: TextLines, decision: Decision, before: Block, block: Block): boolean {
  if (block.fields > 2 * before.fields || before.fields > 2 * block.fields) return false;
  const at = (line: number | undefined): number =>
    line === undefined ? NaN : firstNumber(lines, decision, line);
  const long = before.rows.length >= 2 ? before : block;
  const start = at(long.rows[0]);
  const step = (at(long.rows[long.rows.length - 1]) - start) / (long.rows.length - 1);
  const jump = at(block.rows[0]) - at(before.rows[before.rows.length - 1]);
  const within =
    block.rows.length < 2 || (at(block.rows[block.rows.length - 1]) - at(block.rows[0])) * step > 0;
  return within && jump * step > 0 && Math.abs(jump) <= 12 * Math.abs(step);
}

function append(before: GrowingBlock, block: Block, between: Between): void {
  const both = before.rows.length >= 3 && block.rows.length >= 3;
  const longer = before.rows.length >= block.rows.length ? before.fields : block.fields;
  before.fields = both ? Math.max(before.fields, block.fields) : longer;
  for (const row of between.rows) before.rows.push(row);
  for (const row of block.rows) before.rows.push(row);
  for (const stray of between.strays) before.strays.push(stray);
  before.numbers += block.numbers;
  before.messy += block.messy;
}
