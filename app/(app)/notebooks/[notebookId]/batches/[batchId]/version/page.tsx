import type { Metadata } from 'next';
import { randomUUID } from 'node:crypto';
import { notFound } from 'next/navigation';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { loadBatchHead } from '@/db/queries/batches';
import { listCurves } from '@/db/queries/curves';
import { readOnText } from '@/lib/batch/read-on';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { VersionForm } from './version-form';

export const metadata: Metadata = { title: 'Read on another curve' };

export default async function VersionPage({
  params,
}: PageProps<'/notebooks/[notebookId]/batches/[batchId]/version'>) {
  const actor = await requireActor();
  const { notebookId, batchId } = await params;
  const [batch, curves] = await orNotFound(
    Promise.all([loadBatchHead(actor, batchId), listCurves(actor, notebookId)]),
  );
  const own = batch.curve;
  if (!own) notFound();
  const base = `/notebooks/${notebookId}/batches`;
  const others = curves.filter((curve) => curve.id !== own.id && curve.status !== 'void');
  return (
    <>
      <PageHeader
        crumbs={[
          { href: base, label: 'Batches' },
          { href: `${base}/${batchId}`, label: batch.title },
          { label: 'Another curve' },
        ]}
        title="Read on another curve"
        lead={`The ${batch.sampleCount} samples and their readings go into version ${batch.version + 1} and are calculated again. Version ${batch.version}, on ${readOnText(own)}, stays as it is.`}
      />
      <Card>
        {others.length > 0 ? (
          <VersionForm
            batchId={batchId}
            submissionKey={randomUUID()}
            curves={others}
            newerId={own.newer?.id}
          />
        ) : (
          <p>There is no other curve in this notebook. Make one under Standard curves, then come back.</p>
        )}
      </Card>
    </>
  );
}
