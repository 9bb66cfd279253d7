import type { GridAction, GridState } from './grid-state';

export interface GridKey {
  readonly key: string;
  readonly ctrl: boolean;
  readonly shift: boolean;
  readonly alt: boolean;
}

/** `release`: the next Tab leaves the grid. `leave`: this Tab does. Null: the key is not the grid's. */
export type KeyAnswer = GridAction | 'release' | 'leave' | null;

const ARROWS: Readonly<Record<string, readonly [number, number]>> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
};

function whileTyping({ key, shift }: GridKey, state: GridState): KeyAnswer {
  if (key === 'Enter') return { type: 'commit', rows: shift ? -1 : 1 };
  if (key === 'Tab') return { type: 'step', by: shift ? -1 : 1 };
  if (key === 'Escape') return { type: 'cancel' };
  const arrow = ARROWS[key];
  return arrow && !state.amending ? { type: 'commit', rows: arrow[0], columns: arrow[1] } : null;
}

function withControl({ key, shift }: GridKey, state: GridState): KeyAnswer {
  const end = { row: state.rows.length - 1, column: state.width - 1 };
  switch (key.toLowerCase()) {
    case 'z':
      return { type: shift ? 'redo' : 'undo' };
    case 'y':
      return { type: 'redo' };
    case 'd':
      return { type: 'fillDown' };
    case 'a':
      return { type: 'selectAll' };
    case 'home':
      return { type: 'goTo', row: 0, column: 0, extend: shift };
    case 'end':
      return { type: 'goTo', ...end, extend: shift };
    default:
      return null;
  }
}

/** Tab goes on in reading order; it leaves from the first and the last cell, and from a blank last row. */
function tab(state: GridState, shift: boolean, released: boolean): KeyAnswer {
  const { at, rows, width } = state;
  const inLastRow = at.row === rows.length - 1;
  const rowIsBlank = rows[at.row]?.cells.every((cell) => cell.trim() === '') ?? true;
  const atEdge = shift
    ? at.row === 0 && at.column === 0
    : inLastRow && (rowIsBlank || at.column === width - 1);
  return released || atEdge ? 'leave' : { type: 'step', by: shift ? -1 : 1 };
}

/** What a key does in the grid. `released` is true after an Escape that had nothing to take back. */
export function keyAnswer(pressed: GridKey, state: GridState, released = false): KeyAnswer {
  const { key, shift } = pressed;
  if (state.draft !== null) return whileTyping(pressed, state);
  if (pressed.ctrl) return withControl(pressed, state);
  if (key === 'Tab') return tab(state, shift, released);
  const arrow = ARROWS[key];
  if (arrow) return { type: 'move', rows: arrow[0], columns: arrow[1], extend: shift };
  switch (key) {
    case 'Enter':
      return { type: 'move', rows: shift ? -1 : 1, columns: 0 };
    case 'Home':
      return { type: 'goTo', row: state.at.row, column: 0, extend: shift };
    case 'End':
      return { type: 'goTo', row: state.at.row, column: state.width - 1, extend: shift };
    case 'F2':
      return { type: 'edit' };
    case 'Delete':
    case 'Backspace':
      return { type: 'clear' };
    case 'Escape':
      return 'release';
    default:
      return key.length === 1 && !pressed.alt ? { type: 'edit', text: key } : null;
  }
}
