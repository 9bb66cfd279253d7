import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { ChangeConditions, CorrectReading, VoidDetermination } from '@/lib/schemas/determination';
import { dilutionText } from '@/lib/batch/dilution-text';
import type { UnknownSample } from '@/lib/batch/unknown-request';
import { signalOf } from '@/lib/batch/yardstick';
import { changeFor, createFor, loadFor } from '../access';
import { yardstickOf, type OnWhat } from '../batch-yardsticks';
import { changesSince } from '../determination-history';
import { calculate, makerOf, newReading, readingsOf, refuseUnlessOpen } from '../determination-rows';
import type { DeterminationRow, ReadingRow } from '../models/batches';
import { inTransaction } from '../sequelize';

/** Where a changed determination stands, so that the caller knows which pages show it. */
export interface Changed {
  readonly notebookId: string;
  readonly batchId: string;
}

interface Opened {
  readonly row: DeterminationRow;
  readonly on: OnWhat;
  /** All of them, the superseded too. */
  readonly readings: readonly ReadingRow[];
  readonly current: readonly ReadingRow[];
}

/** Open a determination to change it; the second of two writers is told what the first one did. */
async function open(actor: Actor, id: string, seenVersion: number): Promise<Opened> {
  const row = await loadFor(actor, 'determination', 'edit', id);
  const batch = await loadFor(actor, 'batch', 'edit', row.batchId);
  const readings = await readingsOf(actor, row.notebookId, [id]);
  if (row.version !== seenVersion)
    throw new AppError('CHANGED_MEANWHILE', await changesSince(actor, row, readings, seenVersion));
  if (row.voidedAt)
    throw new AppError('CHANGED_MEANWHILE', `This determination is void: ${row.voidReason ?? ''}`);
  refuseUnlessOpen(batch);
  const current = readings.filter((reading) => !reading.supersededAt);
  return { row, on: batch, readings, current };
}

type Conditions = Pick<UnknownSample, 'sample' | 'pathLengthMm' | 'pathLengthUMm' | 'dilution' | 'readings'>;

/** The result again, from stored readings with the one change in them. */
async function again(actor: Actor, { row, on }: Opened, change: Conditions) {
  const yardstick = await yardstickOf(actor, on);
  const [outcome] = calculate(yardstick, [change]);
  if (!outcome) throw new AppError('CALCULATION_REFUSED');
  return { ...outcome, version: row.version + 1 };
}

/** Put a new reading in the place of one; the old one stays and says by what it was replaced. */
export function correctReading(actor: Actor, input: CorrectReading): Promise<Changed> {
  return inTransaction(async () => {
    const opened = await open(actor, input.determinationId, input.version);
    const { row, current } = opened;
    const old = current.find((reading) => reading.id === input.readingId);
    if (!old)
      throw new AppError(
        'CHANGED_MEANWHILE',
        'This reading was corrected meanwhile. Look at the new one first',
      );
    const typed = (old.minusValue ?? null) === null;
    if (typed && old.value === input.reading.value && old.gapText === input.reading.gapText)
      throw sameAsBefore('/reading', 'This is the reading as it stands. Enter another one, or leave it');
    const signal = signalOf(await yardstickOf(actor, opened.on));
    const corrected = { ...input.reading, signal, origin: 'typed', spectrumId: null, rule: null } as const;
    const readings = current.map((reading) => (reading.id === old.id ? corrected : reading));
    await changeFor(actor, row, await again(actor, opened, { ...conditionsOf(row), readings }), input.reason);
    await supersede(actor, old, input.reason);
    const values = newReading(
      row,
      old.position,
      { ...corrected, reason: input.reason },
      makerOf(actor, row.createdById),
    );
    await createFor(actor, 'reading', { ...values, supersedesId: old.id }, input.reason);
    return row;
  }).then(placeOf);
}

/** Change the name, the path length or the dilution of a sample, with a reason. */
export function changeConditions(actor: Actor, input: ChangeConditions): Promise<Changed> {
  return inTransaction(async () => {
    const { sample, pathLengthMm, pathLengthUMm, dilution, reason } = input;
    const opened = await open(actor, input.determinationId, input.version);
    const { row, current } = opened;
    const same =
      sample === row.sample &&
      pathLengthMm === row.pathLengthMm &&
      pathLengthUMm === row.pathLengthUMm &&
      sameSteps(dilution, row.dilution);
    if (same)
      throw sameAsBefore('/sample', 'Nothing is different from what is saved. Change something, or leave it');
    const conditions = { sample, pathLengthMm, pathLengthUMm, dilution: [...dilution] };
    const outcome = await again(actor, opened, { ...conditions, readings: current });
    await changeFor(actor, row, { ...outcome, ...conditions }, reason);
    return row;
  }).then(placeOf);
}

/** Declare a determination void; it stays to be seen and leaves every count. */
export function voidDetermination(actor: Actor, input: VoidDetermination): Promise<Changed> {
  return inTransaction(async () => {
    const { row } = await open(actor, input.determinationId, input.version);
    const values = { voidedAt: new Date(), voidReason: input.reason, version: row.version + 1 };
    await changeFor(actor, row, values, input.reason);
    return row;
  }).then(placeOf);
}

const placeOf = ({ notebookId, batchId }: DeterminationRow): Changed => ({ notebookId, batchId });

const conditionsOf = ({ sample, pathLengthMm, pathLengthUMm, dilution }: DeterminationRow) => ({
  sample,
  pathLengthMm,
  pathLengthUMm,
  dilution,
});

/** Volumes and what is known of the vessels; by their text, in which both stand. */
const sameSteps = (a: ChangeConditions['dilution'], b: ChangeConditions['dilution']) =>
  dilutionText(a) === dilutionText(b);

function sameAsBefore(pointer: string, detail: string): AppError {
  return new AppError('INVALID_INPUT', detail, [{ pointer, detail }]);
}

async function supersede(actor: Actor, old: ReadingRow, reason: string): Promise<void> {
  const row = await loadFor(actor, 'reading', 'edit', old.id);
  await changeFor(actor, row, { supersededAt: new Date() }, reason);
}
