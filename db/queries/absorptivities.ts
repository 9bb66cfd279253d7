import { createHash } from 'node:crypto';
import { absorptivityRequest, type StoredAbsorptivity } from '@/lib/absorptivity/stored-absorptivity';
import { wavelengthOf } from '@/lib/curve/reading-rule-words';
import { resultFromKnownAbsorptivity } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { SaveAbsorptivity, VoidAbsorptivity } from '@/lib/schemas/absorptivity';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import type { AbsorptivitySummary, AbsorptivityView } from '@/lib/views/absorptivity';
import { changeFor, createFor, listFor, loadFor, may } from '../access';
import { makerOf } from '../determination-rows';
import type { AbsorptivityRow } from '../models/absorptivities';
import { namesOf } from '../names';
import { refuseUnlessNewest } from '../newest-version';
import { pageOf } from '../page';
import { inTransaction } from '../sequelize';
import { idOfSubmission } from '../submission';
import { absorptivitySummary, storedAbsorptivity } from '../views/absorptivity';
import { curveVersionView } from '../views/curve';

async function summaries(
  actor: Actor,
  notebookId: string,
  rows: readonly AbsorptivityRow[],
): Promise<AbsorptivitySummary[]> {
  const versions = await listFor(actor, 'absorptivity', notebookId, {
    where: { lineageId: [...new Set(rows.map((row) => row.lineageId))] },
    attributes: ['id', 'lineageId', 'version', 'status'],
  });
  const names = await namesOf(rows.map((row) => row.createdById));
  return rows.map((row) => {
    const own = versions.filter((version) => version.lineageId === row.lineageId);
    return absorptivitySummary(row, own, names);
  });
}

/** All known absorptivities of a notebook, every version, newest first. @throws AppError NOT_FOUND */
export async function listAbsorptivities(actor: Actor, notebookId: string): Promise<AbsorptivitySummary[]> {
  const rows = await listFor(actor, 'absorptivity', notebookId, { order: [['createdAt', 'DESC']] });
  return summaries(actor, notebookId, rows);
}

/** The same by pages, for the API. @throws AppError NOT_FOUND */
export async function pageOfAbsorptivities(
  actor: Actor,
  notebookId: string,
  query: PageQuery,
): Promise<Page<AbsorptivitySummary>> {
  const page = await pageOf(
    query,
    (part) => listFor(actor, 'absorptivity', notebookId, part as object),
    (row) => row,
  );
  return { items: await summaries(actor, notebookId, page.items), nextCursor: page.nextCursor };
}

/** A known absorptivity with its versions and what the engine says of it. @throws AppError NOT_FOUND */
export async function loadAbsorptivity(actor: Actor, id: string): Promise<AbsorptivityView> {
  const row = await loadFor(actor, 'absorptivity', 'read', id);
  const [summary] = await summaries(actor, row.notebookId, [row]);
  if (!summary) throw new AppError('NOT_FOUND');
  const versions = await listFor(actor, 'absorptivity', row.notebookId, {
    where: { lineageId: row.lineageId },
    order: [['version', 'DESC']],
  });
  const names = await namesOf(versions.map((version) => version.createdById));
  const request = absorptivityRequest(storedAbsorptivity(row));
  const { flags, working } = resultFromKnownAbsorptivity(request);
  return {
    ...summary,
    ...{ request, flags, working },
    versions: versions.map((version) => curveVersionView(version, names)),
    mayEdit: await may(actor, 'absorptivity', 'edit', row),
  };
}

/** "Iron, 510 nm" for one that was given no title of its own. */
const titleOf = ({ title, analyte, readingRule }: SaveAbsorptivity) =>
  title || `${analyte}, ${wavelengthOf(readingRule)} nm`;

function storedOf(input: SaveAbsorptivity): StoredAbsorptivity {
  const { analyte, basis, formulaMass, unit, signal, kind, value, u, source, conditions } = input;
  const { readingRule, pathLengthMm, pathLengthUMm, readingSd, confidence, absorbanceLimit } = input;
  return {
    ...{ analyte, basis, formulaMass, unit, signal, kind, value, u, source, conditions },
    ...{ readingRule, pathLengthMm, pathLengthUMm, readingSd, confidence, absorbanceLimit },
    wavelengthNm: wavelengthOf(readingRule),
    hazardNote: input.hazardNote,
  };
}

/** The version the form was opened on, if it is still the newest. */
async function baseOf(actor: Actor, { notebookId, baseId }: SaveAbsorptivity) {
  if (baseId === '') return null;
  const base = await loadFor(actor, 'absorptivity', 'edit', baseId);
  if (base.notebookId !== notebookId) throw new AppError('NOT_FOUND');
  const [newest] = await listFor(actor, 'absorptivity', notebookId, {
    where: { lineageId: base.lineageId },
    order: [['version', 'DESC']],
    limit: 1,
  });
  await refuseUnlessNewest(base, newest);
  return base;
}

/** The same form sent twice has the same id; another content under the same key is another absorptivity. */
function idOf(actor: Actor, { saveKey, ...content }: SaveAbsorptivity): string {
  const hash = createHash('sha256').update(JSON.stringify(content)).digest('hex');
  return idOfSubmission(actor, `absorptivity ${saveKey} ${hash}`);
}

/**
 * Save a known absorptivity, or a new version of one, in one transaction.
 *
 * @throws AppError NOT_FOUND, NOT_ALLOWED, CHANGED_MEANWHILE
 * @throws EngineError when no concentration follows from it
 */
export function saveAbsorptivity(actor: Actor, input: SaveAbsorptivity): Promise<{ id: string }> {
  return inTransaction(async () => {
    const { notebookId } = input;
    const id = idOf(actor, input);
    const notebook = await loadFor(actor, 'notebook', 'edit', notebookId);
    const [sent] = await listFor(actor, 'absorptivity', notebookId, { where: { id }, attributes: ['id'] });
    if (sent) return { id };
    const base = await baseOf(actor, input);
    const stored = storedOf(input);
    resultFromKnownAbsorptivity(absorptivityRequest(stored));
    const reason = base ? input.reason || null : null;
    const place = {
      lineageId: base?.lineageId ?? id,
      version: (base?.version ?? 0) + 1,
      supersedesId: base?.id ?? null,
      createdById: makerOf(actor, notebook.ownerId),
    };
    const values = {
      id,
      notebookId,
      ...stored,
      ...place,
      title: titleOf(input),
      status: 'saved',
      reason,
    } as const;
    await createFor(actor, 'absorptivity', values, reason ?? undefined);
    if (base?.status === 'saved')
      await changeFor(actor, base, { status: 'superseded' }, `version ${base.version + 1} was saved`);
    return { id };
  });
}

/** Declare a version void; it stays to be seen. @throws AppError NOT_FOUND, NOT_ALLOWED, CHANGED_MEANWHILE */
export function voidAbsorptivity(
  actor: Actor,
  { absorptivityId, reason }: VoidAbsorptivity,
): Promise<{ notebookId: string }> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'absorptivity', 'edit', absorptivityId);
    if (row.status === 'void')
      throw new AppError('CHANGED_MEANWHILE', `This version is void already: ${row.voidReason ?? ''}`);
    await changeFor(actor, row, { status: 'void', voidReason: reason }, reason);
    return { notebookId: row.notebookId };
  });
}
