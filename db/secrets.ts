import { createHash, randomBytes } from 'node:crypto';

/** A secret for a link, a token or a session: 256 random bits in base64url. */
export function newSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** Only this is stored of a secret. The secrets are random, so a plain hash is enough; a password's is not. */
export function hashSecret(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}
