import type { Metadata } from 'next';
import { LimitsRuler, type RuledResult } from '@/components/curve/limits-ruler';
import { ModelTable } from '@/components/curve/model-table';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { compareBatch } from '@/db/queries/batch-comparison';
import { meaningOf } from '@/lib/batch/meaning';
import type { BatchView } from '@/lib/views/batch';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';

export const metadata: Metadata = { title: 'Models and limits' };

/** Results that have a number, where they lie in the measured solution. */
function ruled({ determinations, method }: BatchView): RuledResult[] {
  return determinations.flatMap(({ id, sample, result, voidedAt }) =>
    voidedAt !== null || result.measured === null || result.reportCase === 'notQuantified'
      ? []
      : [
          {
            key: id,
            name: sample,
            value: result.measured.value,
            tone: meaningOf(result, method.range, method.unit).tone,
          },
        ],
  );
}

export default async function ComparePage({
  params,
}: PageProps<'/notebooks/[notebookId]/batches/[batchId]/compare'>) {
  const actor = await requireActor();
  const { notebookId, batchId } = await params;
  const { batch, models, limits } = await orNotFound(compareBatch(actor, batchId));
  const batches = `/notebooks/${notebookId}/batches`;
  const { method } = batch;
  return (
    <>
      <PageHeader
        crumbs={[
          { href: batches, label: 'Batches' },
          { href: `${batches}/${batchId}`, label: batch.title },
          { label: 'Models and limits' },
        ]}
        title="Models and limits"
        lead="What another model or weighting would make of these results, and the limits that the same data allow. Nothing here changes a result: for another model, make a new version of the curve and read the batch on it."
      />
      <Card flush title="Models side by side" aside="c in the measured solution, and its change">
        <ModelTable models={models} unit={method.unit} />
      </Card>
      <Card flush title="Limits on one ruler" aside="in the measured solution">
        {method.range && (
          <LimitsRuler {...limits} range={method.range} unit={method.unit} results={ruled(batch)} />
        )}
      </Card>
    </>
  );
}
