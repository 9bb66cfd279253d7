import { randomUUID } from 'node:crypto';
import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { AbsorptivityForm } from '@/components/absorptivity/absorptivity-form';
import { PageHeader } from '@/components/frame/page-header';
import { readNotebook } from '@/db/queries/notebooks';
import { EMPTY_ABSORPTIVITY } from '@/lib/absorptivity/form-start';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { save } from '@/app/(app)/notebooks/[notebookId]/absorptivities/actions';

export const metadata: Metadata = { title: 'New known absorptivity' };

export default async function NewAbsorptivityPage({
  params,
}: PageProps<'/notebooks/[notebookId]/absorptivities/new'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const notebook = await orNotFound(readNotebook(actor, notebookId));
  if (!notebook.mayEdit) notFound();
  return (
    <>
      <PageHeader
        title="New known absorptivity"
        crumbs={[{ href: `/notebooks/${notebookId}/curves`, label: 'Standard curves' }]}
        lead="A way to results without a standard curve of your own: a published or certified absorptivity, with its uncertainty, source and conditions."
      />
      <AbsorptivityForm
        notebookId={notebookId}
        saveKey={randomUUID()}
        start={EMPTY_ABSORPTIVITY}
        save={save}
      />
    </>
  );
}
