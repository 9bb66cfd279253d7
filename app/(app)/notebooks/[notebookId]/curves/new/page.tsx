import { randomUUID } from 'node:crypto';
import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { orNotFound } from '@/app/_server/page-data';
import { requireActor } from '@/app/_server/current-actor';
import { CurveForm } from '@/components/curve/curve-form';
import { PageHeader } from '@/components/frame/page-header';
import { readNotebook } from '@/db/queries/notebooks';
import { listSpectra } from '@/db/queries/spectra';
import { EMPTY_FORM } from '@/lib/curve/form-start';
import { save } from '@/app/(app)/notebooks/[notebookId]/curves/actions';

export const metadata: Metadata = { title: 'New standard curve' };

export default async function NewCurvePage({ params }: PageProps<'/notebooks/[notebookId]/curves/new'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const notebook = await orNotFound(readNotebook(actor, notebookId));
  if (!notebook.mayEdit) notFound();
  const spectra = await listSpectra(actor, notebookId);
  return (
    <>
      <PageHeader
        title="New standard curve"
        crumbs={[{ href: `/notebooks/${notebookId}/curves`, label: 'Standard curves' }]}
      />
      <CurveForm
        notebookId={notebookId}
        saveKey={randomUUID()}
        start={EMPTY_FORM}
        spectra={spectra}
        save={save}
      />
    </>
  );
}
