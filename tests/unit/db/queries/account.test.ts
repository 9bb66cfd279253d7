import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { changeFor, createFor, loadFor } from '@/db/access';
import { actorFromSession, actorFromToken, openSession, systemActor, withShareVisits } from '@/db/actors';
import { passwordLink } from '@/db/entry/password-links';
import { signIn } from '@/db/entry/sign-in';
import { TRIES } from '@/db/entry/tries';
import { hashPassword } from '@/db/passwords';
import { account, changeOwnName, changeOwnPassword, confirmReading, whoAmI } from '@/db/queries/account';
import { makePasswordLink } from '@/db/queries/people';
import { endAllSessions, endSession, listSessions } from '@/db/queries/sessions';
import { listTokens, makeToken, revokeToken } from '@/db/queries/tokens';
import { db, inTransaction } from '@/db/sequelize';
import type { Actor } from '@/lib/policies/actor';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import { actorOf, makeActor, makeNotebook, makePerson } from '../../../support/factories';

const OLD = 'heron and wren 7';
const NEW = 'reeds by the weir';
let database: TestDatabase;
let passwordHash = '';

async function withPassword() {
  const { id } = await makePerson('analyst');
  const system = systemActor();
  const row = await inTransaction(async () =>
    changeFor(system, await loadFor(system, 'person', 'edit', id), { passwordHash }),
  );
  return { id, email: row.email, actor: await actorOf(id) };
}

async function linkVisitor(): Promise<Actor> {
  const owner = await makePerson('pi');
  const notebookId = await makeNotebook(owner.id);
  const expiresAt = new Date(Date.now() + 60_000);
  const link = { notebookId, label: 'l', tokenHash: notebookId, expiresAt, createdById: owner.id };
  const visit = await inTransaction(async () => {
    const { id } = await createFor(systemActor(), 'shareLink', link);
    return createFor(systemActor(), 'shareSession', { shareLinkId: id, expiresAt });
  });
  const actor = await withShareVisits(null, [visit.id]);
  if (!actor) throw new Error('the visit just opened gave no actor');
  return actor;
}

beforeAll(async () => {
  database = await openTestDatabase();
  passwordHash = await hashPassword(OLD);
});
afterAll(() => database.close());

describe('the own account', () => {
  test('shows itself, changes its name, and is welcomed once', async () => {
    const actor = await makeActor('viewer', 'Old Name');
    expect(await account(actor)).toMatchObject({ name: 'Old Name', role: 'viewer', welcomed: false });
    await changeOwnName(actor, 'New Name');
    await confirmReading(actor);
    expect(await account(actor)).toMatchObject({ name: 'New Name', welcomed: true });
    const first = (await db().Person.findByPk(actor.personId ?? ''))?.welcomedAt;
    await confirmReading(actor);
    expect((await db().Person.findByPk(actor.personId ?? ''))?.welcomedAt).toEqual(first);
  });

  test('does not exist for a reader with a link', async () => {
    const actor = await linkVisitor();
    const missing = { code: 'NOT_FOUND' };
    await expect(account(actor)).rejects.toMatchObject(missing);
    await expect(listSessions(actor)).rejects.toMatchObject(missing);
    await expect(listTokens(actor)).rejects.toMatchObject(missing);
    await expect(makeToken(actor, { name: 't', scope: 'read', days: 1 })).rejects.toMatchObject({
      code: 'NOT_ALLOWED',
    });
    expect(await whoAmI(actor)).toEqual({
      ...{ kind: 'link', via: 'link', id: null, name: 'Reader with a link' },
      ...{ role: null, canWrite: false },
    });
  });
});

describe('changing the password', () => {
  test('keeps the session in use, ends the others, withdraws links', async () => {
    const { id, email, actor } = await withPassword();
    const other = await openSession(id);
    const link = await makePasswordLink(await makeActor('administrator'), id);
    await changeOwnPassword(actor, OLD, NEW);
    expect(await actorFromSession(actor.sessionId ?? '')).not.toBeNull();
    expect(await actorFromSession(other)).toBeNull();
    expect(await passwordLink(link.split('/').at(-1) ?? '')).toEqual({ state: 'withdrawn' });
    await expect(signIn({ email, password: OLD }, null)).rejects.toMatchObject({ code: 'SIGN_IN_FAILED' });
    await expect(signIn({ email, password: NEW }, null)).resolves.toBeTruthy();
  });

  test('a wrong present password changes nothing, and guessing it is limited', async () => {
    const { id, actor } = await withPassword();
    for (let n = 0; n < TRIES.password; n += 1)
      await expect(changeOwnPassword(actor, `guess ${n}`, NEW)).rejects.toMatchObject({
        details: [{ pointer: 'currentPassword', detail: 'This is not the password you have now' }],
      });
    await expect(changeOwnPassword(actor, OLD, NEW)).rejects.toMatchObject({ code: 'TOO_MANY_TRIES' });
    expect((await db().Person.findByPk(id))?.passwordHash).toBe(passwordHash);
  });

  test('never puts a hash into the record', async () => {
    const { id, actor } = await withPassword();
    await changeOwnPassword(actor, OLD, NEW);
    const entries = await db().RecordEntry.findAll({ where: { subjectId: id } });
    expect(entries.at(-1)).toMatchObject({ why: 'password changed by its owner', to: {} });
    expect(JSON.stringify(entries)).not.toContain('$2b$');
  });
});

