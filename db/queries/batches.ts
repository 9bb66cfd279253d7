import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { NewBatch, VoidBatch } from '@/lib/schemas/batch';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import type { Yardstick } from '@/lib/batch/yardstick';
import type { BatchHead, BatchSummary, BatchView } from '@/lib/views/batch';
import { changeFor, createFor, listFor, loadFor, may } from '../access';
import { batchMethod } from '../batch-method';
import { absorptivitiesOfBatches, curvesOfBatches, refuseUnusable, yardstickOf } from '../batch-yardsticks';
import { makerOf, readingsOf } from '../determination-rows';
import type { BatchRow, ReadingRow } from '../models/batches';
import { pageOf } from '../page';
import { recordEvent } from '../record';
import { inTransaction } from '../sequelize';
import { idOfSubmission, keyOfContent } from '../submission';
import { batchSummary } from '../views/batch';
import { determinationView, readingView } from '../views/determination';

/** How many samples that are not void stand in each of some batches. */
async function sampleCounts(actor: Actor, notebookId: string, batchId: readonly string[]) {
  const rows = await listFor(actor, 'determination', notebookId, {
    where: { batchId: [...batchId], voidedAt: null },
    attributes: ['id', 'batchId'],
  });
  const counts = new Map<string, number>();
  for (const row of rows) counts.set(row.batchId, (counts.get(row.batchId) ?? 0) + 1);
  return counts;
}

async function summaries(
  actor: Actor,
  notebookId: string,
  rows: readonly BatchRow[],
): Promise<BatchSummary[]> {
  const curves = await curvesOfBatches(
    actor,
    notebookId,
    rows.map((row) => row.curveId),
  );
  const absorptivities = await absorptivitiesOfBatches(
    actor,
    notebookId,
    rows.map((row) => row.absorptivityId),
  );
  const counts = await sampleCounts(
    actor,
    notebookId,
    rows.map((row) => row.id),
  );
  return rows.map((row) => {
    const curve = curves.get(row.curveId ?? '') ?? null;
    const absorptivity = absorptivities.get(row.absorptivityId ?? '') ?? null;
    return batchSummary(row, { curve, absorptivity }, counts.get(row.id) ?? 0);
  });
}

/** The batches of a notebook, newest first, every version of each. @throws AppError NOT_FOUND */
export async function listBatches(
  actor: Actor,
  notebookId: string,
  query: PageQuery,
): Promise<Page<BatchSummary>> {
  const page = await pageOf(
    query,
    (part) => listFor(actor, 'batch', notebookId, part as object),
    (row) => row,
  );
  return { items: await summaries(actor, notebookId, page.items), nextCursor: page.nextCursor };
}

async function determinationsOf(actor: Actor, batch: BatchRow) {
  const rows = await listFor(actor, 'determination', batch.notebookId, {
    where: { batchId: batch.id },
    order: [['position', 'ASC']],
  });
  const ofEach = new Map<string | null, ReadingRow[]>();
  for (const reading of await readingsOf(
    actor,
    batch.notebookId,
    rows.map((row) => row.id),
  ))
    ofEach.set(reading.determinationId, [...(ofEach.get(reading.determinationId) ?? []), reading]);
  return rows.map((row) => determinationView(row, (ofEach.get(row.id) ?? []).map(readingView)));
}

async function headOf(actor: Actor, row: BatchRow): Promise<BatchHead> {
  const [[summary], method, versions] = await Promise.all([
    summaries(actor, row.notebookId, [row]),
    batchMethod(actor, row),
    listFor(actor, 'batch', row.notebookId, {
      where: { lineageId: row.lineageId },
      attributes: ['id', 'version', 'supersedesId'],
    }),
  ]);
  if (!summary) throw new AppError('NOT_FOUND');
  const placeOf = (version: BatchRow | undefined) =>
    version ? { id: version.id, version: version.version } : null;
  return {
    ...summary,
    method,
    mayEdit: await may(actor, 'batch', 'edit', row),
    supersedes: placeOf(versions.find((version) => version.id === row.supersedesId)),
    supersededBy: placeOf(versions.find((version) => version.supersedesId === row.id)),
  };
}

/** A batch with how it is read and the versions before and after it, without its samples. @throws AppError NOT_FOUND */
export async function loadBatchHead(actor: Actor, id: string): Promise<BatchHead> {
  return headOf(actor, await loadFor(actor, 'batch', 'read', id));
}

/** What the engine is asked for a batch, for pages that calculate while a person types. @throws AppError NOT_FOUND */
export async function yardstickOfBatch(actor: Actor, id: string): Promise<Yardstick> {
  return yardstickOf(actor, await loadFor(actor, 'batch', 'read', id));
}

/** A batch with its samples and what came out. @throws AppError NOT_FOUND */
export async function loadBatch(actor: Actor, id: string): Promise<BatchView> {
  const row = await loadFor(actor, 'batch', 'read', id);
  const [head, determinations] = await Promise.all([headOf(actor, row), determinationsOf(actor, row)]);
  return { ...head, determinations };
}

/** A batch on a curve or a known absorptivity of the same notebook; the same form sent twice makes one. @throws AppError */
export function createBatch(actor: Actor, input: NewBatch): Promise<{ id: string }> {
  return inTransaction(async () => {
    const { notebookId, title, note } = input;
    const on = { curveId: input.curveId ?? null, absorptivityId: input.absorptivityId ?? null };
    const content = [notebookId, on.curveId ?? on.absorptivityId, title, note];
    const id = idOfSubmission(actor, keyOfContent(input.submissionKey, content));
    const notebook = await loadFor(actor, 'notebook', 'edit', notebookId);
    const [sent] = await listFor(actor, 'batch', notebookId, { where: { id } });
    if (sent) return { id };
    await refuseUnusable(actor, notebookId, on);
    const createdById = makerOf(actor, notebook.ownerId);
    const values = { id, notebookId, ...on, lineageId: id, version: 1, supersedesId: null, title, note };
    await createFor(actor, 'batch', { ...values, status: 'open', createdById });
    return { id };
  });
}

/** Declare a batch void; it stays to be seen. @throws AppError NOT_FOUND, NOT_ALLOWED, CHANGED_MEANWHILE */
export function voidBatch(actor: Actor, { batchId, reason }: VoidBatch): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'batch', 'edit', batchId);
    if (row.status === 'void')
      throw new AppError('CHANGED_MEANWHILE', `This batch is void already: ${row.voidReason ?? ''}`);
    if (row.status === 'superseded')
      throw new AppError(
        'CHANGED_MEANWHILE',
        'A newer version of this batch was made meanwhile. Void that one',
      );
    await changeFor(actor, row, { status: 'void', voidReason: reason }, reason);
  });
}

/** Note in the record that the results of a batch left the notebook as a file. @throws AppError NOT_FOUND */
export function recordExport(actor: Actor, batchId: string, format: string): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'batch', 'read', batchId);
    await recordEvent(actor, {
      kind: 'batch',
      verb: 'exported',
      notebookId: row.notebookId,
      subjectId: row.id,
      subjectName: row.title,
      to: { format },
    });
  });
}
