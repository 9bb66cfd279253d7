import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { AccountView, MeView } from '@/lib/views/person';
import { changeFor, loadFor } from '../access';
import { systemActor } from '../actors';
import { laboratory } from '../entry/settings';
import { countTry, forgetTries } from '../entry/tries';
import { hashPassword, passwordMatches, refuseKnownPassword } from '../passwords';
import { endSessionsOf, withdrawLinksOf } from '../revocation';
import { inTransaction } from '../sequelize';

/** A reader with a link has no account, so it does not exist for them. */
function ownId(actor: Actor): string {
  if (actor.personId === null) throw new AppError('NOT_FOUND');
  return actor.personId;
}

/** Who is asking, for scripts that want to know what their token is. */
export async function whoAmI(actor: Actor): Promise<MeView> {
  const { kind, via, personId, name, role, canWrite } = actor;
  return { kind, via, id: personId, name, role, canWrite };
}

export async function account(actor: Actor): Promise<AccountView> {
  const row = await loadFor(actor, 'person', 'read', ownId(actor));
  const { id, name, email, role } = row;
  return { id, name, email, role, welcomed: row.welcomedAt !== null };
}

export function changeOwnName(actor: Actor, name: string): Promise<void> {
  return inTransaction(async () => {
    await changeFor(actor, await loadFor(actor, 'person', 'edit', ownId(actor)), { name });
  });
}

/** The person has read the statements of limits; the first time counts. */
export function confirmReading(actor: Actor): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'person', 'edit', ownId(actor));
    if (!row.welcomedAt) await changeFor(actor, row, { welcomedAt: new Date() });
  });
}

/**
 * Choose another password. Everybody else who is signed in as this person is signed out, and links to set
 * a password are withdrawn.
 *
 * @throws AppError INVALID_INPUT at `currentPassword` or `password`; TOO_MANY_TRIES
 */
export async function changeOwnPassword(actor: Actor, current: string, password: string): Promise<void> {
  const id = ownId(actor);
  await countTry('password', id);
  const row = await loadFor(actor, 'person', 'edit', id);
  if (!(await passwordMatches(current, row.passwordHash)))
    throw new AppError('INVALID_INPUT', undefined, [
      { pointer: 'currentPassword', detail: 'This is not the password you have now' },
    ]);
  await forgetTries('password', id);
  if (!(await laboratory())?.demo) refuseKnownPassword(password, row.email);
  const passwordHash = await hashPassword(password);
  await inTransaction(async () => {
    const why = 'password changed by its owner';
    await changeFor(actor, await loadFor(actor, 'person', 'edit', id), { passwordHash }, why);
    await endSessionsOf(actor, id, why, actor.sessionId);
    await withdrawLinksOf(systemActor(), id, why);
  });
}
