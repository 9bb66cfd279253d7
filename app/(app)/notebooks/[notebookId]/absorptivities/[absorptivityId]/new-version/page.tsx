import { randomUUID } from 'node:crypto';
import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { AbsorptivityForm } from '@/components/absorptivity/absorptivity-form';
import { PageHeader } from '@/components/frame/page-header';
import { loadAbsorptivity } from '@/db/queries/absorptivities';
import { textsOfAbsorptivity } from '@/lib/absorptivity/form-start';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { save } from '@/app/(app)/notebooks/[notebookId]/absorptivities/actions';

export const metadata: Metadata = { title: 'New version of a known absorptivity' };

export default async function NewAbsorptivityVersionPage({
  params,
}: PageProps<'/notebooks/[notebookId]/absorptivities/[absorptivityId]/new-version'>) {
  const actor = await requireActor();
  const { notebookId, absorptivityId } = await params;
  const of = await orNotFound(loadAbsorptivity(actor, absorptivityId));
  if (!of.mayEdit || of.notebookId !== notebookId) notFound();
  return (
    <>
      <PageHeader
        title={`New version of ${of.title}`}
        crumbs={[
          { href: `/notebooks/${notebookId}/curves`, label: 'Standard curves' },
          { href: `/notebooks/${notebookId}/absorptivities/${of.id}`, label: `Version ${of.version}` },
        ]}
        lead={`It starts from version ${of.version} and takes its place; version ${of.version} is kept as it is.`}
      />
      <AbsorptivityForm
        notebookId={notebookId}
        saveKey={randomUUID()}
        start={textsOfAbsorptivity(of)}
        base={{ id: of.id, version: of.version }}
        save={save}
      />
    </>
  );
}
