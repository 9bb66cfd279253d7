import Link from 'next/link';
import { memo, type ReactNode } from 'react';

import { Button } from '@/components/ui/button';
import { Pill, type Tone } from '@/components/ui/pill';
import { ProgressBar } from '@/components/ui/progress-bar';
import { sizeText } from '@/lib/format/optical';
import type { ReadOptions } from '@/lib/readers/types';

import type { UploadItem, UploadVerdict } from './upload-queue';

interface Said {
  tone: Tone;
  words: ReactNode;
}

const spectraWords = (count: number) => `${count} ${count === 1 ? 'spectrum' : 'spectra'}`;

function fileLink(notebookId: string, sourceFileId: string, words: string) {
  return (
    <Link href={`/notebooks/${notebookId}/spectra/files/${sourceFileId}`} className="underline">
      {words}
    </Link>
  );
}

/** The verdict in words. */
function said(verdict: UploadVerdict): Said {
  switch (verdict.verdict) {
    case 'stored': {
      const { sourceFile, elsewhere } = verdict;
      const [other] = elsewhere;
      const warning = sourceFile.warnings[0]?.message;
      const words = (
        <>
          read: {spectraWords(sourceFile.spectrumCount)}
          {warning && <>. {warning}</>}
          {other && (
            <>
              . The same bytes are already in{' '}
              {fileLink(other.notebookId, other.sourceFileId, other.notebookTitle || 'another notebook')}
            </>
          )}
        </>
      );
      return { tone: warning ? 'decide' : other ? 'note' : 'order', words };
    }
    case 'alreadyHere': {
      const { notebookId, id, name } = verdict.sourceFile;
      return { tone: 'note', words: <>these bytes are here already, as {fileLink(notebookId, id, name)}</> };
    }
    case 'asks':
      return { tone: 'decide', words: verdict.questions[0]?.message ?? 'can be read in more than one way' };
    case 'refused':
      return {
        tone: 'stop',
        words: `left out${verdict.line === null ? '' : `, line ${verdict.line}`}: ${verdict.sentence}`,
      };
    case 'failed':
      return { tone: 'stop', words: `not sent: ${verdict.sentence}` };
    case 'cancelled':
      return { tone: 'plain', words: 'not sent: you stopped it' };
  }
}

function Choices({ item, onAnswer }: { item: UploadItem; onAnswer: (options: ReadOptions) => void }) {
  if (item.verdict?.verdict !== 'asks') return null;
  const choices = item.verdict.questions[0]?.choices ?? [];
  return (
    <div className="flex flex-wrap gap-2" role="group" aria-label={`How to read ${item.file.name}`}>
      {choices.map((choice) => (
        <Button key={choice.label} size="small" onClick={() => onAnswer(choice.options)}>
          {choice.label}
        </Button>
      ))}
    </div>
  );
}

function progressWords({ sent }: UploadItem): string {
  if (sent === null) return 'waits';
  return sent < 1 ? `${Math.round(sent * 100)} % sent` : 'being read';
}

/** One file on its way: name, size, bar, and what became of it. */
export const UploadRow = memo(function UploadRow({
  item,
  onAnswer,
}: {
  item: UploadItem;
  onAnswer: (key: number, options: ReadOptions) => void;
}) {
  const result = item.verdict && said(item.verdict);
  const fraction = result ? 1 : (item.sent ?? 0);
  return (
    <li className="grid gap-1.5 border-b px-4 py-2 last:border-b-0">
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <span className="min-w-0 font-medium break-all">{item.file.name}</span>
        <span className="num text-sm text-ink-2">{sizeText(item.file.size)}</span>
        <span className="ml-auto max-w-full">
          {result ? (
            <Pill tone={result.tone} quiet={result.tone === 'order'}>
              {result.words}
            </Pill>
          ) : (
            <span className="num text-sm text-ink-2">{progressWords(item)}</span>
          )}
        </span>
      </div>
      <Choices item={item} onAnswer={(options) => onAnswer(item.key, options)} />
      <ProgressBar
        label={`${item.file.name}: ${result ? 'done' : progressWords(item)}`}
        fraction={!result && item.sent === 1 ? null : fraction}
        tone={result?.tone ?? 'note'}
      />
    </li>
  );
});
