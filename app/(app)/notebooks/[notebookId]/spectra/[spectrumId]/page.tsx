import type { Metadata } from 'next';
import Link from 'next/link';
import { PageHeader } from '@/components/frame/page-header';
import { DefinitionList } from '@/components/spectrum/definition-list';
import { GapsTable } from '@/components/spectrum/gaps-table';
import { OriginalFile } from '@/components/spectrum/original-file';
import { WarningList } from '@/components/spectrum/warning-list';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { Notice } from '@/components/ui/notice';
import { Pill } from '@/components/ui/pill';
import { readNotebook } from '@/db/queries/notebooks';
import { checkSourceBytes } from '@/db/queries/source-files';
import { getSpectrum, getSpectrumPoints } from '@/db/queries/spectra';
import { CHECKED_ON_PAGE_BYTES, readerFacts } from '@/lib/spectrum/reader-facts';
import { spectrumFacts } from '@/lib/spectrum/spectrum-facts';
import { spectrumKey } from '@/lib/spectrum/view-address';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';

import { AsideForm, RenameForm } from './spectrum-forms';
import { SpectrumPlot } from './spectrum-plot';

export const metadata: Metadata = { title: 'Spectrum' };

export default async function SpectrumPage({
  params,
}: PageProps<'/notebooks/[notebookId]/spectra/[spectrumId]'>) {
  const actor = await requireActor();
  const { notebookId, spectrumId } = await params;
  const spectrum = await orNotFound(getSpectrum(actor, spectrumId, notebookId));
  const { mayEdit } = await orNotFound(readNotebook(actor, notebookId));
  const { gaps } = await getSpectrumPoints(actor, spectrumId);
  const intact = await checkSourceBytes(actor, spectrum.sourceFileId, CHECKED_ON_PAGE_BYTES);
  const base = `/notebooks/${notebookId}/spectra`;
  const file = <Link href={`${base}/files/${spectrum.sourceFileId}`}>{spectrum.fileName}</Link>;
  return (
    <>
      <PageHeader
        crumbs={[{ label: 'Spectra', href: base }, { label: spectrum.name }]}
        title={spectrum.name}
        status={spectrum.voided && <Pill>set aside</Pill>}
        actions={<LinkButton href={`${base}?s=${spectrumKey(spectrum.id)}`}>Read it in the plot</LinkButton>}
      />
      {spectrum.voided && (
        <Notice tone="decide" title="This spectrum is set aside">
          {spectrum.voidReason}
        </Notice>
      )}
      <Columns share="wideFirst">
        <Card title="Absorbance" aside="as read">
          <SpectrumPlot spectrum={spectrum} />
        </Card>
        <Card title="What it is">
          <DefinitionList label="What it is" entries={spectrumFacts(spectrum)} />
        </Card>
      </Columns>
      <Columns>
        <Card title="What to know about it">
          <WarningList warnings={spectrum.warnings} />
        </Card>
        <Card title="Where it comes from" aside={`block ${spectrum.block}, line ${spectrum.line}`}>
          <OriginalFile
            sourceFileId={spectrum.sourceFileId}
            sha256={spectrum.sha256}
            intact={intact}
            entries={[
              { label: 'File', value: <span className="underline">{file}</span> },
              { label: 'Data begin', value: `block ${spectrum.block}, line ${spectrum.line}` },
              ...readerFacts(spectrum),
            ]}
          />
        </Card>
      </Columns>
      {gaps.length > 0 && (
        <Card flush title="Gaps" aside="points without a number">
          <GapsTable gaps={gaps} />
        </Card>
      )}
      <Card title="Header" aside="as the file words it">
        <DefinitionList
          label="Header"
          entries={Object.entries(spectrum.header).map(([label, value]) => ({ label, value, mono: true }))}
        />
      </Card>
      {mayEdit && (
        <Columns>
          <Card title="Rename">
            <RenameForm id={spectrum.id} name={spectrum.name} />
          </Card>
          <Card title={spectrum.voided ? 'Bring back' : 'Set aside'}>
            <AsideForm id={spectrum.id} voided={spectrum.voided} />
          </Card>
        </Columns>
      )}
    </>
  );
}
