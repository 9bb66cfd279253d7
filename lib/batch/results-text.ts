import type { BatchView } from '@/lib/views/batch';
import { resultTable, type ResultCell } from './result-rows';
import { guardedText } from './text-guard';

export type DecimalMark = 'point' | 'comma';

function cellText(cell: ResultCell, mark: DecimalMark): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return mark === 'comma' ? String(cell).replace('.', ',') : String(cell);
  return guardedText(cell.replace(/[\t\r\n]+/g, ' '));
}

/**
 * The results of a batch for the clipboard: tab separated, a line of names, a line of units, a line a sample,
 * with the decimal mark that the person's spreadsheet reads.
 */
export function resultsText(batch: BatchView, mark: DecimalMark): string {
  const { names, units, rows } = resultTable(batch);
  return [names, units, ...rows]
    .map((cells) => cells.map((cell) => cellText(cell, mark)).join('\t'))
    .join('\n');
}
