import { describe, expect, test } from 'vitest';
import { gridReducer } from '@/lib/grid/grid-reducer';
import { copyText, filledRows, gridOf, type GridAction, type GridSpec } from '@/lib/grid/grid-state';

const SPEC: GridSpec = {
  columns: [
    { key: 'name', label: 'Standard', kind: 'text' },
    { key: 'concentration', label: 'Concentration', kind: 'decimal', words: ['blank'] },
    { key: 'a1', label: 'A1', kind: 'reading' },
  ],
  extra: (ordinal) => ({ key: `a${ordinal - 1}`, label: `A${ordinal - 1}`, kind: 'reading' }),
  maxColumns: 5,
  maxRows: 6,
  minRows: 2,
};

const run = (rows: string[][], ...actions: GridAction[]) =>
  actions.reduce((state, action) => gridReducer(SPEC, state, action), gridOf(SPEC, rows));
const texts = (state: ReturnType<typeof gridOf>) => filledRows(state).map((row) => row.cells);

describe('gridReducer, moving', () => {
  test('stays inside the grid and keeps one corner while the selection grows', () => {
    const state = run([['S1', '1', '0.1']], { type: 'move', rows: -3, columns: 9 });
    expect(state.at).toEqual({ row: 0, column: 2 });
    const wider = gridReducer(SPEC, state, { type: 'move', rows: 1, columns: -1, extend: true });
    expect([wider.anchor, wider.at]).toEqual([
      { row: 0, column: 2 },
      { row: 1, column: 1 },
    ]);
  });

  test('steps from the last column to the first of the next row and back', () => {
    const at = run([['S1', '1', '0.1']], { type: 'goTo', row: 0, column: 2 }, { type: 'step', by: 1 });
    expect(at.at).toEqual({ row: 1, column: 0 });
    expect(gridReducer(SPEC, at, { type: 'step', by: -1 }).at).toEqual({ row: 0, column: 2 });
  });
});

describe('gridReducer, typing', () => {
  test('typing replaces, F2 amends, Escape gives the old text back', () => {
    const typed = run([['S1', '1', '0.1']], { type: 'edit', text: 'B' });
    expect([typed.draft, typed.amending]).toEqual(['B', false]);
    const amended = run([['S1', '1', '0.1']], { type: 'edit' });
    expect([amended.draft, amended.amending]).toEqual(['S1', true]);
    const cancelled = gridReducer(SPEC, typed, { type: 'cancel' });
    expect([cancelled.draft, texts(cancelled)]).toEqual([null, [['S1', '1', '0.1']]]);
  });

  test('typing into the last row opens another below it, up to the limit', () => {
    let state = run([]);
    for (let row = 0; row < 9; row += 1) {
      state = gridReducer(SPEC, state, { type: 'edit', text: `S${row}` });
      state = gridReducer(SPEC, state, { type: 'commit', rows: 1 });
    }
    expect(state.rows).toHaveLength(6);
    expect(state.rows.at(-1)?.cells[0]).toBe('S8');
  });

  test('leaving a cell as it was makes no step of undo', () => {
    const state = run([['S1', '1', '0.1']], { type: 'edit' }, { type: 'commit', rows: 1 });
    expect(state.past).toEqual([]);
  });

  test('going elsewhere keeps what was being typed', () => {
    const state = run(
      [['S1', '1', '0.1']],
      { type: 'edit', text: 'S9' },
      { type: 'goTo', row: 1, column: 1 },
    );
    expect(texts(state)[0]?.[0]).toBe('S9');
  });

  test('a read-only column takes neither typing nor paste nor delete', () => {
    const spec = { ...SPEC, columns: SPEC.columns.map((c, i) => ({ ...c, readOnly: i === 0 })) };
    let state = gridOf(spec, [['S1', '1', '0.1']]);
    for (const action of [
      { type: 'edit', text: 'x' },
      { type: 'paste', text: 'a\t2\t3\nb\t4\t5' },
      { type: 'selectAll' },
      { type: 'clear' },
    ] satisfies GridAction[])
      state = gridReducer(spec, state, action);
    expect(state.rows[0]?.cells).toEqual(['S1', '', '']);
  });
});

