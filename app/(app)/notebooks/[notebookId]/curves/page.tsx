import type { Metadata } from 'next';
import { orNotFound } from '@/app/_server/page-data';
import { requireActor } from '@/app/_server/current-actor';
import { AbsorptivityTable } from '@/components/absorptivity/absorptivity-table';
import { CurveTable } from '@/components/curve/curve-table';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { laboratory } from '@/db/entry/settings';
import { listAbsorptivities } from '@/db/queries/absorptivities';
import { listCurves } from '@/db/queries/curves';
import { readNotebook } from '@/db/queries/notebooks';
import type { AbsorptivitySummary } from '@/lib/views/absorptivity';

export const metadata: Metadata = { title: 'Standard curves' };

export default async function CurvesPage({ params }: PageProps<'/notebooks/[notebookId]/curves'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const [notebook, curves, absorptivities] = await orNotFound(
    Promise.all([
      readNotebook(actor, notebookId),
      listCurves(actor, notebookId),
      listAbsorptivities(actor, notebookId),
    ]),
  );
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  const current = curves.filter(({ status }) => status === 'saved');
  const earlier = curves.filter(({ status }) => status !== 'saved');
  const start = (
    <LinkButton variant="primary" href={`/notebooks/${notebookId}/curves/new`}>
      New standard curve
    </LinkButton>
  );
  return (
    <>
      <PageHeader title="Standard curves" actions={notebook.mayEdit && start} />
      <Card flush title="In use">
        {current.length > 0 ? (
          <CurveTable label="Curves in use" curves={current} timeZone={timeZone} />
        ) : (
          <EmptyState title="No standard curve yet" action={notebook.mayEdit && start}>
            A curve turns absorbances into concentrations. It needs standards of known concentration, read or
            measured as spectra.
          </EmptyState>
        )}
      </Card>
      {earlier.length > 0 && (
        <Card flush title="Superseded and void" aside="kept, and never changed">
          <CurveTable label="Superseded and void curves" curves={earlier} timeZone={timeZone} />
        </Card>
      )}
      <KnownAbsorptivities
        absorptivities={absorptivities}
        timeZone={timeZone}
        newHref={notebook.mayEdit ? `/notebooks/${notebookId}/absorptivities/new` : undefined}
      />
    </>
  );
}

/** The way to results without a curve. */
function KnownAbsorptivities({
  absorptivities,
  timeZone,
  newHref,
}: {
  absorptivities: readonly AbsorptivitySummary[];
  timeZone: string;
  /** for those who may make one */
  newHref?: string;
}) {
  const start = newHref && <LinkButton href={newHref}>New known absorptivity</LinkButton>;
  return (
    <Card flush title="Known absorptivities" actions={absorptivities.length > 0 && start}>
      {absorptivities.length > 0 ? (
        <AbsorptivityTable label="Known absorptivities" absorptivities={absorptivities} timeZone={timeZone} />
      ) : (
        <EmptyState title="No known absorptivity" action={start}>
          A published or certified absorptivity gives results without standards of your own, where no official
          method asks for them.
        </EmptyState>
      )}
    </Card>
  );
}
