import type { Actor } from '@/lib/policies/actor';
import { changeFor, listPersonalFor, loadFor } from './access';

/*
 * Ending what gives a person access. Always inside a transaction with the change that asks for it, so that
 * the next request of theirs finds nothing left.
 */

/** End the open sessions of a person, save one when it is named. Answers how many ended. */
export async function endSessionsOf(
  actor: Actor,
  personId: string,
  why: string,
  exceptId: string | null = null,
): Promise<number> {
  const open = await listPersonalFor(actor, 'session', { where: { personId, endedAt: null } });
  const others = open.filter((session) => session.id !== exceptId);
  for (const { id } of others)
    await changeFor(actor, await loadFor(actor, 'session', 'edit', id), { endedAt: new Date() }, why);
  return others.length;
}

export async function revokeTokensOf(actor: Actor, personId: string, why: string): Promise<void> {
  const open = await listPersonalFor(actor, 'apiToken', { where: { personId, revokedAt: null } });
  for (const { id } of open)
    await changeFor(actor, await loadFor(actor, 'apiToken', 'edit', id), { revokedAt: new Date() }, why);
}

/** Withdraw the links by which a person could still set a password. */
export async function withdrawLinksOf(actor: Actor, personId: string, why: string): Promise<void> {
  const where = { personId, usedAt: null, withdrawnAt: null };
  for (const { id } of await listPersonalFor(actor, 'passwordLink', { where }))
    await changeFor(
      actor,
      await loadFor(actor, 'passwordLink', 'edit', id),
      { withdrawnAt: new Date() },
      why,
    );
}
