import type { Metadata } from 'next';
import { randomUUID } from 'node:crypto';
import { notFound } from 'next/navigation';
import { WareTable } from '@/components/batch/ware-table';
import { HazardNotice } from '@/components/batch/batch-notices';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Tabs } from '@/components/ui/tabs';
import { loadBatchHead, yardstickOfBatch } from '@/db/queries/batches';
import { listSpectra } from '@/db/queries/spectra';
import { readOn, readOnText } from '@/lib/batch/read-on';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { SpectrumSamplesForm } from './spectrum-samples-form';
import { TypedSamplesForm } from './typed-samples-form';

export const metadata: Metadata = { title: 'Add samples' };

export default async function AddSamplesPage({
  params,
  searchParams,
}: PageProps<'/notebooks/[notebookId]/batches/[batchId]/add'>) {
  const actor = await requireActor();
  const { notebookId, batchId } = await params;
  const batch = await orNotFound(loadBatchHead(actor, batchId));
  if (!batch.mayEdit || batch.status !== 'open') notFound();
  const fromSpectra = (await searchParams).from === 'spectra';
  const yardstick = await yardstickOfBatch(actor, batchId);
  const spectra = fromSpectra ? await listSpectra(actor, notebookId) : [];
  const base = `/notebooks/${notebookId}/batches`;
  const here = `${base}/${batchId}`;
  const form = { batchId, method: batch.method, yardstick, submissionKey: randomUUID() };
  return (
    <>
      <PageHeader
        crumbs={[
          { href: base, label: 'Batches' },
          { href: here, label: batch.title },
          { label: 'Add samples' },
        ]}
        title="Add samples"
        lead={`Read on ${readOnText(readOn(batch))}, in ${unitWithBasis(batch.method.unit, batch.method.basis)}.`}
      />
      <HazardNotice note={batch.method.hazardNote} />
      <Tabs
        label="Where the readings come from"
        current={fromSpectra ? `${here}/add?from=spectra` : `${here}/add`}
        tabs={[
          { href: `${here}/add`, label: 'Typed or pasted readings' },
          { href: `${here}/add?from=spectra`, label: 'From spectra' },
        ]}
      />
      {!fromSpectra && <TypedSamplesForm {...form} />}

      {fromSpectra && spectra.length > 0 && <SpectrumSamplesForm {...form} spectra={spectra} />}
      {fromSpectra && spectra.length === 0 && (
        <EmptyState
          title="No spectra in this notebook"
          action={
            <LinkButton href={`/notebooks/${notebookId}/spectra`} variant="primary">
              Upload spectra
            </LinkButton>
          }
        >
          Upload the files first; then choose the spectra here.
        </EmptyState>
      )}
      <WareTable />
    </>
  );
}
