import Link from 'next/link';
import { LinkButton } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { readOn, YARDSTICK_NOUN } from '@/lib/batch/read-on';
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

/** That the batch is not on the newest curve or absorptivity, or on a void one, and what can be done. */
export function CurveNotice({ batch, base }: { batch: BatchHead; base: string }) {
  const on = readOn(batch);
  const words = curveWords(on, on.kind);
  if (!words) return null;
  const noun = YARDSTICK_NOUN[on.kind];
  const isVoid = on.status === 'void';
  const mayMove = on.kind === 'curve' && batch.mayEdit && batch.status === 'open';
  const again = on.kind === 'curve' ? 'read the samples on' : 'make a new batch on';
  return (
    <Notice
      tone={isVoid ? 'stop' : 'decide'}
      title={isVoid ? `The ${noun} of this batch is void` : `Not on the newest ${noun}`}
      action={
        mayMove && <LinkButton href={`${base}/batches/${batch.id}/version`}>Read on another curve</LinkButton>
      }
    >
      {words}{' '}
      {isVoid
        ? `The results below rest on it. ${again.charAt(0).toUpperCase()}${again.slice(1)} another ${noun} before they leave this notebook.`
        : `Results stay as they were calculated; ${again} the newer one if it should hold for them.`}
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
export function DriftNotice({ batch }: { batch: BatchHead }) {
  const known = batch.method.knownAbsorptivity;
  if (known) return <WithoutStandardsNotice />;
  return (
    <Notice tone="note">
      Whether the instrument or the reagents drifted since the curve was read is not checked here. Read a
      standard again beside the samples when that matters.
    </Notice>
  );
}

/** What a result by a known absorptivity leaves out, wherever such results stand. */
export function WithoutStandardsNotice() {
  return (
    <Notice tone="decide" title="No standards were measured">
      Errors of this instrument&rsquo;s absorbance and wavelength scales, of stray light and of bandwidth are
      not in u unless the stated uncertainty covers them. Where an official method asks for standards, it
      comes first.
    </Notice>
  );
}
