import type { ReadSpectrum, TablePreview } from './types';

/** Rows shown of each end of a table, and the most cells of a row. */
const ENDS = 5;
const MOST_CELLS = 24;
const LONGEST_CELL = 80;

/** The first and last rows of a table of `rows` rows, whose cells `cellsOf` gives as they stand in the file. */
export function previewTable(
  columns: readonly string[],
  rows: number,
  cellsOf: (row: number) => readonly string[],
): TablePreview {
  const cut = (cells: readonly string[]): string[] =>
    cells.slice(0, MOST_CELLS).map((cell) => cell.slice(0, LONGEST_CELL));
  const shown = (from: number, to: number): string[][] =>
    Array.from({ length: Math.max(0, to - from) }, (_, i) => cut(cellsOf(from + i)));
  const head = Math.min(ENDS, rows);
  return {
    columns: cut(columns),
    first: shown(0, head),
    last: shown(Math.max(head, rows - ENDS), rows),
    rows,
  };
}

/** The ends of a spectrum, for formats whose own lines say little to a person. */
export function previewSpectrum(spectrum: ReadSpectrum | undefined): TablePreview {
  if (!spectrum) return { columns: [], first: [], last: [], rows: 0 };
  const gapTexts = new Map(spectrum.gaps.map((gap) => [gap.index, gap.text]));
  return previewTable([`x (${spectrum.xUnit})`, spectrum.signalText || 'y'], spectrum.x.length, (row) => [
    String(spectrum.x[row]),
    gapTexts.get(row) ?? String(spectrum.y[row]),
  ]);
}
