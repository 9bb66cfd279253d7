'use client';

import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { ProgressBar } from '@/components/ui/progress-bar';

import type { UploadItem } from './upload-queue';
import { UploadRow } from './upload-row';
import type { Uploads } from './use-uploads';

type Outcome = 'stored' | 'alreadyHere' | 'asks' | 'refused' | 'failed' | 'cancelled';

const WORDS: readonly (readonly [Outcome, string])[] = [
  ['stored', 'read'],
  ['alreadyHere', 'here already'],
  ['asks', 'to be answered'],
  ['refused', 'left out'],
  ['failed', 'not sent'],
  ['cancelled', 'stopped'],
];

const count = (items: readonly UploadItem[], outcome: Outcome) =>
  items.filter((item) => item.verdict?.verdict === outcome).length;

/** "12 of 15 files done: 11 read, 1 left out". */
function summary(items: readonly UploadItem[]): string {
  const done = items.filter((item) => item.verdict !== null).length;
  const parts = WORDS.flatMap(([outcome, words]) => {
    const n = count(items, outcome);
    return n > 0 ? [`${n} ${words}`] : [];
  });
  const files = `${done} of ${items.length} ${items.length === 1 ? 'file' : 'files'} done`;
  return parts.length > 0 ? `${files}: ${parts.join(', ')}` : files;
}

/** Every file of this visit on its way or landed, with its verdict. */
export function UploadPanel({ uploads: { queue, items, busy } }: { uploads: Uploads }) {
  if (items.length === 0) return null;
  const unsent = count(items, 'failed') + count(items, 'cancelled');
  const sent = items.reduce((sum, item) => sum + (item.verdict ? 1 : (item.sent ?? 0) * 0.9), 0);
  return (
    <Card
      flush
      title="Uploads"
      aside={<span role="status">{summary(items)}</span>}
      actions={
        <>
          {unsent > 0 && (
            <Button size="small" onClick={() => queue.retry()}>
              {unsent === 1 ? 'Try it again' : `Try ${unsent} again`}
            </Button>
          )}
          {busy ? (
            <Button size="small" onClick={() => queue.cancel()}>
              Stop
            </Button>
          ) : (
            <Button size="small" onClick={() => queue.clear()}>
              Close
            </Button>
          )}
        </>
      }
    >
      {items.length > 1 && (
        <ProgressBar label="All files" fraction={sent / items.length} className="rounded-none" />
      )}
      <ul aria-label="Files of this upload" tabIndex={0} className="max-h-96 overflow-y-auto">
        {items.map((item) => (
          <UploadRow key={item.key} item={item} onAnswer={queue.answer} />
        ))}
      </ul>
    </Card>
  );
}
