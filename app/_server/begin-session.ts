import 'server-only';
import { cookies } from 'next/headers';
import { signOut, type SignedIn } from '@/db/entry/sign-in';
import { openSessionCookie } from './session-cookie';

/** Give this browser its new session, end the one it had, and say where a person goes first. */
export async function beginSession({ sessionId, welcomed }: SignedIn): Promise<string> {
  const cookie = await openSessionCookie();
  if (cookie.sessionId) await signOut(cookie.sessionId);
  cookie.sessionId = sessionId;
  await cookie.save();
  return welcomed ? '/notebooks' : '/welcome';
}

/** Take the session's cookie out of this browser; the session itself is ended in the database. */
export async function forgetSession(): Promise<void> {
  (await cookies()).delete('halflight_session');
}
