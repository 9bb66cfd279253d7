import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { NewToken } from '@/lib/schemas/account';
import type { TokenView } from '@/lib/views/person';
import { changeFor, createFor, listPersonalFor, loadFor } from '../access';
import type { ApiTokenRow } from '../models/people';
import { hashSecret, newSecret } from '../secrets';
import { inTransaction } from '../sequelize';

const DAY_MS = 86_400_000;

function view(row: ApiTokenRow): TokenView {
  const state = row.revokedAt ? 'revoked' : row.expiresAt <= new Date() ? 'expired' : 'good';
  return {
    id: row.id,
    name: row.name,
    scope: row.scope,
    createdAt: row.createdAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
    lastUsedAt: row.lastUsedAt?.toISOString() ?? null,
    state,
  };
}

/** The person's own access tokens, the newest first; of each only what it may do, never the token. */
export async function listTokens(actor: Actor): Promise<TokenView[]> {
  if (actor.personId === null) throw new AppError('NOT_FOUND');
  const where = { personId: actor.personId };
  const rows = await listPersonalFor(actor, 'apiToken', { where, order: [['createdAt', 'DESC']] });
  return rows.map(view);
}

/** A new token; the answer holds it, the database its hash. @throws AppError NOT_ALLOWED */
export async function makeToken(actor: Actor, { name, scope, days }: NewToken): Promise<string> {
  const token = `hl_${newSecret()}`;
  await inTransaction(() =>
    createFor(actor, 'apiToken', {
      personId: actor.personId ?? '',
      name,
      scope,
      tokenHash: hashSecret(token),
      expiresAt: new Date(Date.now() + days * DAY_MS),
    }),
  );
  return token;
}

export function revokeToken(actor: Actor, id: string): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'apiToken', 'edit', id);
    if (!row.revokedAt) await changeFor(actor, row, { revokedAt: new Date() });
  });
}
