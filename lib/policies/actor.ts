export const ROLES = ['administrator', 'pi', 'analyst', 'viewer'] as const;
export type Role = (typeof ROLES)[number];
export const MEMBER_ROLES = ['contributor', 'reader'] as const;
export type MemberRole = (typeof MEMBER_ROLES)[number];

declare const made: unique symbol;

/**
 * Who is asking, as read from the database at this request. The private symbol keeps anybody but
 * db/actors.ts from making one; role and memberships are never taken from a cookie.
 */
export interface Actor {
  readonly [made]: true;
  readonly kind: 'person' | 'link' | 'system';
  /** How the request came: a browser session, an access token, a share link, a script of the server. */
  readonly via: 'session' | 'token' | 'link' | 'script';
  readonly personId: string | null;
  readonly name: string;
  readonly role: Role | null;
  /** False for share links and read tokens: nothing may be changed. */
  readonly canWrite: boolean;
  readonly memberships: ReadonlyMap<string, MemberRole>;
  /** Notebooks opened by share links in this browser. */
  readonly sharedNotebookIds: readonly string[];
  readonly sessionId: string | null;
}
