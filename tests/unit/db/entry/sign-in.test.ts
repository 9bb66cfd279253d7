import { setTimeout as pause } from 'node:timers/promises';
import bcrypt from 'bcryptjs';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { changeFor, createFor, loadFor } from '@/db/access';
import { actorFromSession, systemActor } from '@/db/actors';
import { signIn, signOut } from '@/db/entry/sign-in';
import { TRIES } from '@/db/entry/tries';
import { hashPassword, NOBODYS_HASH, PASSWORD_COST } from '@/db/passwords';
import { db, inTransaction } from '@/db/sequelize';
import { parseEnv } from '@/lib/env';
import { openTestDatabase, type TestDatabase } from '../../../support/db';

// the pauses after wrong tries are asked for, not sat through
vi.mock('node:timers/promises', () => ({ setTimeout: vi.fn(async () => undefined) }));
// the configuration is read once in a process; here it follows what a test sets
vi.mock('@/db/environment', () => ({ environment: () => parseEnv(process.env) }));

const PASSWORD = 'heron and wren 7';
const SIGN_IN_FAILED = {
  code: 'SIGN_IN_FAILED',
  message: 'This e-mail address and password do not go together',
};
let database: TestDatabase;
let hash = '';
let count = 0;

async function makeAccount(values: { active?: boolean; passwordHash?: string | null } = {}) {
  count += 1;
  const email = `a${count}@example.test`;
  const details = {
    name: `Account ${count}`,
    email,
    role: 'analyst' as const,
    passwordHash: hash,
    ...values,
  };
  const row = await inTransaction(() => createFor(systemActor(), 'person', details));
  return { id: row.id, email };
}

const entries = () => db().RecordEntry.findAll({ where: { kind: 'sign-in' }, order: [['id', 'ASC']] });
const wrong = (email: string, from: string | null = null) =>
  signIn({ email, password: 'not this one' }, from);

beforeAll(async () => {
  database = await openTestDatabase();
  hash = await hashPassword(PASSWORD);
});
afterAll(() => database.close());
beforeEach(() => {
  delete process.env.TRUST_PROXY;
  vi.mocked(pause).mockClear();
});

describe('signIn', () => {
  test('opens a session and writes it down', async () => {
    const { id, email } = await makeAccount();
    const { sessionId, welcomed } = await signIn({ email, password: PASSWORD }, null);
    expect(await actorFromSession(sessionId)).toMatchObject({
      personId: id,
      role: 'analyst',
      via: 'session',
    });
    expect(welcomed).toBe(false);
    expect((await entries()).at(-1)).toMatchObject({ verb: 'signed in', subjectId: id, to: { email } });
  });

  test('gives the same answer after the same work, whether there is an account or not', async () => {
    const known = await makeAccount();
    const invited = await makeAccount({ passwordHash: null });
    const closed = await makeAccount({ active: false });
    const compared = vi.spyOn(bcrypt, 'compare');
    for (const email of [known.email, invited.email, closed.email, 'nobody@example.test']) {
      const before = (await entries()).length;
      compared.mockClear();
      await expect(wrong(email)).rejects.toMatchObject(SIGN_IN_FAILED);
      expect(compared).toHaveBeenCalledTimes(1);
      expect(bcrypt.getRounds(compared.mock.calls[0]?.[1] ?? '')).toBe(PASSWORD_COST);
      expect(await entries()).toHaveLength(before + 1);
    }
    compared.mockRestore();
  });

  test('refuses a closed account even with its password', async () => {
    const { email } = await makeAccount({ active: false });
    await expect(signIn({ email, password: PASSWORD }, null)).rejects.toMatchObject(SIGN_IN_FAILED);
  });

  test('refuses a longer text whose first 72 bytes are the password', async () => {
    const longest = 'x'.repeat(72);
    const { email } = await makeAccount({ passwordHash: await hashPassword(longest) });
    await expect(signIn({ email, password: `${longest}y` }, null)).rejects.toMatchObject(SIGN_IN_FAILED);
    await expect(signIn({ email, password: longest }, null)).resolves.toBeTruthy();
  });

  test('the hash that stands in for a missing one has the same work factor', () => {
    expect(bcrypt.getRounds(NOBODYS_HASH)).toBe(PASSWORD_COST);
    expect(bcrypt.getRounds(hash)).toBe(PASSWORD_COST);
  });

  test('writes wrong tries down without what was typed as the password', async () => {
    const { id, email } = await makeAccount();
    await expect(wrong(email)).rejects.toThrow();
    const entry = (await entries()).at(-1);
    expect(entry).toMatchObject({ verb: 'refused', subjectId: id, actorName: 'Halflight', to: { email } });
    expect(JSON.stringify(entry)).not.toContain('not this one');
  });
});

