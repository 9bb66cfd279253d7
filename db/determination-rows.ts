import type { UnknownSample } from '@/lib/batch/unknown-request';
import { calculateSamples, type SampleResult, type Yardstick } from '@/lib/batch/yardstick';
import type { DilutionStep, ReadingRule, Signal } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { KeptReading } from '@/lib/batch/typed-reading';
import type { Actor } from '@/lib/policies/actor';
import { createFor, listFor } from './access';
import type { BatchRow, DeterminationRow, ReadingRow } from './models/batches';

/** A reading before it is a row. */
export interface NewReading extends KeptReading {
  readonly signal: Signal;
  readonly origin: 'typed' | 'spectrum';
  readonly spectrumId: string | null;
  readonly rule: ReadingRule | null;
  readonly reason?: string;
}

/** A sample before it is a row. */
export interface NewSample {
  readonly sample: string;
  readonly note?: string;
  readonly pathLengthMm: number;
  readonly pathLengthUMm?: number | null;
  readonly dilution: readonly DilutionStep[];
  readonly readings: readonly NewReading[];
}

export interface Calculated {
  readonly result: SampleResult;
  readonly engineVersion: string;
}

/** What the engine says of some samples, from their readings and nothing else. */
export function calculate(yardstick: Yardstick, samples: readonly UnknownSample[]): Calculated[] {
  const { engine, unknowns } = calculateSamples(yardstick, samples);
  return unknowns.map((result) => ({ result, engineVersion: engine }));
}

export function newReading(
  determination: DeterminationRow,
  position: number,
  reading: NewReading,
  createdById: string,
) {
  const { value, gapReason, gapText, signal, origin, spectrumId, rule } = reading;
  const minusValue = reading.minusValue ?? null;
  return {
    notebookId: determination.notebookId,
    standardId: null,
    determinationId: determination.id,
    position,
    ...{ value, minusValue, gapReason, gapText, signal, origin, spectrumId, rule },
    recipe: null,
    pathLengthMm: determination.pathLengthMm,
    excludedReason: null,
    reason: reading.reason ?? null,
    createdById,
  };
}

/** Who a row is made by; a script has no person of its own and names one. */
export function makerOf(actor: Actor, otherwise: string): string {
  return actor.personId ?? otherwise;
}

interface Place {
  readonly batch: BatchRow;
  readonly yardstick: Yardstick;
  readonly firstPosition: number;
  readonly idAt: (index: number) => string;
}

/** Save samples with their readings and what the engine makes of them. Inside the caller's transaction. */
export async function saveSamples(
  actor: Actor,
  { batch, yardstick, firstPosition, idAt }: Place,
  samples: readonly NewSample[],
  why?: string,
): Promise<DeterminationRow[]> {
  const calculated = calculate(yardstick, samples);
  const createdById = makerOf(actor, batch.createdById);
  const rows: DeterminationRow[] = [];
  for (const [index, sample] of samples.entries()) {
    const outcome = calculated[index];
    if (!outcome) throw new AppError('CALCULATION_REFUSED');
    const values = {
      id: idAt(index),
      notebookId: batch.notebookId,
      batchId: batch.id,
      position: firstPosition + index,
      sample: sample.sample,
      note: sample.note ?? '',
      pathLengthMm: sample.pathLengthMm,
      pathLengthUMm: sample.pathLengthUMm ?? null,
      dilution: [...sample.dilution],
      ...outcome,
      createdById,
    };
    const row = await createFor(actor, 'determination', values, why);
    for (const [place, reading] of sample.readings.entries())
      await createFor(actor, 'reading', newReading(row, place + 1, reading, createdById), reading.reason);
    rows.push(row);
  }
  return rows;
}

/** All readings of some determinations, the superseded too, in their order. */
export function readingsOf(
  actor: Actor,
  notebookId: string,
  determinationIds: readonly string[],
): Promise<ReadingRow[]> {
  return listFor(actor, 'reading', notebookId, {
    where: { determinationId: [...determinationIds] },
    order: [
      ['position', 'ASC'],
      ['createdAt', 'ASC'],
    ],
  });
}

/** A batch that nothing may be added to or changed in says why. @throws AppError CHANGED_MEANWHILE */
export function refuseUnlessOpen(batch: BatchRow): void {
  if (batch.status === 'open') return;
  const why =
    batch.status === 'void' ? 'This batch was declared void' : 'A newer version of this batch was made';
  throw new AppError(
    'CHANGED_MEANWHILE',
    `${why}, so it takes no more changes. What you typed is kept on this page`,
  );
}
