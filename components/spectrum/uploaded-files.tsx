import Link from 'next/link';
import type { ReactNode } from 'react';

import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { shortHash } from '@/lib/format/short-hash';
import { foundInWords } from '@/lib/spectrum/found-in-words';
import type { RefusedUploadView, SourceFileView } from '@/lib/views/source-file';

function Verdict({ warnings }: { warnings: SourceFileView['warnings'] }) {
  const [first] = warnings;
  if (!first)
    return (
      <Pill tone="order" quiet>
        read
      </Pill>
    );
  const more = warnings.length - 1;
  return (
    <Pill tone="decide">
      {first.message}
      {more > 0 && ` (and ${more} more)`}
    </Pill>
  );
}

function Row({ head, found, verdict, hash }: Record<'head' | 'found' | 'verdict' | 'hash', ReactNode>) {
  return (
    <tr>
      <RowHead className="max-w-64 min-w-36 break-words">{head}</RowHead>
      <Td className="whitespace-nowrap text-ink-2">{found}</Td>
      <Td className="min-w-64">{verdict}</Td>
      <Td numeric>{hash}</Td>
    </tr>
  );
}

/** What was uploaded: the files that are kept, then the newest that were left out. */
export function UploadedFiles({
  files,
  refused,
}: {
  files: readonly SourceFileView[];
  refused: readonly RefusedUploadView[];
}) {
  return (
    <Table label="What was uploaded">
      <thead>
        <tr>
          <Th>File</Th>
          <Th>What was found</Th>
          <Th>Verdict</Th>
          <Th numeric>SHA-256</Th>
        </tr>
      </thead>
      <tbody>
        {files.map((file) => (
          <Row
            key={file.id}
            head={
              <Link
                href={`/notebooks/${file.notebookId}/spectra/files/${file.id}`}
                className="hover:underline"
              >
                {file.name}
              </Link>
            }
            found={foundInWords(file)}
            verdict={<Verdict warnings={file.warnings} />}
            hash={<span title={file.sha256}>{shortHash(file.sha256)}</span>}
          />
        ))}
        {refused.map((upload) => (
          <Row
            key={`refused ${upload.entryId}`}
            head={upload.name}
            found="nothing kept"
            verdict={
              <Pill tone="stop">
                left out{upload.line !== null && `, line ${upload.line}`}: {upload.sentence}
              </Pill>
            }
            hash="–"
          />
        ))}
      </tbody>
    </Table>
  );
}
