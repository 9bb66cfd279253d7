import type {
  Attributes,
  CreationAttributes,
  FindOptions,
  Model,
  ModelStatic,
  WhereOptions,
} from 'sequelize';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import { RULES, type Kind, type NotebookFacts, type PersonFacts, type Verb } from '@/lib/policies/rules';
import { KINDS, modelOf, notebookFacts, personFacts, readableNotebooks, type Rows } from './kinds';
import { rememberOpened } from './record';
import { db } from './sequelize';

/** The facts that a rule is asked with; which of the two a kind needs stands in KINDS. */
type Facts = NotebookFacts & PersonFacts;
type Rule = (actor: Actor, facts: Facts) => boolean;

const ruleOf = (kind: Kind, verb: string): Rule | undefined =>
  (RULES[kind] as unknown as Record<string, Rule | undefined>)[verb];

async function factsOf(kind: Kind, row: Model): Promise<Facts | null> {
  const { belongsTo } = KINDS[kind];
  if (kind === 'notebook') return notebookFacts(row as Rows['notebook']) as Facts;
  if (belongsTo === 'self' || belongsTo === 'person') return personFacts(row) as Facts;
  if (belongsTo === 'nobody') return { id: '' } as Facts;
  const id = row.get('notebookId') as string | null;
  const notebook = id === null ? null : await db().Notebook.findByPk(id);
  return notebook ? (notebookFacts(notebook) as Facts) : null;
}

/**
 * One row, opened for one purpose. What the actor may not read does not exist for them.
 *
 * @throws AppError NOT_FOUND, NOT_ALLOWED
 */
export async function loadFor<K extends Kind>(
  actor: Actor,
  kind: K,
  verb: Verb<K>,
  id: string,
): Promise<Rows[K]> {
  const row = await modelOf(db(), kind).findByPk(id);
  const facts = row && (await factsOf(kind, row));
  // Administrators may see that a notebook is there without reading it, so `see` stands in for `read`.
  const exists = ruleOf(kind, verb === 'see' ? 'see' : 'read');
  if (!row || !facts || !exists?.(actor, facts)) throw new AppError('NOT_FOUND');
  if (!ruleOf(kind, verb)?.(actor, facts)) throw new AppError('NOT_ALLOWED');
  rememberOpened(row, verb);
  return row as Rows[K];
}

/** Whether an actor may do something, for pages that show or hide a way to it. Never the guard itself. */
export async function may<K extends Kind>(
  actor: Actor,
  kind: K,
  verb: Verb<K>,
  row: Rows[K],
): Promise<boolean> {
  const facts = await factsOf(kind, row as Model);
  return facts !== null && ruleOf(kind, verb)?.(actor, facts) === true;
}

type ContentKind = { [K in Kind]: Rows[K] extends { notebookId: string | null } ? K : never }[Kind];

/** Rows of one notebook that the actor may read. @throws AppError NOT_FOUND */
export async function listFor<K extends ContentKind>(
  actor: Actor,
  kind: K,
  notebookId: string,
  options: Omit<FindOptions<Attributes<Rows[K]>>, 'where'> & {
    where?: WhereOptions<Attributes<Rows[K]>>;
  } = {},
): Promise<Rows[K][]> {
  const notebook = await db().Notebook.findByPk(notebookId);
  if (!notebook || !ruleOf(kind, 'read')?.(actor, notebookFacts(notebook) as Facts))
    throw new AppError('NOT_FOUND');
  const where = { ...options.where, notebookId } as WhereOptions;
  const rows = await modelOf(db(), kind).findAll({ ...(options as FindOptions), where });
  rows.forEach((row) => rememberOpened(row, 'read'));
  return rows as Rows[K][];
}

/** How many rows of one notebook match. @throws AppError NOT_FOUND */
export async function countFor<K extends ContentKind>(
  actor: Actor,
  kind: K,
  notebookId: string,
  where: WhereOptions<Attributes<Rows[K]>> = {},
): Promise<number> {
  const notebook = await db().Notebook.findByPk(notebookId);
  if (!notebook || !ruleOf(kind, 'read')?.(actor, notebookFacts(notebook) as Facts))
    throw new AppError('NOT_FOUND');
  return modelOf(db(), kind).count({ where: { ...where, notebookId } as WhereOptions });
}

/** Rows of whichever notebooks the actor may read; the others are left out as if they did not exist. */
export async function listAcrossFor<K extends ContentKind>(
  actor: Actor,
  kind: K,
  options: FindOptions<Attributes<Rows[K]>> & { where: WhereOptions<Attributes<Rows[K]>> },
): Promise<Rows[K][]> {
  const rows = (await modelOf(db(), kind).findAll(options as FindOptions)) as Rows[K][];
  const notebookIds = [...new Set(rows.map((row) => row.notebookId))];
  const notebooks = await db().Notebook.findAll({ where: { id: notebookIds } as WhereOptions });
  const readable = new Set(
    notebooks
      .filter((notebook) => ruleOf(kind, 'read')?.(actor, notebookFacts(notebook) as Facts))
      .map((notebook) => notebook.id),
  );
  const own = rows.filter((row) => row.notebookId !== null && readable.has(row.notebookId));
  own.forEach((row) => rememberOpened(row, 'read'));
  return own;
}

