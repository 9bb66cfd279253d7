import { AppError } from '@/lib/errors';
import { changeFor, createFor, loadFor } from '../access';
import { systemActor } from '../actors';
import { recordEvent } from '../record';
import { hashSecret } from '../secrets';
import { db, inTransaction } from '../sequelize';

const VISIT_HOURS = 12;

export interface ShareVisit {
  readonly visitId: string;
  readonly notebookId: string;
}

/**
 * Exchange the secret of a share link for a visit limited to its notebook. A link that has run out or was
 * withdrawn answers the same as one that never was.
 *
 * @throws AppError LINK_SPENT
 */
export function openShareLink(secret: string): Promise<ShareVisit> {
  const system = systemActor('Reader with a link');
  return inTransaction(async () => {
    const found = await db().ShareLink.findOne({ where: { tokenHash: hashSecret(secret) } });
    const now = new Date();
    if (!found || found.revokedAt || found.expiresAt <= now) throw new AppError('LINK_SPENT');
    const link = await loadFor(system, 'shareLink', 'edit', found.id);
    await changeFor(system, link, { openedCount: link.openedCount + 1, lastOpenedAt: now });
    const until = Math.min(link.expiresAt.getTime(), now.getTime() + VISIT_HOURS * 3_600_000);
    const visit = await createFor(system, 'shareSession', {
      shareLinkId: link.id,
      expiresAt: new Date(until),
    });
    await recordEvent(system, {
      kind: 'share link',
      verb: 'opened',
      notebookId: link.notebookId,
      subjectId: link.id,
      subjectName: link.label,
    });
    return { visitId: visit.id, notebookId: link.notebookId };
  });
}

/** Whose notebook a visitor reads and until when, for the strip above every shared page. */
export async function shareOf(notebookId: string, visitIds: readonly string[]) {
  const visits = await db().ShareSession.findAll({ where: { id: [...visitIds] } });
  const links = await db().ShareLink.findAll({
    where: { id: visits.map((visit) => visit.shareLinkId), notebookId, revokedAt: null },
    order: [['expiresAt', 'DESC']],
  });
  const link = links[0];
  if (!link) return null;
  const person = await db().Person.findByPk(link.createdById);
  return { sharedBy: person?.name ?? 'the owner', until: link.expiresAt.toISOString() };
}
