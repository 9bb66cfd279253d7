'use client';

import { useRef, type FocusEvent, type MouseEvent, type PointerEvent } from 'react';
import type { GridColumn } from '@/lib/grid/grid-cell';
import { selectionOf, type GridAction, type GridState } from '@/lib/grid/grid-state';
import { GridCell } from './grid-cell';
import { lookOf, type Looks } from './grid-looks';

interface Place {
  row: number;
  column: number;
}

function placeOf(target: EventTarget): Place | null {
  const cell = target instanceof Element ? target.closest<HTMLElement>('[data-cell]') : null;
  const [row, column] = cell?.dataset.cell?.split(':').map(Number) ?? [];
  return row === undefined || column === undefined ? null : { row, column };
}

const isTypingAt = (state: GridState, place: Place) =>
  state.draft !== null && state.at.row === place.row && state.at.column === place.column;

/** Mouse: press chooses, drag chooses a block, a double click amends. Finger: a tap starts typing. */
function usePointer(state: GridState, send: (action: GridAction) => void) {
  const touch = useRef(false);
  return {
    onPointerDown(event: PointerEvent) {
      touch.current = event.pointerType === 'touch';
      const place = placeOf(event.target);
      if (!place || event.button !== 0 || touch.current || isTypingAt(state, place)) return;
      send({ type: 'goTo', ...place, extend: event.shiftKey });
    },
    onPointerOver(event: PointerEvent) {
      const place = placeOf(event.target);
      if (place && event.buttons === 1 && !touch.current && state.draft === null)
        send({ type: 'goTo', ...place, extend: true });
    },
    onClick(event: MouseEvent) {
      const place = placeOf(event.target);
      if (!place || !touch.current || isTypingAt(state, place)) return;
      send({ type: 'goTo', ...place });
      send({ type: 'edit' });
    },
    // focus that came by itself, from a screen reader or a script: the cursor goes with it
    onFocus(event: FocusEvent) {
      const place = event.target.matches('[data-cell]') ? placeOf(event.target) : null;
      if (place && (place.row !== state.at.row || place.column !== state.at.column))
        send({ type: 'goTo', ...place });
    },
    onDoubleClick(event: MouseEvent) {
      if (placeOf(event.target) && state.draft === null) send({ type: 'edit' });
    },
  };
}

export function GridBody({
  columns,
  state,
  send,
  dispatch,
  looks,
  statusId,
}: {
  columns: readonly GridColumn[];
  state: GridState;
  /** A change after which the focus follows the cursor. */
  send: (action: GridAction) => void;
  /** A change that leaves the focus where it is. */
  dispatch: (action: GridAction) => void;
  looks: Looks;
  statusId: string;
}) {
  const pointer = usePointer(state, send);
  const { top, bottom, left, right } = selectionOf(state);
  const isChosen = (row: number, column: number) =>
    row >= top && row <= bottom && column >= left && column <= right;
  return (
    <tbody {...pointer}>
      {state.rows.map((row, rowIndex) => (
        <tr key={row.id}>
          {columns.map((column, index) => {
            const active = rowIndex === state.at.row && index === state.at.column;
            const { look, sentence } = lookOf(row, column, index, looks);
            const { draft, amending } = state;
            return (
              <GridCell
                key={column.key}
                column={column}
                row={rowIndex}
                index={index}
                look={look}
                active={active}
                selected={isChosen(rowIndex, index)}
                typing={active && draft !== null ? { draft, amending } : null}
                describedBy={active && sentence ? statusId : undefined}
                onType={(text) => dispatch({ type: 'type', text })}
                onLeave={() => dispatch({ type: 'commit' })}
              />
            );
          })}
        </tr>
      ))}
    </tbody>
  );
}
