import type { StoredCurve } from '@/lib/curve/stored-curve';
import type { CurveAnswer } from '@/lib/engine';
import type { Actor } from '@/lib/policies/actor';
import type { MethodView, StandardView } from '@/lib/views/curve';
import { createFor, listFor, loadFor } from './access';
import type { CurveRow, MethodRow } from './models/curves';
import { recordEvent } from './record';
import { methodView, readingOfStandard, standardView } from './views/curve';

/** Where a curve stands among its versions, and who makes it. */
export interface CurvePlace {
  readonly id: string;
  readonly notebookId: string;
  readonly title: string;
  readonly createdById: string;
  readonly reason: string | null;
  readonly base: CurveRow | null;
}

async function saveMethod(actor: Actor, { method }: StoredCurve, place: CurvePlace): Promise<MethodRow> {
  const before = place.base && (await loadFor(actor, 'method', 'read', place.base.methodId));
  const { id: methodId, ...values } = { id: place.id, ...method };
  return createFor(actor, 'method', {
    ...values,
    id: methodId,
    notebookId: place.notebookId,
    lineageId: before?.lineageId ?? methodId,
    version: (before?.version ?? 0) + 1,
    supersedesId: before?.id ?? null,
    limits: {},
    createdById: place.createdById,
  });
}

async function saveStandards(actor: Actor, { standards }: StoredCurve, place: CurvePlace): Promise<void> {
  const { notebookId, createdById } = place;
  for (const [index, { readings, ...standard }] of standards.entries()) {
    const row = await createFor(actor, 'standard', {
      ...standard,
      notebookId,
      curveId: place.id,
      position: index + 1,
    });
    for (const [at, reading] of readings.entries())
      await createFor(actor, 'reading', {
        ...reading,
        notebookId,
        standardId: row.id,
        determinationId: null,
        position: at + 1,
        recipe: null,
        pathLengthMm: standard.pathLengthMm,
        createdById,
      });
  }
}

/** What the record says of the standards, in one entry: each with its readings and why any was left out. */
function told({ standards }: StoredCurve) {
  return standards.map((standard) => ({
    role: standard.role,
    name: standard.name,
    concentration: standard.concentration,
    ...(standard.excludedReason === null ? {} : { leftOut: standard.excludedReason }),
    readings: standard.readings.map((reading) => ({
      value: reading.value ?? reading.gapText,
      ...(typeof reading.minusValue === 'number' ? { minus: reading.minusValue } : {}),
      ...(reading.spectrumId === null ? {} : { spectrum: reading.spectrumId }),
      ...(reading.excludedReason === null ? {} : { leftOut: reading.excludedReason }),
    })),
  }));
}

/** Write method, curve, standards and readings. Inside the caller's transaction. */
export async function saveCurveRows(
  actor: Actor,
  place: CurvePlace,
  stored: StoredCurve,
  answer: CurveAnswer,
): Promise<CurveRow> {
  const { id, notebookId, title, createdById, reason, base } = place;
  const method = await saveMethod(actor, stored, place);
  const row = await createFor(
    actor,
    'curve',
    {
      id,
      notebookId,
      methodId: method.id,
      lineageId: base?.lineageId ?? id,
      version: (base?.version ?? 0) + 1,
      supersedesId: base?.id ?? null,
      title,
      status: 'saved',
      result: answer,
      engineVersion: answer.engine,
      reason,
      createdById,
    },
    reason ?? undefined,
  );
  await saveStandards(actor, stored, place);
  await recordEvent(actor, {
    kind: 'standard curve',
    verb: 'standards saved',
    notebookId,
    subjectId: id,
    subjectName: title,
    to: { standards: told(stored) },
  });
  return row;
}

export interface StoredParts {
  readonly method: MethodView;
  readonly standards: readonly StandardView[];
}

/** Method, standards and readings of a curve that the actor has opened, as they are kept. */
export async function storedParts(actor: Actor, curve: CurveRow): Promise<StoredParts> {
  const { notebookId } = curve;
  const inOrder = { order: [['position', 'ASC']] as [string, string][] };
  const method = await loadFor(actor, 'method', 'read', curve.methodId);
  const standards = await listFor(actor, 'standard', notebookId, {
    where: { curveId: curve.id },
    ...inOrder,
  });
  const readings = await listFor(actor, 'reading', notebookId, {
    where: { standardId: standards.map((standard) => standard.id), supersededAt: null },
    ...inOrder,
  });
  const spectra = await listFor(actor, 'spectrum', notebookId, {
    where: { id: readings.flatMap((reading) => reading.spectrumId ?? []) },
    attributes: ['id', 'name'],
  });
  const names = new Map(spectra.map((spectrum) => [spectrum.id, spectrum.name]));
  return {
    method: methodView(method),
    standards: standards.map((standard) =>
      standardView(
        standard,
        readings
          .filter((reading) => reading.standardId === standard.id)
          .map((reading) => readingOfStandard(reading, names)),
      ),
    ),
  };
}
