import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { changeFor, createFor, listFor, listNotebooksFor, loadFor } from '@/db/access';
import { actorForPerson, actorFromSession, openSession, systemActor } from '@/db/actors';
import { db, inTransaction } from '@/db/sequelize';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { actorOf, makeActor, makeMember, makeNotebook, makePerson } from '../../support/factories';

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const code = (expected: string) => expect.objectContaining({ code: expected });

describe('loadFor', () => {
  test('what a person may not read does not exist for them', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id);
    const stranger = await makeActor('pi');
    await expect(loadFor(stranger, 'notebook', 'read', id)).rejects.toEqual(code('NOT_FOUND'));
    await expect(loadFor(stranger, 'notebook', 'edit', id)).rejects.toEqual(code('NOT_FOUND'));
    await expect(listFor(stranger, 'curve', id)).rejects.toEqual(code('NOT_FOUND'));
  });

  test('a reader reads and may not edit; a contributor edits and does not manage', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id);
    const [reader, contributor] = [await makePerson('analyst'), await makePerson('analyst')];
    await makeMember(id, reader.id, 'reader');
    await makeMember(id, contributor.id, 'contributor');
    await expect(loadFor(await actorOf(reader.id), 'notebook', 'read', id)).resolves.toBeTruthy();
    await expect(loadFor(await actorOf(reader.id), 'notebook', 'edit', id)).rejects.toEqual(
      code('NOT_ALLOWED'),
    );
    await expect(loadFor(await actorOf(contributor.id), 'notebook', 'edit', id)).resolves.toBeTruthy();
    await expect(loadFor(await actorOf(contributor.id), 'notebook', 'manage', id)).rejects.toEqual(
      code('NOT_ALLOWED'),
    );
  });

  test('an administrator sees that a notebook is there, and no contents', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id);
    const administrator = await makeActor('administrator');
    await expect(loadFor(administrator, 'notebook', 'see', id)).resolves.toBeTruthy();
    await expect(loadFor(administrator, 'notebook', 'read', id)).rejects.toEqual(code('NOT_FOUND'));
    expect(await listNotebooksFor(administrator)).toEqual([]);
  });

  test('an archived notebook takes no change', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id);
    const owner = await actorOf(pi.id);
    await inTransaction(async () =>
      changeFor(owner, await loadFor(owner, 'notebook', 'manage', id), { archivedAt: new Date() }),
    );
    await expect(loadFor(owner, 'notebook', 'edit', id)).rejects.toEqual(code('NOT_ALLOWED'));
  });
});

describe('the record', () => {
  test('holds who, from, to and why, written with the change', async () => {
    const pi = await makePerson('pi', 'Ada Marlow');
    const id = await makeNotebook(pi.id, 'Before');
    const owner = await actorOf(pi.id);
    await inTransaction(async () =>
      changeFor(owner, await loadFor(owner, 'notebook', 'edit', id), { title: 'After' }, 'a better title'),
    );
    const [entry] = await db().RecordEntry.findAll({ where: { subjectId: id, verb: 'changed' } });
    expect(entry).toMatchObject({
      actorName: 'Ada Marlow',
      notebookId: id,
      kind: 'notebook',
      from: { title: 'Before' },
      to: { title: 'After' },
      why: 'a better title',
    });
  });

  test('a change that fails leaves neither the change nor an entry', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id, 'Kept');
    const owner = await actorOf(pi.id);
    const before = await db().RecordEntry.count();
    const failing = inTransaction(async () => {
      await changeFor(owner, await loadFor(owner, 'notebook', 'edit', id), { title: 'Lost' });
      throw new Error('later failure');
    });
    await expect(failing).rejects.toThrow('later failure');
    expect((await loadFor(owner, 'notebook', 'read', id)).title).toBe('Kept');
    expect(await db().RecordEntry.count()).toBe(before);
  });

  test('a row opened to read, opened by nobody, or saved without an actor is refused', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id);
    const owner = await actorOf(pi.id);
    const read = await loadFor(owner, 'notebook', 'read', id);
    await expect(inTransaction(() => changeFor(owner, read, { title: 'x' }))).rejects.toThrow(
      'opened to read',
    );
    const opened = await db().Notebook.findByPk(id);
    await expect(inTransaction(() => opened!.update({ title: 'x' }))).rejects.toThrow('without an actor');
    await expect(inTransaction(() => changeFor(owner, opened!, { title: 'x' }))).rejects.toThrow('by nobody');
  });

  test('bulk writes and deletes are refused', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id);
    const { Notebook } = db();
    await expect(Notebook.destroy({ where: { id } })).rejects.toThrow('refused');
    await expect(Notebook.update({ title: 'x' }, { where: { id } })).rejects.toThrow('refused');
    await expect(
      Notebook.bulkCreate([{ title: 'x', purpose: '', ownerId: pi.id, createdById: pi.id }]),
    ).rejects.toThrow('refused');
    await expect((await Notebook.findByPk(id))!.destroy()).rejects.toThrow('refused');
  });

  test('the database itself refuses to change or remove an entry', async () => {
    await makePerson('pi');
    const { sequelize } = db();
    const refused = { parent: { message: expect.stringContaining('append-only') as string } };
    await expect(sequelize.query('UPDATE record_entries SET verb = 1')).rejects.toMatchObject(refused);
    await expect(sequelize.query('DELETE FROM record_entries')).rejects.toMatchObject(refused);
  });

  test('nothing is written outside a transaction', async () => {
    await expect(
      createFor(systemActor(), 'person', {
        name: 'x',
        email: 'x@example.test',
        role: 'pi',
        passwordHash: null,
      }),
    ).rejects.toThrow('transaction');
  });
});

describe('sessions', () => {
  test('a deactivated person is nobody at the next request', async () => {
    const person = await makePerson('analyst');
    const session = await openSession(person.id);
    expect(await actorFromSession(session)).not.toBeNull();
    const system = systemActor();
    await inTransaction(async () =>
      changeFor(system, await loadFor(system, 'person', 'edit', person.id), { active: false }),
    );
    expect(await actorFromSession(session)).toBeNull();
    await expect(actorForPerson(person.id)).rejects.toThrow('active');
  });
});

describe('the write queue', () => {
  test('takes many read-then-write transactions at once and loses none', async () => {
    const pi = await makePerson('pi');
    const id = await makeNotebook(pi.id);
    const owner = await actorOf(pi.id);
    const bump = () =>
      inTransaction(async () => {
        const row = await loadFor(owner, 'notebook', 'edit', id);
        await changeFor(owner, row, { version: row.version + 1 });
      });
    await Promise.all(Array.from({ length: 40 }, bump));
    expect((await loadFor(owner, 'notebook', 'read', id)).version).toBe(41);
  });
});
