import type { Metadata } from 'next';
import { UploadedFiles } from '@/components/spectrum/uploaded-files';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { readNotebook } from '@/db/queries/notebooks';
import { listRefusedUploads, listSourceFiles } from '@/db/queries/source-files';
import { countSpectra, listSpectra } from '@/db/queries/spectra';
import { spectrumUses } from '@/db/queries/spectrum-uses';
import { pageQuery } from '@/lib/schemas/page-query';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { SpectraWorkspace } from './spectra-workspace';

export const metadata: Metadata = { title: 'Spectra' };

const REFUSED_SHOWN = 10;

export default async function SpectraPage({
  params,
  searchParams,
}: PageProps<'/notebooks/[notebookId]/spectra'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const asked = pageQuery.safeParse({ cursor: (await searchParams).files });
  const query = asked.success ? asked.data : pageQuery.parse({});
  const all = { includeVoided: true };
  const notebook = await orNotFound(readNotebook(actor, notebookId));
  const [spectra, total, uses, files, refused] = await Promise.all([
    listSpectra(actor, notebookId, all),
    countSpectra(actor, notebookId, all),
    spectrumUses(actor, notebookId),
    listSourceFiles(actor, notebookId, query),
    listRefusedUploads(actor, notebookId, REFUSED_SHOWN),
  ]);
  return (
    <SpectraWorkspace
      notebookId={notebookId}
      notebookTitle={notebook.title}
      mayEdit={notebook.mayEdit}
      spectra={spectra}
      total={total}
      uses={uses}
    >
      {files.items.length + refused.length > 0 && (
        <Card flush title="What was uploaded" aside="bytes kept as they came">
          <UploadedFiles files={files.items} refused={query.cursor ? [] : refused} />
          {files.nextCursor && (
            <p className="border-t px-4 py-2">
              <LinkButton size="small" href={`?files=${files.nextCursor}`}>
                Earlier files
              </LinkButton>
            </p>
          )}
        </Card>
      )}
    </SpectraWorkspace>
  );
}
