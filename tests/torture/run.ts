import { readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { fuzzReaders, STEPS_PER_BYTE, STEPS_PER_PACKED_BYTE } from '../support/reader-fuzz';
import { sharedFile } from '../support/shared';

/** Damage 100,000 files and read them: `npm run torture`, or with other numbers `npm run torture -- 5000 7`. */
const [runs = 100_000, seed = 1] = process.argv.slice(2).map(Number);
/** Larger files would only make the same damage slower to read. */
const LARGEST = 200_000;
/** An input of this kind that takes longer than this hangs, as far as a person can tell. */
const LONGEST_MS = 5000;

function filesUnder(folder: string): Uint8Array[] {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .sort()
    .map((name) => path.join(folder, name))
    .filter((file) => statSync(file).isFile() && statSync(file).size <= LARGEST && !file.endsWith('.json'))
    .map((file) => readFileSync(file));
}

const shared = sharedFile('spectra');
const moreFiles = shared ? filesUnder(shared) : [];
const start = performance.now();
const report = fuzzReaders({
  runs,
  seed,
  moreFiles,
  onProgress: (done) => {
    if (done % Math.ceil(runs / 20) === 0)
      console.info(`${done} of ${runs} read, ${((performance.now() - start) / 1000).toFixed(0)} s`);
  },
});

for (const failure of report.failures.slice(0, 20)) console.error(failure);
const slow = report.longestMs > LONGEST_MS;
if (slow) console.error(`input ${report.slowest} of seed ${seed} took ${report.longestMs.toFixed(0)} ms`);
const failed = report.failures.length > 0 || slow;
console.info(
  [
    `${failed ? 'FAILED' : 'passed'}: ${report.runs} damaged files (seed ${seed})`,
    `${report.read} read, ${report.refused} refused in a sentence, ${report.failures.length} failures`,
    `at most ${report.mostSteps.toFixed(0)} steps a byte (limit ${STEPS_PER_BYTE})`,
    `and ${report.mostPackedSteps.toFixed(0)} in JCAMP-DX or refused (limit ${STEPS_PER_PACKED_BYTE})`,
    `longest ${report.longestMs.toFixed(0)} ms (input ${report.slowest})`,
  ].join(', '),
);
process.exitCode = failed ? 1 : 0;
