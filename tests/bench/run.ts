import { readFile } from '@/lib/readers/read-file';
import { benchEngine } from './engine';
import { measure, report } from './measure';

/** Fixed work that every figure is put beside: a plain sum of square roots. */
const reference = measure('reference loop', () => {
  let sum = 0;
  for (let k = 1; k <= 1_000_000; k += 1) sum += Math.sqrt(k);
  return sum;
});

const spectrumText = Array.from(
  { length: 10_000 },
  (_, index) =>
    `${(200 + index * 0.1).toFixed(1)},${(0.5 * Math.exp(-(((index - 5000) / 900) ** 2))).toFixed(6)}`,
).join('\n');
const spectrumBytes = new TextEncoder().encode(`Wavelength (nm),Abs\n${spectrumText}\n`);

const plainSplit = measure('a plain split and Number of the same bytes', () =>
  new TextDecoder()
    .decode(spectrumBytes)
    .split('\n')
    .map((line) => line.split(',').map(Number)),
);

console.info(`reference loop ${reference.medianMs.toFixed(3)} ms (one million square roots)\n`);
benchEngine(reference);
report(
  measure('a 10,000-point two-column file, detected and read', () => readFile(spectrumBytes, 'a.csv')),
  plainSplit,
);