describe('guessing', () => {
  // many tries: the comparison itself, which is slow by design, is tested above
  beforeEach(() => {
    vi.spyOn(bcrypt, 'compare').mockImplementation(async (text) => text === PASSWORD);
  });
  afterEach(() => {
    vi.restoreAllMocks();
  });

  test('is slowed, then limited, also for the right password; another account is not touched', async () => {
    const { email } = await makeAccount();
    const other = await makeAccount();
    for (let n = 0; n < TRIES.account; n += 1)
      await expect(wrong(email)).rejects.toMatchObject(SIGN_IN_FAILED);
    expect(vi.mocked(pause).mock.calls.map(([ms]) => ms)).toEqual([
      0, 0, 0, 500, 1000, 2000, 4000, 4000, 4000, 4000,
    ]);
    await expect(signIn({ email, password: PASSWORD }, null)).rejects.toMatchObject({
      code: 'TOO_MANY_TRIES',
    });
    expect((await entries()).at(-1)).toMatchObject({
      verb: 'limited',
      why: 'too many tries for one account',
    });
    await expect(signIn({ email: other.email, password: PASSWORD }, null)).resolves.toBeTruthy();
  });

  test('is limited the same for an address without an account', async () => {
    for (let n = 0; n < TRIES.account; n += 1) await expect(wrong('no@example.test')).rejects.toThrow();
    await expect(wrong('no@example.test')).rejects.toMatchObject({ code: 'TOO_MANY_TRIES' });
  });

  test('a right password forgets the wrong tries before it', async () => {
    const { email } = await makeAccount();
    for (let round = 0; round < 2; round += 1) {
      for (let n = 1; n < TRIES.account; n += 1)
        await expect(wrong(email)).rejects.toMatchObject(SIGN_IN_FAILED);
      await signIn({ email, password: PASSWORD }, null);
    }
  });

  async function spread(from: (n: number) => string) {
    const outcomes: string[] = [];
    for (let n = 0; n <= TRIES.address; n += 1)
      outcomes.push(
        (await wrong(`spread${count}-${n}@example.test`, from(n)).catch(({ code }) =>
          String(code),
        )) as string,
      );
    return outcomes;
  }

  test('without TRUST_PROXY a forged address changes nothing: neither limits others nor lifts a limit', async () => {
    count += 1;
    expect(new Set(await spread(() => '192.0.2.55'))).toEqual(new Set(['SIGN_IN_FAILED']));
    const { email } = await makeAccount();
    for (let n = 0; n < TRIES.account; n += 1)
      await expect(wrong(email, `192.0.2.${n}`)).rejects.toMatchObject(SIGN_IN_FAILED);
    await expect(wrong(email, '192.0.2.200')).rejects.toMatchObject({ code: 'TOO_MANY_TRIES' });
  });

  test('with TRUST_PROXY one address is limited over all accounts, and its forged part is passed over', async () => {
    process.env.TRUST_PROXY = '1';
    count += 1;
    const outcomes = await spread((n) => `192.0.2.${n}, 203.0.113.77`);
    expect(outcomes.slice(0, -1)).not.toContain('TOO_MANY_TRIES');
    expect(outcomes.at(-1)).toBe('TOO_MANY_TRIES');
    await expect(wrong('elsewhere@example.test', '203.0.113.77, 203.0.113.78')).rejects.toMatchObject(
      SIGN_IN_FAILED,
    );
  });
});

describe('sessions', () => {
  const opened = async () =>
    (await signIn({ email: (await makeAccount()).email, password: PASSWORD }, null)).sessionId;

  async function wind(sessionId: string, values: { idleExpiresAt?: Date; expiresAt?: Date }) {
    const system = systemActor();
    await inTransaction(async () =>
      changeFor(system, await loadFor(system, 'session', 'edit', sessionId), values),
    );
  }

  test('end when they were idle too long, or are too old', async () => {
    const past = new Date(Date.now() - 1000);
    const idle = await opened();
    await wind(idle, { idleExpiresAt: past });
    expect(await actorFromSession(idle)).toBeNull();
    const old = await opened();
    await wind(old, { expiresAt: past });
    expect(await actorFromSession(old)).toBeNull();
  });

  test('signing out ends this one only; doing it twice, or with an unknown one, is no error', async () => {
    const { email } = await makeAccount();
    const one = await signIn({ email, password: PASSWORD }, null);
    const two = await signIn({ email, password: PASSWORD }, null);
    await signOut(one.sessionId);
    await signOut(one.sessionId);
    await signOut('no such session');
    expect(await actorFromSession(one.sessionId)).toBeNull();
    expect(await actorFromSession(two.sessionId)).not.toBeNull();
  });
});
