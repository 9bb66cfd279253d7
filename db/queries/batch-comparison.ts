import { requestWith } from '@/lib/batch/unknown-request';
import { calculateStandardCurve, compareModels, type LimitAnswer, type ModelUnder } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { BatchView } from '@/lib/views/batch';
import { loadBatch } from './batches';
import { curveRequestOf } from './curves';

/** What other models and weightings would make of a batch, and the limits of its curve; nothing of it is kept. */
export interface BatchComparison {
  readonly batch: BatchView;
  readonly models: readonly ModelUnder[];
  readonly limits: readonly LimitAnswer[];
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
  const { limits } = calculateStandardCurve(request).curve;
  return { batch, models: compareModels(request), limits };
}
