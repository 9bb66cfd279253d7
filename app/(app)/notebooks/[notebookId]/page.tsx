import type { Metadata } from 'next';
import { NextStep } from '@/components/notebook/next-step';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Facts } from '@/components/ui/facts';
import { Pill } from '@/components/ui/pill';
import { progressOf, readNotebook } from '@/db/queries/notebooks';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';

export const metadata: Metadata = { title: 'Notebook' };

export default async function NotebookPage({ params }: PageProps<'/notebooks/[notebookId]'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const notebook = await orNotFound(readNotebook(actor, notebookId));
  const progress = await progressOf(actor, notebookId);
  const base = `/notebooks/${notebookId}`;
  return (
    <>
      <PageHeader
        crumbs={actor.kind === 'link' ? [] : [{ href: '/notebooks', label: 'Notebooks' }]}
        title={notebook.title}
        status={notebook.archived && <Pill tone="plain">archived</Pill>}
        lead={notebook.purpose}
        actions={
          (notebook.mayEdit || notebook.mayManage) && (
            <LinkButton href={`${base}/settings`}>Title, purpose, archive</LinkButton>
          )
        }
      />
      <Card title="Where the work stands" aside={`owned by ${notebook.owner}`}>
        <NextStep base={base} progress={progress} mayEdit={notebook.mayEdit} />
      </Card>
      <Facts
        facts={[
          { label: 'Spectra', value: progress.spectra },
          { label: 'Standard curves', value: progress.curves },
          { label: 'Batches', value: progress.batches },
          { label: 'Determinations', value: progress.determinations },
        ]}
      />
    </>
  );
}
