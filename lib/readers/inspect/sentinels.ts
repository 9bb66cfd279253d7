import type { Gap } from '../types';
import type { SpectrumDraft } from './spectrum-draft';

/**
 * A value that stands in for "no reading" without being declared: it repeats, is made of nines (or is beyond any
 * measurement) and lies far outside all others.
 */
export function sentinelValue(y: Float64Array): number | undefined {
  const suspects = new Map<number, number>();
  let most = 0;
  for (const value of y) {
    if (looksDeclared(value)) suspects.set(value, (suspects.get(value) ?? 0) + 1);
    else if (!Number.isNaN(value)) most = Math.max(most, Math.abs(value));
  }
  for (const [value, times] of suspects) {
    if (times >= 2 && Math.abs(value) > 10 * most && times < y.length) return value;
  }
  return undefined;
}

function looksDeclared(value: number): boolean {
  const size = Math.abs(value);
  return (
    size === 99 ||
    size === 999 ||
    size === 9999 ||
    size === 99999 ||
    size === 999999 ||
    (size >= 1e29 && size < Infinity)
  );
}

/** Turn the points with one of the values into gaps that keep the value's text. */
export function withGapsAt(draft: SpectrumDraft, values: readonly number[]): SpectrumDraft {
  const gaps: Gap[] = [...draft.gaps];
  const y = Float64Array.from(draft.y);
  const standIns = new Set(values);
  for (let i = 0; i < y.length; i++) {
    const value = y[i] ?? NaN;
    if (!standIns.has(value)) continue;
    gaps.push({ index: i, reason: 'missing', text: String(value) });
    y[i] = NaN;
  }
  if (gaps.length === draft.gaps.length) return draft;
  gaps.sort((a, b) => a.index - b.index);
  return { ...draft, y, gaps };
}
