import { AppError } from '@/lib/errors';
import type { CurveRow } from './models/curves';
import { namesOf } from './names';

type Version = Pick<CurveRow, 'id' | 'version' | 'createdAt' | 'createdById'>;

/**
 * A new version goes after the newest one only: whoever worked on an older one is told who saved what meanwhile.
 *
 * @throws AppError CHANGED_MEANWHILE with id and version of the newest one
 */
export async function refuseUnlessNewest(base: Version, newest: Version | undefined): Promise<void> {
  if (!newest || newest.id === base.id) return;
  const who = (await namesOf([newest.createdById])).get(newest.createdById) ?? 'Somebody';
  const when = newest.createdAt.toISOString().slice(0, 16).replace('T', ' ');
  throw new AppError(
    'CHANGED_MEANWHILE',
    `${who} saved version ${newest.version} on ${when} UTC, after you opened this form. Nothing of yours is lost: it stands below`,
    [
      { pointer: '/newerId', detail: newest.id },
      { pointer: '/newerVersion', detail: String(newest.version) },
    ],
  );
}
