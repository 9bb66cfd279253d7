import { ToneShape } from '@/components/ui/pill';
import type { Flag, FlagLevel } from '@/lib/engine';
import { FLAG_TONE } from './flag-tone';

const RANK: Readonly<Record<FlagLevel, number>> = { stop: 0, warn: 1, note: 2 };
const WORD: Readonly<Record<FlagLevel, string>> = { stop: 'Stop', warn: 'Look at this', note: 'Note' };

/** What the engine says about a result or a curve: what, how large, why, what to do; the gravest first. */
export function FlagList({
  flags,
  inOrder = 'Nothing to say against it.',
}: {
  flags: readonly Flag[];
  inOrder?: string;
}) {
  if (flags.length === 0)
    return (
      <p className="flex items-center gap-2 text-verdigris">
        <ToneShape tone="order" /> {inOrder}
      </p>
    );
  const sorted = [...flags].sort((a, b) => RANK[a.level] - RANK[b.level]);
  return (
    <ul className="grid gap-2.5">
      {sorted.map((flag) => (
        <li key={flag.code + flag.message} className="flex gap-2">
          <ToneShape tone={FLAG_TONE[flag.level]} className="mt-1.5" />
          <div className="min-w-0">
            <span className="sr-only">{WORD[flag.level]}: </span>
            {flag.message} <span className="num text-xs whitespace-nowrap text-ink-2">{flag.code}</span>
          </div>
        </li>
      ))}
    </ul>
  );
}
