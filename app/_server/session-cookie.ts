import 'server-only';
import { getIronSession, type IronSession } from 'iron-session';
import { cookies } from 'next/headers';
import { cookieSettings } from '@/db/entry/settings';

/** The cookies carry ids only; everything they stand for is read from the database at each request. */
interface SessionCookie {
  sessionId?: string;
}
interface ShareCookie {
  visits?: string[];
}

async function open<T extends object>(cookieName: string): Promise<IronSession<T>> {
  const { password, secure } = cookieSettings();
  return getIronSession<T>(await cookies(), {
    cookieName,
    password,
    ttl: 0,
    cookieOptions: { httpOnly: true, sameSite: 'lax', secure, path: '/' },
  });
}

export const openSessionCookie = () => open<SessionCookie>('halflight_session');
export const openShareCookie = () => open<ShareCookie>('halflight_share');
