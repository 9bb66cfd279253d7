import { absorptivityRequest } from '@/lib/absorptivity/stored-absorptivity';
import type { Yardstick } from '@/lib/batch/yardstick';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { YardstickView } from '@/lib/views/batch';
import { listFor, loadFor } from './access';
import type { AbsorptivityRow } from './models/absorptivities';
import type { BatchRow } from './models/batches';
import type { CurveRow } from './models/curves';
import { curveRequestOf } from './queries/curves';
import { storedAbsorptivity } from './views/absorptivity';
import { yardstickView, type YardstickVersion } from './views/batch';

/** What a batch is read on; the table holds to exactly one of the two. */
export type OnWhat = Pick<BatchRow, 'curveId' | 'absorptivityId'>;

type Ids = readonly (string | null)[];
type Found = ReadonlyMap<string, YardstickView>;

/** Not what the engine answered for a curve, which is large. */
const LIGHT: (keyof YardstickVersion)[] = ['id', 'lineageId', 'title', 'version', 'status', 'voidReason'];

/** Views by id: one query for the rows, one for their versions. */
async function viewsOf(
  list: (where: { id: string[] } | { lineageId: string[] }) => Promise<YardstickVersion[]>,
  asked: Ids,
): Promise<Found> {
  const id = [...new Set(asked.flatMap((one) => one ?? []))];
  if (id.length === 0) return new Map();
  const rows = await list({ id });
  const versions = await list({ lineageId: [...new Set(rows.map((row) => row.lineageId))] });
  return new Map(
    rows.map((row) => [
      row.id,
      yardstickView(
        row,
        versions.filter((version) => version.lineageId === row.lineageId),
      ),
    ]),
  );
}

/** Some curves of a notebook as batches show them, by id. */
export const curvesOfBatches = (actor: Actor, notebookId: string, ids: Ids): Promise<Found> =>
  viewsOf((where) => listFor(actor, 'curve', notebookId, { where, attributes: LIGHT }), ids);

/** The same of known absorptivities. */
export const absorptivitiesOfBatches = (actor: Actor, notebookId: string, ids: Ids): Promise<Found> =>
  viewsOf((where) => listFor(actor, 'absorptivity', notebookId, { where, attributes: LIGHT }), ids);

interface Choice {
  readonly kind: 'curve' | 'absorptivity';
  readonly pointer: '/curveId' | '/absorptivityId';
  readonly words: string;
}
const CURVE: Choice = { kind: 'curve', pointer: '/curveId', words: 'standard curve' };
const ABSORPTIVITY: Choice = {
  kind: 'absorptivity',
  pointer: '/absorptivityId',
  words: 'known absorptivity',
};

async function usable<R extends CurveRow | AbsorptivityRow>(
  { kind, pointer, words }: Choice,
  notebookId: string,
  load: () => Promise<R>,
): Promise<R> {
  const refuse = (detail: string) => new AppError('INVALID_INPUT', detail, [{ pointer, detail }]);
  const row = await load().catch((error: unknown) => {
    if (error instanceof AppError && error.code === 'NOT_FOUND')
      throw refuse(`This ${words} is not there. Choose another`);
    throw error;
  });
  if (row.notebookId !== notebookId)
    throw refuse(`This ${words} is in another notebook. Choose one of this notebook`);
  if (row.status === 'void')
    throw refuse(
      `“${row.title}” version ${row.version} is void: ${row.voidReason ?? ''}. Choose another ${kind}`,
    );
  return row;
}

/** The curve that a batch is to be read on; it stands in the same notebook and is not void. @throws AppError */
export const usableCurve = (actor: Actor, notebookId: string, id: string): Promise<CurveRow> =>
  usable(CURVE, notebookId, () => loadFor(actor, 'curve', 'read', id));

/** What a batch is to be read on, if it may be. @throws AppError */
export async function refuseUnusable(actor: Actor, notebookId: string, on: OnWhat): Promise<void> {
  const { curveId, absorptivityId } = on;
  if (curveId !== null) await usableCurve(actor, notebookId, curveId);
  if (absorptivityId !== null)
    await usable(ABSORPTIVITY, notebookId, () => loadFor(actor, 'absorptivity', 'read', absorptivityId));
}

/** What the engine is asked for a batch, from what is stored, without samples. @throws AppError NOT_FOUND */
export async function yardstickOf(actor: Actor, on: OnWhat): Promise<Yardstick> {
  const { curveId, absorptivityId } = on;
  if (curveId !== null) return { kind: 'curve', request: await curveRequestOf(actor, curveId) };
  const row = await loadFor(actor, 'absorptivity', 'read', absorptivityId ?? '');
  return { kind: 'absorptivity', request: absorptivityRequest(storedAbsorptivity(row)) };
}
