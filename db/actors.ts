import { Op } from 'sequelize';
import type { Actor, MemberRole } from '@/lib/policies/actor';
import { LIMITS } from '@/lib/limits';
import { changeFor, createFor, loadFor } from './access';
import type { PersonRow, SessionRow } from './models/people';
import { hashSecret } from './secrets';
import { db, inTransaction } from './sequelize';

const TOUCH_EVERY_MS = 60_000;
const IDLE_MS = LIMITS.sessionIdleMinutes * 60_000;
const ABSOLUTE_MS = LIMITS.sessionAbsoluteHours * 3_600_000;

const make = (facts: object) => facts as Actor;

/** The laboratory's own scripts: seeding, sign-in, opening a share link. Never the answer to a request. */
export function systemActor(name = 'Halflight'): Actor {
  return make({
    kind: 'system',
    via: 'script',
    personId: null,
    name,
    role: null,
    canWrite: true,
    memberships: new Map(),
    sharedNotebookIds: [],
    sessionId: null,
  });
}

async function personActor(
  person: PersonRow,
  via: Actor['via'],
  canWrite: boolean,
  sessionId: string | null,
) {
  const memberships = await db().Membership.findAll({ where: { personId: person.id, endedAt: null } });
  return make({
    kind: 'person',
    via,
    personId: person.id,
    name: person.name,
    role: person.role,
    canWrite,
    memberships: new Map<string, MemberRole>(memberships.map((row) => [row.notebookId, row.role])),
    sharedNotebookIds: [],
    sessionId,
  });
}

/** A person as the server acts for them: in seeding and in tests, where nobody signs in. */
export async function actorForPerson(personId: string): Promise<Actor> {
  const person = await db().Person.findByPk(personId);
  if (!person?.active) throw new Error(`actorForPerson needs an active person, got ${personId}`);
  return personActor(person, 'script', true, null);
}

async function touch(session: SessionRow, now: Date): Promise<void> {
  if (now.getTime() - session.lastSeenAt.getTime() < TOUCH_EVERY_MS) return;
  const system = systemActor();
  await inTransaction(async () => {
    const row = await loadFor(system, 'session', 'edit', session.id);
    await changeFor(system, row, { lastSeenAt: now, idleExpiresAt: new Date(now.getTime() + IDLE_MS) });
  });
}

/** The person behind a session, as the database knows them now; null when it has ended or run out. */
export async function actorFromSession(sessionId: string): Promise<Actor | null> {
  const now = new Date();
  const session = await db().Session.findByPk(sessionId);
  if (!session || session.endedAt || session.expiresAt <= now || session.idleExpiresAt <= now) return null;
  const person = await db().Person.findByPk(session.personId);
  if (!person?.active) return null;
  await touch(session, now);
  return personActor(person, 'session', true, session.id);
}

/** The person behind an access token, with the token's scope. */
export async function actorFromToken(token: string): Promise<Actor | null> {
  const now = new Date();
  const row = await db().ApiToken.findOne({ where: { tokenHash: hashSecret(token) } });
  if (!row || row.revokedAt || row.expiresAt <= now) return null;
  const person = await db().Person.findByPk(row.personId);
  if (!person?.active) return null;
  if (!row.lastUsedAt || now.getTime() - row.lastUsedAt.getTime() > TOUCH_EVERY_MS) {
    const system = systemActor();
    await inTransaction(async () => {
      await changeFor(system, await loadFor(system, 'apiToken', 'edit', row.id), { lastUsedAt: now });
    });
  }
  return personActor(person, 'token', row.scope === 'write', null);
}

/** Which notebooks the share visits of this browser still open. */
async function sharedNotebooks(shareSessionIds: readonly string[]): Promise<string[]> {
  const now = new Date();
  const visits = await db().ShareSession.findAll({
    where: { id: [...shareSessionIds], expiresAt: { [Op.gt]: now } },
  });
  const links = await db().ShareLink.findAll({
    where: { id: visits.map((visit) => visit.shareLinkId), revokedAt: null, expiresAt: { [Op.gt]: now } },
  });
  return [...new Set(links.map((link) => link.notebookId))];
}

/** Add the share visits of this browser to whoever is asking; alone they make a visitor who can only read. */
export async function withShareVisits(
  actor: Actor | null,
  shareSessionIds: readonly string[],
): Promise<Actor | null> {
  if (shareSessionIds.length === 0) return actor;
  const sharedNotebookIds = await sharedNotebooks(shareSessionIds);
  if (sharedNotebookIds.length === 0) return actor;
  if (actor) return make({ ...actor, sharedNotebookIds });
  return make({
    kind: 'link',
    via: 'link',
    personId: null,
    name: 'Reader with a link',
    role: null,
    canWrite: false,
    memberships: new Map(),
    sharedNotebookIds,
    sessionId: null,
  });
}

/** A new session for a person who has just shown their password. */
export async function openSession(personId: string): Promise<string> {
  const now = new Date();
  const system = systemActor();
  const row = await inTransaction(() =>
    createFor(system, 'session', {
      personId,
      lastSeenAt: now,
      idleExpiresAt: new Date(now.getTime() + IDLE_MS),
      expiresAt: new Date(now.getTime() + ABSOLUTE_MS),
    }),
  );
  return row.id;
}
