import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { BatchCurveView } from '@/lib/views/batch';
import { listFor, loadFor } from './access';
import type { CurveRow } from './models/curves';
import { batchCurveView } from './views/batch';

/** Everything of a curve but what the engine answered, which is large. */
const LIGHT = { attributes: { exclude: ['result'] } };

type LightCurve = Omit<CurveRow, 'result'>;

/** Some curves of a notebook as batches show them, by id: one query for them, one for their versions. */
export async function curvesOfBatches(
  actor: Actor,
  notebookId: string,
  curveIds: readonly string[],
): Promise<ReadonlyMap<string, BatchCurveView>> {
  const curves: LightCurve[] = await listFor(actor, 'curve', notebookId, {
    where: { id: [...new Set(curveIds)] },
    ...LIGHT,
  });
  const lineageId = [...new Set(curves.map((curve) => curve.lineageId))];
  const versions: LightCurve[] = await listFor(actor, 'curve', notebookId, {
    where: { lineageId },
    ...LIGHT,
  });
  return new Map(
    curves.map((curve) => [
      curve.id,
      batchCurveView(
        curve,
        versions.filter((version) => version.lineageId === curve.lineageId),
      ),
    ]),
  );
}

/** The curve that a batch is to be read on; it stands in the same notebook and is not void. @throws AppError */
export async function usableCurve(actor: Actor, notebookId: string, curveId: string): Promise<CurveRow> {
  const refuse = (detail: string) => new AppError('INVALID_INPUT', detail, [{ pointer: '/curveId', detail }]);
  const curve = await loadFor(actor, 'curve', 'read', curveId).catch((error: unknown) => {
    if (error instanceof AppError && error.code === 'NOT_FOUND')
      throw refuse('This standard curve is not there. Choose another');
    throw error;
  });
  if (curve.notebookId !== notebookId)
    throw refuse('This standard curve is in another notebook. Choose one of this notebook');
  if (curve.status === 'void')
    throw refuse(
      `“${curve.title}” version ${curve.version} is void: ${curve.voidReason ?? ''}. Choose another curve`,
    );
  return curve;
}
