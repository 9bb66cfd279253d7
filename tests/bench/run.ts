import { calculateStandardCurve, type CurveRequest } from '@/lib/engine';
import { readFile } from '@/lib/readers/read-file';
import { measure, report } from './measure';

/** Fixed work that every figure is put beside: a plain sum of square roots. */
const reference = measure('reference loop', () => {
  let sum = 0;
  for (let k = 1; k <= 1_000_000; k += 1) sum += Math.sqrt(k);
  return sum;
});

const LEVELS = [0, 0.1, 0.25, 0.5, 1, 2, 4];
const request = (unknowns: number): CurveRequest => ({
  signal: 'absorbance',
  pathLengthMm: 10,
  unit: 'mg/L',
  formulaMass: 55.845,
  model: 'linear',
  weighting: 'none',
  confidence: 0.95,
  absorbanceLimit: 2,
  standards: LEVELS.map((concentration, index) => ({
    concentration,
    readings: [0.0043 + 0.198 * concentration, 0.0043 + 0.198 * concentration + 0.0005 * (index % 3)],
  })),
  unknowns: Array.from({ length: unknowns }, (_, index) => ({
    name: `S${index}`,
    readings: [0.1 + 0.005 * index, 0.101 + 0.005 * index],
    dilution: [{ takenMl: 25, toMl: 50, takenUMl: 0.02, toUMl: 0.03 }],
  })),
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
report(
  measure('curve of 14 points with its judgements and working', () => calculateStandardCurve(request(0))),
  reference,
);
report(
  measure('the same with 20 unknowns, budgets and working', () => calculateStandardCurve(request(20))),
  reference,
);
report(
  measure('a 10,000-point two-column file, detected and read', () => readFile(spectrumBytes, 'a.csv')),
  plainSplit,
);
