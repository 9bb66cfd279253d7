import bcrypt from 'bcryptjs';
import { AppError } from '@/lib/errors';
import { LIMITS } from '@/lib/limits';
import { normalPassword, passwordBytes } from '@/lib/password';
import { DEMO_ACCOUNTS } from './demo/people';

/** Work factor of every stored hash. All have the same, so that a comparison takes the same time for everybody. */
export const PASSWORD_COST = 11;

/** The hash of a password that nobody knows: what is compared with where there is no account or no password. */
export const NOBODYS_HASH = '$2b$11$BTCakal3GUgYL3CFVV6KZ.ZGXUGkXsfMsv05w4YR4dTkR2qVtMwY2';

/** Never call it inside a transaction: it takes a quarter of a second, and the write queue would wait. */
export function hashPassword(password: string): Promise<string> {
  return bcrypt.hash(normalPassword(password), PASSWORD_COST);
}

/**
 * Whether a password belongs to a hash. Without a hash the answer is no, after the same work. bcrypt reads
 * 72 bytes and passes over the rest, so a longer text is never right.
 */
export async function passwordMatches(password: string, hash: string | null): Promise<boolean> {
  const equal = await bcrypt.compare(normalPassword(password), hash ?? NOBODYS_HASH);
  return equal && hash !== null && passwordBytes(password) <= LIMITS.passwordBytesMax;
}

const DEMO_PASSWORDS = new Set(DEMO_ACCOUNTS.map((account) => account.password.toLowerCase()));

function refuse(detail: string): never {
  throw new AppError('INVALID_INPUT', undefined, [{ pointer: 'password', detail }]);
}

/**
 * Refuse a new password that others know: the public ones of the demonstration, and the person's own address.
 *
 * @throws AppError INVALID_INPUT at the field `password`
 */
export function refuseKnownPassword(password: string, email: string): void {
  if (DEMO_PASSWORDS.has(normalPassword(password).toLowerCase()))
    refuse('This password is public: it belongs to the demonstration. Choose another');
  if (password.trim().toLowerCase() === email)
    refuse('A password must not be the e-mail address. Choose another');
}
