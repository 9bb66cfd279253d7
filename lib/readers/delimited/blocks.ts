import type { TextLines } from '../text-lines';
import type { ShapeViews } from './candidates';

/** Rows of one table that follow each other: same number of cells, text in the same places. */
export interface Block {
  /** Line numbers from 0. */
  readonly rows: readonly number[];
  readonly fields: number;
  readonly numbers: number;
  readonly messy: number;
  /** Rows before which blank lines stand. */
  readonly breaks: readonly number[];
}

/** All blocks of a file under one dialect, in file order. Blank lines do not end a block; other lines do. */
export function findBlocks(lines: TextLines, views: ShapeViews, fromLine: number): Block[] {
  const blocks: Block[] = [];
  let open:
    | { rows: number[]; fields: number; mask: number; numbers: number; messy: number; breaks: number[] }
    | undefined;
  let blankBefore = false;
  for (let line = fromLine; line < lines.count; line++) {
    const shape = lines.shape[line] ?? 0;
    if (views.isEmpty[shape] === 1) {
      blankBefore = true;
      continue;
    }
    const fields = views.fields[shape] ?? 0;
    const mask = views.mask[shape] ?? 0;
    const isRow = views.isRow[shape] === 1;
    if (open && (!isRow || open.fields !== fields || open.mask !== mask)) {
      blocks.push(open);
      open = undefined;
    }
    if (isRow) {
      open ??= { rows: [], fields, mask, numbers: 0, messy: 0, breaks: [] };
      if (blankBefore && open.rows.length > 0) open.breaks.push(open.rows.length);
      open.rows.push(line);
      open.numbers += views.numbers[shape] ?? 0;
      open.messy += views.messy[shape] ?? 0;
    }
    blankBefore = false;
  }
  if (open) blocks.push(open);
  return blocks;
}

/** How well a dialect reads a block: every number counts for it, every cell left tangled twice against it. */
export function blockScore(block: Block): number {
  return block.numbers - 2 * block.messy;
}

/** The block that a reading stands or falls with. */
export function bestBlock(blocks: readonly Block[]): Block | undefined {
  let best: Block | undefined;
  for (const block of blocks) if (!best || blockScore(block) > blockScore(best)) best = block;
  return best;
}
