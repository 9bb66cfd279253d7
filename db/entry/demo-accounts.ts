import type { Role } from '@/lib/policies/actor';
import { DEMO_ACCOUNTS } from '../demo/people';
import { laboratory } from './settings';

export interface PublicAccount {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly role: Role;
  readonly does: string;
}

/** The accounts that everybody may use: those of the demonstration, and none in a real laboratory. */
export async function publicAccounts(): Promise<readonly PublicAccount[]> {
  if (!(await laboratory())?.demo) return [];
  return DEMO_ACCOUNTS.map(({ name, email, password, role, does }) => ({
    name,
    email,
    password,
    role,
    does,
  }));
}
