import { createHash } from 'node:crypto';
import { curveRequest } from '@/lib/curve/curve-request';
import { wavelengthOf } from '@/lib/curve/reading-rule-words';
import type { StoredCurve } from '@/lib/curve/stored-curve';
import { storedStandards } from '@/lib/curve/stored-standards';
import { calculateStandardCurve } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { CurveDraft, SaveCurve } from '@/lib/schemas/curve';
import { changeFor, listFor, loadFor } from '../access';
import { saveCurveRows } from '../curve-rows';
import type { CurveRow } from '../models/curves';
import { refuseUnlessNewest } from '../newest-version';
import { inTransaction } from '../sequelize';
import { idOfSubmission } from '../submission';
import { readingsFromSpectra } from './spectra';

/** The draft with its spectra read here and now; what a browser may have read of them plays no part. */
async function storedFrom(actor: Actor, notebookId: string, draft: CurveDraft): Promise<StoredCurve> {
  const ids = draft.standards.flatMap(({ readings }) =>
    readings.flatMap((reading) => ('spectrumId' in reading ? [reading.spectrumId] : [])),
  );
  const read = ids.length === 0 ? [] : await readingsFromSpectra(actor, notebookId, ids, draft.rule);
  const { signal, pathLengthMm } = draft.calculation;
  const { standards, refusals } = storedStandards(draft.standards, {
    signal,
    pathLengthMm,
    rule: draft.rule,
    spectra: new Map(read.map((reading) => [reading.spectrumId, reading])),
  });
  if (refusals[0])
    throw new AppError(
      'INVALID_INPUT',
      refusals[0].message,
      refusals.map(({ path, message }) => ({ pointer: `/draft.${path}`, detail: message })),
    );
  const { analyte, basis, hazardNote } = draft.about;
  const about = { analyte, basis, hazardNote, readingRule: draft.rule };
  return { method: { ...draft.calculation, ...about, wavelengthNm: wavelengthOf(draft.rule) }, standards };
}

/** The version the form was opened on, if it is still the newest. @throws AppError CHANGED_MEANWHILE */
async function newestVersion(actor: Actor, notebookId: string, baseId: string): Promise<CurveRow> {
  const base = await loadFor(actor, 'curve', 'edit', baseId);
  if (base.notebookId !== notebookId) throw new AppError('NOT_FOUND');
  const [newest] = await listFor(actor, 'curve', notebookId, {
    where: { lineageId: base.lineageId },
    order: [['version', 'DESC']],
    attributes: { exclude: ['result'] },
    limit: 1,
  });
  await refuseUnlessNewest(base, newest);
  return base;
}

/** The same form sent twice has the same id; another content under the same key is another curve. */
function idOf(actor: Actor, { saveKey, baseId, draft }: SaveCurve): string {
  const content = createHash('sha256')
    .update(JSON.stringify([baseId, draft]))
    .digest('hex');
  return idOfSubmission(actor, `curve ${saveKey} ${content}`);
}

/** "Iron, 510 nm" for a curve that was given no title of its own. */
const titleOf = ({ about }: CurveDraft, { method }: StoredCurve) =>
  about.title || `${about.analyte}, ${method.wavelengthNm} nm`;

/**
 * Save a curve, or a new version of one: readings are taken as typed or read off the stored spectra, the
 * engine calculates from them here, and all of it is written in one transaction.
 *
 * @throws AppError NOT_FOUND, NOT_ALLOWED, INVALID_INPUT, CHANGED_MEANWHILE
 * @throws EngineError when the readings do not make a curve
 */
export function saveCurve(actor: Actor, input: SaveCurve): Promise<{ id: string }> {
  return inTransaction(async () => {
    const { notebookId, baseId, draft } = input;
    const id = idOf(actor, input);
    const notebook = await loadFor(actor, 'notebook', 'edit', notebookId);
    const [sent] = await listFor(actor, 'curve', notebookId, { where: { id }, attributes: ['id'] });
    if (sent) return { id };
    const base = baseId === '' ? null : await newestVersion(actor, notebookId, baseId);
    const stored = await storedFrom(actor, notebookId, draft);
    const answer = calculateStandardCurve(curveRequest(stored.method, stored.standards));
    const place = {
      id,
      notebookId,
      title: titleOf(draft, stored),
      createdById: actor.personId ?? notebook.ownerId,
      reason: base ? draft.about.reason || null : null,
      base,
    };
    await saveCurveRows(actor, place, stored, answer);
    if (base?.status === 'saved') {
      const why = `version ${base.version + 1} was saved`;
      await changeFor(actor, base, { status: 'superseded' }, why);
    }
    return { id };
  });
}
