'use client';

import { useRouter } from 'next/navigation';
import { useCallback, useState, type ReactNode } from 'react';
import { PageHeader } from '@/components/frame/page-header';
import { ChooseFilesButton } from '@/components/spectrum/choose-files-button';
import { CopyAddressButton } from '@/components/spectrum/copy-address-button';
import { SpectraList } from '@/components/spectrum/spectra-list';
import { UploadPanel } from '@/components/spectrum/upload-panel';
import { useFileDrop } from '@/components/spectrum/use-file-drop';
import { useSpectraView } from '@/components/spectrum/use-spectra-view';
import { useUploads } from '@/components/spectrum/use-uploads';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { spectraInWords } from '@/lib/spectrum/spectra-in-words';
import type { SpectrumUse, SpectrumView } from '@/lib/views/spectrum';
import { PlotAndReadings } from './plot-and-readings';

/** Spectra that an upload adds to the plot by itself; the rest of a large drop waits in the list. */
const ADDED_TO_PLOT = 48;

interface Props {
  notebookId: string;
  notebookTitle: string;
  mayEdit: boolean;
  spectra: readonly SpectrumView[];
  total: number;
  uses: Readonly<Record<string, SpectrumUse>>;
  /** what was uploaded, rendered on the server */
  children: ReactNode;
}

function folderSentence(folders: readonly string[]): string {
  const names = folders.join(', ');
  return folders.length === 1
    ? `“${names}” is a folder. Open it and bring the files in it`
    : `${names} are folders. Open them and bring the files in them`;
}

/** Everything of the Spectra page that follows the person: uploads, choice, plot, readings. */
export function SpectraWorkspace({
  notebookId,
  notebookTitle,
  mayEdit,
  spectra,
  total,
  uses,
  children,
}: Props) {
  const router = useRouter();
  const view = useSpectraView(spectra);
  const { add } = view;
  const [notice, setNotice] = useState<string | null>(null);
  const land = useCallback(
    (ids: readonly string[]) => {
      add(ids.slice(0, ADDED_TO_PLOT));
      router.refresh();
    },
    [add, router],
  );
  const uploads = useUploads(`/api/v1/notebooks/${notebookId}/source-files`, land);
  const { queue } = uploads;
  const take = useCallback(
    (files: File[], folders: readonly string[] = []) => {
      const refusal = files.length > 0 ? queue.add(files) : null;
      setNotice(refusal ?? (folders.length > 0 ? folderSentence(folders) : null));
    },
    [queue],
  );
  const over = useFileDrop(mayEdit ? take : null);
  const inUse = spectra.filter((spectrum) => !spectrum.voided);

  return (
    <>
      <PageHeader
        title={spectraInWords(total - (spectra.length - inUse.length), inUse)}
        lead={mayEdit && spectra.length > 0 && 'Drop files anywhere on this page to add them.'}
        actions={
          spectra.length > 0 && (
            <>
              <CopyAddressButton />
              {mayEdit && <ChooseFilesButton onFiles={take} />}
            </>
          )
        }
      />
      {over && <DropTarget notebookTitle={notebookTitle} />}
      {notice && <Notice tone="stop">{notice}</Notice>}
      <UploadPanel uploads={uploads} />
      {spectra.length === 0 ? (
        !uploads.busy && <NoSpectra mayEdit={mayEdit} onFiles={take} />
      ) : (
        <>
          <PlotAndReadings chosen={view.chosen} uses={uses} state={view.rule} onRule={view.setRule} />
          <SpectraList
            spectra={spectra}
            total={total}
            chosenIds={view.chosen.map((spectrum) => spectrum.id)}
            aside={view.aside}
            onChoose={view.choose}
            onAside={view.showAside}
          />
        </>
      )}
      {children}
    </>
  );
}

function NoSpectra({ mayEdit, onFiles }: { mayEdit: boolean; onFiles: (files: File[]) => void }) {
  return (
    <Card>
      <EmptyState
        title="No spectra yet"
        action={mayEdit && <ChooseFilesButton onFiles={onFiles} label="Choose spectrum files" />}
      >
        {mayEdit
          ? 'Drop files here or choose them: delimited text (CSV, TSV) or JCAMP-DX, up to 500 at a time. The bytes are kept as they come.'
          : 'What is uploaded to this notebook will stand here.'}
      </EmptyState>
    </Card>
  );
}

function DropTarget({ notebookTitle }: { notebookTitle: string }) {
  return (
    <div
      aria-hidden="true"
      className="pointer-events-none fixed inset-3 z-50 grid place-items-center rounded-card border-2 border-dashed border-uv bg-uv-wash/90"
    >
      <p className="font-serif text-title">Let go to add them to “{notebookTitle}”</p>
    </div>
  );
}
