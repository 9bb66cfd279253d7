import type { DeterminationReadingView, DeterminationView } from '@/lib/views/determination';
import type { DeterminationRow, ReadingRow } from '../models/batches';

export function readingView(row: ReadingRow): DeterminationReadingView {
  return {
    id: row.id,
    position: row.position,
    value: row.value,
    minusValue: row.minusValue ?? null,
    gapReason: row.gapReason,
    gapText: row.gapText,
    signal: row.signal,
    origin: row.origin,
    spectrumId: row.spectrumId,
    rule: row.rule,
    pathLengthMm: row.pathLengthMm,
    supersedesId: row.supersedesId ?? null,
    reason: row.reason ?? null,
    supersededAt: row.supersededAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  };
}

/** A determination with its readings in use, in their order. */
export function determinationView(
  row: DeterminationRow,
  readings: readonly DeterminationReadingView[],
): DeterminationView {
  return {
    id: row.id,
    notebookId: row.notebookId,
    batchId: row.batchId,
    position: row.position,
    sample: row.sample,
    note: row.note,
    pathLengthMm: row.pathLengthMm,
    pathLengthUMm: row.pathLengthUMm,
    dilution: row.dilution,
    readings: readings.filter((reading) => reading.supersededAt === null),
    result: row.result,
    engineVersion: row.engineVersion,
    version: row.version,
    voidedAt: row.voidedAt?.toISOString() ?? null,
    voidReason: row.voidReason ?? null,
    createdAt: row.createdAt.toISOString(),
  };
}
