import { couldBeGrouped } from '@/lib/schemas/decimal';
import { readBlock, type PasteSummary } from './grid-paste';
import {
  clamp,
  gridColumns,
  gridOf,
  selectionOf,
  tidy,
  type GridAction,
  type GridRow,
  type GridSpec,
  type GridState,
  type Sheet,
} from './grid-state';

/* Every way a grid can change. Pure: the component only draws the state. */

const UNDO_STEPS = 100;

function goTo(state: GridState, row: number, column: number, extend = false): GridState {
  const at = {
    row: clamp(row, 0, state.rows.length - 1),
    column: clamp(column, 0, state.width - 1),
  };
  return { ...state, at, anchor: extend ? state.anchor : at, draft: null, amending: false };
}

function changed(
  spec: GridSpec,
  state: GridState,
  sheet: Sheet,
  pasted: PasteSummary | null = null,
): GridState {
  const past = [...state.past, { rows: state.rows, width: state.width }].slice(-UNDO_STEPS);
  const next = tidy(spec, sheet, state.nextId);
  return { ...state, ...next, past, future: [], draft: null, amending: false, pasted };
}

type Write = (text: string, row: number, column: number) => string;

/** Write into the cells of a rectangle; cells that may not change stay. Null when nothing changes. */
function written(spec: GridSpec, state: GridState, write: Write): readonly GridRow[] | null {
  const columns = gridColumns(spec, state.width);
  let any = false;
  const rows = state.rows.map((row, rowIndex) => {
    const cells = row.cells.map((text, column) =>
      columns[column]?.readOnly ? text : write(text, rowIndex, column),
    );
    if (cells.every((cell, index) => cell === row.cells[index])) return row;
    any = true;
    return { ...row, cells };
  });
  return any ? rows : null;
}

function write(spec: GridSpec, state: GridState, how: Write): GridState {
  const rows = written(spec, state, how);
  const idle = { ...state, draft: null, amending: false };
  return rows ? changed(spec, idle, { rows, width: state.width }) : idle;
}

function commit(spec: GridSpec, state: GridState): GridState {
  const { draft, at } = state;
  if (draft === null) return state;
  return write(spec, state, (text, row, column) => (row === at.row && column === at.column ? draft : text));
}

function step(spec: GridSpec, state: GridState, by: 1 | -1): GridState {
  const done = commit(spec, state);
  const place = done.at.row * done.width + done.at.column + by;
  const next = clamp(place, 0, done.rows.length * done.width - 1);
  return goTo(done, Math.floor(next / done.width), next % done.width);
}

function fillDown(spec: GridSpec, state: GridState): GridState {
  const chosen = selectionOf(state);
  const from = chosen.top === chosen.bottom ? chosen.top - 1 : chosen.top;
  const source = state.rows[from]?.cells;
  if (!source) return state;
  const inside = (row: number, column: number) =>
    row > from && row <= chosen.bottom && column >= chosen.left && column <= chosen.right;
  return write(spec, state, (text, row, column) => (inside(row, column) ? (source[column] ?? '') : text));
}

/** One copied cell goes into every chosen one. */
function pasteOne(spec: GridSpec, state: GridState, text: string, summary: PasteSummary): GridState {
  const { top, bottom, left, right } = selectionOf(state);
  const rows = written(spec, state, (old, row, column) =>
    row >= top && row <= bottom && column >= left && column <= right ? text : old,
  );
  const size = { rows: bottom - top + 1, cells: (bottom - top + 1) * (right - left + 1) };
  return changed(spec, state, { rows: rows ?? state.rows, width: state.width }, { ...summary, ...size });
}

/** The sheet made large enough for a block that starts at the top left corner of the selection. */
function grown(spec: GridSpec, state: GridState, height: number, width: number) {
  const { top } = selectionOf(state);
  let nextId = state.nextId;
  const rows = [...state.rows];
  while (rows.length < top + height) rows.push({ id: `r${nextId++}`, cells: [] });
  return { ...state, ...tidy({ ...spec, fixedRows: true }, { rows, width }, nextId) };
}

