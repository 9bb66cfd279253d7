import type { Model, ModelStatic } from 'sequelize';
import type { Actor } from '@/lib/policies/actor';
import { db, insideTransaction } from './sequelize';

/** Options that access.ts hands to every write; a write without them is refused. */
export interface WriteOptions {
  readonly actor?: Actor;
  readonly why?: string;
}

export interface RecordedEvent {
  readonly kind: string;
  readonly verb: string;
  readonly notebookId?: string | null;
  readonly subjectId?: string | null;
  readonly subjectName?: string | null;
  readonly from?: Record<string, unknown> | null;
  readonly to?: Record<string, unknown> | null;
  readonly why?: string | null;
}

export interface Audit {
  readonly kind: string;
  readonly notebookId: (row: Model) => string | null;
  readonly subjectName: (row: Model) => string | null;
  /** Columns whose value never enters the record (hashes of secrets, results that can be recomputed). */
  readonly hidden?: readonly string[];
  /** Columns that change on every visit; a change of these alone makes no entry. */
  readonly quiet?: readonly string[];
  /** True when the entry of what it came with stands for its making (a spectrum's source file, a standard's curve). */
  readonly madeWithAnother?: (row: Model) => boolean;
}

/**
 * What each row was opened for. A row opened to read, or by nobody, cannot be saved. It lives on globalThis
 * beside the models: Next evaluates this module several times, while the hooks belong to one evaluation.
 */
const shared = globalThis as typeof globalThis & { __halflightOpenedFor?: WeakMap<Model, string> };
const openedFor = (shared.__halflightOpenedFor ??= new WeakMap<Model, string>());

export function rememberOpened(row: Model, verb: string): void {
  openedFor.set(row, verb);
}

const READING_VERBS = new Set(['read', 'see']);

class RecordError extends Error {}

/** Write one entry; always in the transaction of the change it tells of. */
export async function recordEvent(actor: Actor, event: RecordedEvent): Promise<void> {
  if (!insideTransaction()) throw new RecordError(`recordEvent(${event.kind}) needs a transaction, got none`);
  await db().RecordEntry.create({
    at: new Date(),
    actorKind: actor.kind,
    actorVia: actor.via,
    personId: actor.personId,
    actorName: actor.name,
    notebookId: event.notebookId ?? null,
    kind: event.kind,
    subjectId: event.subjectId ?? null,
    subjectName: event.subjectName ?? null,
    verb: event.verb,
    from: event.from ?? null,
    to: event.to ?? null,
    why: event.why ?? null,
  });
}

function visible(row: Model, columns: readonly string[], audit: Audit, previous: boolean) {
  const hidden = new Set(['id', 'createdAt', 'updatedAt', ...(audit.hidden ?? [])]);
  const entries = columns
    .filter((column) => !hidden.has(column))
    .map((column) => [column, previous ? row.previous(column as never) : row.get(column)]);
  return Object.fromEntries(entries) as Record<string, unknown>;
}

function mayWrite(row: Model, options: WriteOptions, audit: Audit): Actor {
  if (!options.actor) throw new RecordError(`${audit.kind} is written without an actor`);
  const verb = openedFor.get(row);
  if (verb === undefined || READING_VERBS.has(verb))
    throw new RecordError(
      `${audit.kind} was opened ${verb ? `to ${verb}` : 'by nobody'} and cannot be saved`,
    );
  return options.actor;
}

/**
 * Hold every write of a model to the record: it names an actor, it was opened for more than reading, and
 * its entry (from, to, why) is written in the same transaction. Bulk writes and deletes are refused.
 */
export function audited(model: ModelStatic<Model>, audit: Audit): void {
  const refuse = (what: string) => () => {
    throw new RecordError(`${audit.kind}: ${what} is refused; rows are changed one by one and never deleted`);
  };
  model.addHook('beforeBulkCreate', 'record', refuse('a bulk create'));
  model.addHook('beforeBulkUpdate', 'record', refuse('a bulk update'));
  model.addHook('beforeBulkDestroy', 'record', refuse('a bulk delete'));
  model.addHook('beforeDestroy', 'record', refuse('a delete'));
  model.addHook('afterCreate', 'record', async (row, options) => {
    const { why, ...write } = options as WriteOptions;
    const actor = mayWrite(row, write, audit);
    if (audit.madeWithAnother?.(row)) return;
    const columns = Object.keys(model.getAttributes());
    await recordEvent(actor, {
      kind: audit.kind,
      verb: 'created',
      notebookId: audit.notebookId(row),
      subjectId: String(row.get('id')),
      subjectName: audit.subjectName(row),
      to: visible(row, columns, audit, false),
      why,
    });
  });
  model.addHook('beforeUpdate', 'record', async (row, options) => {
    const { why, ...write } = options as WriteOptions;
    const actor = mayWrite(row, write, audit);
    const changed = (row.changed() || []).filter((column) => column !== 'updatedAt');
    if (changed.every((column) => audit.quiet?.includes(column))) return;
    await recordEvent(actor, {
      kind: audit.kind,
      verb: 'changed',
      notebookId: audit.notebookId(row),
      subjectId: String(row.get('id')),
      subjectName: audit.subjectName(row),
      from: visible(row, changed, audit, true),
      to: visible(row, changed, audit, false),
      why,
    });
  });
}
