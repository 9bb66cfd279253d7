import type { UnknownRequest } from '../types';
import type { Ledger } from './ledger';

/** The last line of a result: the text that leaves the notebook, and what it was chosen by. */
export function recordReport(
  ledger: Ledger,
  unknown: Pick<UnknownRequest, 'readings'>,
  hasResult: boolean,
  alsoFrom: readonly string[],
  report: string,
): void {
  const readingIds = unknown.readings.map((_, i) => `unknown.reading.${i + 1}.reading`);
  ledger.solved(
    {
      id: 'unknown.report',
      label: 'What is reported',
      symbol: 'report',
      source: 'report rules of this notebook',
    },
    'the first case that applies',
    [...(hasResult ? ['unknown.result', 'unknown.U'] : readingIds), ...alsoFrom],
    report,
  );
}
