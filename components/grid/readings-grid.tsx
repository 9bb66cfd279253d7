'use client';

import {
  useId,
  useLayoutEffect,
  useRef,
  type ClipboardEvent,
  type Dispatch,
  type KeyboardEvent,
} from 'react';
import { keyAnswer } from '@/lib/grid/grid-keys';
import { copyText, gridColumns, type GridAction, type GridSpec, type GridState } from '@/lib/grid/grid-state';
import { GridBody } from './grid-body';
import { lookOf, type Looks } from './grid-looks';
import { GridHead } from './grid-head';
import { GridStatus, GridTools } from './grid-tools';

export interface ReadingsGridProps extends Looks {
  /** The name of the grid for those who do not see its card's title. */
  label: string;
  spec: GridSpec;
  state: GridState;
  dispatch: Dispatch<GridAction>;
  addColumnLabel?: string;
}

/** Sends changes after which the focus follows the cursor of the grid. */
function useFollowingFocus(state: GridState, dispatch: Dispatch<GridAction>) {
  const tableRef = useRef<HTMLTableElement>(null);
  const wantedRef = useRef(false);
  const typing = state.draft !== null;
  useLayoutEffect(() => {
    if (!wantedRef.current) return;
    wantedRef.current = false;
    if (typing) return;
    const place = `[data-cell="${state.at.row}:${state.at.column}"]`;
    tableRef.current?.querySelector<HTMLElement>(place)?.focus();
  });
  function send(action: GridAction) {
    wantedRef.current = true;
    dispatch(action);
  }
  return { tableRef, send };
}

/**
 * A grid of cells for the keyboard: arrows, Enter down, Tab right, type to replace, F2 to amend, Escape,
 * Delete, blocks copied and pasted as a spreadsheet does, Ctrl+D fill down, Ctrl+Z and Ctrl+Y. It draws the
 * state of lib/grid and owns none of its own. One tab stop; Escape, then Tab leaves it from anywhere.
 */
export function ReadingsGrid({ label, spec, state, dispatch, addColumnLabel, ...looks }: ReadingsGridProps) {
  const id = useId();
  const { tableRef, send } = useFollowingFocus(state, dispatch);
  const releasedRef = useRef(false);
  const columns = gridColumns(spec, state.width);

  function onKeyDown(event: KeyboardEvent) {
    if (event.nativeEvent.isComposing) return;
    const pressed = {
      key: event.key,
      ctrl: event.ctrlKey || event.metaKey,
      shift: event.shiftKey,
      alt: event.altKey,
    };
    const answer = keyAnswer(pressed, state, releasedRef.current);
    if (event.key !== 'Shift') releasedRef.current = answer === 'release';
    if (answer === null || answer === 'leave' || answer === 'release') return;
    event.preventDefault();
    send(answer);
  }

  function onPaste(event: ClipboardEvent) {
    const text = event.clipboardData.getData('text/plain');
    // inside a cell being typed, one value is the input's own paste; a block belongs to the grid
    if (text === '' || (state.draft !== null && !/[\t\n\r]/.test(text.trim()))) return;
    event.preventDefault();
    if (state.draft !== null) dispatch({ type: 'cancel' });
    send({ type: 'paste', text });
  }

  function onCopy(event: ClipboardEvent, andClear = false) {
    if (state.draft !== null) return;
    event.preventDefault();
    event.clipboardData.setData('text/plain', copyText(state));
    if (andClear) send({ type: 'clear' });
  }

  const here = state.rows[state.at.row];
  const columnHere = columns[state.at.column];
  const sentence = here && columnHere ? lookOf(here, columnHere, state.at.column, looks).sentence : undefined;

  return (
    <div className="grid gap-2">
      <div className="relative overflow-x-auto rounded-control border">
        <table
          ref={tableRef}
          role="grid"
          aria-label={label}
          aria-multiselectable="true"
          aria-describedby={`${id}-keys`}
          className="w-full border-separate border-spacing-0 text-[0.84375rem]"
          onKeyDown={onKeyDown}
          onPaste={onPaste}
          onCopy={(event) => onCopy(event)}
          onCut={(event) => onCopy(event, true)}
        >
          <GridHead columns={columns} />
          <GridBody
            columns={columns}
            state={state}
            send={send}
            dispatch={dispatch}
            looks={looks}
            statusId={`${id}-status`}
          />
        </table>
      </div>
      <GridStatus id={`${id}-status`} state={state} sentence={sentence} dispatch={dispatch} />
      <div className="flex flex-wrap items-center justify-between gap-2">
        <GridTools state={state} dispatch={dispatch} addColumnLabel={addColumnLabel} />
        <p id={`${id}-keys`} className="text-xs text-ink-2">
          Type, or paste a block from a spreadsheet. Ctrl+D fills down; Escape, then Tab leaves the grid.
        </p>
      </div>
    </div>
  );
}
