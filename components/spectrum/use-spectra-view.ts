'use client';

import { useSearchParams } from 'next/navigation';
import { useMemo, useState } from 'react';

import type { ReadingRule } from '@/lib/engine';
import { spectrumRule, type RuleTexts } from '@/lib/schemas/spectrum-rule';
import {
  chosenSpectra,
  readViewAddress,
  spectrumKey,
  writeViewAddress,
  type SpectraView,
} from '@/lib/spectrum/view-address';
import type { SpectrumView } from '@/lib/views/spectrum';

export interface RuleState {
  /** As typed, right or not. */
  readonly texts: RuleTexts;
  readonly rule: ReadingRule | null;
  readonly errors: Readonly<Record<string, string>>;
  /** Nobody has said yet where to read. */
  readonly untouched: boolean;
}

function ruleState(texts: RuleTexts): Omit<RuleState, 'untouched'> {
  const parsed = spectrumRule.safeParse(texts);
  if (parsed.success) return { texts, rule: parsed.data, errors: {} };
  const errors = Object.fromEntries(
    parsed.error.issues.map((issue) => [String(issue.path[0]), issue.message]),
  );
  return { texts, rule: null, errors };
}

function put(view: SpectraView): void {
  // the address follows without a request: everything that the page needs for it is here already
  window.history.replaceState(null, '', writeViewAddress(view));
}

const now = (): SpectraView => readViewAddress(new URLSearchParams(window.location.search));

/** Add spectra to the view in the address; a view that nobody has chosen takes them by itself. */
export function addToView(ids: readonly string[]): void {
  const view = now();
  if (view.keys === null || ids.length === 0) return;
  put({ ...view, keys: [...new Set([...view.keys, ...ids.map(spectrumKey)])] });
}

const choose = (ids: readonly string[]) => put({ ...now(), keys: ids.map(spectrumKey) });
const showAside = (aside: boolean) => put({ ...now(), aside });

/** What the Spectra page shows, kept in its address. A rule that is half typed stays out of the address. */
export function useSpectraView(spectra: readonly SpectrumView[]) {
  const { keys, texts, aside } = readViewAddress(useSearchParams());
  const [typed, setTyped] = useState<RuleTexts | null>(null);
  const chosenKeys = keys?.join(',') ?? null;
  const chosen = useMemo(() => chosenSpectra(spectra, chosenKeys?.split(',') ?? null), [spectra, chosenKeys]);

  function setRule(next: RuleTexts): void {
    const valid = ruleState(next).rule !== null;
    setTyped(valid ? null : next);
    if (valid)
      put({ ...now(), keys: keys ?? chosen.map((spectrum) => spectrumKey(spectrum.id)), texts: next });
  }
  const rule = ruleState(typed ?? texts);
  const untouched = typed === null && texts.at === '' && texts.from === '' && texts.to === '';
  return {
    chosen,
    aside,
    rule: { ...rule, untouched, errors: untouched ? {} : rule.errors },
    setRule,
    choose,
    showAside,
  };
}
