'use client';

import { useState } from 'react';
import useSWR from 'swr';

import type { SpectrumPointsView } from '@/lib/views/spectrum';

const AT_ONCE = 50;

async function fetchPoints(ids: readonly string[]): Promise<readonly SpectrumPointsView[]> {
  const answer = await fetch(`/api/v1/spectra?ids=${ids.join(',')}`, {
    headers: { accept: 'application/json' },
  });
  if (!answer.ok) throw new Error(`the points of ${ids.length} spectra were answered with ${answer.status}`);
  const { items } = (await answer.json()) as { items: readonly SpectrumPointsView[] };
  return items;
}

/** The points of these spectra, from the API; those that were fetched before are not fetched again. */
export function useSpectrumPoints(ids: readonly string[]) {
  // raw points never change, so what was fetched on this page stays good while the page is open
  const [known] = useState(() => new Map<string, SpectrumPointsView>());
  return useSWR(
    ids.length > 0 ? ['spectrum points', ...ids] : null,
    async () => {
      const missing = ids.filter((id) => !known.has(id));
      for (let from = 0; from < missing.length; from += AT_ONCE)
        for (const view of await fetchPoints(missing.slice(from, from + AT_ONCE))) known.set(view.id, view);
      return ids.flatMap((id) => known.get(id) ?? []);
    },
    { keepPreviousData: true, revalidateOnFocus: false, revalidateIfStale: false },
  );
}
