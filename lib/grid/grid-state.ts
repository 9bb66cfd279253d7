import type { GridColumn } from './grid-cell';
import type { PasteSummary } from './grid-paste';

/* The state of a keyboard grid; how it changes stands in grid-reducer.ts. */

export interface GridRow {
  /** Stays with the row through edits and undo, so that a remark about a row finds it again. */
  readonly id: string;
  readonly cells: readonly string[];
}

export interface GridPlace {
  readonly row: number;
  readonly column: number;
}

/** What a grid is made of. `extra` makes the columns that appear when something wider is pasted. */
export interface GridSpec {
  readonly columns: readonly GridColumn[];
  readonly extra?: (ordinal: number) => GridColumn;
  readonly maxColumns?: number;
  readonly maxRows: number;
  /** Rows shown in an empty grid. */
  readonly minRows?: number;
  /** The rows are given: no row comes or goes. */
  readonly fixedRows?: boolean;
}

export interface Sheet {
  readonly rows: readonly GridRow[];
  readonly width: number;
}

export interface GridState extends Sheet {
  readonly nextId: number;
  readonly at: GridPlace;
  /** The other corner of the selection; the same place when one cell is chosen. */
  readonly anchor: GridPlace;
  /** The text being typed into the cell at `at`; null when nothing is typed. */
  readonly draft: string | null;
  /** Started by F2 or a second tap: arrows move the caret instead of leaving the cell. */
  readonly amending: boolean;
  readonly past: readonly Sheet[];
  readonly future: readonly Sheet[];
  readonly pasted: PasteSummary | null;
}

export type GridAction =
  | { readonly type: 'move'; readonly rows: number; readonly columns: number; readonly extend?: boolean }
  | { readonly type: 'goTo'; readonly row: number; readonly column: number; readonly extend?: boolean }
  | { readonly type: 'selectAll' | 'cancel' | 'clear' | 'fillDown' | 'undo' | 'redo' | 'commasArePoints' }
  /** Start typing: with a text the cell is replaced, without one it is amended. */
  | { readonly type: 'edit'; readonly text?: string }
  | { readonly type: 'type'; readonly text: string }
  | { readonly type: 'commit'; readonly rows?: number; readonly columns?: number }
  /** The next cell in reading order, or the one before. */
  | { readonly type: 'step'; readonly by: 1 | -1 }
  | { readonly type: 'paste'; readonly text: string }
  | { readonly type: 'setCell'; readonly row: number; readonly column: number; readonly text: string }
  | { readonly type: 'addColumn' }
  /** `reset` forgets what could be undone: the rows are other things now. */
  | { readonly type: 'replace' | 'reset'; readonly rows: readonly (readonly string[])[] };

export const clamp = (value: number, low: number, high: number) => Math.min(Math.max(value, low), high);
const isBlank = (row: GridRow) => row.cells.every((cell) => cell.trim() === '');

/** The columns as they stand now, the ones added by a wide paste included. */
export function gridColumns(spec: GridSpec, width: number): readonly GridColumn[] {
  const extra = Array.from({ length: Math.max(0, width - spec.columns.length) }, (_, index) =>
    spec.extra?.(spec.columns.length + index),
  ).filter((column) => column !== undefined);
  return [...spec.columns, ...extra];
}

/** Rows padded to the width, with room below: one blank row to type or paste into. */
export function tidy(spec: GridSpec, sheet: Sheet, nextId: number): Sheet & { nextId: number } {
  const pad = (cells: readonly string[]) =>
    Array.from({ length: sheet.width }, (_, index) => cells[index] ?? '');
  const rows = sheet.rows.map((row) =>
    row.cells.length === sheet.width ? row : { ...row, cells: pad(row.cells) },
  );
  let id = nextId;
  if (!spec.fixedRows) {
    const last = rows.at(-1);
    while (rows.length < (spec.minRows ?? 1)) rows.push({ id: `r${id++}`, cells: pad([]) });
    if (last && rows.at(-1) === last && !isBlank(last) && rows.length < spec.maxRows)
      rows.push({ id: `r${id++}`, cells: pad([]) });
  }
  return { rows, width: sheet.width, nextId: id };
}

/** A grid that starts with these rows of text. */
export function gridOf(spec: GridSpec, rows: readonly (readonly string[])[] = []): GridState {
  const width = clamp(
    Math.max(spec.columns.length, ...rows.map((row) => row.length)),
    spec.columns.length,
    spec.extra ? (spec.maxColumns ?? spec.columns.length) : spec.columns.length,
  );
  const given = rows.map((cells, index) => ({ id: `r${index}`, cells: [...cells] }));
  return {
    ...tidy(spec, { rows: given, width }, rows.length),
    at: { row: 0, column: 0 },
    anchor: { row: 0, column: 0 },
    draft: null,
    amending: false,
    past: [],
    future: [],
    pasted: null,
  };
}

/** The rows that hold anything. */
export function filledRows(state: GridState): readonly GridRow[] {
  return state.rows.filter((row) => !isBlank(row));
}

export function selectionOf(state: GridState) {
  return {
    top: Math.min(state.at.row, state.anchor.row),
    bottom: Math.max(state.at.row, state.anchor.row),
    left: Math.min(state.at.column, state.anchor.column),
    right: Math.max(state.at.column, state.anchor.column),
  };
}

/** The chosen block as a spreadsheet takes it. */
export function copyText(state: GridState): string {
  const { top, bottom, left, right } = selectionOf(state);
  const lines = state.rows.slice(top, bottom + 1).map((row) => row.cells.slice(left, right + 1).join('\t'));
  return lines.join('\n');
}
