import { Op } from 'sequelize';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import type { RecordEntryView } from '@/lib/views/notebook';
import { listFor } from '../access';
import type { RecordEntryRow } from '../models/record-entry';

function view(row: RecordEntryRow): RecordEntryView {
  return {
    id: row.id,
    at: row.at.toISOString(),
    who: row.actorName,
    via: row.actorVia,
    kind: row.kind,
    subject: row.subjectName,
    verb: row.verb,
    from: row.from,
    to: row.to,
    why: row.why,
  };
}

/** What was done in a notebook, newest first; the cursor is the number of the last entry shown. @throws AppError NOT_FOUND */
export async function listRecord(
  actor: Actor,
  notebookId: string,
  { cursor, limit }: PageQuery,
): Promise<Page<RecordEntryView>> {
  const before = cursor === undefined ? null : Number(cursor);
  if (before !== null && !Number.isInteger(before))
    throw new AppError('INVALID_INPUT', 'This cursor is not one of ours');
  const rows = await listFor(actor, 'recordEntry', notebookId, {
    where: before === null ? {} : { id: { [Op.lt]: before } },
    order: [['id', 'DESC']],
    limit: limit + 1,
  });
  const items = rows.slice(0, limit).map(view);
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last ? String(last.id) : null };
}
