import type { Caution } from '@/lib/cautions';

/** The statements of limits, each with the word that one looks for. */
export function CautionList({ cautions }: { cautions: readonly Caution[] }) {
  return (
    <dl className="grid gap-x-8 gap-y-3.5 sm:grid-cols-2">
      {cautions.map(({ title, text }) => (
        <div key={title}>
          <dt className="font-semibold">{title}</dt>
          <dd className="text-ink-2">{text}</dd>
        </div>
      ))}
    </dl>
  );
}
