import type { SourceFileRow, SpectrumRow } from '@/db/models/spectra';
import type { ReaderWarning } from '@/lib/readers/types';
import type { SourceFileView } from '@/lib/views/source-file';

const distinct = <T>(values: readonly T[]): T[] => [...new Set(values)];

/** The warnings of the file, then those of its spectra; each sentence once, with the spectrum it is about. */
function warningsOf(file: SourceFileRow, spectra: readonly SpectrumRow[]): ReaderWarning[] {
  const named = spectra.flatMap((spectrum) =>
    spectrum.warnings.map((warning) =>
      spectra.length === 1 ? warning : { ...warning, message: `${spectrum.name}: ${warning.message}` },
    ),
  );
  const all = [...file.warnings, ...named];
  return all.filter((warning, i) => all.findIndex((other) => other.message === warning.message) === i);
}

export function sourceFileView(file: SourceFileRow, spectra: readonly SpectrumRow[]): SourceFileView {
  return {
    id: file.id,
    notebookId: file.notebookId,
    name: file.name,
    sha256: file.sha256,
    sizeBytes: file.sizeBytes,
    reader: file.reader,
    readerVersion: file.readerVersion,
    dialect: file.dialect,
    warnings: warningsOf(file, spectra),
    spectrumCount: file.spectrumCount,
    pointCount: file.pointCount,
    signals: distinct(spectra.map((spectrum) => spectrum.signal)),
    xUnits: distinct(spectra.map((spectrum) => spectrum.xUnit)),
    createdAt: file.createdAt.toISOString(),
  };
}
