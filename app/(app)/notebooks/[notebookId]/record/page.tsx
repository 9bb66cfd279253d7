import type { Metadata } from 'next';
import { RecordTable } from '@/components/notebook/record-table';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { laboratory } from '@/db/entry/settings';
import { listRecord } from '@/db/queries/record';
import { pageQuery } from '@/lib/schemas/page-query';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';

export const metadata: Metadata = { title: 'Record' };

export default async function RecordPage({
  params,
  searchParams,
}: PageProps<'/notebooks/[notebookId]/record'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const asked = pageQuery.safeParse(await searchParams);
  const query = asked.success ? asked.data : pageQuery.parse({});
  const page = await orNotFound(listRecord(actor, notebookId, query));
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  return (
    <>
      <PageHeader
        title="Record"
        lead="Every change to this notebook: who, when, what, from, to and why. Entries are added and never changed."
      />
      <Card flush title="Newest first" aside={`times in ${timeZone.replace('_', ' ')}`}>
        <RecordTable entries={page.items} timeZone={timeZone} />
      </Card>
      {page.nextCursor && (
        <p>
          <LinkButton href={`?cursor=${page.nextCursor}`}>Earlier entries</LinkButton>
        </p>
      )}
    </>
  );
}
