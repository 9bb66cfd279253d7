import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { readNotebook } from '@/db/queries/notebooks';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { ArchiveForm, NotebookForm } from './settings-forms';

export const metadata: Metadata = { title: 'Title, purpose, archive' };

export default async function SettingsPage({ params }: PageProps<'/notebooks/[notebookId]/settings'>) {
  const actor = await requireActor();
  const notebook = await orNotFound(readNotebook(actor, (await params).notebookId));
  if (!notebook.mayEdit && !notebook.mayManage) notFound();
  return (
    <>
      <PageHeader title="Title, purpose, archive" />
      {notebook.mayEdit && (
        <Card title="Title and purpose">
          <NotebookForm key={notebook.version} notebook={notebook} />
        </Card>
      )}
      {notebook.mayManage && (
        <Card title={notebook.archived ? 'In the archive' : 'Archive'}>
          <ArchiveForm notebook={notebook} />
        </Card>
      )}
    </>
  );
}
