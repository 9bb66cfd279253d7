import type { ReactNode } from 'react';

export interface Definition {
  label: string;
  value: ReactNode;
  /** figures, hashes, codes */
  mono?: boolean;
}

/** Names and what stands behind them, one to a line. */
export function DefinitionList({ entries, label }: { entries: readonly Definition[]; label: string }) {
  return (
    <dl aria-label={label} className="grid gap-x-6 gap-y-1.5 sm:grid-cols-[10rem_minmax(0,1fr)]">
      {entries.map((entry) => (
        <div key={entry.label} className="contents">
          <dt className="text-sm text-ink-2">{entry.label}</dt>
          <dd className={`mb-1.5 min-w-0 break-words sm:mb-0 ${entry.mono ? 'num text-[0.84375rem]' : ''}`}>
            {entry.value}
          </dd>
        </div>
      ))}
    </dl>
  );
}
