'use client';

import { useSyncExternalStore } from 'react';
import { DownloadButton } from '@/components/ui/button';
import { CopyButton } from '@/components/ui/copy-button';
import { SegmentedControl } from '@/components/ui/radio-group';
import type { DecimalMark } from '@/lib/batch/results-text';

const KEY = 'halflight.decimal-mark';
const CHANGED = 'halflight:decimal-mark';

function subscribe(tell: () => void): () => void {
  addEventListener(CHANGED, tell);
  return () => removeEventListener(CHANGED, tell);
}

/** The mark chosen here before; else the one that numbers have in the browser's own language. */
function markNow(): DecimalMark {
  const kept = localStorage.getItem(KEY);
  if (kept === 'point' || kept === 'comma') return kept;
  return (0.5).toLocaleString().includes(',') ? 'comma' : 'point';
}

function choose(mark: string): void {
  localStorage.setItem(KEY, mark);
  dispatchEvent(new Event(CHANGED));
}

/** Ways for the results to leave the page: copied with the decimal mark of one's spreadsheet, or as a CSV file. */
export function ResultTools({
  batchId,
  texts,
}: {
  batchId: string;
  /** the table as text, once for each decimal mark */
  texts: Readonly<Record<DecimalMark, string>>;
}) {
  const mark = useSyncExternalStore<DecimalMark>(subscribe, markNow, () => 'point');
  return (
    <div className="flex flex-wrap items-center gap-2">
      <SegmentedControl
        name="decimalMark"
        label="Decimal mark when copied"
        hideLabel
        value={mark}
        onChange={choose}
        choices={[
          { value: 'point', label: '0.5' },
          { value: 'comma', label: '0,5' },
        ]}
      />
      <CopyButton text={texts[mark]} label="Copy table" copiedLabel="Copied" />
      <DownloadButton href={`/api/v1/batches/${batchId}/results.csv?for=spreadsheet`} download size="small">
        Download CSV
      </DownloadButton>
    </div>
  );
}
