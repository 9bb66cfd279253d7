import type { Actor } from '@/lib/policies/actor';
import type { NewShareLink } from '@/lib/schemas/notebook';
import type { ShareLinkView } from '@/lib/views/notebook';
import { changeFor, createFor, listFor, loadFor } from '../access';
import { appUrl } from '../entry/settings';
import type { ShareLinkRow } from '../models/notebooks';
import { namesOf } from '../names';
import { hashSecret, newSecret } from '../secrets';
import { inTransaction } from '../sequelize';

const DAY_MS = 86_400_000;

function stateOf(row: ShareLinkRow): ShareLinkView['state'] {
  if (row.revokedAt) return 'revoked';
  return row.expiresAt <= new Date() ? 'expired' : 'open';
}

function view(row: ShareLinkRow, names: ReadonlyMap<string, string>): ShareLinkView {
  return {
    id: row.id,
    label: row.label,
    createdBy: names.get(row.createdById) ?? 'unknown',
    createdAt: row.createdAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
    revokedAt: row.revokedAt?.toISOString() ?? null,
    state: stateOf(row),
    openedCount: row.openedCount,
    lastOpenedAt: row.lastOpenedAt?.toISOString() ?? null,
  };
}

/** @throws AppError NOT_FOUND when the notebook is not the actor's to share */
export async function listShareLinks(actor: Actor, notebookId: string): Promise<ShareLinkView[]> {
  const rows = await listFor(actor, 'shareLink', notebookId, { order: [['createdAt', 'DESC']] });
  const names = await namesOf(rows.map((row) => row.createdById));
  return rows.map((row) => view(row, names));
}

/**
 * Make a link that shows the notebook to whoever holds it. The address is told once: only its hash is kept.
 *
 * @throws AppError NOT_FOUND, NOT_ALLOWED
 */
export function makeShareLink(actor: Actor, input: NewShareLink): Promise<{ id: string; address: string }> {
  const secret = newSecret();
  return inTransaction(async () => {
    const notebook = await loadFor(actor, 'notebook', 'manage', input.notebookId);
    const row = await createFor(actor, 'shareLink', {
      notebookId: notebook.id,
      label: input.label,
      tokenHash: hashSecret(secret),
      expiresAt: new Date(Date.now() + input.days * DAY_MS),
      createdById: actor.personId ?? notebook.ownerId,
    });
    return { id: row.id, address: `${appUrl()}/s/${secret}` };
  });
}

/** Withdraw a link; it acts at the next request of everybody who holds it. @throws AppError NOT_FOUND, NOT_ALLOWED */
export function revokeShareLink(actor: Actor, shareLinkId: string): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'shareLink', 'edit', shareLinkId);
    if (!row.revokedAt) await changeFor(actor, row, { revokedAt: new Date() });
  });
}
