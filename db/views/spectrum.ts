import type { SourceFileRow, SpectrumRow } from '@/db/models/spectra';
import { pointsOfBytes, type StoredPoints } from '@/db/points';
import type { ReadSpectrum } from '@/lib/readers/types';
import { readingForm } from '@/lib/spectrum/reading-form';
import type { RawPointsView, SpectrumDetail, SpectrumPointsView, SpectrumView } from '@/lib/views/spectrum';

export function spectrumView(row: SpectrumRow, fileName: string): SpectrumView {
  return {
    id: row.id,
    notebookId: row.notebookId,
    sourceFileId: row.sourceFileId,
    name: row.name,
    fileName,
    fromNm: row.fromNm,
    toNm: row.toNm,
    pointCount: row.pointCount,
    gapCount: row.gapCount,
    highestAbsorbance: row.highestAbsorbance,
    signal: row.signal,
    signalText: row.signalText,
    xUnit: row.xUnit,
    pathLengthMm: row.pathLengthMm,
    warningCount: row.warnings.length,
    createdAt: row.createdAt.toISOString(),
    voided: row.voidedAt !== null && row.voidedAt !== undefined,
    voidReason: row.voidReason ?? null,
  };
}

export function spectrumDetail(row: SpectrumRow, file: SourceFileRow): SpectrumDetail {
  return {
    ...spectrumView(row, file.name),
    block: row.block + 1,
    line: row.line,
    position: row.position,
    xUnitGuessed: row.xUnitGuessed,
    signalGuessed: row.signalGuessed,
    signalScale: row.signalScale,
    header: row.header,
    warnings: row.warnings,
    reader: file.reader,
    readerVersion: file.readerVersion,
    dialect: file.dialect,
    sha256: file.sha256,
  };
}

/** The spectrum as its reader gave it, from the row and the stored points. */
export function readSpectrumOf(row: SpectrumRow, points: StoredPoints): ReadSpectrum {
  return {
    name: row.name,
    x: pointsOfBytes(points.x),
    xUnit: row.xUnit,
    xUnitGuessed: row.xUnitGuessed,
    y: pointsOfBytes(points.y),
    signal: row.signal,
    signalGuessed: row.signalGuessed,
    signalText: row.signalText,
    signalScale: row.signalScale,
    gaps: row.gaps,
    block: row.block,
    line: row.line,
    header: row.header,
    warnings: row.warnings,
  };
}

export function spectrumPointsView(row: SpectrumRow, points: StoredPoints): SpectrumPointsView {
  const { wavelengthNm, absorbance, gaps } = readingForm(readSpectrumOf(row, points));
  const isAbsorbance = row.signal !== 'other';
  return {
    id: row.id,
    notebookId: row.notebookId,
    name: row.name,
    isAbsorbance,
    wavelengthNm,
    absorbance,
    gaps,
  };
}

export function rawPointsView(row: SpectrumRow, points: StoredPoints): RawPointsView {
  const { xUnit, signal, signalText, signalScale, gaps } = row;
  const x = [...pointsOfBytes(points.x)];
  const y = Array.from(pointsOfBytes(points.y), (value) => (Number.isNaN(value) ? null : value));
  return { id: row.id, xUnit, signal, signalText, signalScale, x, y, gaps };
}
