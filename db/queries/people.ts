import { Op } from 'sequelize';
import { AppError } from '@/lib/errors';
import { LIMITS } from '@/lib/limits';
import type { Actor } from '@/lib/policies/actor';
import { RULES } from '@/lib/policies/rules';
import type { PersonDetails } from '@/lib/schemas/people';
import type { PersonView } from '@/lib/views/person';
import { changeFor, createFor, listPersonalFor, loadFor } from '../access';
import { systemActor } from '../actors';
import { appUrl } from '../entry/settings';
import type { PasswordLinkRow, PersonRow } from '../models/people';
import { endSessionsOf, revokeTokensOf, withdrawLinksOf } from '../revocation';
import { hashSecret, newSecret } from '../secrets';
import { inTransaction } from '../sequelize';

function view(row: PersonRow, link: PasswordLinkRow | undefined): PersonView {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: row.role,
    active: row.active,
    hasPassword: row.passwordHash !== null,
    createdAt: row.createdAt.toISOString(),
    openLink: link ? { purpose: link.purpose, expiresAt: link.expiresAt.toISOString() } : null,
  };
}

async function openLinks(actor: Actor, personId?: string): Promise<Map<string, PasswordLinkRow>> {
  const open = { usedAt: null, withdrawnAt: null, expiresAt: { [Op.gt]: new Date() } };
  const where = personId ? { ...open, personId } : open;
  const rows = await listPersonalFor(actor, 'passwordLink', { where });
  return new Map(rows.map((row) => [row.personId, row]));
}

/** Everybody of the laboratory, for administrators. @throws AppError NOT_FOUND for all others */
export async function listPeople(actor: Actor): Promise<PersonView[]> {
  if (!RULES.person.list(actor)) throw new AppError('NOT_FOUND');
  const rows = await listPersonalFor(actor, 'person', { order: [['name', 'ASC']] });
  const links = await openLinks(actor);
  return rows.map((row) => view(row, links.get(row.id)));
}

/** One person, for administrators. @throws AppError NOT_FOUND */
export async function person(actor: Actor, id: string): Promise<PersonView> {
  if (!RULES.person.list(actor)) throw new AppError('NOT_FOUND');
  const row = await loadFor(actor, 'person', 'read', id);
  return view(row, (await openLinks(actor, id)).get(id));
}

async function refuseTakenEmail(actor: Actor, email: string, exceptId?: string): Promise<void> {
  const [other] = await listPersonalFor(actor, 'person', { where: { email } });
  if (other && other.id !== exceptId)
    throw new AppError('CONFLICT', undefined, [
      { pointer: 'email', detail: `${other.name} has this e-mail address already` },
    ]);
}

/** A fresh link to set a password; those made before are withdrawn. Answers with the address to hand over. */
async function freshLink(actor: Actor, row: PersonRow): Promise<string> {
  await withdrawLinksOf(actor, row.id, 'a newer link was made');
  const secret = newSecret();
  await createFor(actor, 'passwordLink', {
    personId: row.id,
    tokenHash: hashSecret(secret),
    purpose: row.passwordHash === null ? 'invitation' : 'reset',
    expiresAt: new Date(Date.now() + LIMITS.passwordLinkHours * 3_600_000),
  });
  return `${appUrl()}/set-password/${secret}`;
}

/**
 * Add a person; the link by which they set their password is in the answer and nowhere else.
 *
 * @throws AppError NOT_FOUND for whoever is no administrator; CONFLICT at `email`
 */
export function addPerson(actor: Actor, details: PersonDetails): Promise<{ id: string; link: string }> {
  return inTransaction(async () => {
    if (!RULES.person.list(actor)) throw new AppError('NOT_FOUND');
    await refuseTakenEmail(actor, details.email);
    const row = await createFor(actor, 'person', { ...details, passwordHash: null });
    return { id: row.id, link: await freshLink(actor, row) };
  });
}

/** A new link for somebody who lost theirs or their password. */
export function makePasswordLink(actor: Actor, personId: string): Promise<string> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'person', 'manage', personId);
    if (!row.active)
      throw new AppError('CONFLICT', 'This account is closed. Open it again first, then make a link');
    return freshLink(actor, row);
  });
}

export function withdrawPasswordLink(actor: Actor, personId: string): Promise<void> {
  return inTransaction(async () => {
    await loadFor(actor, 'person', 'manage', personId);
    await withdrawLinksOf(actor, personId, 'withdrawn by an administrator');
  });
}

/** Somebody must be left who can add people. Asked inside the transaction, so that two cannot both go. */
async function refuseLastAdministrator(actor: Actor, row: PersonRow): Promise<void> {
  if (row.role !== 'administrator' || !row.active) return;
  const where = { role: 'administrator' as const, active: true, id: { [Op.ne]: row.id } };
  if ((await listPersonalFor(actor, 'person', { where })).length === 0)
    throw new AppError(
      'CONFLICT',
      `${row.name} is the only active administrator. Make somebody else an administrator first`,
    );
}

/** Name, address and role. The role acts at the person's next request. */
export function changePerson(actor: Actor, id: string, details: PersonDetails): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'person', 'manage', id);
    await refuseTakenEmail(actor, details.email, id);
    if (details.role !== 'administrator') await refuseLastAdministrator(actor, row);
    await changeFor(actor, row, details);
  });
}

/**
 * Close an account or open it again. Closing ends every session, token and link of the person at once;
 * opening gives none of them back.
 */
export function setPersonActive(actor: Actor, id: string, active: boolean, why?: string): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'person', 'manage', id);
    if (row.active === active) return;
    if (!active) {
      await refuseLastAdministrator(actor, row);
      const because = `${actor.name} closed the account`;
      await endSessionsOf(systemActor(), id, because);
      await revokeTokensOf(systemActor(), id, because);
      await withdrawLinksOf(actor, id, because);
    }
    await changeFor(actor, row, { active }, why);
  });
}
