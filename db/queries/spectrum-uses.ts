import { Op } from 'sequelize';
import { listFor } from '@/db/access';
import type { Actor } from '@/lib/policies/actor';
import type { SpectrumUse } from '@/lib/views/spectrum';

/**
 * What the curves and batches of a notebook use each of its spectra as; the newest use counts. A plot draws
 * standards and samples apart by it.
 *
 * @throws AppError NOT_FOUND
 */
export async function spectrumUses(actor: Actor, notebookId: string): Promise<Record<string, SpectrumUse>> {
  const readings = await listFor(actor, 'reading', notebookId, {
    where: { spectrumId: { [Op.ne]: null }, supersededAt: null },
    attributes: ['spectrumId', 'standardId', 'determinationId'],
    order: [['createdAt', 'ASC']],
  });
  if (readings.length === 0) return {};
  const standards = await listFor(actor, 'standard', notebookId, {
    attributes: ['id', 'role', 'concentration'],
  });
  const byId = new Map(standards.map((standard) => [standard.id, standard]));
  const uses: Record<string, SpectrumUse> = {};
  for (const { spectrumId, standardId } of readings) {
    if (spectrumId === null) continue;
    const standard = standardId === null ? undefined : byId.get(standardId);
    uses[spectrumId] = standard
      ? { role: standard.role, concentration: standard.concentration }
      : { role: 'sample' };
  }
  return uses;
}
