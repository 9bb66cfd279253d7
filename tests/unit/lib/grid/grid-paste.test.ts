import { describe, expect, test } from 'vitest';
import { cellContent, type GridColumn } from '@/lib/grid/grid-cell';
import { parseBlock, pasteWords } from '@/lib/grid/grid-paste';

describe('parseBlock', () => {
  test.each([
    [
      'a\tb\r\nc\td\r\n',
      [
        ['a', 'b'],
        ['c', 'd'],
      ],
    ],
    ['\t\tx', [['', '', 'x']]],
    ['0,5;0,1012', [['0,5', '0,1012']]],
    ['"a\tb"\t"he said ""x"""', [['a\tb', 'he said "x"']]],
    [
      '0.5  0.10\n1.0 0.20',
      [
        ['0.5', '0.10'],
        ['1.0', '0.20'],
      ],
    ],
    ['Weir 3\nSluice pond', [['Weir 3'], ['Sluice pond']]],
    ['a\t1\n\nb\t2', [['a', '1'], [''], ['b', '2']]],
  ])('reads %j', (text, cells) => {
    expect(parseBlock(text)).toEqual(cells);
  });
});

describe('pasteWords', () => {
  const base = {
    cells: 24,
    rows: 8,
    commas: 0,
    asked: 0,
    headingsLeftOut: false,
    columnsLeftOut: 0,
    rowsLeftOut: 0,
  };
  test('says how much came and what was made of it', () => {
    expect(pasteWords({ ...base, commas: 3 })).toBe('24 cells in 8 rows; decimal commas read as points');
    expect(pasteWords({ ...base, cells: 1, rows: 1 })).toBe('1 cell in 1 row');
    expect(pasteWords({ ...base, rowsLeftOut: 2 })).toContain('2 rows did not fit');
  });
});

describe('cellContent', () => {
  const reading: GridColumn = { key: 'a', label: 'A1', kind: 'reading' };
  const concentration: GridColumn = { key: 'c', label: 'c', kind: 'decimal', words: ['blank'] };
  test.each([
    [reading, '0,25', { state: 'number', value: 0.25 }],
    [reading, '−0.0002', { state: 'number', value: -0.0002 }],
    [reading, ' ', { state: 'blank' }],
    [concentration, 'Blank', { state: 'text', text: 'blank' }],
  ])('%o %j', (column, text, content) => {
    expect(cellContent(column, text)).toEqual(content);
  });
  test('keeps what an instrument writes instead of a number', () => {
    expect(cellContent(reading, 'OVER')).toMatchObject({ state: 'gap', text: 'OVER' });
    expect(cellContent(reading, '>3.5')).toMatchObject({ state: 'gap', text: '>3.5' });
  });
  test('asks about 1,234 in either kind of column and refuses words in a concentration', () => {
    expect(cellContent(reading, '1,234')).toMatchObject({
      state: 'bad',
      message: expect.stringContaining('1.234 or 1234'),
    });
    expect(cellContent(concentration, '1,234')).toMatchObject({ state: 'bad' });
    expect(cellContent(concentration, 'about 2')).toMatchObject({ state: 'bad' });
  });
});
