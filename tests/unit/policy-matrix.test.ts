import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { z } from 'zod';
import { action } from '@/app/_server/action';
import { route } from '@/app/_server/route';
import { createFor } from '@/db/access';
import { actorFromToken, systemActor, withShareVisits } from '@/db/actors';
import { KINDS } from '@/db/kinds';
import { makeToken } from '@/db/queries/tokens';
import { inTransaction } from '@/db/sequelize';
import { ROLES, type Actor } from '@/lib/policies/actor';
import { RULES, type Kind, type NotebookFacts, type PersonFacts } from '@/lib/policies/rules';
import { openTestDatabase, type TestDatabase } from '../support/db';
import { actorOf, makeMember, makeNotebook, makePerson } from '../support/factories';

// a request that shows neither session, token nor link
vi.mock('@/app/_server/current-actor', () => ({
  currentActor: async () => null,
  apiActor: async () => null,
}));

/*
 * Who may do what, as a table that a person can read: policy-matrix.snapshot.txt. The actors are made the way
 * requests make them (session, token, link), so a right that widens by any of these shows as a changed line.
 */

type Facts = NotebookFacts & PersonFacts;
type Asker = readonly [name: string, actor: Actor];
type Relation = readonly [word: string, facts: (actor: Actor) => Facts];

let database: TestDatabase;
let askers: Asker[] = [];
let notebookRelations: Relation[] = [];
const personRelations: Relation[] = [
  ['self', (actor) => facts(actor.personId ?? '')],
  ['other', () => facts('somebody else')],
];

const facts = (id: string, ownerId = 'somebody else', archived = false): Facts => ({ id, ownerId, archived });

async function shareVisit(notebookId: string, createdById: string): Promise<string> {
  const expiresAt = new Date(Date.now() + 60_000);
  const link = { notebookId, label: 'l', tokenHash: 'not used here', expiresAt, createdById };
  const visit = await inTransaction(async () => {
    const { id } = await createFor(systemActor(), 'shareLink', link);
    return createFor(systemActor(), 'shareSession', { shareLinkId: id, expiresAt });
  });
  return visit.id;
}

function made(actor: Actor | null): Actor {
  if (!actor) throw new Error('an actor was expected');
  return actor;
}

beforeAll(async () => {
  database = await openTestDatabase();
  const owner = await makePerson('pi');
  const contributed = await makeNotebook(owner.id);
  const readOnly = await makeNotebook(owner.id);
  const linked = await makeNotebook(owner.id);
  const visit = await shareVisit(linked, owner.id);
  notebookRelations = [
    ['owner', (actor) => facts('own', actor.personId ?? '')],
    ['archived', (actor) => facts('archived', actor.personId ?? '', true)],
    ['contributor', () => facts(contributed)],
    ['reader', () => facts(readOnly)],
    ['link', () => facts(linked)],
    ['stranger', () => facts('another')],
  ];
  for (const role of ROLES) {
    const { id } = await makePerson(role);
    await makeMember(contributed, id, 'contributor');
    await makeMember(readOnly, id, 'reader');
    const session = made(await withShareVisits(await actorOf(id), [visit]));
    askers.push([role, session]);
    for (const scope of ['write', 'read'] as const)
      askers.push([
        `${role}, ${scope} token`,
        made(await actorFromToken(await makeToken(session, { name: scope, scope, days: 1 }))),
      ]);
  }
  askers = [
    ...askers,
    ['link visitor', made(await withShareVisits(null, [visit]))],
    ['system', systemActor()],
  ];
});
afterAll(() => database.close());

function relationsOf(kind: Kind): Relation[] {
  const { belongsTo } = KINDS[kind];
  if (belongsTo === 'nobody') return [['always', () => facts('')]];
  return belongsTo === 'notebook' || kind === 'notebook' ? notebookRelations : personRelations;
}

function cell(kind: Kind, verb: string, actor: Actor): string {
  const rule = (RULES[kind] as unknown as Record<string, (a: Actor, f: Facts) => boolean>)[verb]; // each rule takes these two
  const relations = relationsOf(kind);
  const allowed = relations.filter(([, of]) => rule?.(actor, of(actor)) === true).map(([word]) => word);
  if (allowed.length === 0) return '-';
  return allowed.length === relations.length ? 'always' : allowed.join(' ');
}

function table(kind: Kind): string {
  const verbs = Object.keys(RULES[kind]);
  const rows = [
    ['', ...verbs],
    ...askers.map(([name, actor]) => [name, ...verbs.map((verb) => cell(kind, verb, actor))]),
    ['nobody', ...verbs.map(() => '-')],
  ];
  const widths = ['', ...verbs].map((_, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)));
  const line = (row: string[]) => row.map((text, column) => text.padEnd((widths[column] ?? 0) + 2)).join('');
  return rows.map((row) => line(row).trimEnd()).join('\n');
}

/** Kinds with the same rights stand above one table. */
function tables(): string[] {
  const kindsOf = new Map<string, Kind[]>();
  for (const kind of Object.keys(RULES) as Kind[])
    kindsOf.set(table(kind), [...(kindsOf.get(table(kind)) ?? []), kind]);
  return [...kindsOf].map(([text, kinds]) => `## ${kinds.join(', ')}\n\n${text}`);
}

const HEAD = `Who may do what. A row for each asker, a column for each verb; in the cell, towards which notebooks or
people it is allowed. Notebooks: one's own (owner), one's own in the archive (archived), as contributor, as
reader, by a link, any other (stranger). People: oneself (self), another (other). "nobody" stands for whoever
shows neither session, token nor link: the doors refuse them before a rule is asked.`;

test('role x kind x verb', async () => {
  await expect([HEAD, ...tables()].join('\n\n') + '\n').toMatchFileSnapshot('./policy-matrix.snapshot.txt');
});

test('a reader with a link and a read token change nothing at all', () => {
  const changing = (kind: Kind) =>
    Object.keys(RULES[kind]).filter((verb) => !['read', 'see', 'list'].includes(verb));
  const quiet = askers.filter(([name]) => name === 'link visitor' || name.endsWith('read token'));
  expect(quiet).toHaveLength(ROLES.length + 1);
  for (const [name, actor] of quiet)
    for (const kind of Object.keys(RULES) as Kind[])
      for (const verb of changing(kind))
        expect([name, kind, verb, cell(kind, verb, actor)]).toEqual([name, kind, verb, '-']);
});

test('nobody is refused at both doors, before anything is read or done', async () => {
  const work = vi.fn();
  const context = { params: Promise.resolve({}) };
  const answer = await route({}, work)(new Request('http://halflight.test/api/v1/me'), context);
  expect(answer.status).toBe(401);
  expect(await answer.json()).toMatchObject({ code: 'NOT_SIGNED_IN', status: 401 });
  const send = action(z.object({}), work)({ status: 'idle' }, new FormData());
  await expect(send).rejects.toMatchObject({ digest: expect.stringContaining('/sign-in') });
  expect(work).not.toHaveBeenCalled();
});
