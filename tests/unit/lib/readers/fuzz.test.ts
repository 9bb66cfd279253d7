import { describe, expect, test } from 'vitest';
import { BLOW_UPS } from '../../../support/reader-blow-ups';
import { fuzzReaders, readCounted } from '../../../support/reader-fuzz';

test('2,000 damaged files: read or refused in a sentence, in bounded steps, and every spectrum keeps its promises', () => {
  const report = fuzzReaders({ runs: 2000, seed: 20_261 });
  expect(report.failures).toEqual([]);
  expect(report.read).toBeGreaterThan(1000);
  expect(report.refused).toBeGreaterThan(100);
}, 120_000);

describe('inputs made to be slow take steps in proportion to their bytes', () => {
  // One that grows faster than its input meets the time limit of a test here, too, were its steps not counted.
  test.each(BLOW_UPS.map(({ name, make }) => [name, make] as const))('%s', (_, make) => {
    const [short, long] = [10_000, 80_000].map((size) => readCounted(new TextEncoder().encode(make(size))));
    expect([short?.wrong, long?.wrong]).toEqual([[], []]);
    expect(long?.perByte).toBeLessThan(1.3 * (short?.perByte ?? 0) + 2);
  });
});
