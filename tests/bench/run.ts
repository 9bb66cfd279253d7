import { benchEngine } from './engine';
import { measure } from './measure';
import { benchReaders } from './readers';

/** Fixed work that every figure is put beside: a plain sum of square roots. */
const reference = measure('reference loop', () => {
  let sum = 0;
  for (let k = 1; k <= 1_000_000; k += 1) sum += Math.sqrt(k);
  return sum;
});

console.info(`reference loop ${reference.medianMs.toFixed(3)} ms (one million square roots)\n`);
benchEngine(reference);
console.info();
benchReaders(reference);
