import type { BatchSummary, YardstickView } from '@/lib/views/batch';
import type { BatchRow } from '../models/batches';
import type { CurveRow } from '../models/curves';

/** One version of a curve or of a known absorptivity, without what it holds. */
export type YardstickVersion = Pick<
  CurveRow,
  'id' | 'lineageId' | 'title' | 'version' | 'status' | 'voidReason'
>;

/** What a batch shows of what it is read on; `versions` are the versions of the same, in any order. */
export function yardstickView(
  row: Omit<YardstickVersion, 'lineageId'>,
  versions: readonly Pick<YardstickVersion, 'id' | 'version' | 'status'>[],
): YardstickView {
  const newest = versions
    .filter((version) => version.status === 'saved' && version.version > row.version)
    .sort((a, b) => b.version - a.version)[0];
  return {
    id: row.id,
    title: row.title,
    version: row.version,
    status: row.status,
    voidReason: row.voidReason ?? null,
    newer: newest ? { id: newest.id, version: newest.version } : null,
  };
}

export function batchSummary(
  row: BatchRow,
  { curve, absorptivity }: Pick<BatchSummary, 'curve' | 'absorptivity'>,
  sampleCount: number,
): BatchSummary {
  return {
    id: row.id,
    notebookId: row.notebookId,
    title: row.title,
    note: row.note,
    version: row.version,
    status: row.status,
    voidReason: row.voidReason ?? null,
    curve,
    absorptivity,
    sampleCount,
    createdAt: row.createdAt.toISOString(),
  };
}
