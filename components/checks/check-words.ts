import { agreement } from '@/lib/checks/digits';
import { type CheckResults, verdictOf } from '@/lib/checks/run-checks';
import type { CheckSource, PublishedCheck } from '@/lib/checks/types';
import { significantText } from '@/lib/format/round';

/** The numbers of both places where the engine ran. */
export interface BothResults {
  readonly browser: CheckResults;
  readonly server: CheckResults;
}

/** How many digits agree, in the place that has fewer; empty while there is no number. */
export function digitsText({ id, published }: PublishedCheck, { browser, server }: BothResults): string {
  const values = [browser[id], server[id]].filter((value) => value !== undefined);
  const found = values.map((value) => agreement(value ?? NaN, published));
  const [fewest] = found.sort((a, b) => a.digits - b.digits);
  if (!fewest) return '';
  const { all, digits, printed } = fewest;
  if (all) return printed === 1 ? 'the printed digit' : `all ${printed} printed digits`;
  return `${digits} of ${printed} printed digits`;
}

export interface VerdictWords {
  readonly tone: 'order' | 'stop' | 'plain';
  readonly words: string;
}

/** The verdict over both places, in words. */
export function verdictWords(check: PublishedCheck, { browser, server }: BothResults): VerdictWords {
  const here = verdictOf(check, browser);
  const there = verdictOf(check, server);
  if (here === 'disagrees' && there === 'disagrees') return { tone: 'stop', words: 'does not agree' };
  if (there === 'disagrees') return { tone: 'stop', words: 'does not agree on the server' };
  if (here === 'disagrees') return { tone: 'stop', words: 'does not agree in this browser' };
  if (here === 'waiting') return { tone: 'plain', words: 'agrees on the server' };
  return { tone: 'order', words: 'agrees' };
}

/** The checks that do not agree in one place or the other. */
export function disagreeing(sources: readonly CheckSource[], both: BothResults): readonly PublishedCheck[] {
  return sources.flatMap(({ checks }) => checks).filter((check) => verdictWords(check, both).tone === 'stop');
}

/** How far the two places are apart from each other. */
export function apartText({ browser, server }: BothResults): string {
  const apart = Object.entries(browser).map(([id, here]) => {
    const there = server[id];
    if (here === null || there === null || there === undefined) return 0;
    return here === there ? 0 : Math.abs(here - there) / Math.max(Math.abs(here), Math.abs(there));
  });
  const most = Math.max(0, ...apart);
  return most === 0
    ? 'Browser and server give the same numbers to the last bit.'
    : `Browser and server differ from each other by at most ${significantText(most, 1)} of a value.`;
}
