import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { withShareVisits } from '@/db/actors';
import { openShareLink, shareOf } from '@/db/entry/share-visits';
import { listMembers } from '@/db/queries/members';
import { changeNotebook, listNotebooks, readNotebook } from '@/db/queries/notebooks';
import { listRecord } from '@/db/queries/record';
import { listShareLinks, makeShareLink, revokeShareLink } from '@/db/queries/share-links';
import { db } from '@/db/sequelize';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { actorOf, makeMember, makeNotebook, makePerson } from '../../support/factories';

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const code = (expected: string) => expect.objectContaining({ code: expected });
const secretOf = (address: string) => address.split('/').at(-1) ?? '';

async function shared() {
  const pi = await makePerson('pi', 'Petra Isles');
  const owner = await actorOf(pi.id);
  const notebookId = await makeNotebook(pi.id, 'Shared one');
  const { id, address } = await makeShareLink(owner, { notebookId, label: 'the client', days: 3 });
  return { owner, notebookId, linkId: id, secret: secretOf(address) };
}

async function visitor(secret: string) {
  const { visitId } = await openShareLink(secret);
  return { visitId, actor: (await withShareVisits(null, [visitId]))! };
}

describe('a share link', () => {
  test('shows its notebook and no other, and changes nothing', async () => {
    const { notebookId, secret } = await shared();
    const other = await shared();
    const { actor } = await visitor(secret);
    expect(await readNotebook(actor, notebookId)).toMatchObject({
      title: 'Shared one',
      mayEdit: false,
      mayManage: false,
    });
    expect((await listNotebooks(actor)).map(({ id }) => id)).toEqual([notebookId]);
    await expect(readNotebook(actor, other.notebookId)).rejects.toEqual(code('NOT_FOUND'));
    await expect(
      changeNotebook(actor, { id: notebookId, title: 'x', purpose: '', version: 1 }),
    ).rejects.toEqual(code('NOT_ALLOWED'));
    await expect(listMembers(actor, notebookId)).rejects.toEqual(code('NOT_FOUND'));
    await expect(listShareLinks(actor, notebookId)).rejects.toEqual(code('NOT_FOUND'));
  });

  test('is stored only as a hash, and its opening is counted and recorded', async () => {
    const { owner, notebookId, secret } = await shared();
    await visitor(secret);
    const rows = JSON.stringify(await db().ShareLink.findAll({ raw: true }));
    expect(rows).not.toContain(secret);
    expect((await listShareLinks(owner, notebookId))[0]).toMatchObject({ openedCount: 1, state: 'open' });
    const { items } = await listRecord(owner, notebookId, { limit: 5 });
    expect(items[0]).toMatchObject({ kind: 'share link', verb: 'opened', subject: 'the client' });
    expect(JSON.stringify(items)).not.toContain(secret);
  });

  test('withdrawn, it ends every visit at once and opens nothing again', async () => {
    const { owner, linkId, secret, notebookId } = await shared();
    const { visitId } = await visitor(secret);
    expect(await shareOf(notebookId, [visitId])).toMatchObject({ sharedBy: 'Petra Isles' });
    await revokeShareLink(owner, linkId);
    expect(await withShareVisits(null, [visitId])).toBeNull();
    expect(await shareOf(notebookId, [visitId])).toBeNull();
    await expect(openShareLink(secret)).rejects.toEqual(code('LINK_SPENT'));
  });

  test('that was never made answers as one that has run out', async () => {
    await expect(openShareLink('nothing-like-it')).rejects.toEqual(code('LINK_SPENT'));
  });

  test('a contributor and a reader make none', async () => {
    const { notebookId } = await shared();
    const analyst = await makePerson('analyst');
    await makeMember(notebookId, analyst.id, 'contributor');
    const input = { notebookId, label: 'x', days: 1 };
    await expect(makeShareLink(await actorOf(analyst.id), input)).rejects.toEqual(code('NOT_ALLOWED'));
    const stranger = await actorOf((await makePerson('pi')).id);
    await expect(makeShareLink(stranger, input)).rejects.toEqual(code('NOT_FOUND'));
  });
});
