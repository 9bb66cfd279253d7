import { Card } from '@/components/ui/card';
import { ToneShape } from '@/components/ui/pill';
import { dilutionSentence } from '@/lib/batch/dilution-text';
import type { LiveResult } from '@/lib/batch/live-results';
import type { BatchMethodView } from '@/lib/views/batch';
import { ResultsTable } from './results-table';

/** What comes out while it is typed, with how each dilution was understood. Nothing of it is saved yet. */
export function LiveTable({
  results,
  method,
  origin,
}: {
  results: readonly LiveResult[];
  method: BatchMethodView;
  origin: 'typed' | 'spectrum';
}) {
  const calculated = results.flatMap((live) => (live.ok ? [live] : []));
  const refused = results.flatMap((live) => (live.ok ? [] : [live]));
  const diluted = calculated.filter(({ sample }) => sample.dilution.length > 0);
  return (
    <Card flush title="Results as you type" aside="not saved yet">
      {calculated.length === 0 && refused.length === 0 && (
        <p className="p-4 text-ink-2">Each sample is calculated as soon as it has a name and a reading.</p>
      )}
      {calculated.length > 0 && (
        <ResultsTable
          label="Results as you type"
          method={method}
          rows={calculated.map(({ sample, result }, index) => ({
            ...sample,
            key: `${index}`,
            readings: sample.readings.map((reading) => ({ ...reading, origin })),
            result,
          }))}
        />
      )}
      {(diluted.length > 0 || refused.length > 0) && (
        <ul className="grid gap-1 border-t px-4 py-3 text-sm" aria-label="How it was understood">
          {refused.map(({ sample, message }, index) => (
            <li key={`refused ${index}`} className="flex items-baseline gap-2">
              <ToneShape tone="stop" />
              <span>
                {sample.sample}: {message}
              </span>
            </li>
          ))}
          {diluted.map(({ sample }, index) => (
            <li key={index} className="text-ink-2">
              <span className="font-medium text-ink">{sample.sample}</span>:{' '}
              {dilutionSentence(sample.dilution)}
            </li>
          ))}
        </ul>
      )}
    </Card>
  );
}
