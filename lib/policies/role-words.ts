import type { MemberRole, Role } from './actor';

/** The roles as people read them. */
export const ROLE_WORDS: Readonly<Record<Role, string>> = {
  administrator: 'administrator',
  pi: 'PI',
  analyst: 'analyst',
  viewer: 'viewer',
};

export const MEMBER_ROLE_WORDS: Readonly<Record<MemberRole, string>> = {
  contributor: 'contributor',
  reader: 'reader',
};
