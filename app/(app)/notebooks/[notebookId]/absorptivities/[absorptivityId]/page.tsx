import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { AbsorptivityDetail } from '@/components/absorptivity/absorptivity-detail';
import { VoidAbsorptivity } from '@/components/absorptivity/void-absorptivity';
import { CurveStatusPill } from '@/components/curve/curve-status';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { laboratory } from '@/db/entry/settings';
import { loadAbsorptivity } from '@/db/queries/absorptivities';
import type { AbsorptivityView } from '@/lib/views/absorptivity';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { declareVoid } from '@/app/(app)/notebooks/[notebookId]/absorptivities/actions';

export const metadata: Metadata = { title: 'Known absorptivity' };

function Actions({ of }: { of: AbsorptivityView }) {
  if (!of.mayEdit) return null;
  const base = `/notebooks/${of.notebookId}`;
  const newest = of.versions[0]?.id === of.id;
  return (
    <>
      {of.status !== 'void' && <VoidAbsorptivity id={of.id} version={of.version} action={declareVoid} />}
      {newest && <LinkButton href={`${base}/absorptivities/${of.id}/new-version`}>New version</LinkButton>}
      {of.status === 'saved' && (
        <LinkButton variant="primary" href={`${base}/batches/new?absorptivity=${of.id}`}>
          New batch on it
        </LinkButton>
      )}
    </>
  );
}

export default async function AbsorptivityPage({
  params,
}: PageProps<'/notebooks/[notebookId]/absorptivities/[absorptivityId]'>) {
  const actor = await requireActor();
  const { notebookId, absorptivityId } = await params;
  const of = await orNotFound(loadAbsorptivity(actor, absorptivityId));
  if (of.notebookId !== notebookId) notFound();
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  return (
    <>
      <PageHeader
        title={of.title}
        status={<CurveStatusPill curve={of} />}
        crumbs={[{ href: `/notebooks/${notebookId}/curves`, label: 'Standard curves' }]}
        lead="Known absorptivity: results by it rest on no standards of your own."
        actions={<Actions of={of} />}
      />
      <AbsorptivityDetail of={of} timeZone={timeZone} />
    </>
  );
}
