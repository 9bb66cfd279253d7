import type { MemberRole, Role } from '@/lib/policies/actor';

export interface NotebookSummary {
  readonly id: string;
  readonly title: string;
  readonly purpose: string;
  readonly owner: string;
  readonly archived: boolean;
  readonly createdAt: string;
  readonly changedAt: string;
}

/** One notebook as its reader may see it, with what they may do. */
export interface NotebookView extends NotebookSummary {
  readonly ownerId: string;
  readonly version: number;
  readonly mayEdit: boolean;
  readonly mayManage: boolean;
  readonly mayListMembers: boolean;
}

/** Where the work stands, counted. */
export interface NotebookProgress {
  readonly spectra: number;
  readonly curves: number;
  /** Known absorptivities in use. */
  readonly absorptivities: number;
  readonly batches: number;
  readonly determinations: number;
  readonly newestCurveId: string | null;
  readonly newestCurveTitle: string | null;
  readonly newestBatchId: string | null;
}

export interface PersonName {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
}

export interface MemberView {
  readonly id: string;
  readonly personId: string;
  readonly name: string;
  readonly role: MemberRole;
  readonly since: string;
}

export interface ShareLinkView {
  readonly id: string;
  readonly label: string;
  readonly createdBy: string;
  readonly createdAt: string;
  readonly expiresAt: string;
  readonly revokedAt: string | null;
  readonly state: 'open' | 'expired' | 'revoked';
  readonly openedCount: number;
  readonly lastOpenedAt: string | null;
}

export interface RecordEntryView {
  readonly id: number;
  readonly at: string;
  readonly who: string;
  readonly via: string;
  readonly kind: string;
  readonly subject: string | null;
  readonly verb: string;
  readonly from: Readonly<Record<string, unknown>> | null;
  readonly to: Readonly<Record<string, unknown>> | null;
  readonly why: string | null;
}
