import { AsyncLocalStorage } from 'node:async_hooks';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { Sequelize, Transaction } from 'sequelize';
import sqlite3 from 'sqlite3';
import type { Kind } from '@/lib/policies/rules';
import { KINDS, modelOf } from './kinds';
import { defineModels, type Models } from './models';
import { audited } from './record';

interface OpenDatabase extends Models {
  readonly sequelize: Sequelize;
  readonly context: AsyncLocalStorage<Map<string, unknown>>;
  lastWrite: Promise<unknown>;
}

/**
 * Next evaluates this module several times in one process, so connection, models and queue live on
 * globalThis: one of each, however often it is imported.
 */
const shared = globalThis as typeof globalThis & { __halflightDb?: OpenDatabase };

/** Pragmas on every connection: the driver opens a new one for each transaction and no hook fires for it. */
class PragmaDatabase extends sqlite3.Database {
  constructor(file: string, mode: number, done: (error: Error | null) => void) {
    super(file, mode, (error) => {
      if (error) return done(error);
      this.configure('busyTimeout', 5000);
      this.exec('PRAGMA journal_mode=WAL; PRAGMA synchronous=FULL; PRAGMA foreign_keys=ON;', done);
    });
  }
}

export function dataDir(): string {
  return path.resolve(process.env.DATA_DIR ?? 'data');
}

function open(): OpenDatabase {
  mkdirSync(dataDir(), { recursive: true, mode: 0o700 });
  const context = new AsyncLocalStorage<Map<string, unknown>>();
  // Sequelize finds the running transaction by itself through this, so no query can forget it.
  const cls = {
    bind: <F>(work: F) => work,
    run: <T>(work: (store: unknown) => T) => context.run(new Map(), () => work(context.getStore())),
    get: (key: string) => context.getStore()?.get(key),
    set: (key: string, value: unknown) => context.getStore()?.set(key, value),
  };
  Sequelize.useCLS(cls);
  const sequelize = new Sequelize({
    dialect: 'sqlite',
    storage: path.join(dataDir(), 'halflight.sqlite'),
    logging: false,
    transactionType: Transaction.TYPES.IMMEDIATE,
    dialectModule: { ...sqlite3, Database: PragmaDatabase },
  });
  const models = defineModels(sequelize);
  for (const [kind, { audit }] of Object.entries(KINDS))
    if (audit) audited(modelOf(models, kind as Kind), audit);
  return { sequelize, context, lastWrite: Promise.resolve(), ...models };
}

export function db(): OpenDatabase {
  shared.__halflightDb ??= open();
  return shared.__halflightDb;
}

/** Close the database, so that scripts can end and tests can open another. */
export async function closeDb(): Promise<void> {
  const open = shared.__halflightDb;
  shared.__halflightDb = undefined;
  await open?.lastWrite;
  await open?.sequelize.close();
}

/**
 * Run `work` in the one write queue, in one transaction; inside another call it joins that one.
 * SQLite has a single writer: transactions started side by side end in SQLITE_BUSY, queued ones do not.
 * Never leave work un-awaited inside: the transaction would end without it.
 */
export function inTransaction<T>(work: () => Promise<T>): Promise<T> {
  const { sequelize, context } = db();
  if (context.getStore()?.get('transaction')) return work();
  const open = db();
  const turn = open.lastWrite.then(() => sequelize.transaction(work));
  open.lastWrite = turn.catch(() => undefined);
  return turn;
}

export function insideTransaction(): boolean {
  return db().context.getStore()?.get('transaction') !== undefined;
}
