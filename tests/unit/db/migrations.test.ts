import { afterAll, beforeAll, expect, test } from 'vitest';
import { migrator } from '@/db/migrate';
import { modelOf } from '@/db/kinds';
import { db } from '@/db/sequelize';
import { RULES, type Kind } from '@/lib/policies/rules';
import { openTestDatabase, type TestDatabase } from '../../support/db';

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const schema = async () => {
  const [rows] = await db().sequelize.query(
    "SELECT type, name, sql FROM sqlite_master WHERE name NOT LIKE 'sqlite_%' ORDER BY type, name",
  );
  return rows;
};

test('go up, down and up again to the same schema', async () => {
  const before = await schema();
  const run = await migrator();
  await run.down({ to: 0 });
  expect(await schema()).toHaveLength(1);
  await run.up();
  expect(await schema()).toEqual(before);
});

test.each(Object.keys(RULES) as Kind[])('the table of %s has the columns of its model', async (kind) => {
  const model = modelOf(db(), kind);
  const table = await db()
    .sequelize.getQueryInterface()
    .describeTable(model.getTableName() as string);
  const columns = Object.values(model.getAttributes()).map((attribute) => attribute.field ?? '');
  expect(Object.keys(table).sort()).toEqual(columns.sort());
});
