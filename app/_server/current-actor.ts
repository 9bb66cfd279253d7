import 'server-only';
import { cache } from 'react';
import { cookies, headers } from 'next/headers';
import { redirect } from 'next/navigation';
import type { Actor } from '@/lib/policies/actor';
import { actorFromSession, actorFromToken, withShareVisits } from '@/db/actors';
import { openSessionCookie, openShareCookie } from './session-cookie';

async function fromCookies(): Promise<Actor | null> {
  const jar = await cookies();
  const sessionId = jar.has('halflight_session') ? (await openSessionCookie()).sessionId : undefined;
  const person = sessionId ? await actorFromSession(sessionId) : null;
  const visits = jar.has('halflight_share') ? (await openShareCookie()).visits : undefined;
  return withShareVisits(person, visits ?? []);
}

/** Who is asking: a person signed in, a browser with a share link, or nobody. Read once a request. */
export const currentActor = cache(fromCookies);

/** The same for pages that nobody sees without an account or a link. */
export async function requireActor(): Promise<Actor> {
  const actor = await currentActor();
  if (!actor) redirect('/sign-in');
  return actor;
}

/** For API calls: an access token in the Authorization header goes before any cookie. */
export async function apiActor(): Promise<Actor | null> {
  const authorization = (await headers()).get('authorization');
  if (authorization === null) return currentActor();
  const token = /^Bearer\s+(\S+)$/i.exec(authorization)?.[1];
  return token ? actorFromToken(token) : null;
}
