import { LIMITS } from './limits';

/** The same password typed on two machines may come composed or decomposed (é as one sign or two); NFC makes it one. */
export function normalPassword(password: string): string {
  return password.normalize('NFC');
}

/** Length in bytes of UTF-8, which is what the hash counts: a letter such as é has 2, an emoji 4 or more. */
export function passwordBytes(password: string): number {
  return new TextEncoder().encode(normalPassword(password)).length;
}

const BYTES = 'Plain letters and digits have one byte each, accented letters two.';

/** What keeps this text from being a password, in a sentence; null when nothing does. */
export function passwordProblem(password: string): string | null {
  const bytes = passwordBytes(password);
  if (bytes === 0) return 'Enter a password';
  if (bytes < LIMITS.passwordBytesMin)
    return `This has ${bytes} ${bytes === 1 ? 'byte' : 'bytes'}; a password needs at least ${LIMITS.passwordBytesMin}. ${BYTES}`;
  if (bytes > LIMITS.passwordBytesMax)
    return `This has ${bytes} bytes; a password may have ${LIMITS.passwordBytesMax} at most. ${BYTES}`;
  if (password.includes('\0')) return 'A password may not hold a zero byte';
  return null;
}

/** What stands beside a field for a new password. */
export const PASSWORD_HINT = `${LIMITS.passwordBytesMin} to ${LIMITS.passwordBytesMax} bytes: as many plain letters, digits, spaces or signs; accented letters count twice. Several words in a row do well.`;
