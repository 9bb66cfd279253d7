import type { Actor } from './actor';

/** What a rule must know of a notebook, and nothing more. */
export interface NotebookFacts {
  readonly id: string;
  readonly ownerId: string;
  readonly archived: boolean;
}

export interface PersonFacts {
  readonly id: string;
}

const owns = (a: Actor, n: NotebookFacts) => a.kind === 'person' && a.personId === n.ownerId;
const membership = (a: Actor, n: NotebookFacts) => a.memberships.get(n.id);
const holdsLink = (a: Actor, n: NotebookFacts) => a.sharedNotebookIds.includes(n.id);
const system = (a: Actor) => a.kind === 'system';
const isAdministrator = (a: Actor) => a.kind === 'person' && a.role === 'administrator';
const isSelf = (a: Actor, p: PersonFacts) => a.kind === 'person' && a.personId === p.id;
const bySession = (a: Actor) => a.via === 'session';

const reads = (a: Actor, n: NotebookFacts) =>
  system(a) || owns(a, n) || membership(a, n) !== undefined || holdsLink(a, n);
const worksIn = (a: Actor, n: NotebookFacts) =>
  a.canWrite &&
  !n.archived &&
  (system(a) || (a.role !== 'viewer' && (owns(a, n) || membership(a, n) === 'contributor')));
const runs = (a: Actor, n: NotebookFacts) => a.canWrite && (system(a) || (a.role !== 'viewer' && owns(a, n)));
const nobody = () => false;

/** Everything inside a notebook follows the notebook: whoever reads it reads all of it. */
const CONTENT = { read: reads, create: worksIn, edit: worksIn } as const;

/**
 * Who may do what. Nothing is allowed that is not listed; pure and synchronous, so that no await can be
 * missed. `read` decides whether a thing exists for the asker at all.
 */
export const RULES = {
  notebook: {
    /** The title and the owner: administrators see these of every notebook, but not its contents. */
    see: (a: Actor, n: NotebookFacts) => reads(a, n) || isAdministrator(a),
    read: reads,
    create: (a: Actor) => a.canWrite && (system(a) || a.role === 'pi' || a.role === 'analyst'),
    edit: worksIn,
    manage: runs,
  },
  sourceFile: CONTENT,
  spectrum: CONTENT,
  method: CONTENT,
  curve: CONTENT,
  standard: CONTENT,
  absorptivity: CONTENT,
  batch: CONTENT,
  determination: CONTENT,
  reading: CONTENT,
  membership: {
    /** Not by a link: whom else a notebook is shared with is not the business of whoever holds one. */
    read: (a: Actor, n: NotebookFacts) => system(a) || owns(a, n) || membership(a, n) !== undefined,
    create: runs,
    edit: runs,
  },
  shareLink: { read: runs, create: runs, edit: runs },
  person: {
    list: (a: Actor) => system(a) || isAdministrator(a),
    read: (a: Actor, p: PersonFacts) => system(a) || isAdministrator(a) || isSelf(a, p),
    create: (a: Actor) => a.canWrite && (system(a) || (isAdministrator(a) && bySession(a))),
    edit: (a: Actor, p: PersonFacts) =>
      a.canWrite && (system(a) || (bySession(a) && (isAdministrator(a) || isSelf(a, p)))),
    manage: (a: Actor) => a.canWrite && (system(a) || (isAdministrator(a) && bySession(a))),
  },
  passwordLink: {
    read: (a: Actor) => system(a) || isAdministrator(a),
    create: (a: Actor) => a.canWrite && (system(a) || (isAdministrator(a) && bySession(a))),
    edit: (a: Actor) => a.canWrite && (system(a) || (isAdministrator(a) && bySession(a))),
  },
  apiToken: {
    read: (a: Actor, p: PersonFacts) => system(a) || isSelf(a, p),
    create: (a: Actor, p: PersonFacts) => a.canWrite && (system(a) || (isSelf(a, p) && bySession(a))),
    edit: (a: Actor, p: PersonFacts) => a.canWrite && (system(a) || (isSelf(a, p) && bySession(a))),
  },
  session: {
    read: (a: Actor, p: PersonFacts) => system(a) || isSelf(a, p),
    create: system,
    edit: (a: Actor, p: PersonFacts) => system(a) || (isSelf(a, p) && bySession(a)),
  },
  shareSession: { read: system, create: system, edit: system },
  laboratory: {
    read: () => true,
    create: system,
    edit: (a: Actor) => a.canWrite && (system(a) || (isAdministrator(a) && bySession(a))),
  },
  recordEntry: { read: (a: Actor, n: NotebookFacts) => reads(a, n), create: nobody, edit: nobody },
} as const;

export type Kind = keyof typeof RULES;
export type Verb<K extends Kind> = keyof (typeof RULES)[K] & string;
