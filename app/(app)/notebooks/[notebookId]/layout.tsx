import type { ReactNode } from 'react';
import { NotebookTabs } from '@/components/frame/notebook-tabs';
import { progressOf, readNotebook } from '@/db/queries/notebooks';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';

/** The pages of one notebook beside each other. */
export default async function NotebookLayout({
  children,
  params,
}: {
  children: ReactNode;
  params: Promise<{ notebookId: string }>;
}) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const notebook = await orNotFound(readNotebook(actor, notebookId));
  const progress = await progressOf(actor, notebookId);
  const base = `/notebooks/${notebookId}`;
  const tabs = [
    { href: base, label: 'Overview' },
    { href: `${base}/spectra`, label: 'Spectra', count: progress.spectra },
    {
      href: `${base}/curves`,
      label: 'Standard curves',
      count: progress.curves,
      also: `${base}/absorptivities`,
    },
    { href: `${base}/batches`, label: 'Batches', count: progress.batches },
    { href: `${base}/record`, label: 'Record' },
    ...(notebook.mayListMembers ? [{ href: `${base}/members`, label: 'Members' }] : []),
  ];
  return (
    <>
      <NotebookTabs tabs={tabs} label={notebook.title} />
      {children}
    </>
  );
}
