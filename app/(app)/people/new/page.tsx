import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { RULES } from '@/lib/policies/rules';
import { requireActor } from '@/app/_server/current-actor';
import { AddPersonForm } from './add-person-form';

export const metadata: Metadata = { title: 'Add a person' };

export default async function AddPersonPage() {
  if (!RULES.person.create(await requireActor())) notFound();
  return (
    <>
      <PageHeader
        crumbs={[{ href: '/people', label: 'People' }, { label: 'Add a person' }]}
        title="Add a person"
      />
      <Card>
        <AddPersonForm />
      </Card>
    </>
  );
}
