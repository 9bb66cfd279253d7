import { agreement, agrees } from './digits';
import type { CheckSource, PublishedCheck } from './types';

/** What came out, by id of the check; null where the engine refused, nothing where it was not asked yet. */
export type CheckResults = Readonly<Record<string, number | null>>;

/** Every check of a source; a check that throws has no number, and the others still have theirs. */
export function runSource({ checks }: CheckSource): CheckResults {
  return Object.fromEntries(checks.map((check) => [check.id, ours(check)]));
}

function ours({ compute }: PublishedCheck): number | null {
  try {
    const value = compute();
    return Number.isFinite(value) ? value : null;
  } catch {
    return null;
  }
}

export type Verdict = 'agrees' | 'disagrees' | 'waiting';

export function verdictOf({ id, published }: PublishedCheck, results: CheckResults): Verdict {
  const value = results[id];
  if (value === undefined) return 'waiting';
  return value !== null && agrees(agreement(value, published)) ? 'agrees' : 'disagrees';
}

export interface Tally {
  readonly agree: number;
  readonly disagree: number;
  readonly waiting: number;
  readonly total: number;
}

export function tally(sources: readonly CheckSource[], results: CheckResults): Tally {
  const verdicts = sources.flatMap(({ checks }) => checks).map((check) => verdictOf(check, results));
  const count = (verdict: Verdict) => verdicts.filter((one) => one === verdict).length;
  return {
    agree: count('agrees'),
    disagree: count('disagrees'),
    waiting: count('waiting'),
    total: verdicts.length,
  };
}
