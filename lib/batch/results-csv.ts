import type { BatchView } from '@/lib/views/batch';
import { resultTable, type ResultCell } from './result-rows';
import { guardedText } from './text-guard';

const LINE_END = '\r\n';

function field(cell: ResultCell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return String(cell);
  const text = guardedText(cell);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

const line = (cells: readonly ResultCell[]) => cells.map(field).join(',') + LINE_END;

/** "value (mg/L)": in a file the unit stands in the name, so that every line below is data. */
const heading = (name: string, unit: string) => (unit === '' ? name : `${name} (${unit})`);

/**
 * The results of a batch as a CSV file (RFC 4180): one line of headings, one line a sample, CRLF, decimal
 * points, every digit that was computed. Texts that would start a formula carry an apostrophe (guardedText).
 */
export function resultsCsv(batch: BatchView): string {
  const { names, units, rows } = resultTable(batch);
  const headings = names.map((name, index) => heading(name, units[index] ?? ''));
  return line(headings) + rows.map(line).join('');
}

/** A file name from a title: letters, digits and hyphens. */
export function resultsFileName(batch: BatchView): string {
  const name = batch.title
    .normalize('NFKD')
    .replace(/[^\w]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 80);
  return `${name || 'batch'}-v${batch.version}-results.csv`;
}
