import type { Metadata } from 'next';
import { orNotFound } from '@/app/_server/page-data';
import { requireActor } from '@/app/_server/current-actor';
import { CurveTable } from '@/components/curve/curve-table';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { laboratory } from '@/db/entry/settings';
import { listCurves } from '@/db/queries/curves';
import { readNotebook } from '@/db/queries/notebooks';

export const metadata: Metadata = { title: 'Standard curves' };

export default async function CurvesPage({ params }: PageProps<'/notebooks/[notebookId]/curves'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const [notebook, curves] = await orNotFound(
    Promise.all([readNotebook(actor, notebookId), listCurves(actor, notebookId)]),
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
    </>
  );
}
