import type { Metadata } from 'next';
import Link from 'next/link';
import { PageHeader } from '@/components/frame/page-header';
import { HeaderText } from '@/components/spectrum/header-text';
import { OriginalFile } from '@/components/spectrum/original-file';
import { WarningList } from '@/components/spectrum/warning-list';
import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { laboratory } from '@/db/entry/settings';
import { checkSourceBytes, getSourceFile } from '@/db/queries/source-files';
import { formatDateTime } from '@/lib/format/dates';
import { absorbanceText, nmRangeText, sizeText } from '@/lib/format/optical';
import { foundInWords } from '@/lib/spectrum/found-in-words';
import { CHECKED_ON_PAGE_BYTES, readerFacts } from '@/lib/spectrum/reader-facts';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';

export const metadata: Metadata = { title: 'Source file' };

export default async function SourceFilePage({
  params,
}: PageProps<'/notebooks/[notebookId]/spectra/files/[sourceFileId]'>) {
  const actor = await requireActor();
  const { notebookId, sourceFileId } = await params;
  const file = await orNotFound(getSourceFile(actor, sourceFileId, notebookId));
  const intact = await checkSourceBytes(actor, sourceFileId, CHECKED_ON_PAGE_BYTES);
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  const base = `/notebooks/${notebookId}/spectra`;
  return (
    <>
      <PageHeader
        crumbs={[{ label: 'Spectra', href: base }, { label: file.name }]}
        title={file.name}
        lead={foundInWords(file)}
      />
      <Columns>
        <Card title="Original" aside="bytes kept as they came">
          <OriginalFile
            sourceFileId={file.id}
            sha256={file.sha256}
            intact={intact}
            entries={[
              { label: 'Uploaded', value: formatDateTime(file.createdAt, timeZone), mono: true },
              { label: 'By', value: file.uploadedBy ?? 'unknown' },
              { label: 'Size', value: sizeText(file.sizeBytes) },
              ...readerFacts(file),
            ]}
          />
        </Card>
        <Card title="What to know about it">
          <WarningList warnings={file.warnings} />
        </Card>
      </Columns>
      <Card flush title="Spectra in it">
        <Table label="Spectra in this file">
          <thead>
            <tr>
              <Th>Spectrum</Th>
              <Th numeric>Range</Th>
              <Th numeric>Points</Th>
              <Th numeric>Highest A</Th>
            </tr>
          </thead>
          <tbody>
            {file.spectra.map((spectrum) => (
              <tr key={spectrum.id}>
                <RowHead>
                  <Link href={`${base}/${spectrum.id}`} className="hover:underline">
                    {spectrum.name}
                  </Link>{' '}
                  {spectrum.voided && <Pill>set aside</Pill>}
                </RowHead>
                <Td numeric>{nmRangeText(spectrum.fromNm, spectrum.toNm)}</Td>
                <Td numeric>{spectrum.pointCount}</Td>
                <Td numeric>
                  {spectrum.highestAbsorbance === null ? '–' : absorbanceText(spectrum.highestAbsorbance)}
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      </Card>
      {file.headerText !== '' && (
        <Card title="Header text" aside="as the file words it">
          <HeaderText text={file.headerText} label="Header text" />
        </Card>
      )}
      {file.trailerText !== '' && (
        <Card title="Text behind the data">
          <HeaderText text={file.trailerText} label="Text behind the data" />
        </Card>
      )}
    </>
  );
}
