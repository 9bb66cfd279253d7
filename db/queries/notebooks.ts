import { Op } from 'sequelize';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import { RULES } from '@/lib/policies/rules';
import type { NewNotebook, NotebookArchiving, NotebookChange } from '@/lib/schemas/notebook';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import type { NotebookProgress, NotebookSummary, NotebookView, PersonName } from '@/lib/views/notebook';
import { actorForPerson } from '../actors';
import { changeFor, countFor, createFor, listFor, listNotebooksFor, loadFor, may } from '../access';
import type { NotebookRow } from '../models/notebooks';
import { activePeople, namesOf } from '../names';
import { pageOf } from '../page';
import { inTransaction } from '../sequelize';

function summary(row: NotebookRow, names: ReadonlyMap<string, string>): NotebookSummary {
  return {
    id: row.id,
    title: row.title,
    purpose: row.purpose,
    owner: names.get(row.ownerId) ?? 'unknown',
    archived: Boolean(row.archivedAt),
    createdAt: row.createdAt.toISOString(),
    changedAt: row.updatedAt.toISOString(),
  };
}

/** The notebooks that somebody may read; archived ones only when asked for. */
export async function listNotebooks(
  actor: Actor,
  { search = '', archived = false }: { search?: string; archived?: boolean } = {},
): Promise<NotebookSummary[]> {
  const pattern = { [Op.like]: `%${search.replace(/[%_]/g, ' ')}%` };
  const found = search === '' ? {} : { [Op.and]: [{ [Op.or]: [{ title: pattern }, { purpose: pattern }] }] };
  const rows = await listNotebooksFor(actor, {
    where: { ...found, archivedAt: archived ? { [Op.not]: null } : null },
    order: [['updatedAt', 'DESC']],
  });
  const names = await namesOf(rows.map((row) => row.ownerId));
  return rows.map((row) => summary(row, names));
}

export async function pageOfNotebooks(actor: Actor, query: PageQuery): Promise<Page<NotebookSummary>> {
  const page = await pageOf(
    query,
    ({ where, ...part }) => listNotebooksFor(actor, { where: { [Op.and]: [where] }, ...part }),
    (row) => row,
  );
  const names = await namesOf(page.items.map((row) => row.ownerId));
  return { items: page.items.map((row) => summary(row, names)), nextCursor: page.nextCursor };
}

/** @throws AppError NOT_FOUND */
export async function readNotebook(actor: Actor, id: string): Promise<NotebookView> {
  const row = await loadFor(actor, 'notebook', 'read', id);
  const names = await namesOf([row.ownerId]);
  return {
    ...summary(row, names),
    ownerId: row.ownerId,
    version: row.version,
    mayEdit: await may(actor, 'notebook', 'edit', row),
    mayManage: await may(actor, 'notebook', 'manage', row),
    mayListMembers: actor.kind !== 'link',
  };
}

/** What is in a notebook so far. @throws AppError NOT_FOUND */
export async function progressOf(actor: Actor, id: string): Promise<NotebookProgress> {
  const newest = { order: [['createdAt', 'DESC']] as [string, string][], limit: 1 };
  const [spectra, curves, absorptivities, batches, determinations, [curve], [batch]] = await Promise.all([
    countFor(actor, 'spectrum', id, { voidedAt: null }),
    countFor(actor, 'curve', id, { status: 'saved' }),
    countFor(actor, 'absorptivity', id, { status: 'saved' }),
    countFor(actor, 'batch', id, { status: 'open' }),
    countFor(actor, 'determination', id, { voidedAt: null }),
    listFor(actor, 'curve', id, { where: { status: 'saved' }, attributes: ['id', 'title'], ...newest }),
    listFor(actor, 'batch', id, { where: { status: 'open' }, attributes: ['id'], ...newest }),
  ]);
  return {
    spectra,
    curves,
    absorptivities,
    batches,
    determinations,
    newestCurveId: curve?.id ?? null,
    newestCurveTitle: curve?.title ?? null,
    newestBatchId: batch?.id ?? null,
  };
}

/** Whom the actor may name as the owner of a new notebook: themselves, or any PI. */
export async function possibleOwners(actor: Actor): Promise<PersonName[]> {
  return actor.kind === 'person' ? activePeople(['pi']) : [];
}

/** Make a notebook; whoever makes it for somebody else becomes a contributor. @throws AppError NOT_ALLOWED */
export function createNotebook(actor: Actor, input: NewNotebook): Promise<{ id: string }> {
  return inTransaction(async () => {
    if (!RULES.notebook.create(actor))
      throw new AppError('NOT_ALLOWED', 'You may read notebooks, not make them');
    const owners = await possibleOwners(actor);
    if (!owners.some((owner) => owner.id === input.ownerId))
      throw new AppError('INVALID_INPUT', 'A notebook is owned by a PI', [
        { pointer: '/ownerId', detail: 'Choose one of the PIs' },
      ]);
    const maker = actor.personId ?? input.ownerId;
    const row = await createFor(actor, 'notebook', { ...input, createdById: maker });
    if (maker !== input.ownerId) await joinOwnNotebook(row, maker);
    return { id: row.id };
  });
}

/** The maker's own membership rests on the owner's right to give it, so it is made in the owner's name. */
async function joinOwnNotebook(row: NotebookRow, personId: string): Promise<void> {
  const owner = await actorForPerson(row.ownerId);
  const why = 'made the notebook and named its owner';
  await createFor(owner, 'membership', { notebookId: row.id, personId, role: 'contributor' }, why);
}

/** @throws AppError NOT_FOUND, NOT_ALLOWED, CHANGED_MEANWHILE */
export function changeNotebook(actor: Actor, { id, title, purpose, version }: NotebookChange): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'notebook', 'edit', id);
    if (row.version !== version)
      throw new AppError('CHANGED_MEANWHILE', `Somebody changed it meanwhile: it is now “${row.title}”`);
    await changeFor(actor, row, { title, purpose, version: version + 1 });
  });
}

/** Archive a notebook, or take it out of the archive. @throws AppError NOT_FOUND, NOT_ALLOWED */
export function archiveNotebook(actor: Actor, { id, archive, reason }: NotebookArchiving): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'notebook', 'manage', id);
    await changeFor(actor, row, { archivedAt: archive === 'yes' ? new Date() : null }, reason);
  });
}
