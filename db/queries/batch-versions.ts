import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { NewBatchVersion } from '@/lib/schemas/batch';
import { changeFor, createFor, listFor, loadFor } from '../access';
import { methodOfCurve } from '../batch-method';
import { usableCurve, yardstickOf } from '../batch-yardsticks';
import {
  makerOf,
  readingsOf,
  refuseUnlessOpen,
  saveSamples,
  type NewReading,
  type NewSample,
} from '../determination-rows';
import type { BatchRow, DeterminationRow, ReadingRow } from '../models/batches';
import type { CurveRow, MethodRow } from '../models/curves';
import { readingOf } from '../spectrum-samples';
import { inTransaction } from '../sequelize';
import { idOfSubmission, keyOfContent } from '../submission';
import { readingsFromSpectra } from './spectra';

const sameRule = (a: MethodRow, b: MethodRow) =>
  a.wavelengthNm === b.wavelengthNm && JSON.stringify(a.readingRule) === JSON.stringify(b.readingRule);

/** Typed readings belong to the analyte and the place they were read at; another curve must share both. */
function refuseOtherMethod(from: MethodRow, to: MethodRow, readings: readonly ReadingRow[]): void {
  const refuse = (detail: string) => new AppError('INVALID_INPUT', detail, [{ pointer: '/curveId', detail }]);
  if (from.analyte.toLowerCase() !== to.analyte.toLowerCase())
    throw refuse(
      `This curve is for ${to.analyte}, the samples were read for ${from.analyte}. Choose a curve for ${from.analyte}`,
    );
  if (!sameRule(from, to) && readings.some((reading) => reading.origin === 'typed'))
    throw refuse(
      `This curve is read at ${to.wavelengthNm} nm by its own rule, while readings of this batch were typed for ${from.wavelengthNm} nm. Make a new batch and type its readings there`,
    );
}

/** Readings taken for an absorptivity have no standards beside them: they start afresh on a curve. */
function curveIdOf({ curveId }: BatchRow): string {
  if (curveId !== null) return curveId;
  const detail =
    'This batch is read on a known absorptivity. Make a new batch on the curve and enter its readings there';
  throw new AppError('INVALID_INPUT', detail, [{ pointer: '/curveId', detail }]);
}

interface Moving {
  readonly actor: Actor;
  readonly batch: BatchRow;
  readonly from: MethodRow;
  readonly to: MethodRow;
}

/** The readings of the old version for the new one; what came off a spectrum is read again when the rule differs. */
async function movedReadings({ actor, batch, from, to }: Moving, rows: readonly ReadingRow[]) {
  const ids = rows.flatMap((row) => row.spectrumId ?? []);
  const read = sameRule(from, to)
    ? []
    : await readingsFromSpectra(actor, batch.notebookId, ids, to.readingRule);
  const again = new Map(read.map((one) => [one.spectrumId, one]));
  const reason = `from version ${batch.version} of this batch`;
  return (row: ReadingRow): NewReading => {
    const one = row.spectrumId === null ? undefined : again.get(row.spectrumId);
    if (one?.error !== undefined)
      throw new AppError('INVALID_INPUT', `${one.name} cannot be read by the new curve's rule: ${one.error}`);
    if (one) return { ...readingOf(one, to.readingRule), reason };
    const { value, minusValue, gapReason, gapText, signal, origin, spectrumId, rule } = row;
    return { value, minusValue, gapReason, gapText, signal, origin, spectrumId, rule, reason };
  };
}

async function movedSamples(moving: Moving, rows: readonly DeterminationRow[]): Promise<NewSample[]> {
  const all = await readingsOf(
    moving.actor,
    moving.batch.notebookId,
    rows.map((row) => row.id),
  );
  const current = all.filter((reading) => !reading.supersededAt);
  refuseOtherMethod(moving.from, moving.to, current);
  const moved = await movedReadings(moving, current);
  return rows.map(({ id, sample, note, pathLengthMm, pathLengthUMm, dilution }) => ({
    ...{ sample, note, pathLengthMm, pathLengthUMm, dilution },
    readings: current.filter((reading) => reading.determinationId === id).map(moved),
  }));
}

async function newVersion(actor: Actor, old: BatchRow, curve: CurveRow, id: string): Promise<BatchRow> {
  return createFor(actor, 'batch', {
    id,
    notebookId: old.notebookId,
    curveId: curve.id,
    absorptivityId: null,
    lineageId: old.lineageId,
    version: old.version + 1,
    supersedesId: old.id,
    title: old.title,
    note: old.note,
    status: 'open',
    createdById: makerOf(actor, old.createdById),
  });
}

/**
 * Read a batch on another curve: a new version with the same samples and readings, calculated again. The old
 * version stays as it was and says that it is superseded; void determinations stay behind.
 *
 * @throws AppError INVALID_INPUT, CHANGED_MEANWHILE, NOT_FOUND, NOT_ALLOWED
 */
export function createBatchVersion(
  actor: Actor,
  input: NewBatchVersion,
): Promise<{ id: string; notebookId: string }> {
  return inTransaction(async () => {
    const key = keyOfContent(input.submissionKey, [input.batchId, input.curveId]);
    const id = idOfSubmission(actor, key);
    const old = await loadFor(actor, 'batch', 'edit', input.batchId);
    const { notebookId } = old;
    const [sent] = await listFor(actor, 'batch', notebookId, { where: { id } });
    if (sent) return { id, notebookId };
    refuseUnlessOpen(old);
    const target = await usableCurve(actor, notebookId, input.curveId);
    const moving = {
      actor,
      batch: old,
      from: await methodOfCurve(actor, curveIdOf(old)),
      to: await methodOfCurve(actor, target.id),
    };
    const rows = await listFor(actor, 'determination', notebookId, {
      where: { batchId: old.id, voidedAt: null },
      order: [['position', 'ASC']],
    });
    const samples = await movedSamples(moving, rows);
    const batch = await newVersion(actor, old, target, id);
    const yardstick = await yardstickOf(actor, batch);
    const idAt = (index: number) => idOfSubmission(actor, key, index + 1);
    if (samples.length > 0)
      await saveSamples(actor, { batch, yardstick, firstPosition: 1, idAt }, samples, input.reason);
    await changeFor(actor, old, { status: 'superseded' }, input.reason);
    return { id, notebookId };
  });
}
