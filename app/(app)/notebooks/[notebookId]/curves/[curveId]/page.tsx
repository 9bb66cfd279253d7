import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { orNotFound } from '@/app/_server/page-data';
import { requireActor } from '@/app/_server/current-actor';
import { CurveDetail } from '@/components/curve/curve-detail';
import { VoidCurve } from '@/components/curve/void-curve';
import { WorkingDialog } from '@/components/working/working-dialog';
import { CurveStatusPill } from '@/components/curve/curve-status';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { laboratory } from '@/db/entry/settings';
import { loadCurve } from '@/db/queries/curves';
import type { CurveView } from '@/lib/views/curve';
import { declareVoid } from '@/app/(app)/notebooks/[notebookId]/curves/actions';

export const metadata: Metadata = { title: 'Standard curve' };

function Actions({ curve }: { curve: CurveView }) {
  const base = `/notebooks/${curve.notebookId}`;
  const newest = curve.versions[0]?.id === curve.id;
  return (
    <>
      <WorkingDialog
        title={`The working of ${curve.title}`}
        steps={curve.result.curve.working}
        prefix="curve"
      />
      {curve.mayEdit && curve.status !== 'void' && <VoidCurve curve={curve} action={declareVoid} />}
      {curve.mayEdit && newest && (
        <LinkButton href={`${base}/curves/${curve.id}/new-version`}>New version</LinkButton>
      )}
      {curve.mayEdit && curve.status === 'saved' && (
        <LinkButton variant="primary" href={`${base}/batches/new?curve=${curve.id}`}>
          New batch on this curve
        </LinkButton>
      )}
    </>
  );
}

export default async function CurvePage({ params }: PageProps<'/notebooks/[notebookId]/curves/[curveId]'>) {
  const actor = await requireActor();
  const { notebookId, curveId } = await params;
  const curve = await orNotFound(loadCurve(actor, curveId));
  if (curve.notebookId !== notebookId) notFound();
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  return (
    <>
      <PageHeader
        title={curve.title}
        status={<CurveStatusPill curve={curve} />}
        crumbs={[{ href: `/notebooks/${notebookId}/curves`, label: 'Standard curves' }]}
        actions={<Actions curve={curve} />}
      />
      <CurveDetail curve={curve} timeZone={timeZone} />
    </>
  );
}
