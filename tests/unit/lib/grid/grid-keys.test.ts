import { describe, expect, test } from 'vitest';
import { keyAnswer, type GridKey } from '@/lib/grid/grid-keys';
import { gridOf, type GridSpec } from '@/lib/grid/grid-state';

const SPEC: GridSpec = {
  columns: [
    { key: 'name', label: 'Standard', kind: 'text' },
    { key: 'a1', label: 'A1', kind: 'reading' },
  ],
  maxRows: 5,
};
const press = (key: string, more: Partial<GridKey> = {}): GridKey => ({
  key,
  ctrl: false,
  shift: false,
  alt: false,
  ...more,
});
const idle = gridOf(SPEC, [['S1', '0.1']]);
const typing = { ...idle, draft: 'x' };

describe('keyAnswer', () => {
  test.each([
    ['ArrowDown', {}, { type: 'move', rows: 1, columns: 0, extend: false }],
    ['ArrowLeft', { shift: true }, { type: 'move', rows: 0, columns: -1, extend: true }],
    ['Enter', {}, { type: 'move', rows: 1, columns: 0 }],
    ['Delete', {}, { type: 'clear' }],
    ['7', {}, { type: 'edit', text: '7' }],
    ['F2', {}, { type: 'edit' }],
    ['z', { ctrl: true }, { type: 'undo' }],
    ['Z', { ctrl: true, shift: true }, { type: 'redo' }],
    ['d', { ctrl: true }, { type: 'fillDown' }],
    ['End', { ctrl: true }, { type: 'goTo', row: 1, column: 1, extend: false }],
    ['F5', {}, null],
    ['c', { ctrl: true }, null],
  ])('%s %o', (key, more, answer) => {
    expect(keyAnswer(press(key, more), idle)).toEqual(answer);
  });

  test('while typing, arrows leave the cell; while amending they move the caret', () => {
    expect(keyAnswer(press('ArrowLeft'), typing)).toEqual({ type: 'commit', rows: 0, columns: -1 });
    expect(keyAnswer(press('ArrowLeft'), { ...typing, amending: true })).toBeNull();
    expect(keyAnswer(press('Enter'), typing)).toEqual({ type: 'commit', rows: 1 });
    expect(keyAnswer(press('z', { ctrl: true }), typing)).toBeNull();
  });

  test('Tab is never a trap: it leaves at the edges, in a blank last row, and after Escape', () => {
    expect(keyAnswer(press('Tab'), idle)).toEqual({ type: 'step', by: 1 });
    expect(keyAnswer(press('Tab'), { ...idle, at: { row: 1, column: 0 } })).toBe('leave');
    expect(keyAnswer(press('Tab', { shift: true }), idle)).toBe('leave');
    expect(keyAnswer(press('Escape'), idle)).toBe('release');
    expect(keyAnswer(press('Tab'), idle, true)).toBe('leave');
  });
});
