import { cellContent, type GridColumn } from '@/lib/grid/grid-cell';
import type { GridRow, GridSpec } from '@/lib/grid/grid-state';
import { LIMITS } from '@/lib/limits';
import type { StandardDraftInput } from '@/lib/schemas/curve';

/* The grid of standards and the standards it spells. Row by row: name, concentration, readings. */

export const BLANK_WORD = 'blank';
const FIRST_READING = 2;
const FIRST_READINGS_SHOWN = 3;

/** A subscript would be read aloud as nothing; A1 is read as it is written. */
const readingColumn = (ordinal: number, letter: string): GridColumn => ({
  key: `reading-${ordinal}`,
  label: `${letter}${ordinal}`,
  kind: 'reading',
  width: '5.75rem',
});

export function typedSpec(unit: string, letter: string): GridSpec {
  return {
    columns: [
      { key: 'name', label: 'Standard', kind: 'text', width: '5.5rem' },
      {
        key: 'concentration',
        label: 'Concentration',
        unit,
        kind: 'decimal',
        words: [BLANK_WORD],
        width: '8.5rem',
      },
      ...Array.from({ length: FIRST_READINGS_SHOWN }, (_, index) => readingColumn(index + 1, letter)),
    ],
    extra: (ordinal) => readingColumn(ordinal - FIRST_READING + 1, letter),
    maxColumns: FIRST_READING + LIMITS.readingsPerStandard,
    maxRows: LIMITS.standards,
    minRows: 6,
  };
}

export function spectraSpec(unit: string, count: number): GridSpec {
  return {
    columns: [
      { key: 'spectrum', label: 'Spectrum', kind: 'text', readOnly: true, width: '9rem' },
      { key: 'name', label: 'Standard', kind: 'text', width: '5.5rem' },
      {
        key: 'concentration',
        label: 'Concentration',
        unit,
        kind: 'decimal',
        words: [BLANK_WORD],
        width: '8.5rem',
      },
      { key: 'reading', label: 'A read', kind: 'text', readOnly: true, width: '6rem' },
    ],
    maxRows: count,
    fixedRows: true,
  };
}

/** Why things are left out, by row, and by row and reading. */
export interface LeftOut {
  /** By the id of a row: the whole standard. */
  readonly rows: Readonly<Record<string, string>>;
  /** By "row id/column": one reading. */
  readonly cells: Readonly<Record<string, string>>;
}
export const NOTHING_LEFT_OUT: LeftOut = { rows: {}, cells: {} };
export const cellKey = (rowId: string, column: number) => `${rowId}/${column}`;

/** Where a standard of the draft and its readings stand in the grid; rows of spectra go by the spectrum's id. */
export interface GridSource {
  /** The first row of it; the row that a whole standard is left out by. */
  readonly rowId: string;
  readonly readings: readonly { readonly rowId: string; readonly column: number }[];
}

export interface SpelledStandards {
  readonly standards: readonly StandardDraftInput[];
  readonly sources: readonly GridSource[];
}

const isBlankRow = (row: GridRow) => row.cells.every((cell) => cell.trim() === '');
const isBlankWord = (text: string) => text.trim().toLowerCase() === BLANK_WORD;

/** The standards a typed grid spells. Rows without anything are passed over; a blank cell is no reading. */
export function typedStandards(rows: readonly GridRow[], leftOut: LeftOut): SpelledStandards {
  const standards: StandardDraftInput[] = [];
  const sources: GridSource[] = [];
  let count = 0;
  for (const row of rows) {
    if (isBlankRow(row)) continue;
    const [name = '', concentration = '', ...cells] = row.cells;
    const role = isBlankWord(concentration) ? 'blank' : 'standard';
    if (role === 'standard') count += 1;
    const filled = cells.flatMap((text, index) =>
      text.trim() === '' ? [] : [{ text: text.trim(), column: index + FIRST_READING }],
    );
    standards.push({
      role,
      name: name.trim() || (role === 'blank' ? 'Blank' : `S${count}`),
      concentration: role === 'blank' ? '' : concentration,
      leftOut: leftOut.rows[row.id] ?? null,
      readings: filled.map(({ text, column }) => ({
        text,
        leftOut: leftOut.cells[cellKey(row.id, column)] ?? null,
      })),
    });
    sources.push({ rowId: row.id, readings: filled.map(({ column }) => ({ rowId: row.id, column })) });
  }
  return { standards, sources };
}

export const SPECTRUM_READING_COLUMN = 3;

/**
 * The standards that chosen spectra make: rows of one name and one concentration are readings of one standard.
 *
 * @param spectrumIds the spectrum of each row, in the order of the rows
 */
export function spectraStandards(
  rows: readonly GridRow[],
  spectrumIds: readonly string[],
  leftOut: LeftOut,
): SpelledStandards {
  const groups = new Map<string, { standard: StandardDraftInput; source: GridSource }>();
  rows.forEach((row, index) => {
    const spectrumId = spectrumIds[index];
    if (spectrumId === undefined) return;
    const [spectrum = '', name = '', concentration = ''] = row.cells;
    const role = isBlankWord(concentration) ? 'blank' : 'standard';
    const called = name.trim() || (role === 'blank' ? 'Blank' : spectrum.trim());
    const key = JSON.stringify([called, concentration.trim().replace(',', '.').toLowerCase()]);
    const group = groups.get(key) ?? {
      standard: {
        role,
        name: called,
        concentration: role === 'blank' ? '' : concentration,
        leftOut: leftOut.rows[spectrumId] ?? null,
        readings: [],
      },
      source: { rowId: spectrumId, readings: [] },
    };
    const place = { rowId: spectrumId, column: SPECTRUM_READING_COLUMN };
    const why = leftOut.cells[cellKey(spectrumId, SPECTRUM_READING_COLUMN)] ?? null;
    groups.set(key, {
      standard: {
        ...group.standard,
        readings: [...group.standard.readings, { spectrumId, leftOut: why }],
      },
      source: { ...group.source, readings: [...group.source.readings, place] },
    });
  });
  const all = [...groups.values()];
  return { standards: all.map(({ standard }) => standard), sources: all.map(({ source }) => source) };
}

/** Rows named "blank" that were given the concentration 0: most often a blank, not a standard. */
export function looksLikeBlank(name: string, concentration: string, column: GridColumn): boolean {
  const content = cellContent(column, concentration);
  return (
    /^(reagent[\s-]*)?bl(an)?k\b/i.test(name.trim()) && content.state === 'number' && content.value === 0
  );
}
