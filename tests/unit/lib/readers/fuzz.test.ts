import { expect, test } from 'vitest';
import { fuzzReaders } from '../../../support/reader-fuzz';

test('2,000 damaged files: read or refused in a sentence, in bounded steps, and every spectrum keeps its promises', () => {
  const report = fuzzReaders(2000, 20_261);
  expect(report.failures).toEqual([]);
  expect(report.read).toBeGreaterThan(1000);
  expect(report.refused).toBeGreaterThan(100);
}, 120_000);
