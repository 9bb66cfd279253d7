import { curveRequest } from '@/lib/curve/curve-request';
import type { CurveRequest } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { VoidCurve } from '@/lib/schemas/curve';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import type { CurveSummary, CurveView } from '@/lib/views/curve';
import { changeFor, listFor, loadFor, may } from '../access';
import { storedParts } from '../curve-rows';
import type { CurveRow } from '../models/curves';
import { namesOf } from '../names';
import { pageOf } from '../page';
import { inTransaction } from '../sequelize';
import { curveSummary, curveVersionView, type LightCurve } from '../views/curve';

/** Everything of a curve but what the engine answered, which is large. */
const LIGHT = { attributes: { exclude: ['result'] } };

function versionsOf(actor: Actor, notebookId: string, lineageIds: readonly string[]): Promise<LightCurve[]> {
  return listFor(actor, 'curve', notebookId, {
    where: { lineageId: [...new Set(lineageIds)] },
    order: [['version', 'DESC']],
    ...LIGHT,
  });
}

async function summaries(
  actor: Actor,
  notebookId: string,
  rows: readonly CurveRow[],
): Promise<CurveSummary[]> {
  const methods = await listFor(actor, 'method', notebookId, {
    where: { id: rows.map((row) => row.methodId) },
  });
  const versions = await versionsOf(
    actor,
    notebookId,
    rows.map((row) => row.lineageId),
  );
  const names = await namesOf(rows.map((row) => row.createdById));
  return rows.flatMap((row) => {
    const method = methods.find((one) => one.id === row.methodId);
    const own = versions.filter((version) => version.lineageId === row.lineageId);
    return method ? [curveSummary(row, method, own, names)] : [];
  });
}

/** All curves of a notebook, every version, newest first. @throws AppError NOT_FOUND */
export async function listCurves(actor: Actor, notebookId: string): Promise<CurveSummary[]> {
  const rows = await listFor(actor, 'curve', notebookId, { order: [['createdAt', 'DESC']] });
  return summaries(actor, notebookId, rows);
}

/** The same by pages, for the API. @throws AppError NOT_FOUND */
export async function pageOfCurves(
  actor: Actor,
  notebookId: string,
  query: PageQuery,
): Promise<Page<CurveSummary>> {
  const page = await pageOf(
    query,
    (part) => listFor(actor, 'curve', notebookId, part as object),
    (row) => row,
  );
  return { items: await summaries(actor, notebookId, page.items), nextCursor: page.nextCursor };
}

/** A curve with its method, standards, readings and versions. @throws AppError NOT_FOUND */
export async function loadCurve(actor: Actor, id: string): Promise<CurveView> {
  const row = await loadFor(actor, 'curve', 'read', id);
  const [summary] = await summaries(actor, row.notebookId, [row]);
  if (!summary) throw new AppError('NOT_FOUND');
  const { method, standards } = await storedParts(actor, row);
  const versions = await versionsOf(actor, row.notebookId, [row.lineageId]);
  const names = await namesOf(versions.map((version) => version.createdById));
  return {
    ...summary,
    engineVersion: row.engineVersion,
    method,
    standards,
    request: curveRequest(method, standards),
    result: row.result,
    versions: versions.map((version) => curveVersionView(version, names)),
    mayEdit: await may(actor, 'curve', 'edit', row),
  };
}

/** What the engine is asked for a curve, from its stored readings, without unknowns. @throws AppError NOT_FOUND */
export async function curveRequestOf(actor: Actor, id: string): Promise<CurveRequest> {
  const { method, standards } = await storedParts(actor, await loadFor(actor, 'curve', 'read', id));
  return curveRequest(method, standards);
}

/** Declare a curve void; it stays to be seen. @throws AppError NOT_FOUND, NOT_ALLOWED, CHANGED_MEANWHILE */
export function voidCurve(actor: Actor, { curveId, reason }: VoidCurve): Promise<{ notebookId: string }> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'curve', 'edit', curveId);
    if (row.status === 'void')
      throw new AppError('CHANGED_MEANWHILE', `This version is void already: ${row.voidReason ?? ''}`);
    await changeFor(actor, row, { status: 'void', voidReason: reason }, reason);
    return { notebookId: row.notebookId };
  });
}
