'use client';

import { useSearchParams } from 'next/navigation';
import { useCallback, useEffect, useMemo, useState } from 'react';

import type { ReadingRule } from '@/lib/engine';
import { LIMITS } from '@/lib/limits';
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

function added(view: SpectraView, ids: readonly string[]): SpectraView {
  if (view.keys === null || ids.length === 0) return view; // a view that nobody has chosen takes them by itself
  const keys = [...new Set([...view.keys, ...ids.map(spectrumKey)])];
  return { ...view, keys: keys.slice(0, LIMITS.spectraAtOnce) };
}

/**
 * The view, with its address following it. The state leads: the router takes up a new address only after a
 * while, and a field or a tick must follow the hand at once.
 */
function useViewInAddress() {
  const search = useSearchParams();
  const [view, setView] = useState(() => readViewAddress(search));
  const [opened] = useState(view);
  useEffect(() => {
    // without a request: everything that the page needs for it is here already
    if (view !== opened) window.history.replaceState(null, '', writeViewAddress(view));
  }, [view, opened]);
  useEffect(() => {
    const goBack = () => setView(readViewAddress(new URLSearchParams(window.location.search)));
    window.addEventListener('popstate', goBack);
    return () => window.removeEventListener('popstate', goBack);
  }, []);
  return [view, setView] as const;
}

/** What the Spectra page shows, kept in its address. A rule that is half typed stays out of the address. */
export function useSpectraView(spectra: readonly SpectrumView[]) {
  const [view, setView] = useViewInAddress();
  const [typed, setTyped] = useState<RuleTexts | null>(null);
  const chosen = useMemo(() => chosenSpectra(spectra, view.keys), [spectra, view.keys]);
  const add = useCallback((ids: readonly string[]) => setView((now) => added(now, ids)), [setView]);
  const rule = ruleState(typed ?? view.texts);
  const { at, from, to } = view.texts;
  const untouched = typed === null && at === '' && from === '' && to === '';

  function setRule(texts: RuleTexts): void {
    const valid = ruleState(texts).rule !== null;
    setTyped(valid ? null : texts);
    const keys = view.keys ?? chosen.map((spectrum) => spectrumKey(spectrum.id));
    if (valid) setView({ ...view, keys, texts });
  }
  return {
    chosen,
    add,
    aside: view.aside,
    rule: { ...rule, untouched, errors: untouched ? {} : rule.errors },
    setRule,
    choose: (ids: readonly string[]) => setView({ ...view, keys: ids.map(spectrumKey) }),
    showAside: (aside: boolean) => setView({ ...view, aside }),
  };
}
