import type { Signal } from '@/lib/engine';
import type { GridColumn } from '@/lib/grid/grid-cell';
import type { GridRow, GridSpec, GridState } from '@/lib/grid/grid-state';
import { LIMITS } from '@/lib/limits';
import { typedRow } from '@/lib/schemas/determination';
import { SIGNAL_SYMBOL } from './reading-text';
import type { UnknownSample } from './unknown-request';

/** The texts of one row of the grid, by what they mean. */
export interface SampleTexts {
  readonly sample: string;
  readonly readings: readonly string[];
  readonly dilution: string;
  /** Empty means the path length of the curve. */
  readonly pathLengthMm: string;
}

const MIN_ROWS = 6;

/** The grid of samples: name, so many readings, dilution, path length. */
export function sampleGrid(readingCount: number, signal: Signal, curvePathMm: number): GridSpec {
  const readings = Array.from({ length: readingCount }, (_, index): GridColumn => ({
    key: `reading${index}`,
    label: `Reading ${index + 1}`,
    unit: SIGNAL_SYMBOL[signal],
    kind: 'reading',
  }));
  return {
    columns: [
      { key: 'sample', label: 'Sample', kind: 'text', width: '9rem' },
      ...readings,
      { key: 'dilution', label: 'Dilution', unit: 'mL', kind: 'text', width: '9rem' },
      {
        key: 'pathLengthMm',
        label: 'Path length',
        unit: `mm (${curvePathMm} when empty)`,
        kind: 'decimal',
        width: '8rem',
      },
    ],
    maxRows: LIMITS.determinations,
    minRows: MIN_ROWS,
  };
}

/** The rows that hold anything, with the cell that is being typed as far as it is typed. */
export function rowsAsTyped(grid: Pick<GridState, 'rows' | 'draft' | 'at'>): readonly GridRow[] {
  const { draft, at } = grid;
  const rows = grid.rows.map((row, index) =>
    draft !== null && index === at.row
      ? { ...row, cells: row.cells.map((text, column) => (column === at.column ? draft : text)) }
      : row,
  );
  return rows.filter((row) => row.cells.some((text) => text.trim() !== ''));
}

export function textsOf(row: GridRow, readingCount: number): SampleTexts {
  const { cells } = row;
  return {
    sample: cells[0] ?? '',
    readings: cells.slice(1, 1 + readingCount),
    dilution: cells[1 + readingCount] ?? '',
    pathLengthMm: cells[2 + readingCount] ?? '',
  };
}

/** The same rows with room for another number of readings; readings that no longer fit are not lost silently. */
export function withReadingCount(rows: readonly GridRow[], from: number, to: number): string[][] {
  return rows.map((row) => {
    const { sample, readings, dilution, pathLengthMm } = textsOf(row, from);
    return [
      sample,
      ...Array.from({ length: to }, (_, index) => readings[index] ?? ''),
      dilution,
      pathLengthMm,
    ];
  });
}

/** How many readings the fullest row holds: fewer columns than this would lose some. */
export function readingsInUse(rows: readonly GridRow[], readingCount: number): number {
  return Math.max(
    1,
    ...rows.map((row) => textsOf(row, readingCount).readings.findLastIndex((text) => text.trim() !== '') + 1),
  );
}

export interface CheckedRow {
  /** Sentences by column key; empty when the row can be saved. */
  readonly problems: Readonly<Record<string, string>>;
  /** What the engine is asked for; null while the row cannot be calculated with. */
  readonly sample: UnknownSample | null;
}

function columnKey(path: readonly PropertyKey[]): string {
  return path[0] === 'readings' ? `reading${Number(path[1] ?? 0)}` : String(path[0]);
}

/** A row checked by the schema of the form, the same that the server uses. */
export function checkRow(texts: SampleTexts, signal: Signal, curvePathMm: number): CheckedRow {
  const parsed = typedRow.safeParse(filledIn(texts, curvePathMm));
  if (parsed.success) {
    const { readings, ...sample } = parsed.data;
    return {
      problems: {},
      sample: { ...sample, readings: readings.map((reading) => ({ ...reading, signal })) },
    };
  }
  const problems = parsed.error.issues.map((issue) => [columnKey(issue.path), issue.message] as const);
  return { problems: Object.fromEntries(problems), sample: null };
}

/** The row as it is sent: an empty path length is that of the curve. */
export function filledIn(texts: SampleTexts, curvePathMm: number): SampleTexts {
  return {
    ...texts,
    pathLengthMm: texts.pathLengthMm.trim() === '' ? String(curvePathMm) : texts.pathLengthMm,
  };
}