describe('sessions', () => {
  test('are listed with the present one marked; one is ended, then all', async () => {
    const { id } = await makePerson('viewer');
    const actor = await actorOf(id);
    const [two, three] = [await openSession(id), await openSession(id)];
    const list = await listSessions(actor);
    expect(list.map((session) => session.id).sort()).toEqual([actor.sessionId, two, three].sort());
    expect(list.filter((session) => session.current).map((session) => session.id)).toEqual([actor.sessionId]);
    await endSession(actor, two);
    expect(await actorFromSession(two)).toBeNull();
    expect(await listSessions(actor)).toHaveLength(2);
    expect(await endAllSessions(actor)).toBe(2);
    expect(await actorFromSession(actor.sessionId ?? '')).toBeNull();
    expect(await actorFromSession(three)).toBeNull();
  });

  test('of others do not exist', async () => {
    const other = await openSession((await makePerson('viewer')).id);
    for (const role of ['viewer', 'administrator'] as const)
      await expect(endSession(await makeActor(role), other)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await actorFromSession(other)).not.toBeNull();
  });
});

describe('access tokens', () => {
  test('act for their owner within their scope, and are stored as a hash', async () => {
    const actor = await makeActor('analyst');
    const [read, write] = [
      await makeToken(actor, { name: 'reads', scope: 'read', days: 1 }),
      await makeToken(actor, { name: 'writes', scope: 'write', days: 366 }),
    ];
    const as = async (token: string) => whoAmI((await actorFromToken(token)) as Actor); // made just above
    expect(await as(read)).toMatchObject({
      id: actor.personId,
      via: 'token',
      role: 'analyst',
      canWrite: false,
    });
    expect(await as(write)).toMatchObject({ canWrite: true });
    expect(JSON.stringify([await listTokens(actor), await db().ApiToken.findAll()])).not.toContain(read);
    expect((await listTokens(actor)).map(({ name, state }) => [name, state])).toContainEqual([
      'writes',
      'good',
    ]);
  });

  test('revoked or run out, they let nobody in', async () => {
    const actor = await makeActor('analyst');
    const token = await makeToken(actor, { name: 't', scope: 'read', days: 1 });
    const id = (await listTokens(actor))[0]?.id ?? '';
    await revokeToken(actor, id);
    expect(await actorFromToken(token)).toBeNull();
    expect((await listTokens(actor))[0]?.state).toBe('revoked');
    const short = await makeToken(actor, { name: 'short', scope: 'read', days: 1 });
    const row = (await listTokens(actor)).find(({ name }) => name === 'short');
    const past = { expiresAt: new Date(Date.now() - 1) };
    await inTransaction(async () =>
      changeFor(actor, await loadFor(actor, 'apiToken', 'edit', row?.id ?? ''), past),
    );
    expect(await actorFromToken(short)).toBeNull();
    expect((await listTokens(actor)).map(({ state }) => state)).toContain('expired');
  });

  test('make no tokens and end no sessions; those of others do not exist', async () => {
    const actor = await makeActor('pi');
    const token = (await actorFromToken(
      await makeToken(actor, { name: 't', scope: 'write', days: 1 }),
    )) as Actor; // made here
    await expect(makeToken(token, { name: 'child', scope: 'write', days: 1 })).rejects.toMatchObject({
      code: 'NOT_ALLOWED',
    });
    await expect(endSession(token, actor.sessionId ?? '')).rejects.toMatchObject({ code: 'NOT_ALLOWED' });
    const id = (await listTokens(actor))[0]?.id ?? '';
    await expect(revokeToken(await makeActor('administrator'), id)).rejects.toMatchObject({
      code: 'NOT_FOUND',
    });
  });
});
