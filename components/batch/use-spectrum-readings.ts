'use client';

import useSWR from 'swr';
import { LIMITS } from '@/lib/limits';
import type { SpectrumPreview } from '@/lib/views/determination';

interface Answer {
  readonly items: readonly SpectrumPreview[];
}

async function ask(url: string): Promise<readonly SpectrumPreview[]> {
  const response = await fetch(url);
  if (!response.ok) {
    const { detail } = (await response.json()) as { detail?: string };
    throw new Error(detail ?? 'The spectra could not be read');
  }
  return ((await response.json()) as Answer).items;
}

async function readAll([, batchId, ids]: readonly [string, string, string]): Promise<
  ReadonlyMap<string, SpectrumPreview>
> {
  const all = ids.split(',');
  const parts = Array.from({ length: Math.ceil(all.length / LIMITS.pageSize) }, (_, index) =>
    all.slice(index * LIMITS.pageSize, (index + 1) * LIMITS.pageSize).join(','),
  );
  const read = await Promise.all(
    parts.map((part) => ask(`/api/v1/batches/${batchId}/spectrum-readings?spectra=${part}`)),
  );
  return new Map(read.flat().map((one) => [one.spectrumId, one]));
}

const NONE: ReadonlyMap<string, SpectrumPreview> = new Map();

/** What the chosen spectra read by the rule of the batch's method. */
export function useSpectrumReadings(batchId: string, spectrumIds: readonly string[]) {
  const key =
    spectrumIds.length > 0 ? (['spectrum-readings', batchId, spectrumIds.join(',')] as const) : null;
  const { data, error, isLoading } = useSWR<ReadonlyMap<string, SpectrumPreview>, Error>(key, readAll, {
    keepPreviousData: true,
    revalidateOnFocus: false,
  });
  return { read: spectrumIds.length > 0 ? (data ?? NONE) : NONE, error, isLoading };
}
