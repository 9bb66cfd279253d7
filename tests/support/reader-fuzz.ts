import { seededUniform } from '../../fixtures/generate/seeded-noise';
import { demoFiles } from '../../fixtures/generate/write-demo';
import { spectrumFixtures } from '../../fixtures/generate/write-spectra';
import { readFile } from '@/lib/readers/read-file';
import { ReaderError, type ReadSpectrum } from '@/lib/readers/types';

/** The readers' own count of what they looked at stays under this many steps for each byte, and a small constant. */
export const STEPS_PER_BYTE = 40;
const STEPS_AT_LEAST = 2000;

export interface FuzzReport {
  readonly runs: number;
  readonly read: number;
  readonly refused: number;
  /** The most steps for a byte that any input took. */
  readonly mostSteps: number;
  /** Inputs that threw something else or took too many steps: what happened, and how to make them again. */
  readonly failures: readonly string[];
}

const encoder = new TextEncoder();

function seedFiles(): Uint8Array[] {
  const contents = [...spectrumFixtures().map((fixture) => fixture.content), ...Object.values(demoFiles())];
  return contents
    .map((content) => (typeof content === 'string' ? encoder.encode(content) : content))
    .filter((bytes) => bytes.length > 0);
}

/** Read files with bytes flipped, cut, repeated, inserted and joined; the same inputs for the same seed. */
export function fuzzReaders(runs: number, seed: number): FuzzReport {
  const files = seedFiles();
  const uniform = seededUniform(seed);
  const failures: string[] = [];
  let [read, refused, mostSteps] = [0, 0, 0];
  for (let run = 0; run < runs; run++) {
    const bytes = mutated(files, uniform);
    let steps = 0;
    try {
      const { spectra } = readFile(bytes, 'fuzz.csv', { onSteps: (more) => (steps += more) });
      read += 1;
      for (const spectrum of spectra) {
        const wrong = brokenPromise(spectrum);
        if (wrong) failures.push(`run ${run} of seed ${seed}: ${wrong}`);
      }
    } catch (error) {
      if (error instanceof ReaderError) refused += 1;
      else failures.push(`run ${run} of seed ${seed}: ${String(error)}`);
    }
    mostSteps = Math.max(mostSteps, steps / (bytes.length + STEPS_AT_LEAST / STEPS_PER_BYTE));
    if (steps > STEPS_PER_BYTE * bytes.length + STEPS_AT_LEAST)
      failures.push(`run ${run} of seed ${seed}: ${steps} steps for ${bytes.length} bytes`);
  }
  return { runs, read, refused, mostSteps, failures };
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
    if (way === 0) for (let k = 1 + below(6); k > 0; k--) bytes[below(bytes.length)] = below(256);
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
