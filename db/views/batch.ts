import type { BatchCurveView, BatchSummary } from '@/lib/views/batch';
import type { BatchRow } from '../models/batches';
import type { CurveRow } from '../models/curves';

/** What a batch shows of its curve; `versions` are the versions of the same curve, in any order. */
export function batchCurveView(
  curve: Pick<CurveRow, 'id' | 'title' | 'version' | 'status' | 'voidReason'>,
  versions: readonly Pick<CurveRow, 'id' | 'version' | 'status'>[],
): BatchCurveView {
  const newest = versions
    .filter((version) => version.status === 'saved' && version.version > curve.version)
    .sort((a, b) => b.version - a.version)[0];
  return {
    id: curve.id,
    title: curve.title,
    version: curve.version,
    status: curve.status,
    voidReason: curve.voidReason ?? null,
    newer: newest ? { id: newest.id, version: newest.version } : null,
  };
}

export function batchSummary(row: BatchRow, curve: BatchCurveView, sampleCount: number): BatchSummary {
  return {
    id: row.id,
    notebookId: row.notebookId,
    title: row.title,
    note: row.note,
    version: row.version,
    status: row.status,
    voidReason: row.voidReason ?? null,
    curve,
    sampleCount,
    createdAt: row.createdAt.toISOString(),
  };
}
