'use client';

import { useEffect, useState, useSyncExternalStore } from 'react';

import { sendTo } from './send-upload';
import { createUploadQueue, type UploadItem, type UploadQueue } from './upload-queue';

const NONE: readonly UploadItem[] = [];
const REFRESH_AFTER_MS = 1500;

export interface Uploads {
  readonly queue: UploadQueue;
  readonly items: readonly UploadItem[];
  readonly busy: boolean;
}

/** Ids of the spectra behind what has landed so far. */
function landed(items: readonly UploadItem[]): string[] {
  return items.flatMap(({ verdict }) =>
    verdict && 'spectra' in verdict ? verdict.spectra.map((s) => s.id) : [],
  );
}

/**
 * The uploads of this page. `onLanded` is called with the spectra that are newly in the notebook, a moment after
 * they came and at once when all is done. Leaving the page while files are on their way asks first.
 */
export function useUploads(address: string, onLanded: (spectrumIds: readonly string[]) => void): Uploads {
  const [queue] = useState(() => createUploadQueue(sendTo(address)));
  const [told] = useState(() => new Set<string>());
  const items = useSyncExternalStore(queue.subscribe, queue.snapshot, () => NONE);
  const busy = items.some((item) => item.verdict === null);
  const done = items.filter((item) => item.verdict !== null).length;

  useEffect(() => {
    if (!busy) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [busy]);

  useEffect(() => {
    if (done === 0) return;
    const tell = () => {
      const ids = landed(queue.snapshot()).filter((id) => !told.has(id));
      ids.forEach((id) => told.add(id));
      onLanded(ids);
    };
    const timer = setTimeout(tell, busy ? REFRESH_AFTER_MS : 0);
    return () => clearTimeout(timer);
  }, [done, busy, queue, told, onLanded]);

  return { queue, items, busy };
}
