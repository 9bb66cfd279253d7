import { ToneShape } from '@/components/ui/pill';
import type { ReaderWarning } from '@/lib/readers/types';

/** What a person should know about what was read, each with its line and its code. */
export function WarningList({ warnings }: { warnings: readonly ReaderWarning[] }) {
  if (warnings.length === 0) return <p className="text-ink-2">Nothing: it was read without a doubt.</p>;
  return (
    <ul className="grid gap-2">
      {warnings.map((warning, i) => (
        <li key={i} className="flex gap-2">
          <ToneShape tone="decide" className="mt-1.5" />
          <span>
            {warning.line !== undefined && <span className="font-medium">Line {warning.line}: </span>}
            {warning.message}
            <span className="num ml-2 text-xs text-ink-2">{warning.code}</span>
          </span>
        </li>
      ))}
    </ul>
  );
}
