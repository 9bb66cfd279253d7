import type { Metadata } from 'next';
import Link from 'next/link';
import { PageHeader } from '@/components/frame/page-header';
import { Button, LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { Field } from '@/components/ui/field';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { laboratory } from '@/db/entry/settings';
import { listNotebooks, possibleOwners } from '@/db/queries/notebooks';
import { RULES } from '@/lib/policies/rules';
import { formatDate } from '@/lib/format/dates';
import type { NotebookSummary } from '@/lib/views/notebook';
import { requireActor } from '@/app/_server/current-actor';

export const metadata: Metadata = { title: 'Notebooks' };

const one = (value: string | string[] | undefined) => (Array.isArray(value) ? value[0] : value) ?? '';

export default async function NotebooksPage({ searchParams }: PageProps<'/notebooks'>) {
  const actor = await requireActor();
  const query = await searchParams;
  const search = one(query.search);
  const archived = one(query.archived) === 'yes';
  const [notebooks, owners, lab] = await Promise.all([
    listNotebooks(actor, { search, archived }),
    possibleOwners(actor),
    laboratory(),
  ]);
  const mayCreate = RULES.notebook.create(actor) && owners.length > 0;
  const create = (
    <LinkButton href="/notebooks/new" variant="primary">
      New notebook
    </LinkButton>
  );
  return (
    <>
      <PageHeader title={archived ? 'Archived notebooks' : 'Notebooks'} actions={mayCreate && create} />
      <search>
        <form className="flex flex-wrap items-end gap-3" action="/notebooks">
          {archived && <input type="hidden" name="archived" value="yes" />}
          <Field
            name="search"
            label="Search titles and purposes"
            type="search"
            initial={search}
            className="w-72 max-w-full"
          />
          <Button>Search</Button>
          <Link
            href={archived ? '/notebooks' : '/notebooks?archived=yes'}
            className="py-2 text-uv underline underline-offset-2"
          >
            {archived ? 'Notebooks in use' : 'Archived notebooks'}
          </Link>
        </form>
      </search>
      <Card flush title={archived ? 'In the archive' : 'In use'} aside={countOf(notebooks.length)}>
        {notebooks.length > 0 ? (
          <NotebookTable notebooks={notebooks} timeZone={lab?.timeZone ?? 'UTC'} />
        ) : (
          <EmptyState
            title={search ? 'No notebook matches' : 'No notebooks yet'}
            action={mayCreate && !search && create}
          >
            {search
              ? 'Try fewer letters, or look in the archive.'
              : 'A notebook holds spectra, standard curves and the batches read off them. You see those you own, work in or were given to read.'}
          </EmptyState>
        )}
      </Card>
    </>
  );
}

const countOf = (n: number) => (n === 1 ? '1 notebook' : `${n} notebooks`);

function NotebookTable({ notebooks, timeZone }: { notebooks: readonly NotebookSummary[]; timeZone: string }) {
  return (
    <Table label="Notebooks">
      <thead>
        <tr>
          <Th>Title</Th>
          <Th>Purpose</Th>
          <Th>Owner</Th>
          <Th>Last changed</Th>
        </tr>
      </thead>
      <tbody>
        {notebooks.map((notebook) => (
          <tr key={notebook.id}>
            <RowHead>
              <Link href={`/notebooks/${notebook.id}`} className="underline-offset-2 hover:underline">
                {notebook.title}
              </Link>
            </RowHead>
            <Td className="max-w-96 truncate text-ink-2">{notebook.purpose}</Td>
            <Td className="whitespace-nowrap">{notebook.owner}</Td>
            <Td className="whitespace-nowrap text-ink-2">{formatDate(notebook.changedAt, timeZone)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
