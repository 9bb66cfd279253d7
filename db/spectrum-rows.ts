import type { CreationAttributes } from 'sequelize';
import { LIMITS } from '@/lib/limits';
import { toAscendingNm } from '@/lib/readers/to-ascending-nm';
import { ReaderError, type ReadResult, type ReadSpectrum } from '@/lib/readers/types';
import { pathLengthFromHeader } from '@/lib/spectrum/path-length';
import { readingForm } from '@/lib/spectrum/reading-form';
import { highestAbsorbance, spectrumWarnings } from '@/lib/spectrum/spectrum-warnings';
import { createFor, insertRaw } from './access';
import type { SourceFileRow, SpectrumRow } from './models/spectra';
import { bytesOfPoints } from './points';
import type { Actor } from '@/lib/policies/actor';

/** What is stored of one spectrum beside its raw points; worked out before the transaction begins. */
export interface PreparedSpectrum {
  readonly read: ReadSpectrum;
  readonly values: Omit<
    CreationAttributes<SpectrumRow>,
    'notebookId' | 'sourceFileId' | 'position' | 'createdById'
  >;
}

function prepare(read: ReadSpectrum, position: number, reader: string): PreparedSpectrum {
  const form = readingForm(read);
  const [first, last] = [form.wavelengthNm[0], form.wavelengthNm.at(-1)];
  const name = read.name.trim().slice(0, LIMITS.name) || `Spectrum ${position + 1}`;
  if (first === undefined || last === undefined)
    throw new ReaderError('NO_WAVELENGTHS', `${name} has no point with a wavelength`, read.line);
  const isAbsorbance = read.signal !== 'other';
  const warnings = [
    ...read.warnings,
    ...toAscendingNm(read).warnings,
    ...spectrumWarnings(form, isAbsorbance),
  ];
  const values = {
    name,
    block: read.block,
    line: read.line,
    xUnit: read.xUnit,
    xUnitGuessed: read.xUnitGuessed,
    signal: read.signal,
    signalGuessed: read.signalGuessed,
    signalText: read.signalText,
    signalScale: read.signalScale,
    pointCount: read.x.length,
    gapCount: form.gaps.length,
    fromNm: first,
    toNm: last,
    highestAbsorbance: isAbsorbance ? highestAbsorbance(form) : null,
    pathLengthMm: pathLengthFromHeader(read.header, reader),
    header: { ...read.header },
    gaps: [...read.gaps],
    warnings,
  };
  return { read, values };
}

/** @throws ReaderError when the file holds no spectrum */
export function prepareSpectra(result: ReadResult): PreparedSpectrum[] {
  if (result.spectra.length === 0)
    throw new ReaderError(
      result.notASpectrum ? 'NOT_A_SPECTRUM' : 'NO_SPECTRUM',
      result.notASpectrum?.message ?? 'There is no spectrum in this file. Export the scan itself',
    );
  return result.spectra.map((read, position) => prepare(read, position, result.reader));
}

/** Write the spectra of a source file and their raw points; inside the file's transaction. */
export async function insertSpectra(
  actor: Actor,
  file: SourceFileRow,
  spectra: readonly PreparedSpectrum[],
): Promise<SpectrumRow[]> {
  const { notebookId, id: sourceFileId, createdById, createdAt } = file;
  const rows: SpectrumRow[] = [];
  for (const [position, { read, values }] of spectra.entries()) {
    const place = { notebookId, sourceFileId, position, createdById, createdAt };
    const row = await createFor(actor, 'spectrum', { ...values, ...place });
    const points = [row.id, bytesOfPoints(read.x), bytesOfPoints(read.y)];
    await insertRaw('spectrum_points', ['spectrum_id', 'x', 'y'], points);
    rows.push(row);
  }
  return rows;
}
