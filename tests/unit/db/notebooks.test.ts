import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { addMember, endMembership, listMembers } from '@/db/queries/members';
import {
  archiveNotebook,
  changeNotebook,
  createNotebook,
  listNotebooks,
  pageOfNotebooks,
  readNotebook,
} from '@/db/queries/notebooks';
import { listRecord } from '@/db/queries/record';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { actorOf, makeActor, makeNotebook, makePerson } from '../../support/factories';

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const code = (expected: string) => expect.objectContaining({ code: expected });

describe('making a notebook', () => {
  test('an analyst names a PI as owner and becomes a contributor', async () => {
    const pi = await makePerson('pi', 'Paula Inch');
    const analyst = await makePerson('analyst', 'Ann Lyst');
    const { id } = await createNotebook(await actorOf(analyst.id), {
      title: 'Iron',
      purpose: '',
      ownerId: pi.id,
    });
    const view = await readNotebook(await actorOf(analyst.id), id);
    expect(view).toMatchObject({ owner: 'Paula Inch', mayEdit: true, mayManage: false });
    const members = await listMembers(await actorOf(pi.id), id);
    expect(members.map(({ name, role }) => [name, role])).toEqual([['Ann Lyst', 'contributor']]);
  });

  test('a viewer and an administrator make none, and only a PI can own one', async () => {
    const pi = await makePerson('pi');
    const analyst = await makePerson('analyst');
    const input = { title: 'x', purpose: '', ownerId: pi.id };
    await expect(createNotebook(await makeActor('viewer'), input)).rejects.toEqual(code('NOT_ALLOWED'));
    await expect(createNotebook(await makeActor('administrator'), input)).rejects.toEqual(
      code('NOT_ALLOWED'),
    );
    const own = { ...input, ownerId: analyst.id };
    await expect(createNotebook(await actorOf(analyst.id), own)).rejects.toEqual(code('INVALID_INPUT'));
  });
});

describe('lists', () => {
  test('show what one may read, filtered by words, without the archive', async () => {
    const pi = await makePerson('pi');
    const owner = await actorOf(pi.id);
    await makeNotebook(pi.id, 'Iron in weirs');
    const archived = await makeNotebook(pi.id, 'Old iron');
    await makeNotebook((await makePerson('pi')).id, 'Somebody else’s iron');
    await archiveNotebook(owner, { id: archived, archive: 'yes', reason: 'done' });
    expect((await listNotebooks(owner, { search: 'iron' })).map(({ title }) => title)).toEqual([
      'Iron in weirs',
    ]);
    expect((await listNotebooks(owner, { archived: true })).map(({ title }) => title)).toEqual(['Old iron']);
    expect(await listNotebooks(owner, { search: '%' })).toHaveLength(1);
  });

  test('come in pages that meet without a gap', async () => {
    const pi = await makePerson('pi');
    const owner = await actorOf(pi.id);
    for (let k = 0; k < 5; k += 1) await makeNotebook(pi.id, `N${k}`);
    const titles: string[] = [];
    let cursor: string | undefined;
    do {
      const page = await pageOfNotebooks(owner, { cursor, limit: 2 });
      titles.push(...page.items.map(({ title }) => title));
      cursor = page.nextCursor ?? undefined;
    } while (cursor);
    expect([...titles].sort()).toEqual(['N0', 'N1', 'N2', 'N3', 'N4']);
    await expect(pageOfNotebooks(owner, { cursor: 'nonsense', limit: 2 })).rejects.toEqual(
      code('INVALID_INPUT'),
    );
  });
});

describe('changing a notebook', () => {
  test('the second of two writers is told and changes nothing', async () => {
    const pi = await makePerson('pi');
    const owner = await actorOf(pi.id);
    const id = await makeNotebook(pi.id, 'First');
    await changeNotebook(owner, { id, title: 'Second', purpose: '', version: 1 });
    const late = changeNotebook(owner, { id, title: 'Third', purpose: '', version: 1 });
    await expect(late).rejects.toEqual(code('CHANGED_MEANWHILE'));
    expect((await readNotebook(owner, id)).title).toBe('Second');
  });

  test('archiving stands in the record with its reason', async () => {
    const pi = await makePerson('pi');
    const owner = await actorOf(pi.id);
    const id = await makeNotebook(pi.id);
    await archiveNotebook(owner, { id, archive: 'yes', reason: 'the season is over' });
    const { items } = await listRecord(owner, id, { limit: 10 });
    expect(items[0]).toMatchObject({ verb: 'changed', why: 'the season is over' });
    expect(items.at(-1)).toMatchObject({ kind: 'notebook', verb: 'created' });
  });
});

describe('members', () => {
  test('only the owner adds and removes; it acts at the next request', async () => {
    const pi = await makePerson('pi');
    const owner = await actorOf(pi.id);
    const id = await makeNotebook(pi.id);
    const analyst = await makePerson('analyst');
    await addMember(owner, { notebookId: id, personId: analyst.id, role: 'contributor' });
    const contributor = await actorOf(analyst.id);
    const other = await makePerson('viewer');
    await expect(
      addMember(contributor, { notebookId: id, personId: other.id, role: 'reader' }),
    ).rejects.toEqual(code('NOT_ALLOWED'));
    const [membership] = await listMembers(owner, id);
    await endMembership(owner, membership?.id ?? '');
    await expect(readNotebook(await actorOf(analyst.id), id)).rejects.toEqual(code('NOT_FOUND'));
  });

  test('a viewer can only be a reader, and nobody is added twice', async () => {
    const pi = await makePerson('pi');
    const owner = await actorOf(pi.id);
    const id = await makeNotebook(pi.id);
    const viewer = await makePerson('viewer');
    const input = { notebookId: id, personId: viewer.id };
    await expect(addMember(owner, { ...input, role: 'contributor' })).rejects.toEqual(code('INVALID_INPUT'));
    await addMember(owner, { ...input, role: 'reader' });
    await expect(addMember(owner, { ...input, role: 'reader' })).rejects.toEqual(code('CONFLICT'));
  });
});
