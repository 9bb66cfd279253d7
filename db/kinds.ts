import type { Model, ModelStatic, WhereOptions } from 'sequelize';
import { Op } from 'sequelize';
import type { Actor } from '@/lib/policies/actor';
import type { Kind, NotebookFacts, PersonFacts } from '@/lib/policies/rules';
import type { AbsorptivityRow } from './models/absorptivities';
import type { BatchRow, DeterminationRow, ReadingRow } from './models/batches';
import type { CurveRow, MethodRow, StandardRow } from './models/curves';
import type { MembershipRow, NotebookRow, ShareLinkRow, ShareSessionRow } from './models/notebooks';
import type { ApiTokenRow, LaboratoryRow, PasswordLinkRow, PersonRow, SessionRow } from './models/people';
import type { RecordEntryRow } from './models/record-entry';
import type { SourceFileRow, SpectrumRow } from './models/spectra';
import type { Audit } from './record';
import type { Models } from './models';

/** The row type behind each kind. */
export interface Rows {
  laboratory: LaboratoryRow;
  person: PersonRow;
  session: SessionRow;
  passwordLink: PasswordLinkRow;
  apiToken: ApiTokenRow;
  notebook: NotebookRow;
  membership: MembershipRow;
  shareLink: ShareLinkRow;
  shareSession: ShareSessionRow;
  sourceFile: SourceFileRow;
  spectrum: SpectrumRow;
  method: MethodRow;
  curve: CurveRow;
  standard: StandardRow;
  absorptivity: AbsorptivityRow;
  batch: BatchRow;
  determination: DeterminationRow;
  reading: ReadingRow;
  recordEntry: RecordEntryRow;
}

/** Where the facts come from that the rules need. */
type Belonging = 'notebook' | 'person' | 'self' | 'nobody';

interface KindOf {
  readonly model: keyof Models;
  readonly belongsTo: Belonging;
  readonly audit: Audit | null;
}

const field = (name: string) => (row: Model) => (row.get(name) as string | null | undefined) ?? null;
const none = () => null;
const always = () => true;

function content(model: keyof Models, kind: string, nameField: string | null, hidden: string[] = []): KindOf {
  const audit = {
    kind,
    notebookId: field('notebookId'),
    subjectName: nameField ? field(nameField) : none,
    hidden,
  };
  return { model, belongsTo: 'notebook', audit };
}

function personal(model: keyof Models, audit: Partial<Audit> & { kind: string }): KindOf {
  return { model, belongsTo: 'person', audit: { notebookId: none, subjectName: none, ...audit } };
}

export const KINDS: Readonly<Record<Kind, KindOf>> = {
  laboratory: {
    model: 'Laboratory',
    belongsTo: 'nobody',
    audit: { kind: 'laboratory', notebookId: none, subjectName: field('name') },
  },
  person: {
    model: 'Person',
    belongsTo: 'self',
    audit: {
      kind: 'person',
      notebookId: none,
      subjectName: field('name'),
      hidden: ['passwordHash'],
      quiet: ['welcomedAt'],
    },
  },
  session: personal('Session', { kind: 'session', quiet: ['lastSeenAt', 'idleExpiresAt'] }),
  passwordLink: personal('PasswordLink', { kind: 'password link', hidden: ['tokenHash'] }),
  apiToken: personal('ApiToken', {
    kind: 'access token',
    subjectName: field('name'),
    hidden: ['tokenHash'],
    quiet: ['lastUsedAt'],
  }),
  notebook: {
    model: 'Notebook',
    belongsTo: 'self',
    audit: { kind: 'notebook', notebookId: field('id'), subjectName: field('title') },
  },
  membership: content('Membership', 'membership', 'role'),
  shareLink: {
    model: 'ShareLink',
    belongsTo: 'notebook',
    audit: {
      kind: 'share link',
      notebookId: field('notebookId'),
      subjectName: field('label'),
      hidden: ['tokenHash'],
      quiet: ['openedCount', 'lastOpenedAt'],
    },
  },
  shareSession: {
    model: 'ShareSession',
    belongsTo: 'nobody',
    audit: { kind: 'share visit', notebookId: none, subjectName: none },
  },
  sourceFile: content('SourceFile', 'source file', 'name', ['headerText', 'trailerText']),
  spectrum: {
    model: 'Spectrum',
    belongsTo: 'notebook',
    audit: {
      kind: 'spectrum',
      notebookId: field('notebookId'),
      subjectName: field('name'),
      hidden: ['header', 'gaps'],
      madeWithAnother: always,
    },
  },
  method: content('Method', 'method', 'analyte'),
  curve: content('Curve', 'standard curve', 'title', ['result']),
  standard: {
    model: 'Standard',
    belongsTo: 'notebook',
    audit: {
      kind: 'standard',
      notebookId: field('notebookId'),
      subjectName: field('name'),
      madeWithAnother: always,
    },
  },
  absorptivity: content('Absorptivity', 'known absorptivity', 'title'),
  batch: content('Batch', 'batch', 'title'),
  determination: content('Determination', 'determination', 'sample', ['result']),
  reading: {
    model: 'Reading',
    belongsTo: 'notebook',
    audit: {
      kind: 'reading',
      notebookId: field('notebookId'),
      subjectName: none,
      // readings of a standard stand in the entry of their curve
      madeWithAnother: (row) => row.get('standardId') !== null,
    },
  },
  recordEntry: { model: 'RecordEntry', belongsTo: 'notebook', audit: null },
};

export function notebookFacts(row: NotebookRow): NotebookFacts {
  return {
    id: row.id,
    ownerId: row.ownerId,
    archived: row.archivedAt !== null && row.archivedAt !== undefined,
  };
}

export function personFacts(row: Model): PersonFacts {
  return { id: String(row.get('personId') ?? row.get('id')) };
}

/** The notebooks an actor may read, as a condition on the notebooks table. */
export function readableNotebooks(actor: Actor): WhereOptions<NotebookRow> {
  if (actor.kind === 'system') return {};
  const ids = [...actor.memberships.keys(), ...actor.sharedNotebookIds];
  return actor.personId === null ? { id: ids } : { [Op.or]: [{ ownerId: actor.personId }, { id: ids }] };
}

export function modelOf(models: Models, kind: Kind): ModelStatic<Model> {
  return models[KINDS[kind].model] as unknown as ModelStatic<Model>;
}
