/** Inputs of one kind at any size: `make(n)` gives a text of about n characters. */
export interface BlowUp {
  readonly name: string;
  readonly make: (size: number) => string;
}

const R = (piece: string, times: number): string => piece.repeat(Math.max(1, Math.floor(times)));
const list = (count: number, of: (i: number) => string): string[] =>
  Array.from({ length: Math.floor(count) }, (_, i) => of(i));
const TABLE = '\n200,1\n201,2\n202,3\n';
const NTUPLE = '##PAGE=N=1\n##DATA TABLE=(X++(Y..Y))\n200 1 2 3\n';
const GRID = '##TITLE=a\n##XUNITS=NM\n##FIRSTX=200\n##LASTX=300\n';
const SERIES_X =
  '<Series name="nm" dependency="independent"><AutoIncrementedValueSet><StartValue><D>200</D></StartValue><Increment><D>1</D></Increment></AutoIncrementedValueSet><Unit label="nm"/></Series>';
const seriesY = (from: number): string =>
  `<Series name="y"><IndividualValueSet startIndex="${from}"><D>1</D></IndividualValueSet></Series>`;

/** Rows of ever more cells under one x that goes on: joined to one table, they would make it nearly all empty. */
function ramp(size: number): string {
  const rows = list(size / 12, (i) => `${(200 + i / 100).toFixed(2)} 1`);
  for (let wide = 2; wide < size / 48; wide *= 2)
    for (let k = 0; k < 3; k++) rows.push(`${(200 + rows.length / 100).toFixed(2)} ${R('1 ', wide)}`);
  return rows.join('\n');
}

/**
 * What makes a careless reader slow: comments and signs that a pattern can part in many ways, blanks without end, one
 * thing compared with all others of its kind, lengths that the file only claims.
 */
export const BLOW_UPS: readonly BlowUp[] = [
  { name: 'comments before an element', make: (n) => `<?xml version="1.0"?>${R('<!--a-->', n / 8)}<root>` },
  { name: 'comment signs', make: (n) => `${R('$', n)}\nfoo` },
  { name: 'comment lines', make: (n) => `${R('$$ $$ $$\n\n', n / 10)}foo\n` },
  { name: 'blank lines after a label sign', make: (n) => `##\n${R('\n', n)}` },
  { name: 'blanks inside a cell', make: (n) => `a,b,c\n220,0.1,x\n230,0.2,x\n240,0.3,x${R(' ', n)}y\n1,2,3` },
  { name: 'blanks inside a heading', make: (n) => `nm,t${R(' ', n)}z${TABLE}` },
  { name: 'blanks and hyphens inside a heading', make: (n) => `"x",a${R(' -', n / 2)}z${TABLE}` },
  { name: 'blanks inside a declaration', make: (n) => `missing${R(' ', n)}x${TABLE}` },
  { name: 'declarations', make: (n) => `${R('missing = -9\n', n / 13)}${TABLE}` },
  { name: 'brackets never closed', make: (n) => `wavelength ${R('(', n)}\n200 0.1\n201 0.2\n202 0.3\n` },
  { name: 'words in a heading', make: (n) => `${R('t ', n / 2)}\n200 0.1\n201 0.2\n202 0.3\n` },
  { name: 'quotes', make: (n) => `${R('"', n)}${TABLE}` },
  { name: 'quotes never closed', make: (n) => R('200,"1\n', n / 7) },
  { name: 'one number without end', make: (n) => `${R('9', n)},1${TABLE}` },
  { name: 'signs between digits', make: (n) => `${R('1-', n / 2)}\n${R('200-1\n', 10)}` },
  {
    name: 'wide rows with blank lines between',
    make: (n) =>
      [0, 1, 2, 0, 1, 2]
        .map((row) => `${row === 0 ? '\n' : ''}${200 + row},${R('0.1,', n / 24)}0.2`)
        .join('\n'),
  },
  {
    name: 'many named columns',
    make: (n) =>
      [
        `nm,${list(n / 16, (i) => `a${i}`).join(',')}`,
        ...list(4, (i) => `${200 + i},${R('0,', n / 16)}`),
      ].join('\n'),
  },
  {
    name: 'columns that could all be keys',
    make: (n) =>
      list(12, (row) => `${200 + (row % 3)},0.${row},${R(`${(row >> 2) % 3},`, n / 24)}1`).join('\n'),
  },
  { name: 'one x for all', make: (n) => `300,1\n${list(n / 10, (i) => `300,${i}`).join('\n')}\n400,1\n` },
  { name: 'tables one below the other', make: (n) => R(`a\nb\nc\nd${TABLE}`, n / 28) },
  {
    name: 'tables of several builds',
    make: (n) =>
      list(
        n / 40,
        (i) => `wavelength\n${list(3, (row) => `${200 + row}${R(',5', 1 + (i % 3))}`).join('\n')}`,
      ).join('\n'),
  },
  {
    name: 'a record before each table',
    make: (n) =>
      list(n / 56, (i) => `key${i}: v\n${list(7, (k) => `30${k},${k % 4}`).join('\n')}`).join('\n'),
  },
  { name: 'rows of ever more cells', make: ramp },
  { name: 'damaged line after damaged line', make: (n) => list(n / 14, (i) => `${200 + i},1\nx`).join('\n') },
  {
    name: 'labels before pages',
    make: (n) =>
      `##TITLE=a\n##DATA TYPE=UV\n${list(n / 30, (i) => `##$L${i}=1\n`).join('')}${R(NTUPLE, n / 80)}`,
  },
  {
    name: 'variables before pages',
    make: (n) => `##TITLE=a\n##DATA TYPE=UV\n##SYMBOL=${R('X,', n / 4)}Y\n${R(NTUPLE, n / 80)}`,
  },
  { name: 'blocks inside blocks', make: (n) => R('##TITLE=a\n##DATA TYPE=LINK\n', n / 26) },
  { name: 'repeat counts', make: (n) => `${GRID}##XYDATA=(X++(Y..Y))\n${R('200A0S9Z9\n', n / 10)}` },
  {
    name: 'a repeat count for each byte',
    make: (n) => `${GRID}##XYDATA=(X++(Y..Y))\n${R('200A0Z00\n', n / 9)}`,
  },
  {
    name: 'tables of one long repeat',
    make: (n) => `${GRID}${R('##XYDATA=(X++(Y..Y))\n200A0Z00\n', n / 30)}`,
  },
  {
    name: 'pairs of one x',
    make: (n) => `${GRID}##XYPOINTS=(XY..XY)\n${list(n / 10, (i) => `300,${i}`).join('\n')}`,
  },
  {
    name: 'a claimed length',
    make: (n) => `<AnIML><SeriesSet length="${n}">${SERIES_X}${R(seriesY(0), n / 95)}`,
  },
  { name: 'values far out', make: (n) => `<AnIML><SeriesSet>${SERIES_X}${R(seriesY(n - 100), n / 95)}` },
  { name: 'elements never closed', make: (n) => `<AnIML>${R('<b>', n / 6)}${R('</c>', n / 6)}` },
  {
    name: 'encoded blanks',
    make: (n) =>
      `<AnIML><SeriesSet>${SERIES_X}<Series name="y"><EncodedValueSet>${R(' ', n)}</EncodedValueSet></Series>`,
  },
];
