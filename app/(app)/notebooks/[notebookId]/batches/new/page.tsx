import type { Metadata } from 'next';
import { randomUUID } from 'node:crypto';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { listCurves } from '@/db/queries/curves';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { BatchForm } from './batch-form';

export const metadata: Metadata = { title: 'New batch' };

const one = (value: string | string[] | undefined) => (Array.isArray(value) ? value[0] : value);

export default async function NewBatchPage({
  params,
  searchParams,
}: PageProps<'/notebooks/[notebookId]/batches/new'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const curves = await orNotFound(listCurves(actor, notebookId));
  const asked = one((await searchParams).curve);
  const base = `/notebooks/${notebookId}`;
  const usable = curves.filter((curve) => curve.status !== 'void');
  return (
    <>
      <PageHeader
        crumbs={[{ href: `${base}/batches`, label: 'Batches' }, { label: 'New' }]}
        title="New batch"
      />
      <Card>
        {usable.length > 0 ? (
          <BatchForm notebookId={notebookId} submissionKey={randomUUID()} curves={curves} asked={asked} />
        ) : (
          <EmptyState
            title="A batch needs a standard curve"
            action={
              <LinkButton href={`${base}/curves/new`} variant="primary">
                New standard curve
              </LinkButton>
            }
          >
            {curves.length > 0
              ? 'Every curve of this notebook is void. Make one that holds.'
              : 'Samples are read back from the readings of standards. Make the curve first.'}
          </EmptyState>
        )}
      </Card>
    </>
  );
}
