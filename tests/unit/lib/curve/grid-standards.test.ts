import { describe, expect, test } from 'vitest';
import { cellIssues, draftIssues, SPECTRA_COLUMNS, TYPED_COLUMNS } from '@/lib/curve/draft-issues';
import {
  cellKey,
  looksLikeBlank,
  NOTHING_LEFT_OUT,
  spectraStandards,
  typedSpec,
  typedStandards,
} from '@/lib/curve/grid-standards';
import { gridOf } from '@/lib/grid/grid-state';
import { curveDraftInput } from '../../../support/curve-draft';

const SPEC = typedSpec('mg/L', 'A');
const rowsOf = (rows: string[][]) => gridOf(SPEC, rows).rows;

describe('typedStandards', () => {
  test('names what has no name, tells blanks apart, and passes over blank rows and cells', () => {
    const { standards } = typedStandards(
      rowsOf([
        ['', 'Blank', '0.01', '', ''],
        ['', '', '', '', ''],
        ['', '1', '0.2', '', '0.21'],
        ['Top', '2', '0.4', 'OVER', ''],
      ]),
      NOTHING_LEFT_OUT,
    );
    expect(standards.map(({ role, name, readings }) => [role, name, readings.length])).toEqual([
      ['blank', 'Blank', 1],
      ['standard', 'S1', 2],
      ['standard', 'Top', 2],
    ]);
  });

  test('what is left out follows its row and its column, past blank cells', () => {
    const rows = rowsOf([
      ['S1', '1', '0.2', '', '0.21'],
      ['S2', '2', '0.4'],
    ]);
    const { standards } = typedStandards(rows, {
      rows: { r1: 'spilt' },
      cells: { [cellKey('r0', 4)]: 'bubble' },
    });
    expect(standards[0]?.readings.map(({ leftOut }) => leftOut)).toEqual([null, 'bubble']);
    expect(standards[1]?.leftOut).toBe('spilt');
  });
});

describe('spectraStandards', () => {
  test('rows of one name and concentration are readings of one standard, commas or points', () => {
    const rows = rowsOf([
      ['a.csv', 'S1', '0,5', ''],
      ['b.csv', 'S2', '1', ''],
      ['c.csv', 'S1', '0.5', ''],
      ['d.csv', '', 'blank', ''],
    ]);
    const ids = ['a', 'b', 'c', 'd'];
    const { standards, sources } = spectraStandards(rows, ids, {
      rows: {},
      cells: { [cellKey('c', 3)]: 'cloudy' },
    });
    expect(standards.map(({ name, role }) => [name, role])).toEqual([
      ['S1', 'standard'],
      ['S2', 'standard'],
      ['Blank', 'blank'],
    ]);
    expect(standards[0]?.readings).toEqual([
      { spectrumId: 'a', leftOut: null },
      { spectrumId: 'c', leftOut: 'cloudy' },
    ]);
    expect(sources[0]?.readings.map(({ rowId }) => rowId)).toEqual(['a', 'c']);
  });
});

test('sentences about standards stand at the cells they came from', () => {
  const rows = rowsOf([
    ['', '', '', ''],
    ['S1', 'x', '0.2', '', '0.3'],
    ['S2', '2', '', ''],
  ]);
  const spelled = typedStandards(rows, NOTHING_LEFT_OUT);
  const draft = { ...curveDraftInput(), standards: [...spelled.standards] };
  const cells = cellIssues(draftIssues(draft), spelled, TYPED_COLUMNS);
  expect(Object.keys(cells).sort()).toEqual(['r1/1', 'r2/2']);
  const ofReading = cellIssues({ 'standards.0.readings.1': 'no' }, spelled, SPECTRA_COLUMNS);
  expect(ofReading).toEqual({ 'r1/4': 'no' });
});

test.each([
  ['Blank', '0', true],
  ['Reagent blank', '0.0', true],
  ['blk 2', '0', true],
  ['S0', '0', false],
  ['Blank', '0.1', false],
  ['Blanket', '0', false],
])('%s at %s looks like a blank: %s', (name, concentration, answer) => {
  const column = SPEC.columns[1];
  if (!column) throw new Error('the grid has a column of concentrations');
  expect(looksLikeBlank(name, concentration, column)).toBe(answer);
});
