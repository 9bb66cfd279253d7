import { requestWith } from '@/lib/batch/unknown-request';
import { allLimits, compareModels, type LimitsAnswer, type ModelUnder } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { BatchView } from '@/lib/views/batch';
import { loadBatch } from './batches';
import { curveRequestOf } from './curves';

/** What other models and weightings would make of a batch, and the limits of its curve; nothing of it is kept. */
export interface BatchComparison {
  readonly batch: BatchView;
  readonly models: readonly ModelUnder[];
  /** In the measured solution; for the fewest readings that a sample has. */
  readonly limits: LimitsAnswer;
}

/**
 * Calculate a batch again under every model and weighting, from the stored readings. A comparison to look at: to
 * change the model, the curve gets a new version and the batch is read on it.
 *
 * @throws AppError NOT_FOUND, also when it is read on a known absorptivity, which has no model
 */
export async function compareBatch(actor: Actor, batchId: string): Promise<BatchComparison> {
  const batch = await loadBatch(actor, batchId);
  if (!batch.curve) throw new AppError('NOT_FOUND');
  const current = batch.determinations.filter(({ voidedAt }) => voidedAt === null);
  const request = requestWith(await curveRequestOf(actor, batch.curve.id), current);
  const readings = Math.min(...current.map((one) => one.readings.length));
  const limits = allLimits({
    unit: request.unit,
    curve: { ...request, unknowns: [] },
    readings: Number.isFinite(readings) ? Math.max(1, readings) : 1,
  });
  return { batch, models: compareModels(request), limits };
}
