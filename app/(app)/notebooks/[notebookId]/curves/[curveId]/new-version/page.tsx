import { randomUUID } from 'node:crypto';
import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { orNotFound } from '@/app/_server/page-data';
import { requireActor } from '@/app/_server/current-actor';
import { CurveForm } from '@/components/curve/curve-form';
import { HazardNote } from '@/components/curve/curve-status';
import { PageHeader } from '@/components/frame/page-header';
import { loadCurve } from '@/db/queries/curves';
import { listSpectra } from '@/db/queries/spectra';
import { formOf } from '@/lib/curve/form-start';
import { save } from '@/app/(app)/notebooks/[notebookId]/curves/actions';

export const metadata: Metadata = { title: 'New version of a standard curve' };

export default async function NewVersionPage({
  params,
}: PageProps<'/notebooks/[notebookId]/curves/[curveId]/new-version'>) {
  const actor = await requireActor();
  const { notebookId, curveId } = await params;
  const curve = await orNotFound(loadCurve(actor, curveId));
  if (!curve.mayEdit || curve.notebookId !== notebookId) notFound();
  const spectra = await listSpectra(actor, notebookId, { includeVoided: true });
  return (
    <>
      <PageHeader
        title={`New version of ${curve.title}`}
        crumbs={[
          { href: `/notebooks/${notebookId}/curves`, label: 'Standard curves' },
          { href: `/notebooks/${notebookId}/curves/${curveId}`, label: `Version ${curve.version}` },
        ]}
        lead={`It starts from version ${curve.version} and takes its place; version ${curve.version} is kept as it is.`}
      />
      <HazardNote note={curve.method.hazardNote} />
      <CurveForm
        notebookId={notebookId}
        saveKey={randomUUID()}
        start={formOf(curve)}
        base={{ id: curve.id, version: curve.version }}
        spectra={spectra}
        save={save}
      />
    </>
  );
}
