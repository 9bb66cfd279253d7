import { seededUniform } from '../../fixtures/generate/seeded-noise';
import { demoFiles } from '../../fixtures/generate/write-demo';
import { spectrumFixtures } from '../../fixtures/generate/write-spectra';
import { readFile, type ReadAnswers } from '@/lib/readers/read-file';
import { ReaderError, type ReadSpectrum } from '@/lib/readers/types';

/**
 * The readers' own count of what they looked at stays under this many steps for each byte, and a small constant. In
 * JCAMP-DX a repeat count may stand for 32 points a byte, each of which is looked at some ten times.
 */
export const STEPS_PER_BYTE = 40;
export const STEPS_PER_PACKED_BYTE = 400;
const STEPS_AT_LEAST = 2000;

export interface FuzzReport {
  readonly runs: number;
  readonly read: number;
  readonly refused: number;
  /** The most steps for a byte that any input took: of packed tables, and of all others. */
  readonly mostSteps: number;
  readonly mostPackedSteps: number;
  /** The longest any input took, and which it was. */
  readonly longestMs: number;
  readonly slowest: number;
  /** Inputs that threw something else or took too many steps: what happened, and how to make them again. */
  readonly failures: readonly string[];
}

const encoder = new TextEncoder();

function fixtureFiles(): Uint8Array[] {
  const contents = [...spectrumFixtures().map((fixture) => fixture.content), ...Object.values(demoFiles())];
  return contents
    .map((content) => (typeof content === 'string' ? encoder.encode(content) : content))
    .filter((bytes) => bytes.length > 0);
}

export interface FuzzOptions {
  readonly runs: number;
  readonly seed: number;
  /** Damaged as well as the project's own fixtures. */
  readonly moreFiles?: readonly Uint8Array[];
  readonly onProgress?: (done: number) => void;
}

/** Read files with bytes flipped, cut, repeated, inserted and joined; the same inputs for the same seed. */
export function fuzzReaders({ runs, seed, moreFiles = [], onProgress }: FuzzOptions): FuzzReport {
  const files = [...fixtureFiles(), ...moreFiles];
  const uniform = seededUniform(seed);
  const failures: string[] = [];
  let [read, refused, mostSteps, mostPackedSteps, longestMs, slowest] = [0, 0, 0, 0, 0, 0];
  for (let run = 0; run < runs; run++) {
    const bytes = mutated(files, uniform);
    const outcome = readCounted(bytes, uniform() < 0.2 ? someAnswers(uniform) : {});
    if (outcome.refused) refused += 1;
    else read += 1;
    if (outcome.packed) mostPackedSteps = Math.max(mostPackedSteps, outcome.perByte);
    else mostSteps = Math.max(mostSteps, outcome.perByte);
    if (outcome.ms > longestMs) [longestMs, slowest] = [outcome.ms, run];
    failures.push(...outcome.wrong.map((wrong) => `input ${run} of seed ${seed}: ${wrong}`));
    onProgress?.(run + 1);
  }
  return { runs, read, refused, mostSteps, mostPackedSteps, longestMs, slowest, failures };
}

export interface CountedReading {
  readonly refused: boolean;
  readonly packed: boolean;
  /** Steps for each byte, a small constant apart. */
  readonly perByte: number;
  readonly ms: number;
  readonly wrong: readonly string[];
}

/** Read an input with its steps counted, and say what it did that no input may do. */
export function readCounted(bytes: Uint8Array, answers: ReadAnswers = {}): CountedReading {
  const wrong: string[] = [];
  let steps = 0;
  let refused = false;
  // A refusal in the midst of a packed table counts as one: which reader refused, nobody says.
  let packed = true;
  const start = performance.now();
  try {
    const { spectra, reader } = readFile(bytes, 'fuzz.csv', {
      ...answers,
      onSteps: (more) => (steps += more),
    });
    packed = reader === 'jcamp-dx';
    wrong.push(...spectra.flatMap((spectrum) => brokenPromise(spectrum) ?? []));
  } catch (error) {
    refused = true;
    if (!(error instanceof ReaderError)) wrong.push(String(error));
  }
  // With answers a file is read twice: as answered, and for the key of its shape.
  const readings = Object.keys(answers).length > 0 ? 2 : 1;
  const most = packed ? STEPS_PER_PACKED_BYTE : STEPS_PER_BYTE;
  const over = Math.max(0, steps / readings - STEPS_AT_LEAST);
  if (over > most * bytes.length)
    wrong.push(`${steps} steps in ${readings} readings of ${bytes.length} bytes`);
  const perByte = bytes.length === 0 ? 0 : over / bytes.length;
  return { refused, packed, perByte, ms: performance.now() - start, wrong };
}

