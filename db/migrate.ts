import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { SequelizeStorage, Umzug, type MigrationParams } from 'umzug';
import type { QueryInterface } from 'sequelize';
import { db } from './sequelize';

interface MigrationModule {
  up(params: MigrationParams<QueryInterface>): Promise<void>;
  down(params: MigrationParams<QueryInterface>): Promise<void>;
}

const folder = path.join(process.cwd(), 'db', 'migrations');

/** The migrations of this database, oldest first. They are plain ESM, so node reads them with no compiler. */
export async function migrator(): Promise<Umzug<QueryInterface>> {
  const { sequelize } = db();
  const names = (await readdir(folder)).filter((name) => name.endsWith('.mjs')).sort();
  const migrations = await Promise.all(
    names.map(async (name) => {
      const loaded = (await import(pathToFileURL(path.join(folder, name)).href)) as MigrationModule;
      return { name, up: loaded.up, down: loaded.down };
    }),
  );
  return new Umzug({
    migrations,
    context: sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize }),
    logger: undefined,
  });
}

/** Bring the database up to date; answers with the names of the migrations that ran. */
export async function migrate(): Promise<string[]> {
  const done = await (await migrator()).up();
  return done.map((migration) => migration.name);
}
