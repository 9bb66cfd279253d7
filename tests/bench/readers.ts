import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import Papa from 'papaparse';
import { jcampBlock } from '../../fixtures/generate/encode-jcamp';
import { readFile } from '@/lib/readers/read-file';
import { measure, measureInTurn, report, type Measured } from './measure';

const encoder = new TextEncoder();

/** A table of two columns with an invented band: `points` rows under a heading. */
function twoColumns(points: number): Uint8Array {
  const rows = Array.from({ length: points }, (_, index) => {
    const x = (200 + index * 0.1).toFixed(1);
    return `${x},${(0.5 * Math.exp(-(((index - points / 2) / 900) ** 2))).toFixed(6)}`;
  });
  return encoder.encode(`Wavelength (nm),Abs\n${rows.join('\n')}\n`);
}

/** An invented spectrum in difference form, as long as the longest that real files were found to hold. */
function differenceForm(points: number): Uint8Array {
  const y = Array.from({ length: points }, (_, i) =>
    Math.round(40_000 * Math.exp(-(((i - 6000) / 1500) ** 2))),
  );
  const spectrum = {
    title: 'invented',
    y,
    yFactor: 1e-5,
    firstX: 200,
    deltaX: 0.05,
    form: 'DIFDUP',
  } as const;
  return encoder.encode(jcampBlock(spectrum).join('\r\n'));
}

/** What a reader that guesses nothing has to do at least. */
function plainSplit(bytes: Uint8Array): number[][] {
  return new TextDecoder()
    .decode(bytes)
    .split('\n')
    .map((line) => line.split(',').map(Number));
}

const typed = (bytes: Uint8Array): unknown =>
  Papa.parse(new TextDecoder().decode(bytes), { dynamicTyping: true }).data;

/** A table of about so many million bytes. */
const megabytes = (size: number): Uint8Array => twoColumns(Math.round((size * 1e6) / 15.4));

function benchTables(): void {
  const table = twoColumns(10_000);
  const [own, split, papa] = measureInTurn(
    [
      ['a 10,000-point two-column file, detected and read', () => readFile(table, 'a.csv')],
      ['a plain split and Number of the same bytes', () => plainSplit(table)],
      ['papaparse with its own typing', () => typed(table)],
    ],
    200,
  );
  if (own && split) report(own, split);
  if (own && papa) report(own, papa);
}

function benchSizes(reference: Measured): void {
  const sizes = [1, 2, 4].map((size) => ({ size, bytes: megabytes(size) }));
  const times = measureInTurn(
    sizes.map(({ size, bytes }) => [`${size} MB of two columns`, () => readFile(bytes, 'a.csv')]),
    15,
  );
  for (const time of times) report(time, reference);
  const perMegabyte = times.map(({ medianMs }, i) => medianMs / (sizes[i]?.size ?? NaN));
  console.info(`ms for a megabyte at 1, 2, 4 MB: ${perMegabyte.map((ms) => ms.toFixed(1)).join(', ')}`);
}

/** A full collection, so that what is measured afterwards is held and not merely left over. */
function collect(): void {
  setFlagsFromString('--expose-gc');
  const gc = runInNewContext('gc') as () => void;
  // Buffers are given back by the collection after the one that finds them dead.
  gc();
  gc();
}

const usedBytes = (): number => {
  const { heapUsed, arrayBuffers } = process.memoryUsage();
  return heapUsed + arrayBuffers;
};

/** Heap and buffers while a table is read (the highest of many looks) and what its result holds. */
function memoryOfReading(size: number): void {
  const bytes = megabytes(size);
  collect();
  const before = usedBytes();
  let most = 0;
  const look = (): void => {
    most = Math.max(most, usedBytes() - before);
  };
  const result = readFile(bytes, 'a.csv', { onSteps: look });
  look();
  collect();
  const held = usedBytes() - before;
  const points = result.spectra.reduce((sum, { x }) => sum + x.length, 0);
  const times = (used: number): string => (used / bytes.length).toFixed(1);
  console.info(
    `memory for ${size} MB (${points} points): ${times(most)} times the input at most, ${times(held)} held`,
  );
}

/** Speed and memory of the readers. */
export function benchReaders(reference: Measured): void {
  benchTables();
  const packed = differenceForm(13_550);
  report(
    measure('13,550 points of JCAMP-DX in DIFDUP', () => readFile(packed, 'a.jdx'), {
      runs: 100,
      warmUp: 20,
    }),
    reference,
  );
  benchSizes(reference);
  memoryOfReading(5);
}
