import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { actorFromSession, actorFromToken, openSession } from '@/db/actors';
import {
  addPerson,
  changePerson,
  listPeople,
  makePasswordLink,
  person,
  setPersonActive,
} from '@/db/queries/people';
import { makeToken } from '@/db/queries/tokens';
import { db } from '@/db/sequelize';
import type { Actor, Role } from '@/lib/policies/actor';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import { actorOf, makeActor, makePerson } from '../../../support/factories';

let database: TestDatabase;
let administrator: Actor;
let count = 0;

const details = (role: Role = 'viewer') => {
  count += 1;
  return { name: `Newcomer ${count}`, email: `newcomer${count}@example.test`, role };
};

beforeAll(async () => {
  database = await openTestDatabase();
  administrator = await makeActor('administrator', 'Wilma Register');
});
afterAll(() => database.close());

describe('people are for administrators', () => {
  test.each<Role>(['pi', 'analyst', 'viewer'])('a %s finds none, and adds and changes none', async (role) => {
    const other = await makePerson('viewer');
    const self = await makePerson(role);
    const actor = await actorOf(self.id);
    const missing = { code: 'NOT_FOUND' };
    await expect(listPeople(actor)).rejects.toMatchObject(missing);
    await expect(person(actor, other.id)).rejects.toMatchObject(missing);
    await expect(person(actor, self.id)).rejects.toMatchObject(missing);
    await expect(addPerson(actor, details())).rejects.toMatchObject(missing);
    await expect(changePerson(actor, other.id, details())).rejects.toMatchObject(missing);
    await expect(makePasswordLink(actor, other.id)).rejects.toMatchObject(missing);
    await expect(setPersonActive(actor, other.id, false)).rejects.toMatchObject(missing);
    await expect(changePerson(actor, self.id, details('administrator'))).rejects.toMatchObject({
      code: 'NOT_ALLOWED',
    });
  });

  test('an access token of an administrator looks but adds nobody', async () => {
    const token = await actorFromToken(
      await makeToken(administrator, { name: 't', scope: 'write', days: 1 }),
    );
    expect(token).not.toBeNull();
    await expect(listPeople(token as Actor)).resolves.toBeTruthy(); // just seen not to be null
    await expect(addPerson(token as Actor, details())).rejects.toMatchObject({ code: 'NOT_ALLOWED' });
  });
});

describe('addPerson', () => {
  test('shows the person with an open link, which holds no secret', async () => {
    const { id, link } = await addPerson(administrator, details('pi'));
    const view = await person(administrator, id);
    expect(view).toMatchObject({
      role: 'pi',
      active: true,
      hasPassword: false,
      openLink: { purpose: 'invitation' },
    });
    expect(JSON.stringify(view)).not.toContain(link.split('/').at(-1));
    expect(await listPeople(administrator)).toContainEqual(view);
  });

  test('refuses an address that somebody has, at its field, and makes nobody', async () => {
    const first = details();
    await addPerson(administrator, first);
    const before = await db().Person.count();
    await expect(addPerson(administrator, { ...details(), email: first.email })).rejects.toMatchObject({
      code: 'CONFLICT',
      details: [{ pointer: 'email', detail: `${first.name} has this e-mail address already` }],
    });
    expect(await db().Person.count()).toBe(before);
  });

  test('stands in the record under the name of the administrator', async () => {
    const { id } = await addPerson(administrator, details());
    const [entry] = await db().RecordEntry.findAll({ where: { subjectId: id } });
    expect(entry).toMatchObject({ kind: 'person', verb: 'created', actorName: 'Wilma Register' });
  });
});

describe('changePerson', () => {
  test('a role acts at the next request', async () => {
    const { id } = await makePerson('viewer');
    const session = await openSession(id);
    await changePerson(administrator, id, details('analyst'));
    expect(await actorFromSession(session)).toMatchObject({ role: 'analyst' });
  });

  test('takes the own address again, but not that of another', async () => {
    const { id, name } = await makePerson('viewer');
    const own = (await person(administrator, id)).email;
    const other = details();
    await addPerson(administrator, other);
    await changePerson(administrator, id, { name, email: own, role: 'analyst' });
    await expect(
      changePerson(administrator, id, { name, email: other.email, role: 'analyst' }),
    ).rejects.toMatchObject({
      code: 'CONFLICT',
    });
  });
});

describe('closing an account', () => {
  test('ends its sessions and tokens at once; opening it again gives none of them back', async () => {
    const { id, name } = await makePerson('analyst');
    const [one, two] = [await openSession(id), await openSession(id)];
    const token = await makeToken(await actorOf(id), { name: 'script', scope: 'read', days: 9 });
    const all = async () => [
      await actorFromSession(one),
      await actorFromSession(two),
      await actorFromToken(token),
    ];
    expect(await all()).not.toContain(null);
    await setPersonActive(administrator, id, false, 'left the laboratory');
    expect(await all()).toEqual([null, null, null]);
    await setPersonActive(administrator, id, true);
    expect(await all()).toEqual([null, null, null]);
    const entries = await db().RecordEntry.findAll({
      where: { subjectId: id, verb: 'changed' },
      order: [['id', 'ASC']],
    });
    expect(entries.map(({ to, why }) => [to, why])).toEqual([
      [{ active: false }, 'left the laboratory'],
      [{ active: true }, null],
    ]);
    expect(entries[0]).toMatchObject({ subjectName: name, actorName: 'Wilma Register' });
  });

  test('a closed account gets no link', async () => {
    const { id } = await makePerson('viewer');
    await setPersonActive(administrator, id, false);
    await expect(makePasswordLink(administrator, id)).rejects.toMatchObject({ code: 'CONFLICT' });
  });
});

describe('the last active administrator', () => {
  let own: TestDatabase;
  beforeEach(async () => {
    await database.close();
    own = database = await openTestDatabase();
  });
  afterAll(() => own.close());

  test('is neither closed nor made anything else, also when there is a closed one beside', async () => {
    const last = await makePerson('administrator');
    const closed = await makePerson('administrator');
    const actor = await actorOf(last.id);
    await setPersonActive(actor, closed.id, false);
    const refusal = { code: 'CONFLICT', message: expect.stringContaining('only active administrator') };
    await expect(setPersonActive(actor, last.id, false)).rejects.toMatchObject(refusal);
    await expect(changePerson(actor, last.id, details('pi'))).rejects.toMatchObject(refusal);
    await expect(changePerson(actor, last.id, details('administrator'))).resolves.toBeUndefined();
  });

  test('is left when two go at the same moment', async () => {
    const [one, two] = [await makePerson('administrator'), await makePerson('administrator')];
    const [first, second] = [await actorOf(one.id), await actorOf(two.id)];
    const both = await Promise.allSettled([
      setPersonActive(first, one.id, false),
      changePerson(second, two.id, details('pi')),
    ]);
    expect(both.map(({ status }) => status)).toEqual(['fulfilled', 'rejected']);
  });
});