describe('gridReducer, blocks', () => {
  const BLOCK = 'S1\t0,5\t0,1012\t0,0993\nS2\t1,0\t0,2007\tOVER\r\n';

  test('pastes a block with decimal commas past the right and lower edge', () => {
    const state = run([], { type: 'paste', text: BLOCK });
    expect(texts(state)).toEqual([
      ['S1', '0.5', '0.1012', '0.0993'],
      ['S2', '1.0', '0.2007', 'OVER'],
    ]);
    expect(state.pasted).toMatchObject({ cells: 8, rows: 2, commas: 5, asked: 0, columnsLeftOut: 0 });
    expect(state.rows).toHaveLength(3);
  });

  test('says what did not fit', () => {
    const wide = run([], { type: 'paste', text: 'S1\t1\t1\t2\t3\t4\t5' });
    expect(wide.pasted).toMatchObject({ columnsLeftOut: 2, cells: 5 });
    const long = run([], {
      type: 'paste',
      text: Array.from({ length: 9 }, (_, i) => `S${i}\t${i}`).join('\n'),
    });
    expect(long.pasted).toMatchObject({ rowsLeftOut: 3, rows: 6 });
    expect(long.rows).toHaveLength(6);
  });

  test('leaves a line of headings out, and keeps a reading that is text', () => {
    const state = run([], { type: 'paste', text: 'Name\tc, mg/L\tA\nS1\t1\tOVER' });
    expect(texts(state)).toEqual([['S1', '1', 'OVER']]);
    expect(state.pasted?.headingsLeftOut).toBe(true);
    const readings = run([], { type: 'goTo', row: 0, column: 2 }, { type: 'paste', text: 'OVER\n0.3' });
    expect(texts(readings).map((row) => row[2])).toEqual(['OVER', '0.3']);
  });

  test('asks about 1,234 and reads it as decimal only when told to', () => {
    const state = run([], { type: 'paste', text: 'S1\t0,5\t1,234' });
    expect(texts(state)).toEqual([['S1', '0.5', '1,234']]);
    expect(state.pasted?.asked).toBe(1);
    const answered = gridReducer(SPEC, state, { type: 'commasArePoints' });
    expect(texts(answered)).toEqual([['S1', '0.5', '1.234']]);
    expect(answered.pasted?.asked).toBe(0);
  });

  test('one copied cell fills the selection', () => {
    const state = run(
      [
        ['S1', '1', ''],
        ['S2', '2', ''],
      ],
      { type: 'goTo', row: 0, column: 2 },
      { type: 'move', rows: 1, columns: 0, extend: true },
      { type: 'paste', text: '0.4' },
    );
    expect(texts(state).map((row) => row[2])).toEqual(['0.4', '0.4']);
  });

  test('copies the selection as a spreadsheet takes it, and pasting it back changes nothing', () => {
    const rows = [
      ['S1', '1', '0.1'],
      ['S2', '2', 'OVER'],
    ];
    const chosen = run(rows, { type: 'move', rows: 1, columns: 2, extend: true });
    expect(copyText(chosen)).toBe('S1\t1\t0.1\nS2\t2\tOVER');
    expect(texts(gridReducer(SPEC, chosen, { type: 'paste', text: copyText(chosen) }))).toEqual(rows);
  });

  test('fills down from the first chosen row, or from the cell above a single one', () => {
    const rows = [
      ['S1', '1', ''],
      ['', '', ''],
      ['', '', ''],
    ];
    const chosen = run(rows, { type: 'move', rows: 2, columns: 1, extend: true }, { type: 'fillDown' });
    expect(texts(chosen)).toEqual(Array(3).fill(['S1', '1', '']));
    const single = run(rows, { type: 'goTo', row: 1, column: 1 }, { type: 'fillDown' });
    expect(texts(single)).toEqual([
      ['S1', '1', ''],
      ['', '1', ''],
    ]);
    expect(run(rows, { type: 'fillDown' }).past).toEqual([]);
  });
});

describe('gridReducer, undo', () => {
  test('takes every change back one by one and forward again, row identities included', () => {
    const start = run([['S1', '1', '0.1']]);
    const pasted = gridReducer(SPEC, start, { type: 'paste', text: 'A\t2\t0.2\t0.3\nB\t3\t0.4\t0.5' });
    const cleared = gridReducer(SPEC, gridReducer(SPEC, pasted, { type: 'selectAll' }), { type: 'clear' });
    const back = gridReducer(SPEC, cleared, { type: 'undo' });
    expect(back.rows).toEqual(pasted.rows);
    const first = gridReducer(SPEC, back, { type: 'undo' });
    expect([first.rows, first.width]).toEqual([start.rows, 3]);
    expect(gridReducer(SPEC, first, { type: 'redo' }).rows).toEqual(pasted.rows);
    expect(gridReducer(SPEC, start, { type: 'undo' })).toBe(start);
  });

  test('a new change ends what could be done again', () => {
    const undone = run([['S1', '1', '0.1']], { type: 'clear' }, { type: 'undo' });
    const other = gridReducer(SPEC, undone, { type: 'setCell', row: 0, column: 1, text: '7' });
    expect(gridReducer(SPEC, other, { type: 'redo' })).toBe(other);
  });

  test('a replaced sheet can be taken back', () => {
    const state = run([['S1', '1', '0.1']], { type: 'replace', rows: [['X', '9', '0.9']] }, { type: 'undo' });
    expect(texts(state)).toEqual([['S1', '1', '0.1']]);
  });
});
