import { LIMITS } from '@/lib/limits';
import type { Question, ReadOptions } from '@/lib/readers/types';
import type { UploadOutcome } from '@/lib/views/source-file';

/** What became of a file. "failed" is a matter of the line and may be tried again; "refused" is one of the file. */
export type UploadVerdict =
  | Exclude<UploadOutcome, { verdict: 'asks' }>
  | { readonly verdict: 'asks'; readonly shape: string; readonly questions: readonly Question[] }
  | { readonly verdict: 'refused'; readonly sentence: string; readonly line: number | null }
  | { readonly verdict: 'failed'; readonly sentence: string }
  | { readonly verdict: 'cancelled' };

export interface UploadItem {
  readonly key: number;
  readonly file: File;
  /** null while it waits; 1 when every byte is sent and the file is being read. */
  readonly sent: number | null;
  readonly options: ReadOptions;
  readonly verdict: UploadVerdict | null;
}

export type SendUpload = (
  file: File,
  options: ReadOptions,
  onSent: (fraction: number) => void,
  signal: AbortSignal,
) => Promise<UploadVerdict>;

export interface UploadQueue {
  subscribe(listener: () => void): () => void;
  snapshot(): readonly UploadItem[];
  /** Takes a drop whole or not at all; returns the sentence when it is too much. */
  add(files: readonly File[]): string | null;
  /** Send again what failed on the line or was cancelled. */
  retry(): void;
  /** The person's word for one file; files of the same shape take the same answer. */
  answer(key: number, options: ReadOptions): void;
  cancel(): void;
  clear(): void;
}

const AT_ONCE = 3;
const MEGABYTE = 1024 * 1024;

function tooLarge(file: File): UploadVerdict | null {
  if (file.size <= LIMITS.fileBytes) return null;
  const sentence = `This file is larger than ${LIMITS.fileBytes / MEGABYTE} MB. Split it, or export fewer spectra at a time`;
  return { verdict: 'refused', sentence, line: null };
}

/** Files on their way, a few at a time, each with its own progress and verdict. Knows no page. */
export function createUploadQueue(send: SendUpload, atOnce = AT_ONCE): UploadQueue {
  let items: readonly UploadItem[] = [];
  let nextKey = 1;
  let running = 0;
  let stop = new AbortController();
  const listeners = new Set<() => void>();
  const answers = new Map<string, ReadOptions>();

  function change(next: readonly UploadItem[]): void {
    items = next;
    listeners.forEach((listener) => listener());
  }
  const patch = (key: number, part: Partial<UploadItem>) =>
    change(items.map((item) => (item.key === key ? { ...item, ...part } : item)));
  const again = (item: UploadItem, options = item.options): UploadItem => ({
    ...item,
    options,
    sent: null,
    verdict: null,
  });

  function settle(item: UploadItem, verdict: UploadVerdict): void {
    const known = verdict.verdict === 'asks' ? answers.get(verdict.shape) : undefined;
    // an answer that was already given and did not help must not be given for ever
    const helps = known && JSON.stringify({ ...item.options, ...known }) !== JSON.stringify(item.options);
    if (helps) patch(item.key, again(item, { ...item.options, ...known }));
    else patch(item.key, { verdict });
  }

  async function run(item: UploadItem): Promise<void> {
    const { signal } = stop;
    running += 1;
    patch(item.key, { sent: 0 });
    try {
      settle(item, await send(item.file, item.options, (sent) => patch(item.key, { sent }), signal));
    } finally {
      running -= 1;
      pump();
    }
  }

  function pump(): void {
    while (running < atOnce) {
      const next = items.find((item) => item.sent === null && item.verdict === null);
      if (!next) return;
      void run(next); // its failures are verdicts; what else it throws reaches the window's error log
    }
  }

  return {
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    snapshot: () => items,
    add(files) {
      if (files.length > LIMITS.filesPerDrop)
        return `These are ${files.length} files; ${LIMITS.filesPerDrop} go at a time. Nothing was sent: bring them in parts`;
      const added = files.map((file) => {
        const verdict = tooLarge(file);
        return { key: nextKey++, file, sent: null, options: {}, verdict };
      });
      change([...items, ...added]);
      pump();
      return null;
    },
    retry() {
      const open = (verdict: UploadVerdict | null) =>
        verdict?.verdict === 'failed' || verdict?.verdict === 'cancelled';
      change(items.map((item) => (open(item.verdict) ? again(item) : item)));
      pump();
    },
    answer(key, options) {
      const asked = items.find((item) => item.key === key)?.verdict;
      if (asked?.verdict !== 'asks') return;
      answers.set(asked.shape, { ...answers.get(asked.shape), ...options });
      const same = (item: UploadItem) =>
        item.verdict?.verdict === 'asks' && item.verdict.shape === asked.shape;
      change(items.map((item) => (same(item) ? again(item, { ...item.options, ...options }) : item)));
      pump();
    },
    cancel() {
      stop.abort();
      stop = new AbortController();
      const waiting = (item: UploadItem) => item.verdict === null && item.sent === null;
      change(items.map((item) => (waiting(item) ? { ...item, verdict: { verdict: 'cancelled' } } : item)));
    },
    clear() {
      change(items.filter((item) => item.verdict === null));
    },
  };
}
