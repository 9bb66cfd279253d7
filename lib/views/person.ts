import type { Role } from '@/lib/policies/actor';

/** What each role may do, as pages say it. */
export const ROLE_MAY: Readonly<Record<Role, string>> = {
  administrator:
    'Adds people and sets roles. Sees titles and owners of notebooks, but what is in them only as a member.',
  pi: 'Owns notebooks, works in them and shares them.',
  analyst: 'Makes notebooks, naming a PI as owner, and works in them.',
  viewer: 'Reads the notebooks they are a member of.',
};

export type LinkPurpose = 'invitation' | 'reset';

/** One person, as administrators see them. */
export interface PersonView {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly active: boolean;
  readonly hasPassword: boolean;
  readonly createdAt: string;
  /** The link by which this person can set a password now, without the secret in it. */
  readonly openLink: { readonly purpose: LinkPurpose; readonly expiresAt: string } | null;
}

export interface AccountView {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  /** Whether this person has confirmed reading the statements of limits. */
  readonly welcomed: boolean;
}

export interface SessionView {
  readonly id: string;
  readonly openedAt: string;
  readonly lastSeenAt: string;
  /** When it ends by itself, unless it is used before. */
  readonly endsAt: string;
  readonly current: boolean;
}

export interface TokenView {
  readonly id: string;
  readonly name: string;
  readonly scope: 'read' | 'write';
  readonly createdAt: string;
  readonly expiresAt: string;
  readonly lastUsedAt: string | null;
  readonly state: 'good' | 'expired' | 'revoked';
}

/** Answer of /api/v1/me. */
export interface MeView {
  readonly kind: 'person' | 'link' | 'system';
  readonly via: 'session' | 'token' | 'link' | 'script';
  readonly id: string | null;
  readonly name: string;
  readonly role: Role | null;
  readonly canWrite: boolean;
}

/** What a person who opens a link to set a password meets. */
export type PasswordLinkView =
  | { readonly state: 'open'; readonly name: string; readonly email: string; readonly purpose: LinkPurpose }
  | { readonly state: 'used' | 'expired' | 'withdrawn' | 'unknown' };

export const LINK_SENTENCES: Readonly<Record<Exclude<PasswordLinkView['state'], 'open'>, string>> = {
  used: 'This link has been used: it set a password once, and that is all it can do. Sign in with that password, or ask an administrator for a new link.',
  expired: 'This link has run out: it was good for 48 hours. Ask an administrator for a new one.',
  withdrawn:
    'This link was withdrawn, perhaps because a newer one was made. Ask an administrator for a new one.',
  unknown: 'This is not a link of this laboratory. Check that the whole address was copied.',
};
