import { formatDateTime } from '@/lib/format/dates';
import type { DeterminationChange } from '@/lib/views/determination';

const sentence = (what: string) => what.charAt(0).toUpperCase() + what.slice(1);

/** What happened to a determination since it was saved, oldest first. */
export function ChangeHistory({
  history,
  timeZone,
}: {
  history: readonly DeterminationChange[];
  timeZone: string;
}) {
  return (
    <ol className="grid gap-2.5">
      {history.map((change, index) => (
        <li key={index} className="grid gap-0.5 border-l-2 border-rule-strong pl-3">
          <span>{sentence(change.what)}</span>
          {change.why && <span className="text-ink-2">{change.why}</span>}
          <span className="text-sm text-ink-2">
            {change.who}, <span className="num">{formatDateTime(change.at, timeZone)}</span>
          </span>
        </li>
      ))}
    </ol>
  );
}
