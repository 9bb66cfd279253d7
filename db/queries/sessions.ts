import { Op } from 'sequelize';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { SessionView } from '@/lib/views/person';
import { changeFor, listPersonalFor, loadFor } from '../access';
import type { SessionRow } from '../models/people';
import { endSessionsOf } from '../revocation';
import { inTransaction } from '../sequelize';

function view(row: SessionRow, currentId: string | null): SessionView {
  const endsAt = Math.min(row.idleExpiresAt.getTime(), row.expiresAt.getTime());
  return {
    id: row.id,
    openedAt: row.createdAt.toISOString(),
    lastSeenAt: row.lastSeenAt.toISOString(),
    endsAt: new Date(endsAt).toISOString(),
    current: row.id === currentId,
  };
}

function ownId(actor: Actor): string {
  if (actor.personId === null) throw new AppError('NOT_FOUND');
  return actor.personId;
}

/** Where the person is signed in now, the latest first. */
export async function listSessions(actor: Actor): Promise<SessionView[]> {
  const now = { [Op.gt]: new Date() };
  const where = { personId: ownId(actor), endedAt: null, expiresAt: now, idleExpiresAt: now };
  const rows = await listPersonalFor(actor, 'session', { where, order: [['lastSeenAt', 'DESC']] });
  return rows.map((row) => view(row, actor.sessionId));
}

export function endSession(actor: Actor, id: string): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'session', 'edit', id);
    if (row.endedAt) return;
    await changeFor(actor, row, { endedAt: new Date() }, 'ended on the account page');
  });
}

/** Sign out everywhere, this browser included. Answers how many sessions ended. */
export function endAllSessions(actor: Actor): Promise<number> {
  return inTransaction(() => endSessionsOf(actor, ownId(actor), 'signed out everywhere'));
}