/** What every spectrum of any input promises: places and numbers agree, x is finite, a point without a number is a gap. */
function brokenPromise(spectrum: ReadSpectrum): string | undefined {
  const { x, y, gaps } = spectrum;
  if (x.length !== y.length || x.length === 0) return `${x.length} x for ${y.length} y`;
  if (!x.every(Number.isFinite)) return 'an x that is not finite';
  const gapPlaces = new Set(gaps.map((gap) => gap.index));
  if (gapPlaces.size !== gaps.length) return 'two gaps at one place';
  const bad = y.findIndex((value, i) => (gapPlaces.has(i) ? !Number.isNaN(value) : !Number.isFinite(value)));
  return bad < 0 ? undefined : `y[${bad}] is ${y[bad]} and ${gapPlaces.has(bad) ? 'a' : 'no'} gap`;
}

function mutated(files: readonly Uint8Array[], uniform: () => number): Uint8Array {
  const below = (n: number): number => Math.floor(uniform() * n);
  let bytes: Uint8Array = (files[below(files.length)] ?? new Uint8Array()).slice();
  for (let change = 1 + below(4); change > 0; change--) {
    const at = below(bytes.length + 1);
    const length = below(Math.min(400, bytes.length - at + 1));
    const way = below(6);
    if (below(200) === 0) bytes = blownUp(bytes, at, 1 + below(40), 1 + below(2000));
    else if (way === 0) for (let k = 1 + below(6); k > 0; k--) bytes[below(bytes.length)] = below(256);
    else if (way === 1) bytes = bytes.slice(0, at);
    else if (way === 2) bytes = joined(bytes.slice(0, at), bytes.slice(at + length));
    else if (way === 3)
      bytes = joined(
        bytes.slice(0, at + length),
        ...Array.from({ length: 1 + below(5) }, () => bytes.slice(at, at + length)),
        bytes.slice(at + length),
      );
    else if (way === 4) bytes = joined(bytes, files[below(files.length)] ?? new Uint8Array());
    else
      bytes = joined(bytes.slice(0, at), encoder.encode(TOKENS[below(TOKENS.length)] ?? ''), bytes.slice(at));
    if (bytes.length === 0) break;
  }
  return bytes;
}

/** Answers as a person may give them, fitting or not. */
function someAnswers(uniform: () => number): ReadAnswers {
  const answers = Array.from(
    { length: 1 + Math.floor(3 * uniform()) },
    () => ANSWERS[Math.floor(uniform() * ANSWERS.length)],
  );
  return Object.assign({}, ...answers) as ReadAnswers;
}

const ANSWERS: readonly ReadAnswers[] = [
  { delimiter: ',' },
  { delimiter: 'blank' },
  { delimiter: 'fixed' },
  { decimalMark: ',' },
  { headerRows: 3 },
  { orientation: 'columns' },
  { orientation: 'pairs' },
  { orientation: 'rows' },
  { orientation: 'long' },
  { orientation: 'stacked' },
  { xColumn: 0 },
  { xColumn: 2 },
  { xRow: 0 },
  { xRow: 5 },
  { yColumns: [1] },
  { yColumns: [3, 0] },
  { xUnit: 'eV' },
  { signal: 'percentTransmittance' },
  { firstX: 200, stepX: 0.5 },
  { table: 1 },
  { equalX: 'mean' },
  { equalX: 'keep' },
  { turnRound: 'split' },
  { missingValues: [0, -9999] },
];

/** A short piece many times over: what grows faster than its input shows here. */
function blownUp(bytes: Uint8Array, at: number, length: number, times: number): Uint8Array {
  const piece = bytes.slice(at, at + length);
  const pieces = Array.from({ length: times }, () => piece);
  return joined(bytes.slice(0, at), ...pieces, bytes.slice(at + length));
}

/** What damage likes to put into such files. */
const TOKENS = [
  '##END=',
  '##TITLE=',
  '\n##XYDATA=(X++(Y..Y))\n',
  'Z99999999',
  '9'.repeat(40),
  ',,,,,,,,',
  '"',
  '\r',
  '\n\n\n',
  '-',
  '1e999',
  'NaN',
  'E+',
  '?',
  '##NPOINTS=1e9\n',
  '##XFACTOR=0\n',
  '##DELTAX=1e-300\n',
  '\t;|,',
  '\ufeff',
  '\u0000',
  '>3.5',
  '0,1,2',
  '%',
  '##YFACTOR=1E400\n',
  '##PAGE=N=2\n',
  '##DATA TYPE=LINK\n',
  '$$',
  '<!--',
  '<D>',
  ' '.repeat(300),
  '(',
  '\u2212',
  '-9999',
];

function joined(...parts: readonly Uint8Array[]): Uint8Array {
  const out = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  let at = 0;
  for (const part of parts) {
    out.set(part, at);
    at += part.length;
  }
  return out;
}
