import { createHash } from 'node:crypto';
import type { Actor } from '@/lib/policies/actor';

/**
 * The id of a row that a form makes, from the key the form carries: sent twice, the same form names the same
 * row, so a double click saves once. Two people never meet in one id, whatever keys they send.
 */
export function idOfSubmission(actor: Actor, key: string, index = 0): string {
  const hash = createHash('sha256')
    .update(`${actor.personId ?? actor.name} ${key} ${index}`)
    .digest('hex');
  const [a, b, c, d, e] = [
    hash.slice(0, 8),
    hash.slice(8, 12),
    hash.slice(13, 16),
    hash.slice(17, 20),
    hash.slice(20, 32),
  ];
  return `${a}-${b}-8${c}-8${d}-${e}`;
}

/** A key that belongs to what was sent with it: another content under the same key makes other rows. */
export function keyOfContent(key: string, content: unknown): string {
  return `${key} ${createHash('sha256').update(JSON.stringify(content)).digest('hex')}`;
}
