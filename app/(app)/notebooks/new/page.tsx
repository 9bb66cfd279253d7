import type { Metadata } from 'next';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { possibleOwners } from '@/db/queries/notebooks';
import { requireActor } from '@/app/_server/current-actor';
import { NotebookForm } from './notebook-form';

export const metadata: Metadata = { title: 'New notebook' };

export default async function NewNotebookPage() {
  const actor = await requireActor();
  const owners = await possibleOwners(actor);
  const own = owners.find((owner) => owner.id === actor.personId) ?? owners[0];
  return (
    <>
      <PageHeader crumbs={[{ href: '/notebooks', label: 'Notebooks' }]} title="New notebook" />
      <Card>
        {own ? (
          <NotebookForm owners={owners} ownerId={own.id} />
        ) : (
          <p>
            A notebook is owned by a PI, and there is none yet. An administrator can add one under People.
          </p>
        )}
      </Card>
    </>
  );
}