/** The notebooks that an actor may read, newest work first. */
export async function listNotebooksFor(
  actor: Actor,
  options: FindOptions<Attributes<Rows['notebook']>> = {},
): Promise<Rows['notebook'][]> {
  const where = { ...readableNotebooks(actor), ...(options.where as object) };
  const rows = await db().Notebook.findAll({ ...options, where });
  rows.forEach((row) => rememberOpened(row, 'read'));
  return rows;
}

type PersonalKind = 'person' | 'apiToken' | 'session' | 'passwordLink';

/** Rows that belong to people; those the actor may not read are left out. */
export async function listPersonalFor<K extends PersonalKind>(
  actor: Actor,
  kind: K,
  options: FindOptions<Attributes<Rows[K]>> = {},
): Promise<Rows[K][]> {
  const rows = await modelOf(db(), kind).findAll(options as FindOptions);
  const readable = rows.filter((row) => ruleOf(kind, 'read')?.(actor, personFacts(row) as Facts));
  readable.forEach((row) => rememberOpened(row, 'read'));
  return readable as Rows[K][];
}

/**
 * Make a row. A row inside a notebook asks the notebook's rules.
 *
 * @throws AppError NOT_FOUND (the notebook is not the actor's to read), NOT_ALLOWED
 */
export async function createFor<K extends Kind>(
  actor: Actor,
  kind: K,
  values: CreationAttributes<Rows[K]>,
  why?: string,
): Promise<Rows[K]> {
  const model = modelOf(db(), kind) as ModelStatic<Model>;
  const row = model.build(values as never);
  const facts =
    kind === 'notebook' ? ({ id: '', ownerId: '', archived: false } as Facts) : await factsOf(kind, row);
  if (!facts || (KINDS[kind].belongsTo === 'notebook' && !RULES.notebook.read(actor, facts)))
    throw new AppError('NOT_FOUND');
  if (!ruleOf(kind, 'create')?.(actor, facts)) throw new AppError('NOT_ALLOWED');
  rememberOpened(row, 'create');
  await row.save({ actor, why } as object);
  return row as Rows[K];
}

/** Change a row that was opened for it; the record entry is written with it. */
export async function changeFor<R extends Model>(
  actor: Actor,
  row: R,
  values: Partial<Attributes<R>>,
  why?: string,
): Promise<R> {
  await row.update(values as object, { actor, why } as object);
  return row;
}

/**
 * The one bulk door: raw points and bytes of a source file, bound, inside the file's transaction. The
 * record entry of the source file, which carries the hash, stands for them.
 */
export async function insertRaw(
  table: 'source_bytes' | 'spectrum_points',
  columns: readonly string[],
  values: readonly (string | Buffer)[],
): Promise<void> {
  const marks = columns.map((_, index) => `$${index + 1}`).join(', ');
  await db().sequelize.query(`INSERT INTO ${table} (${columns.join(', ')}) VALUES (${marks})`, {
    bind: [...values],
  });
}

/** Raw columns of one row that the actor has already opened. */
export async function readRaw<T extends object>(
  table: 'source_bytes' | 'spectrum_points',
  owner: Model,
): Promise<T | null> {
  const key = table === 'source_bytes' ? 'source_file_id' : 'spectrum_id';
  const [row] = await db().sequelize.query<T>(`SELECT * FROM ${table} WHERE ${key} = $1`, {
    bind: [String(owner.get('id'))],
    type: 'SELECT' as never,
  });
  return row ?? null;
}

const OWNERS_AT_ONCE = 500;

/** Raw columns of many rows that the actor has already opened; each row carries the key of its owner. */
export async function readManyRaw<T extends object>(
  table: 'source_bytes' | 'spectrum_points',
  owners: readonly Model[],
): Promise<T[]> {
  const key = table === 'source_bytes' ? 'source_file_id' : 'spectrum_id';
  const found: T[] = [];
  for (let from = 0; from < owners.length; from += OWNERS_AT_ONCE) {
    const ids = owners.slice(from, from + OWNERS_AT_ONCE).map((owner) => String(owner.get('id')));
    const marks = ids.map((_, index) => `$${index + 1}`).join(', ');
    const rows = await db().sequelize.query<T>(`SELECT * FROM ${table} WHERE ${key} IN (${marks})`, {
      bind: ids,
      type: 'SELECT' as never,
    });
    found.push(...rows);
  }
  return found;
}
