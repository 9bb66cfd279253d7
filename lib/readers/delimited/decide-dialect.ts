import type { TextLines } from '../text-lines';
import type { ReadOptions } from '../types';
import { bestBlock, blockScore, findBlocks, type Block } from './blocks';
import { candidateDialects, viewShapes, type Dialect, type ShapeViews } from './candidates';

export interface Decision {
  readonly dialect: Dialect;
  readonly views: ShapeViews;
  readonly blocks: readonly Block[];
  readonly best: Block;
  /** Another delimiter that reads the table about as well, with other columns. */
  readonly rival?: Dialect;
}

/** A reading with this share of the winner's score is its rival. */
const ALIKE = 0.98;

/**
 * Decide delimiter and decimal mark together: each pair reads the whole table, and the one whose best block holds the
 * most numbers wins. On equal terms a delimiter that is seldom part of a number goes first.
 */
export function decideDialect(lines: TextLines, options: ReadOptions): Decision | undefined {
  const decision = decideAmong(lines, options, 2);
  if (decision && decision.best.rows.length >= 1) return decision;
  return decideAmong(lines, options, 1);
}

function decideAmong(lines: TextLines, options: ReadOptions, minNumbers: number): Decision | undefined {
  const from = options.headerRows ?? 0;
  let winner: Decision | undefined;
  let most = 0;
  const tried: { dialect: Dialect; score: number; fields: number }[] = [];
  for (const dialect of candidateDialects(lines.text, options)) {
    const views = viewShapes(lines, dialect, minNumbers);
    options.onSteps?.(views.looked + lines.count);
    const blocks = findBlocks(lines, views, from);
    const best = bestBlock(blocks);
    if (!best) continue;
    if (dialect.delimiter === 'fixed') options.onSteps?.(best.rows.length);
    const score = blockScore(best);
    if (dialect.delimiter === 'fixed' && !options.delimiter && !equalLengths(lines, best)) continue;
    tried.push({ dialect, score, fields: best.fields });
    if (score <= most) continue;
    most = score;
    winner = { dialect, views, blocks, best };
  }
  if (!winner) return undefined;
  const { dialect, best } = winner;
  const rival = tried.find(
    (other) =>
      other.score >= ALIKE * most &&
      other.dialect.delimiter !== dialect.delimiter &&
      other.fields !== best.fields,
  );
  return rival ? { ...winner, rival: rival.dialect } : winner;
}

/** Fixed width shows in lines of one length. */
function equalLengths(lines: TextLines, block: Block): boolean {
  let most = 0;
  const counts = new Map<number, number>();
  for (const row of block.rows) {
    let end = lines.end[row] ?? 0;
    while (end > (lines.start[row] ?? 0) && lines.text.charCodeAt(end - 1) === 32) end -= 1;
    const length = end - (lines.start[row] ?? 0);
    const count = (counts.get(length) ?? 0) + 1;
    counts.set(length, count);
    most = Math.max(most, count);
  }
  return most >= 0.95 * block.rows.length;
}
