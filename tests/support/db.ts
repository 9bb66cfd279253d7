import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { migrate } from '@/db/migrate';
import { closeDb } from '@/db/sequelize';

export interface TestDatabase {
  readonly folder: string;
  close(): Promise<void>;
}

/** A real SQLite file in a folder of its own, migrated; close it in afterAll. */
export async function openTestDatabase(): Promise<TestDatabase> {
  await closeDb();
  const folder = mkdtempSync(path.join(tmpdir(), 'halflight-test-'));
  process.env.DATA_DIR = folder;
  process.env.SESSION_SECRET ??= 'a secret of the tests, long enough to be taken';
  await migrate();
  return {
    folder,
    async close() {
      await closeDb();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