function paste(spec: GridSpec, state: GridState, text: string): GridState {
  const { top, left } = selectionOf(state);
  const widest = Math.max(state.width, spec.extra ? (spec.maxColumns ?? state.width) : state.width);
  const { cells, ...told } = readBlock(text, gridColumns(spec, widest).slice(left));
  const blockWidth = Math.max(0, ...cells.map((row) => row.length));
  const width = clamp(left + blockWidth, state.width, widest);
  const height = Math.min(cells.length, (spec.fixedRows ? state.rows.length : spec.maxRows) - top);
  const summary: PasteSummary = {
    ...told,
    cells: cells.slice(0, height).reduce((sum, row) => sum + Math.min(row.length, width - left), 0),
    rows: height,
    columnsLeftOut: left + Math.max(blockWidth, 1) > width ? left + blockWidth - width : 0,
    rowsLeftOut: cells.length - height,
  };
  if (cells.length === 1 && blockWidth === 1) return pasteOne(spec, state, cells[0]?.[0] ?? '', summary);
  const room = grown(spec, state, height, width);
  const rows = written(spec, room, (old, row, column) =>
    row >= top && row < top + height ? (cells[row - top]?.[column - left] ?? old) : old,
  );
  const after = changed(spec, { ...state, nextId: room.nextId }, { rows: rows ?? room.rows, width }, summary);
  const corner = { row: top + Math.max(height, 1) - 1, column: Math.min(left + blockWidth, width) - 1 };
  return { ...after, anchor: { row: top, column: left }, at: corner };
}

/** The answer to the question of the last paste: the commas are decimal marks. */
function commasArePoints(spec: GridSpec, state: GridState): GridState {
  const columns = gridColumns(spec, state.width);
  const after = write(spec, state, (text, _row, column) =>
    columns[column]?.kind !== 'text' && couldBeGrouped(text) ? text.trim().replace(',', '.') : text,
  );
  const pasted = state.pasted && { ...state.pasted, asked: 0, commas: state.pasted.commas + 1 };
  return { ...after, pasted };
}

function travel(state: GridState, from: 'past' | 'future'): GridState {
  const to = from === 'past' ? 'future' : 'past';
  const sheet = state[from].at(-1);
  if (!sheet) return state;
  const here = { rows: state.rows, width: state.width };
  const next = {
    ...state,
    ...sheet,
    [from]: state[from].slice(0, -1),
    [to]: [...state[to], here],
    pasted: null,
  };
  return goTo(next, state.at.row, state.at.column);
}

/** Every change of a grid. */
export function gridReducer(spec: GridSpec, state: GridState, action: GridAction): GridState {
  switch (action.type) {
    case 'move':
      return goTo(state, state.at.row + action.rows, state.at.column + action.columns, action.extend);
    case 'goTo':
      return goTo(commit(spec, state), action.row, action.column, action.extend);
    case 'selectAll':
      return {
        ...state,
        anchor: { row: 0, column: 0 },
        at: { row: state.rows.length - 1, column: state.width - 1 },
      };
    case 'edit': {
      const column = gridColumns(spec, state.width)[state.at.column];
      if (column?.readOnly) return state;
      const draft = action.text ?? state.rows[state.at.row]?.cells[state.at.column] ?? '';
      return { ...state, anchor: state.at, draft, amending: action.text === undefined };
    }
    case 'type':
      return { ...state, draft: action.text };
    case 'commit': {
      const done = commit(spec, state);
      const { rows = 0, columns = 0 } = action;
      return rows === 0 && columns === 0 ? done : goTo(done, done.at.row + rows, done.at.column + columns);
    }
    case 'cancel':
      return state.draft === null
        ? { ...state, anchor: state.at }
        : { ...state, draft: null, amending: false };
    case 'step':
      return step(spec, state, action.by);
    case 'clear': {
      const { top, bottom, left, right } = selectionOf(state);
      return write(spec, state, (text, row, column) =>
        row >= top && row <= bottom && column >= left && column <= right ? '' : text,
      );
    }
    case 'fillDown':
      return fillDown(spec, state);
    case 'paste':
      return paste(spec, state, action.text);
    case 'commasArePoints':
      return commasArePoints(spec, state);
    case 'setCell':
      return write(spec, state, (text, row, column) =>
        row === action.row && column === action.column ? action.text : text,
      );
    case 'addColumn': {
      const widest = spec.extra ? (spec.maxColumns ?? state.width) : state.width;
      return state.width < widest
        ? changed(spec, state, { rows: state.rows, width: state.width + 1 })
        : state;
    }
    case 'reset':
      return gridOf(spec, action.rows);
    case 'replace':
      return {
        ...gridOf(spec, action.rows),
        past: [...state.past, { rows: state.rows, width: state.width }].slice(-UNDO_STEPS),
      };
    case 'undo':
      return travel(state, 'past');
    case 'redo':
      return travel(state, 'future');
  }
}
