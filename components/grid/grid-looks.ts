import type { ReactNode } from 'react';
import { cellContent, type GridColumn } from '@/lib/grid/grid-cell';
import type { GridRow } from '@/lib/grid/grid-state';
import type { CellLook } from './grid-cell';

/** What the page around a grid adds to its cells. */
export interface Looks {
  /** Text shown in a read-only cell in place of its own. */
  shown?: (row: GridRow, column: GridColumn) => string | undefined;
  /** A sentence about a cell beyond what its column already says. */
  problem?: (row: GridRow, column: GridColumn, index: number) => string | undefined;
  /** Why a cell is left out; it is then struck through. */
  leftOut?: (row: GridRow, column: GridColumn, index: number) => string | undefined;
  /** Something small before the text, such as a light disc. */
  adorn?: (row: GridRow, column: GridColumn, text: string) => ReactNode;
}

export function lookOf(
  row: GridRow,
  column: GridColumn,
  index: number,
  looks: Looks,
): { look: CellLook; sentence?: string } {
  const text = looks.shown?.(row, column) ?? row.cells[index] ?? '';
  const content = cellContent(column, text);
  const problem =
    (content.state === 'bad' ? content.message : undefined) ?? looks.problem?.(row, column, index);
  const look: CellLook = {
    text,
    problem,
    gap: content.state === 'gap',
    leftOut: looks.leftOut?.(row, column, index),
    adornment: looks.adorn?.(row, column, text),
  };
  return { look, sentence: problem ?? (content.state === 'gap' ? content.message : undefined) };
}
