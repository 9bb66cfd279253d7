import type { Metadata } from 'next';
import { randomUUID } from 'node:crypto';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { listAbsorptivities } from '@/db/queries/absorptivities';
import { listCurves } from '@/db/queries/curves';
import type { AbsorptivitySummary } from '@/lib/views/absorptivity';
import type { CurveSummary } from '@/lib/views/curve';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { BatchForm } from './batch-form';

export const metadata: Metadata = { title: 'New batch' };

const choiceOf = (of: CurveSummary | AbsorptivitySummary) => ({
  ...{ id: of.id, title: of.title, version: of.version, status: of.status, voidReason: of.voidReason },
  ...{ newer: of.newer, unit: of.unit, basis: of.basis, wavelengthNm: of.wavelengthNm },
});

const one = (value: string | string[] | undefined) => (Array.isArray(value) ? value[0] : value);

export default async function NewBatchPage({
  params,
  searchParams,
}: PageProps<'/notebooks/[notebookId]/batches/new'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const [curves, absorptivities] = await orNotFound(
    Promise.all([listCurves(actor, notebookId), listAbsorptivities(actor, notebookId)]),
  );
  const choices = [
    ...curves.map((curve) => ({ kind: 'curve' as const, ...choiceOf(curve) })),
    ...absorptivities.map((known) => ({ kind: 'absorptivity' as const, ...choiceOf(known) })),
  ];
  const { curve, absorptivity } = await searchParams;
  const asked = one(curve) ?? one(absorptivity);
  const base = `/notebooks/${notebookId}`;
  const usable = choices.filter((choice) => choice.status !== 'void');
  return (
    <>
      <PageHeader
        crumbs={[{ href: `${base}/batches`, label: 'Batches' }, { label: 'New' }]}
        title="New batch"
      />
      <Card>
        {usable.length > 0 ? (
          <BatchForm notebookId={notebookId} submissionKey={randomUUID()} choices={choices} asked={asked} />
        ) : (
          <EmptyState
            title="A batch needs a standard curve"
            action={
              <div className="flex flex-wrap justify-center gap-2">
                <LinkButton href={`${base}/curves/new`} variant="primary">
                  New standard curve
                </LinkButton>
                <LinkButton href={`${base}/absorptivities/new`}>New known absorptivity</LinkButton>
              </div>
            }
          >
            {choices.length > 0
              ? 'Every curve of this notebook is void. Make one that holds.'
              : 'Samples are read back from the readings of standards. Make the curve first, or enter a known absorptivity.'}
          </EmptyState>
        )}
      </Card>
    </>
  );
}
