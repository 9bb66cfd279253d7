import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { migrator } from '@/db/migrate';
import { addTypedSamples } from '@/db/queries/determinations';
import { createBatch } from '@/db/queries/batches';
import { db } from '@/db/sequelize';
import { addTypedSamples as typedSchema } from '@/lib/schemas/determination';
import { makeAbsorptivity } from '../../support/example-absorptivity';
import { makeCurve } from '../../support/example-curve';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { actorOf, makeNotebook, makePerson } from '../../support/factories';

const NAME = '20261201-1100-add-known-absorptivities.mjs';

let database: TestDatabase;
let on: { notebookId: string; curveId: string; absorptivityId: string };

async function newBatch(what: { curveId?: string; absorptivityId?: string }): Promise<string> {
  const { id } = await createBatch(await owner(), {
    ...{ notebookId: on.notebookId, submissionKey: randomUUID(), title: 'July weirs', note: '' },
    ...what,
  });
  return id;
}
let ownerId: string;
const owner = () => actorOf(ownerId);

beforeAll(async () => {
  database = await openTestDatabase();
  ownerId = (await makePerson('pi')).id;
  const notebookId = await makeNotebook(ownerId);
  const curveId = await makeCurve(await owner(), notebookId);
  on = { notebookId, curveId, absorptivityId: '' };
  const batchId = await newBatch({ curveId });
  const samples = [
    { sample: 'Weir 3', readings: ['0.4021', 'OVER'], dilution: '10 in 100', pathLengthMm: '10' },
  ];
  const sent = { batchId, submissionKey: randomUUID(), samples: JSON.stringify(samples) };
  await addTypedSamples(await owner(), typedSchema.parse(sent));
});
afterAll(() => database.close());

const rows = async (sql: string) => (await db().sequelize.query(sql))[0] as Record<string, unknown>[];
const kept = async () =>
  Promise.all(
    ['batches', 'determinations', 'readings', 'curves'].map((table) => rows(`SELECT * FROM ${table}`)),
  );
const columnNotNull = async () => {
  const columns = await rows('PRAGMA table_info(batches)');
  return columns.find(({ name }) => name === 'curve_id')?.notnull;
};
const isSound = async () => {
  expect(await rows('PRAGMA foreign_key_check')).toEqual([]);
  expect(await rows('PRAGMA integrity_check')).toEqual([{ integrity_check: 'ok' }]);
};

test('batches, determinations and readings from before survive it, on the way up and down', async () => {
  const before = await kept();
  expect(before.map((found) => found.length)).toEqual([1, 1, 12, 1]);
  const run = await migrator();
  await run.down({ to: NAME });
  expect(await columnNotNull()).toBe(1);
  await isSound();
  await run.up();
  expect(await columnNotNull()).toBe(0);
  await isSound();
  expect(await kept()).toEqual(before);
});

test('a batch is on a curve or on an absorptivity, never on both and never on neither', async () => {
  on = { ...on, absorptivityId: await makeAbsorptivity(await owner(), on.notebookId) };
  await newBatch({ absorptivityId: on.absorptivityId });
  await expect(newBatch({})).rejects.toMatchObject({ parent: { code: 'SQLITE_CONSTRAINT' } });
  await expect(newBatch(on)).rejects.toMatchObject({ parent: { code: 'SQLITE_CONSTRAINT' } });
  const unknown = rows("UPDATE batches SET absorptivity_id = 'none', curve_id = NULL");
  await expect(unknown).rejects.toMatchObject({ name: 'SequelizeForeignKeyConstraintError' });
  await isSound();
});

test('there is no way down while a batch is on an absorptivity', async () => {
  const run = await migrator();
  await expect(run.down({ to: NAME })).rejects.toThrow(/1 batches are read on a known absorptivity/);
  expect(await columnNotNull()).toBe(0);
});
