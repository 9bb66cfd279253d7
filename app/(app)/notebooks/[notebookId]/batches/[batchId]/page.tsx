import type { Metadata } from 'next';
import { BatchFacts } from '@/components/batch/batch-facts';
import { CurveNotice, DriftNotice, HazardNotice, StatusNotice } from '@/components/batch/batch-notices';
import { resultRowOf } from '@/components/batch/result-row-of';
import { ResultTools } from '@/components/batch/result-tools';
import { ResultsTable } from '@/components/batch/results-table';
import { VoidDeterminations } from '@/components/batch/void-determinations';
import { FlagList } from '@/components/flags/flag-list';
import { coverage } from '@/components/flags/quantity';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { Pill } from '@/components/ui/pill';
import { loadBatch } from '@/db/queries/batches';
import { resultsText } from '@/lib/batch/results-text';
import type { BatchView } from '@/lib/views/batch';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { VoidBatch } from './void-batch';

export const metadata: Metadata = { title: 'Batch' };

export default async function BatchPage({ params }: PageProps<'/notebooks/[notebookId]/batches/[batchId]'>) {
  const actor = await requireActor();
  const { notebookId, batchId } = await params;
  const batch = await orNotFound(loadBatch(actor, batchId));
  const base = `/notebooks/${notebookId}`;
  const here = `${base}/batches/${batchId}`;
  const works = batch.mayEdit && batch.status === 'open';
  const known = batch.method.knownAbsorptivity;
  return (
    <>
      <PageHeader
        crumbs={[{ href: `${base}/batches`, label: 'Batches' }, { label: batch.title }]}
        title={batch.title}
        status={<BatchStatus batch={batch} />}
        lead={batch.note}
        actions={<BatchActions batch={batch} here={here} works={works} />}
      />
      <StatusNotice batch={batch} base={base} />
      <HazardNotice note={batch.method.hazardNote} />
      <CurveNotice batch={batch} base={base} />
      <BatchFacts batch={batch} base={base} />
      <Results batch={batch} here={here} works={works} />
      {known && known.flags.length > 0 && (
        <Card title="What to know about the absorptivity">
          <FlagList flags={known.flags} />
        </Card>
      )}
      <DriftNotice batch={batch} />
    </>
  );
}

function BatchStatus({ batch }: { batch: BatchView }) {
  return (
    <>
      <Pill tone="plain">version {batch.version}</Pill>
      {batch.status !== 'open' && (
        <Pill tone={batch.status === 'void' ? 'stop' : 'decide'}>{batch.status}</Pill>
      )}
    </>
  );
}

function BatchActions({ batch, here, works }: { batch: BatchView; here: string; works: boolean }) {
  const onCurve = batch.curve !== null;
  const compare = onCurve && batch.determinations.length > 0 && (
    <LinkButton href={`${here}/compare`}>Models and limits</LinkButton>
  );
  if (!works) return compare;
  return (
    <>
      {compare}
      <VoidBatch batchId={batch.id} title={batch.title} />
      {onCurve && batch.determinations.length > 0 && (
        <LinkButton href={`${here}/version`}>Read on another curve</LinkButton>
      )}
      <LinkButton href={`${here}/add`} variant="primary">
        Add samples
      </LinkButton>
    </>
  );
}

function Results({ batch, here, works }: { batch: BatchView; here: string; works: boolean }) {
  const current = batch.determinations.filter((determination) => determination.voidedAt === null);
  const voided = batch.determinations.filter((determination) => determination.voidedAt !== null);
  const texts = { point: resultsText(batch, 'point'), comma: resultsText(batch, 'comma') };
  return (
    <>
      <Card
        flush
        title="Results"
        aside={`± is U, ${coverage(batch.method.confidence)} coverage`}
        actions={current.length > 0 && <ResultTools batchId={batch.id} texts={texts} />}
      >
        {current.length > 0 ? (
          <ResultsTable
            label="Results"
            method={batch.method}
            rows={current.map((determination) => resultRowOf(determination, here))}
          />
        ) : (
          <EmptyState
            title="No samples yet"
            action={
              works && (
                <LinkButton href={`${here}/add`} variant="primary">
                  Add samples
                </LinkButton>
              )
            }
          >
            Type or paste their readings, or take them from the spectra of this notebook.
          </EmptyState>
        )}
      </Card>
      {voided.length > 0 && <VoidDeterminations determinations={voided} here={here} />}
    </>
  );
}
