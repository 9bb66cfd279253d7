import { DownloadButton } from '@/components/ui/button';
import { Pill } from '@/components/ui/pill';

import { DefinitionList, type Definition } from './definition-list';

/** The bytes as they came: their hash, whether they still give it, and the way to have them. */
export function OriginalFile({
  sourceFileId,
  sha256,
  intact,
  entries,
}: {
  sourceFileId: string;
  sha256: string;
  /** null when they were not checked for this page */
  intact: boolean | null;
  entries: readonly Definition[];
}) {
  const check =
    intact === null ? (
      <span className="text-ink-2">checked when you download it</span>
    ) : intact ? (
      <Pill tone="order" quiet>
        checked now: the stored bytes give this hash
      </Pill>
    ) : (
      <Pill tone="stop">the stored bytes no longer give this hash: restore the database from a backup</Pill>
    );
  const hash = [
    { label: 'SHA-256', value: <span className="break-all">{sha256}</span>, mono: true },
    { label: 'Check', value: check },
  ];
  return (
    <div className="grid gap-4">
      <DefinitionList label="Original file" entries={[...entries, ...hash]} />
      <p>
        <DownloadButton href={`/api/v1/source-files/${sourceFileId}/bytes`} download>
          Download the original
        </DownloadButton>
      </p>
    </div>
  );
}
