import { setTimeout as pause } from 'node:timers/promises';
import { AppError } from '@/lib/errors';
import type { SignInForm } from '@/lib/schemas/account';
import { changeFor, listPersonalFor, loadFor } from '../access';
import { actorFromSession, openSession, systemActor } from '../actors';
import type { PersonRow } from '../models/people';
import { passwordMatches } from '../passwords';
import { recordEvent } from '../record';
import { inTransaction } from '../sequelize';
import { believedAddress } from './client-address';
import { trustedProxies } from './settings';
import { countTry, forgetTries, pauseAfterMs, takeBackTry } from './tries';

export interface SignedIn {
  readonly sessionId: string;
  /** False until this person has confirmed reading the statements of limits. */
  readonly welcomed: boolean;
}

/** One entry in the record about a try to sign in; never what was typed as the password. */
function note(verb: string, email: string, person: PersonRow | null, why?: string): Promise<void> {
  return inTransaction(() =>
    recordEvent(systemActor(), {
      kind: 'sign-in',
      verb,
      subjectId: person?.id ?? null,
      subjectName: person?.name ?? null,
      to: { email },
      why,
    }),
  );
}

async function personAt(email: string): Promise<PersonRow | null> {
  const [person] = await listPersonalFor(systemActor(), 'person', { where: { email } });
  return person ?? null;
}

async function countBoth(email: string, address: string | null): Promise<number> {
  const limited = (why: string) => async () => note('limited', email, await personAt(email), why);
  if (address) await countTry('address', address, limited('too many tries from one address'));
  return countTry('account', email, limited('too many tries for one account'));
}

/**
 * Let a person in by e-mail address and password. Whether there is such an account, has a password and is
 * active makes no difference to a wrong try: not in the answer, not in the work, not in the record.
 *
 * @param forwardedFor the X-Forwarded-For header as it came; believed as far as TRUST_PROXY says
 * @throws AppError SIGN_IN_FAILED, TOO_MANY_TRIES
 */
export async function signIn(
  { email, password }: SignInForm,
  forwardedFor: string | null,
): Promise<SignedIn> {
  const address = believedAddress(forwardedFor, trustedProxies());
  const tries = await countBoth(email, address);
  const person = await personAt(email);
  const right = await passwordMatches(password, person?.active ? person.passwordHash : null);
  if (!person || !right) {
    await note('refused', email, person);
    await pause(pauseAfterMs(tries));
    throw new AppError('SIGN_IN_FAILED');
  }
  await forgetTries('account', email);
  if (address) await takeBackTry('address', address);
  return { sessionId: await open(person, email), welcomed: person.welcomedAt !== null };
}

/** The session, unless the account was closed or its password changed while this one was compared. */
function open(person: PersonRow, email: string): Promise<string> {
  return inTransaction(async () => {
    const now = await loadFor(systemActor(), 'person', 'read', person.id);
    if (!now.active || now.passwordHash !== person.passwordHash) throw new AppError('SIGN_IN_FAILED');
    await note('signed in', email, now);
    return openSession(now.id);
  });
}

/** End the session of this browser; one that is over already stays over. */
export async function signOut(sessionId: string): Promise<void> {
  const actor = await actorFromSession(sessionId);
  if (!actor) return;
  await inTransaction(async () => {
    const session = await loadFor(actor, 'session', 'edit', sessionId);
    await changeFor(actor, session, { endedAt: new Date() }, 'signed out');
  });
}
