'use client';

import { useMemo } from 'react';
import useSWR from 'swr';
import type { ReadSpectra } from '@/lib/curve/stored-standards';
import { spectrumRule, type RuleTexts } from '@/lib/schemas/spectrum-rule';
import type { SpectrumReadingView } from '@/lib/views/spectrum';

async function read([address, body]: readonly [string, string]): Promise<ReadSpectra> {
  const answer = await fetch(address, {
    method: 'POST',
    body,
    headers: { 'content-type': 'application/json' },
  });
  if (!answer.ok) {
    const problem = (await answer.json()) as { detail?: string };
    throw new Error(problem.detail ?? 'The spectra could not be read');
  }
  const { items } = (await answer.json()) as { items: readonly SpectrumReadingView[] };
  return new Map(items.map((item) => [item.spectrumId, item]));
}

const NONE: ReadSpectra = new Map();

/** What the rule reads off the chosen spectra, asked of the server again whenever either changes. */
export function useSpectrumReadings(notebookId: string, ids: readonly string[], rule: RuleTexts) {
  const key = useMemo(() => {
    if (ids.length === 0 || !spectrumRule.safeParse(rule).success) return null;
    const body = JSON.stringify({ spectrumIds: ids, rule });
    return [`/api/v1/notebooks/${notebookId}/curves/readings`, body] as const;
  }, [notebookId, ids, rule]);
  const { data, error, isLoading } = useSWR<ReadSpectra, Error>(key, read, { keepPreviousData: true });
  return { spectra: key === null ? NONE : (data ?? NONE), loading: isLoading, failure: error?.message };
}
