import { readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { actorFromSession } from '@/db/actors';
import { DEMO_ACCOUNTS } from '@/db/demo/people';
import { publicAccounts } from '@/db/entry/demo-accounts';
import { laboratory } from '@/db/entry/settings';
import { newSetUpCode, setUp } from '@/db/entry/set-up';
import { db } from '@/db/sequelize';
import { openTestDatabase, type TestDatabase } from '../../../support/db';

const form = {
  laboratory: 'Fen laboratory',
  timeZone: 'Europe/London',
  name: 'Aud Finn',
  email: 'aud@example.test',
  password: 'reeds by the weir',
  passwordAgain: 'reeds by the weir',
};
const atCode = (sentence: string) => ({
  code: 'INVALID_INPUT',
  details: [{ pointer: 'code', detail: expect.stringContaining(sentence) }],
});
let database: TestDatabase;

beforeEach(async () => {
  database = await openTestDatabase();
});
afterEach(() => database.close());

describe('the code', () => {
  test('has 16 signs in four groups, and only its hash is kept, for the owner of the files alone', async () => {
    const code = await newSetUpCode();
    expect(code).toMatch(/^([a-hjkmnp-z2-9]{4}-){3}[a-hjkmnp-z2-9]{4}$/);
    const file = path.join(database.folder, 'set-up-code.json');
    expect(readFileSync(file, 'utf8')).not.toContain(code.slice(0, 4));
    expect(statSync(file).mode & 0o077).toBe(0);
  });

  test('is taken in capitals, with blanks or without dashes', async () => {
    const code = (await newSetUpCode()).toUpperCase().replaceAll('-', ' ');
    await expect(setUp({ ...form, code })).resolves.toBeTruthy();
  });

  test('a newer one takes the place of the one before', async () => {
    const code = await newSetUpCode();
    await newSetUpCode();
    await expect(setUp({ ...form, code })).rejects.toMatchObject(atCode('not the code'));
  });

  test('allows ten tries, sent one by one or side by side; then not even the right one is taken', async () => {
    const code = await newSetUpCode();
    await Promise.allSettled(Array.from({ length: 10 }, () => setUp({ ...form, code: 'wrong' })));
    await expect(setUp({ ...form, code })).rejects.toMatchObject(atCode('Too many wrong codes'));
    expect(await laboratory()).toBeNull();
  });

  test('is missing when the server was not started in the usual way', async () => {
    await expect(setUp({ ...form, code: 'x' })).rejects.toMatchObject(atCode('Start Halflight again'));
  });
});

describe('setUp', () => {
  test('makes a real laboratory and signs its administrator in', async () => {
    const { sessionId } = await setUp({ ...form, code: await newSetUpCode() });
    expect(await laboratory()).toMatchObject({ name: form.laboratory, timeZone: form.timeZone, demo: false });
    expect(await actorFromSession(sessionId)).toMatchObject({ role: 'administrator', name: form.name });
    expect(await publicAccounts()).toEqual([]);
  });

  test('works once: with a second code, or twice at the same moment', async () => {
    const code = await newSetUpCode();
    const both = await Promise.allSettled([
      setUp({ ...form, code }),
      setUp({ ...form, code, email: 'b@example.test' }),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    await expect(setUp({ ...form, code: await newSetUpCode() })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await db().Laboratory.count()).toBe(1);
    expect(await db().Person.count()).toBe(1);
  });

  test('refuses a public password without spending a try', async () => {
    const code = await newSetUpCode();
    for (let n = 0; n < 12; n += 1)
      await expect(
        setUp({ ...form, code, password: DEMO_ACCOUNTS[0]?.password ?? '' }),
      ).rejects.toMatchObject({
        details: [{ pointer: 'password', detail: expect.stringContaining('public') }],
      });
    await expect(setUp({ ...form, code })).resolves.toBeTruthy();
  });
});
