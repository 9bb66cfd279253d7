import type { ReactNode } from 'react';

export interface Fact {
  label: ReactNode;
  /** set in figures; put an uncertainty or a unit in <small> and it steps back */
  value: ReactNode;
  /** a short remark under the value */
  note?: ReactNode;
}

const CELL =
  'min-w-0 grow basis-40 border-t border-l px-4 py-3 [&_small]:font-sans [&_small]:text-sm [&_small]:font-normal [&_small]:text-ink-2';

/** The strip of main figures above a page's tables. */
export function Facts({ facts, label }: { facts: readonly Fact[]; label?: string }) {
  return (
    <div className="overflow-hidden rounded-card border bg-sheet">
      <dl aria-label={label} className="-mt-px -ml-px flex flex-wrap">
        {facts.map((fact, index) => (
          <div key={index} className={CELL}>
            <dt className="text-xs text-ink-2">{fact.label}</dt>
            <dd className="num mt-0.5 text-fact font-medium">{fact.value}</dd>
            {fact.note && <dd className="text-sm text-ink-2">{fact.note}</dd>}
          </div>
        ))}
      </dl>
    </div>
  );
}
