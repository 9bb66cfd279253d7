import type { Env } from '@/lib/env';
import type { LaboratoryView } from './entry/settings';

const LOOPBACK = /^(127(\.\d{1,3}){3}|localhost|::1|\[::1\])$/;

/**
 * Why the server must not start with these settings on this database, in a sentence; null when it may.
 * Whether a database is a demo stands in it; DEMO decides only for an empty one.
 */
export function refusal(settings: Env, existing: LaboratoryView | null): string | null {
  const demo = existing ? existing.demo : settings.DEMO !== '0';
  if (existing?.demo && settings.DEMO === '0')
    return 'This database holds the demonstration laboratory, but DEMO=0 is set. Point DATA_DIR to an empty folder for a real laboratory.';
  if (existing && !existing.demo && settings.DEMO === '1')
    return 'This database holds a real laboratory, but DEMO=1 is set. Point DATA_DIR to an empty folder for the demonstration.';
  if (demo && !LOOPBACK.test(settings.HOST))
    return 'The demonstration has public passwords, so it serves this computer only: leave HOST out or set HOST=127.0.0.1.';
  if (!demo && !settings.SESSION_SECRET)
    return 'SESSION_SECRET is missing: set it to at least 32 random characters, for example from `openssl rand -hex 32`.';
  return null;
}
