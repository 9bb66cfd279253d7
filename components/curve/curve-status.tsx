import { LinkButton } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Pill } from '@/components/ui/pill';
import type { CurveSummary } from '@/lib/views/curve';

/** Where a version stands: in use, superseded, void. */
export function CurveStatusPill({ curve }: { curve: Pick<CurveSummary, 'status' | 'newer'> }) {
  if (curve.status === 'void') return <Pill tone="stop">void</Pill>;
  if (curve.status === 'superseded') return <Pill tone="decide">superseded</Pill>;
  return (
    <Pill tone="order" quiet>
      in use
    </Pill>
  );
}

/** Says before anything else that a version is void or not the newest, and leads to the one that is. */
export function CurveStatusNotice({
  curve,
  folder = 'curves',
}: {
  curve: Pick<CurveSummary, 'notebookId' | 'version' | 'status' | 'voidReason' | 'newer'>;
  /** where its versions have their pages */
  folder?: 'curves' | 'absorptivities';
}) {
  const newer = curve.newer && (
    <LinkButton href={`/notebooks/${curve.notebookId}/${folder}/${curve.newer.id}`}>
      Go to version {curve.newer.version}
    </LinkButton>
  );
  if (curve.status === 'void')
    return (
      <Notice tone="stop" title={`Version ${curve.version} is void`} action={newer}>
        {curve.voidReason}. Do not read results off it.
      </Notice>
    );
  if (curve.status !== 'superseded') return null;
  return (
    <Notice tone="decide" title={`Version ${curve.version} is superseded`} action={newer}>
      {curve.newer
        ? `Version ${curve.newer.version} took its place. This one is kept as it was, with the results read off it.`
        : 'The version that took its place is void. This one is kept as it was.'}
    </Notice>
  );
}

/** The hazard note of a method, wherever its work is done. */
export function HazardNote({ note }: { note: string }) {
  if (note.trim() === '') return null;
  return (
    <Notice tone="decide" title="Hazards of this method">
      <p className="whitespace-pre-line">{note}</p>
      <p className="text-sm text-ink-2">Local rules and the safety data sheets go before this note.</p>
    </Notice>
  );
}
