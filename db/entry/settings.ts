import { environment } from '../environment';
import { sessionSecret } from '../session-secret';
import { db } from '../sequelize';

/*
 * How somebody becomes an actor, and what everybody may know. Functions in this folder serve strangers, so
 * they take no actor; each says what it lets through.
 */

export function cookieSettings(): { password: string; secure: boolean } {
  return { password: sessionSecret(), secure: appUrl().startsWith('https:') };
}

/** How many reverse proxies in front of the server may be believed about an address; 0 means none. */
export function trustedProxies(): number {
  return environment().TRUST_PROXY;
}

/** The address that people type, for links that leave the application. */
export function appUrl(): string {
  const { APP_URL, HOST, PORT } = environment();
  return APP_URL ?? `http://${HOST}:${PORT}`;
}

export interface LaboratoryView {
  readonly id: string;
  readonly name: string;
  readonly timeZone: string;
  readonly demo: boolean;
}

/** The laboratory of this database, or null before it was set up. */
export async function laboratory(): Promise<LaboratoryView | null> {
  const row = await db().Laboratory.findOne();
  return row && { id: row.id, name: row.name, timeZone: row.timeZone, demo: row.demo };
}
