import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { changeFor, createFor, loadFor } from '@/db/access';
import { actorFromSession, openSession, systemActor } from '@/db/actors';
import { DEMO_ACCOUNTS } from '@/db/demo/people';
import { passwordLink, setPasswordByLink } from '@/db/entry/password-links';
import { signIn } from '@/db/entry/sign-in';
import { addPerson, makePasswordLink, setPersonActive, withdrawPasswordLink } from '@/db/queries/people';
import { db, inTransaction } from '@/db/sequelize';
import { LINK_SENTENCES } from '@/lib/views/person';
import type { Actor } from '@/lib/policies/actor';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import { makeActor } from '../../../support/factories';

const PASSWORD = 'reeds by the weir';
let database: TestDatabase;
let administrator: Actor;
let count = 0;

async function invited() {
  count += 1;
  const details = { name: `Guest ${count}`, email: `guest${count}@example.test`, role: 'viewer' as const };
  const { id, link } = await addPerson(administrator, details);
  return { id, email: details.email, token: link.split('/').at(-1) ?? '' };
}

async function expire(token: string, personId: string) {
  const system = systemActor();
  const link = await db().PasswordLink.findOne({ where: { personId } });
  await inTransaction(async () => {
    const row = await loadFor(system, 'passwordLink', 'edit', link?.id ?? '');
    await changeFor(system, row, { expiresAt: new Date(Date.now() - 1) });
  });
  return token;
}

beforeAll(async () => {
  database = await openTestDatabase();
  const lab = { name: 'Fen laboratory', timeZone: 'UTC', demo: false };
  await inTransaction(() => createFor(systemActor(), 'laboratory', lab));
  administrator = await makeActor('administrator');
});
afterAll(() => database.close());

describe('a link to set a password', () => {
  test('says whose it is, is not spent by looking, sets a password and signs in', async () => {
    const { id, email, token } = await invited();
    const open = { state: 'open', name: `Guest ${count}`, email, purpose: 'invitation' };
    expect(await passwordLink(token)).toEqual(open);
    expect(await passwordLink(token)).toEqual(open);
    const { sessionId, welcomed } = await setPasswordByLink(token, PASSWORD);
    expect(await actorFromSession(sessionId)).toMatchObject({ personId: id, role: 'viewer' });
    expect(welcomed).toBe(false);
    await expect(signIn({ email, password: PASSWORD }, null)).resolves.toBeTruthy();
  });

  test('is stored as a hash, good for 48 hours', async () => {
    const { id, token } = await invited();
    const row = await db().PasswordLink.findOne({ where: { personId: id } });
    expect(JSON.stringify(row)).not.toContain(token);
    const hours = (row?.expiresAt.getTime() ?? 0) - (row?.createdAt.getTime() ?? 0);
    expect(Math.round(hours / 3_600_000)).toBe(48);
    const record = await db().RecordEntry.findAll({ where: { kind: 'password link' } });
    expect(JSON.stringify(record)).not.toContain(row?.tokenHash);
  });

  test('resets: ends the sessions that were open', async () => {
    const { id, token } = await invited();
    await setPasswordByLink(token, PASSWORD);
    const before = await openSession(id);
    const reset = (await makePasswordLink(administrator, id)).split('/').at(-1) ?? '';
    expect(await passwordLink(reset)).toMatchObject({ state: 'open', purpose: 'reset' });
    await setPasswordByLink(reset, `${PASSWORD} again`);
    expect(await actorFromSession(before)).toBeNull();
  });
});

describe('a link that is good no more', () => {
  async function expectState(token: string, state: keyof typeof LINK_SENTENCES) {
    expect(await passwordLink(token)).toEqual({ state });
    await expect(setPasswordByLink(token, PASSWORD)).rejects.toMatchObject({
      code: 'LINK_SPENT',
      message: LINK_SENTENCES[state],
    });
  }

  test('because it was used', async () => {
    const { token } = await invited();
    await setPasswordByLink(token, PASSWORD);
    await expectState(token, 'used');
  });

  test('because it has run out', async () => {
    const { id, token } = await invited();
    await expectState(await expire(token, id), 'expired');
  });

  test('because an administrator withdrew it, made a newer one, or closed the account', async () => {
    const one = await invited();
    await withdrawPasswordLink(administrator, one.id);
    await expectState(one.token, 'withdrawn');
    const two = await invited();
    await makePasswordLink(administrator, two.id);
    await expectState(two.token, 'withdrawn');
    const three = await invited();
    await setPersonActive(administrator, three.id, false);
    await expectState(three.token, 'withdrawn');
  });

  test('because it never was one', async () => {
    await expectState('made-up', 'unknown');
  });

  test('used by two at once, it works for one', async () => {
    const { token } = await invited();
    const both = await Promise.allSettled([
      setPasswordByLink(token, PASSWORD),
      setPasswordByLink(token, PASSWORD),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  });
});

test.each([DEMO_ACCOUNTS[0]?.password ?? '', (DEMO_ACCOUNTS[1]?.password ?? '').toUpperCase()])(
  'outside the demonstration its password %s is refused, and the link stays good',
  async (password) => {
    const { token } = await invited();
    await expect(setPasswordByLink(token, password)).rejects.toMatchObject({
      code: 'INVALID_INPUT',
      details: [{ pointer: 'password', detail: expect.stringContaining('public') }],
    });
    expect(await passwordLink(token)).toMatchObject({ state: 'open' });
  },
);
