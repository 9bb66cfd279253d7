import type { Metadata } from 'next';
import Link from 'next/link';
import { curveWords } from '@/components/batch/curve-words';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { Pagination } from '@/components/ui/pagination';
import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { laboratory } from '@/db/entry/settings';
import { listBatches } from '@/db/queries/batches';
import { readNotebook } from '@/db/queries/notebooks';
import { readOn, YARDSTICK_NOUN } from '@/lib/batch/read-on';
import { formatDate } from '@/lib/format/dates';
import { pageQuery } from '@/lib/schemas/page-query';
import type { BatchSummary } from '@/lib/views/batch';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';

export const metadata: Metadata = { title: 'Batches' };

export default async function BatchesPage({
  params,
  searchParams,
}: PageProps<'/notebooks/[notebookId]/batches'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const asked = pageQuery.safeParse(await searchParams);
  const query = asked.success ? asked.data : pageQuery.parse({});
  const [page, notebook] = await orNotFound(
    Promise.all([listBatches(actor, notebookId, query), readNotebook(actor, notebookId)]),
  );
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  const base = `/notebooks/${notebookId}/batches`;
  const create = (
    <LinkButton href={`${base}/new`} variant="primary">
      New batch
    </LinkButton>
  );
  return (
    <>
      <PageHeader
        title="Batches"
        lead="Samples read on a standard curve or by a known absorptivity, each with its uncertainty."
        actions={notebook.mayEdit && create}
      />
      <Card flush title="Newest first">
        {page.items.length > 0 ? (
          <BatchTable batches={page.items} base={base} timeZone={timeZone} />
        ) : (
          <EmptyState title="No batches yet" action={notebook.mayEdit && create}>
            A batch holds the samples that are read on one standard curve, or by one known absorptivity.
          </EmptyState>
        )}
        <Pagination
          label="Pages of batches"
          next={page.nextCursor ? `?cursor=${page.nextCursor}` : undefined}
        />
      </Card>
    </>
  );
}

function BatchTable({
  batches,
  base,
  timeZone,
}: {
  batches: readonly BatchSummary[];
  base: string;
  timeZone: string;
}) {
  return (
    <Table label="Batches">
      <thead>
        <tr>
          <Th>Title</Th>
          <Th numeric>Version</Th>
          <Th>Read on</Th>
          <Th numeric>Samples</Th>
          <Th>Made</Th>
          <Th>State</Th>
        </tr>
      </thead>
      <tbody>
        {batches.map((batch) => (
          <tr key={batch.id}>
            <RowHead className="min-w-40">
              <Link href={`${base}/${batch.id}`} className="underline-offset-2 hover:underline">
                {batch.title}
              </Link>
            </RowHead>
            <Td numeric>{batch.version}</Td>
            <Td className="whitespace-nowrap">
              {readOn(batch).title} <span className="text-ink-2">version {readOn(batch).version}</span>
            </Td>
            <Td numeric>{batch.sampleCount}</Td>
            <Td className="whitespace-nowrap text-ink-2">{formatDate(batch.createdAt, timeZone)}</Td>
            <Td>
              <BatchState batch={batch} />
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function BatchState({ batch }: { batch: BatchSummary }) {
  if (batch.status === 'void') return <Pill tone="stop">void</Pill>;
  if (batch.status === 'superseded') return <Pill tone="plain">superseded</Pill>;
  const on = readOn(batch);
  const noun = YARDSTICK_NOUN[on.kind];
  if (on.status === 'void') return <Pill tone="stop">{noun} void</Pill>;
  const words = curveWords(on, on.kind);
  return words ? (
    <Pill tone="decide">newer {noun}</Pill>
  ) : (
    <Pill tone="order" quiet>
      in use
    </Pill>
  );
}
