import Link from 'next/link';
import { LinkButton } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { BatchHead } from '@/lib/views/batch';
import { curveWords } from './curve-words';

/** The hazard note of the method, where its work is done. */
export function HazardNotice({ note }: { note: string }) {
  if (note.trim() === '') return null;
  return (
    <Notice tone="decide" title="Hazards of this method">
      {note}
    </Notice>
  );
}

/** That the batch is not on the newest curve, or on a void one, and what can be done. */
export function CurveNotice({ batch, base }: { batch: BatchHead; base: string }) {
  const words = curveWords(batch.curve);
  if (!words) return null;
  const mayMove = batch.mayEdit && batch.status === 'open';
  return (
    <Notice
      tone={batch.curve.status === 'void' ? 'stop' : 'decide'}
      title={batch.curve.status === 'void' ? 'The curve of this batch is void' : 'Not on the newest curve'}
      action={
        mayMove && <LinkButton href={`${base}/batches/${batch.id}/version`}>Read on another curve</LinkButton>
      }
    >
      {words}{' '}
      {batch.curve.status === 'void'
        ? 'The results below rest on it. Read the samples on another curve before they leave this notebook.'
        : 'Results stay as they were calculated; read the samples on the newer one if it should hold for them.'}
    </Notice>
  );
}

/** That this version is not the one in use. */
export function StatusNotice({ batch, base }: { batch: BatchHead; base: string }) {
  if (batch.status === 'void')
    return (
      <Notice tone="stop" title="This batch is void">
        {batch.voidReason}. It stays to be seen, and its numbers must not be used.
      </Notice>
    );
  if (batch.status !== 'superseded') return null;
  return (
    <Notice tone="decide" title="Superseded">
      {batch.supersededBy ? (
        <>
          <Link
            href={`${base}/batches/${batch.supersededBy.id}`}
            className="text-uv underline underline-offset-2"
          >
            Version {batch.supersededBy.version}
          </Link>{' '}
          of this batch is the one in use.
        </>
      ) : (
        'A newer version of this batch is the one in use.'
      )}
    </Notice>
  );
}

/** What the numbers do not say until control checks are made. */
export function DriftNotice() {
  return (
    <Notice tone="note">
      Whether the instrument or the reagents drifted since the curve was read is not checked here. Read a
      standard again beside the samples when that matters.
    </Notice>
  );
}
