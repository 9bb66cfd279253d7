import { AppError } from '@/lib/errors';
import { signalOf, type Yardstick } from '@/lib/batch/yardstick';
import { LIMITS } from '@/lib/limits';
import type { Actor } from '@/lib/policies/actor';
import type { AddSpectrumSamples, AddTypedSamples } from '@/lib/schemas/determination';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import type { DeterminationDetail, DeterminationView, SpectrumPreview } from '@/lib/views/determination';
import { countFor, listFor, loadFor } from '../access';
import { readingRuleOf } from '../batch-method';
import { refuseUnusable, yardstickOf } from '../batch-yardsticks';
import { historyOf } from '../determination-history';
import { readingsOf, refuseUnlessOpen, saveSamples, type NewSample } from '../determination-rows';
import type { BatchRow } from '../models/batches';
import { pageOf } from '../page';
import { inTransaction } from '../sequelize';
import { readingOf, samplesFromSpectra } from '../spectrum-samples';
import { idOfSubmission, keyOfContent } from '../submission';
import { determinationView, readingView } from '../views/determination';
import { readingsFromSpectra } from './spectra';

/** The determinations of a batch, newest first, void ones included. @throws AppError NOT_FOUND */
export async function listDeterminations(
  actor: Actor,
  batchId: string,
  query: PageQuery,
): Promise<Page<DeterminationView>> {
  const batch = await loadFor(actor, 'batch', 'read', batchId);
  const page = await pageOf(
    query,
    ({ where, ...part }) =>
      listFor(actor, 'determination', batch.notebookId, { where: { ...where, batchId }, ...part }),
    (row) => row,
  );
  const readings = await readingsOf(
    actor,
    batch.notebookId,
    page.items.map((row) => row.id),
  );
  const ofRow = (id: string) => readings.filter((reading) => reading.determinationId === id).map(readingView);
  return {
    items: page.items.map((row) => determinationView(row, ofRow(row.id))),
    nextCursor: page.nextCursor,
  };
}

/** One determination with every reading it ever had and its history. @throws AppError NOT_FOUND */
export async function loadDetermination(actor: Actor, id: string): Promise<DeterminationDetail> {
  const row = await loadFor(actor, 'determination', 'read', id);
  const readings = await readingsOf(actor, row.notebookId, [id]);
  const views = readings.map(readingView);
  return {
    ...determinationView(row, views),
    superseded: views.filter((reading) => reading.supersededAt !== null),
    history: await historyOf(actor, row, readings),
  };
}

interface Adding {
  readonly batchId: string;
  readonly submissionKey: string;
  readonly samples: readonly unknown[];
}

export interface Added {
  readonly notebookId: string;
  readonly count: number;
}

/**
 * Add samples to an open batch. The results are calculated here from the readings that are stored; the same
 * form sent twice adds them once.
 */
function add(
  actor: Actor,
  { batchId, submissionKey, samples: sent }: Adding,
  samplesOn: (batch: BatchRow, yardstick: Yardstick) => Promise<readonly NewSample[]> | readonly NewSample[],
): Promise<Added> {
  return inTransaction(async () => {
    const batch = await loadFor(actor, 'batch', 'edit', batchId);
    const { notebookId } = batch;
    const key = keyOfContent(submissionKey, [batchId, sent]);
    const idAt = (index: number) => idOfSubmission(actor, key, index);
    const saved = await listFor(actor, 'determination', notebookId, {
      where: { id: idAt(0) },
      attributes: ['id'],
    });
    if (saved.length > 0) return { notebookId, count: 0 };
    refuseUnlessOpen(batch);
    await refuseUnusable(actor, notebookId, batch);
    const yardstick = await yardstickOf(actor, batch);
    const samples = await samplesOn(batch, yardstick);
    const present = await countFor(actor, 'determination', notebookId, { batchId });
    if (present + samples.length > LIMITS.determinations)
      throw new AppError(
        'INVALID_INPUT',
        `A batch takes ${LIMITS.determinations} samples. Make a second batch`,
      );
    await saveSamples(actor, { batch, yardstick, firstPosition: present + 1, idAt }, samples);
    return { notebookId, count: samples.length };
  });
}

/** Add samples whose readings were typed or pasted, in the signal the batch is read in. @throws AppError, EngineError */
export function addTypedSamples(actor: Actor, input: AddTypedSamples): Promise<Added> {
  return add(actor, input, (_batch, yardstick) =>
    input.samples.map((sample) => ({
      ...sample,
      readings: sample.readings.map((reading) => ({
        ...reading,
        signal: signalOf(yardstick),
        origin: 'typed' as const,
        spectrumId: null,
        rule: null,
      })),
    })),
  );
}

/** Add samples read off spectra of the notebook by the rule of the batch. @throws AppError, EngineError */
export function addSpectrumSamples(actor: Actor, input: AddSpectrumSamples): Promise<Added> {
  return add(actor, input, (batch) => samplesFromSpectra(actor, batch, input.samples));
}

/** What spectra read by the rule of a batch, as they would be kept. @throws AppError NOT_FOUND */
export async function readSpectraForBatch(
  actor: Actor,
  batchId: string,
  spectrumIds: readonly string[],
): Promise<SpectrumPreview[]> {
  const batch = await loadFor(actor, 'batch', 'read', batchId);
  const rule = await readingRuleOf(actor, batch);
  const read = await readingsFromSpectra(actor, batch.notebookId, spectrumIds, rule);
  return read.map((one) => {
    const { value, minusValue = null, gapText } = readingOf(one, rule);
    return {
      spectrumId: one.spectrumId,
      value,
      minusValue,
      gapText,
      atNm: one.atNm,
      error: one.error ?? null,
    };
  });
}
