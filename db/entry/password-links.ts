import { AppError } from '@/lib/errors';
import { LINK_SENTENCES, type PasswordLinkView } from '@/lib/views/person';
import { changeFor, listPersonalFor, loadFor } from '../access';
import { openSession, systemActor } from '../actors';
import type { PasswordLinkRow } from '../models/people';
import { hashPassword, refuseKnownPassword } from '../passwords';
import { endSessionsOf, withdrawLinksOf } from '../revocation';
import { hashSecret } from '../secrets';
import { inTransaction } from '../sequelize';
import type { SignedIn } from './sign-in';
import { laboratory } from './settings';

const system = systemActor('Holder of a password link');

async function find(token: string): Promise<PasswordLinkRow | null> {
  const where = { tokenHash: hashSecret(token) };
  const [row] = await listPersonalFor(system, 'passwordLink', { where });
  return row ?? null;
}

async function viewOf(row: PasswordLinkRow | null): Promise<PasswordLinkView> {
  if (!row) return { state: 'unknown' };
  if (row.usedAt) return { state: 'used' };
  if (row.withdrawnAt) return { state: 'withdrawn' };
  if (row.expiresAt <= new Date()) return { state: 'expired' };
  const person = await loadFor(system, 'person', 'read', row.personId);
  if (!person.active) return { state: 'withdrawn' };
  return { state: 'open', name: person.name, email: person.email, purpose: row.purpose };
}

/** What a link to set a password is good for. Looking at it does not spend it. */
export async function passwordLink(token: string): Promise<PasswordLinkView> {
  return viewOf(await find(token));
}

async function openOrRefuse(token: string) {
  const row = await find(token);
  const view = await viewOf(row);
  if (view.state !== 'open' || !row) {
    const state = view.state === 'open' ? 'unknown' : view.state;
    throw new AppError('LINK_SPENT', LINK_SENTENCES[state]);
  }
  return { row, email: view.email };
}

/**
 * Set a password by a link and sign in with it. The link is spent, other links of this person are
 * withdrawn, and whoever was signed in as them is signed out.
 *
 * @throws AppError LINK_SPENT; INVALID_INPUT for a password that others know
 */
export async function setPasswordByLink(token: string, password: string): Promise<SignedIn> {
  const { email } = await openOrRefuse(token);
  if (!(await laboratory())?.demo) refuseKnownPassword(password, email);
  const passwordHash = await hashPassword(password);
  return inTransaction(async () => {
    const { row } = await openOrRefuse(token); // again: it may have been spent while the hash was made
    const link = await loadFor(system, 'passwordLink', 'edit', row.id);
    const person = await loadFor(system, 'person', 'edit', row.personId);
    const why = link.purpose === 'invitation' ? 'password set by invitation' : 'password set anew by link';
    await changeFor(system, link, { usedAt: new Date() });
    await changeFor(system, person, { passwordHash }, why);
    await withdrawLinksOf(system, person.id, why);
    await endSessionsOf(system, person.id, why);
    return { sessionId: await openSession(person.id), welcomed: person.welcomedAt !== null };
  });
}
