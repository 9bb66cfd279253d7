import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { BudgetTable } from '@/components/batch/budget-table';
import { ChangeHistory } from '@/components/batch/change-history';
import { DeterminationFacts } from '@/components/batch/determination-facts';
import { CurveNotice, DriftNotice, HazardNotice } from '@/components/batch/batch-notices';
import { MonteCarloCard } from '@/components/batch/monte-carlo-card';
import { ReadingsCard } from '@/components/batch/readings-card';
import { PlaceOnCurve } from '@/components/charts/place-on-curve';
import { FlagList } from '@/components/flags/flag-list';
import { Quantity } from '@/components/flags/quantity';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { Disclosure } from '@/components/ui/disclosure';
import { Notice } from '@/components/ui/notice';
import { WorkingList } from '@/components/working/working-list';
import { laboratory } from '@/db/entry/settings';
import { loadAbsorptivity } from '@/db/queries/absorptivities';
import { loadBatchHead } from '@/db/queries/batches';
import { loadCurve } from '@/db/queries/curves';
import { loadDetermination } from '@/db/queries/determinations';
import { meaningOf } from '@/lib/batch/meaning';
import { readOn, readOnText } from '@/lib/batch/read-on';
import { requestWith } from '@/lib/batch/unknown-request';
import { readingText, SIGNAL_SYMBOL } from '@/lib/batch/reading-text';
import type { DeterminationView } from '@/lib/views/determination';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { ChangeConditions, CorrectReading, VoidDetermination } from './change-dialogs';

export const metadata: Metadata = { title: 'Determination' };

/** What the dialog needs; the working stays on the server. */
const conditionsOf = ({ id, version, sample, pathLengthMm, pathLengthUMm, dilution }: DeterminationView) => ({
  ...{ id, version, sample, pathLengthMm, pathLengthUMm, dilution },
});

export default async function DeterminationPage({
  params,
}: PageProps<'/notebooks/[notebookId]/batches/[batchId]/determinations/[determinationId]'>) {
  const actor = await requireActor();
  const { notebookId, batchId, determinationId } = await params;
  const determination = await orNotFound(loadDetermination(actor, determinationId));
  if (determination.batchId !== batchId) notFound();
  const batch = await orNotFound(loadBatchHead(actor, batchId));
  const curve = batch.curve && (await orNotFound(loadCurve(actor, batch.curve.id)));
  const known = batch.absorptivity && (await orNotFound(loadAbsorptivity(actor, batch.absorptivity.id)));
  const behind = curve?.result.curve.working ?? known?.working ?? [];
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  const base = `/notebooks/${notebookId}`;
  const { method } = batch;
  const { result } = determination;
  const works = batch.mayEdit && batch.status === 'open' && determination.voidedAt === null;
  return (
    <>
      <PageHeader
        crumbs={[
          { href: `${base}/batches`, label: 'Batches' },
          { href: `${base}/batches/${batchId}`, label: batch.title },
          { label: determination.sample },
        ]}
        title={determination.sample}
        lead={`${method.analyte}, read on ${readOnText(readOn(batch))}`}
        actions={
          works && (
            <>
              <VoidDetermination
                id={determination.id}
                version={determination.version}
                sample={determination.sample}
              />
              <ChangeConditions determination={conditionsOf(determination)} />
            </>
          )
        }
      />
      {determination.voidedAt !== null && (
        <Notice tone="stop" title="This determination is void">
          {determination.voidReason}. It stays to be seen, and its number must not be used.
        </Notice>
      )}
      <HazardNotice note={method.hazardNote} />
      <CurveNotice batch={batch} base={base} />
      <Columns>
        <Card title="Result" aside={`reported as: ${result.report}`}>
          <div className="grid gap-4">
            <Quantity
              result={result}
              unit={method.unit}
              basis={method.basis}
              confidence={method.confidence}
              large
            />
            <p className="flex flex-wrap items-center gap-3 text-sm text-ink-2">
              {method.range && (
                <PlaceOnCurve
                  value={result.reportCase === 'notQuantified' ? null : (result.measured?.value ?? null)}
                  {...method.range}
                  tone={meaningOf(result, method.range, method.unit).tone}
                />
              )}
              {result.advice === undefined && meaningOf(result, method.range, method.unit).sentence}
            </p>
          </div>
        </Card>
        <Card title="What to know about it">
          <FlagList
            flags={[...result.flags, ...(method.knownAbsorptivity?.flags ?? [])]}
            inOrder={
              method.range
                ? 'Within the standards, and nothing speaks against it.'
                : 'Nothing speaks against it.'
            }
          />
        </Card>
      </Columns>
      <DeterminationFacts determination={determination} method={method} />
      <Columns>
        <ReadingsCard
          determination={determination}
          base={base}
          correct={
            works
              ? (reading) => (
                  <CorrectReading
                    key={reading.position}
                    determination={{ id: determination.id, version: determination.version }}
                    reading={{ id: reading.id, position: reading.position }}
                    shown={readingText(reading, reading.origin)}
                    symbol={SIGNAL_SYMBOL[method.signal]}
                  />
                )
              : undefined
          }
        />
        {result.concentration && <BudgetTable budget={result.budget} unit={method.unit} />}
      </Columns>
      {curve && result.concentration && (
        <MonteCarloCard request={requestWith(curve.request, [determination])} unit={method.unit} />
      )}
      <Card title="Show the working" aside={`engine ${determination.engineVersion}`}>
        <Disclosure summary="Every step from the readings to the report, with these numbers">
          <WorkingList steps={result.working} prefix="result" behind={behind} />
        </Disclosure>
        <div className="mt-3">
          <Disclosure
            summary={curve ? 'The steps of the standard curve behind it' : 'The known absorptivity behind it'}
          >
            <WorkingList steps={behind} prefix="result" />
          </Disclosure>
        </div>
      </Card>
      <Card title="History">
        <ChangeHistory history={determination.history} timeZone={timeZone} />
      </Card>
      <DriftNotice batch={batch} />
    </>
  );
}
