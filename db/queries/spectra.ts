import { Op, type WhereOptions } from 'sequelize';
import { changeFor, countFor, listAcrossFor, listFor, loadFor, readManyRaw, readRaw } from '@/db/access';
import type { SpectrumRow } from '@/db/models/spectra';
import { pageOf } from '@/db/page';
import type { StoredPoints } from '@/db/points';
import { inTransaction } from '@/db/sequelize';
import { rawPointsView, spectrumDetail, spectrumPointsView, spectrumView } from '@/db/views/spectrum';
import type { ReadingRule } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import { LIMITS } from '@/lib/limits';
import type { Actor } from '@/lib/policies/actor';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import { readPointsByRule } from '@/lib/spectrum/read-points-by-rule';
import type {
  RawPointsView,
  SpectrumDetail,
  SpectrumPointsView,
  SpectrumReadingView,
  SpectrumView,
} from '@/lib/views/spectrum';

export interface SpectraWanted {
  /** Part of the spectrum's name. */
  readonly search?: string;
  /** Spectra that were set aside are left out unless asked for. */
  readonly includeVoided?: boolean;
}

/** Columns that a list does not need. */
const LIGHT = { exclude: ['header', 'gaps'] };

const inOrderOfNames = new Intl.Collator('en', { numeric: true, sensitivity: 'base' }).compare;

function wanted({ search = '', includeVoided = false }: SpectraWanted): WhereOptions<SpectrumRow> {
  const text = search.trim();
  return {
    ...(includeVoided ? {} : { voidedAt: null }),
    ...(text === '' ? {} : { name: { [Op.like]: `%${text}%` } }),
  };
}

async function fileNames(actor: Actor, rows: readonly SpectrumRow[]): Promise<Map<string, string>> {
  const ids = [...new Set(rows.map((row) => row.sourceFileId))];
  const files = await listAcrossFor(actor, 'sourceFile', {
    where: { id: ids },
    attributes: ['id', 'name', 'notebookId'],
  });
  return new Map(files.map((file) => [file.id, file.name]));
}

async function views(actor: Actor, rows: readonly SpectrumRow[]): Promise<SpectrumView[]> {
  const names = await fileNames(actor, rows);
  return rows.map((row) => spectrumView(row, names.get(row.sourceFileId) ?? ''));
}

/**
 * The spectra of a notebook to choose from, by file name (2 before 10) and place in the file; of a very
 * large notebook the newest. @throws AppError NOT_FOUND
 */
export async function listSpectra(
  actor: Actor,
  notebookId: string,
  options: SpectraWanted = {},
): Promise<SpectrumView[]> {
  const rows = await listFor(actor, 'spectrum', notebookId, {
    where: wanted(options),
    attributes: LIGHT,
    order: [['createdAt', 'DESC']],
    limit: LIMITS.spectraListed,
  });
  const position = new Map(rows.map((row) => [row.id, row.position]));
  const place = (view: SpectrumView) => position.get(view.id) ?? 0;
  const listed = await views(actor, rows);
  return listed.sort((a, b) => inOrderOfNames(a.fileName, b.fileName) || place(a) - place(b));
}

/** How many there are, whatever the list holds. @throws AppError NOT_FOUND */
export function countSpectra(actor: Actor, notebookId: string, options: SpectraWanted = {}): Promise<number> {
  return countFor(actor, 'spectrum', notebookId, wanted(options));
}

/** One page, newest first, for the API. @throws AppError NOT_FOUND */
export async function pageOfSpectra(
  actor: Actor,
  notebookId: string,
  { search, includeVoided, ...query }: PageQuery & SpectraWanted,
): Promise<Page<SpectrumView>> {
  const where = wanted({ search, includeVoided });
  const page = await pageOf(
    query,
    (part) =>
      listFor(actor, 'spectrum', notebookId, {
        where: { [Op.and]: [where, part.where] } as WhereOptions,
        order: part.order,
        limit: part.limit,
        attributes: LIGHT,
      }),
    (row) => row,
  );
  return { items: await views(actor, page.items), nextCursor: page.nextCursor };
}

/** One spectrum; with `notebookId` only when it is in that notebook. @throws AppError NOT_FOUND */
export async function getSpectrum(actor: Actor, id: string, notebookId?: string): Promise<SpectrumDetail> {
  const row = await loadFor(actor, 'spectrum', 'read', id);
  if (notebookId !== undefined && row.notebookId !== notebookId) throw new AppError('NOT_FOUND');
  return spectrumDetail(row, await loadFor(actor, 'sourceFile', 'read', row.sourceFileId));
}

async function pointsOf(row: SpectrumRow): Promise<StoredPoints> {
  const points = await readRaw<StoredPoints>('spectrum_points', row);
  if (!points) throw new Error(`spectrum ${row.id} has no points`);
  return points;
}

/** @throws AppError NOT_FOUND */
export async function getSpectrumPoints(actor: Actor, id: string): Promise<SpectrumPointsView> {
  const row = await loadFor(actor, 'spectrum', 'read', id);
  return spectrumPointsView(row, await pointsOf(row));
}

/** The points as the file gave them. @throws AppError NOT_FOUND */
export async function getRawPoints(actor: Actor, id: string): Promise<RawPointsView> {
  const row = await loadFor(actor, 'spectrum', 'read', id);
  return rawPointsView(row, await pointsOf(row));
}

/** Rows in the order asked for, each once. @throws AppError NOT_FOUND when one of them does not exist for the actor */
function inOrder(rows: readonly SpectrumRow[], ids: readonly string[]): SpectrumRow[] {
  const byId = new Map(rows.map((row) => [row.id, row]));
  return [...new Set(ids)].map((id) => {
    const row = byId.get(id);
    if (!row) throw new AppError('NOT_FOUND', 'One of these spectra is not here, or not yours to see');
    return row;
  });
}

async function pointViews(rows: readonly SpectrumRow[]): Promise<SpectrumPointsView[]> {
  const stored = await readManyRaw<StoredPoints>('spectrum_points', rows);
  const byId = new Map(stored.map((points) => [points.spectrum_id, points]));
  return rows.flatMap((row) => {
    const points = byId.get(row.id);
    return points ? [spectrumPointsView(row, points)] : [];
  });
}

/** Several spectra for one plot, in the order asked for. @throws AppError NOT_FOUND */
export async function manySpectrumPoints(
  actor: Actor,
  ids: readonly string[],
): Promise<SpectrumPointsView[]> {
  const rows = await listAcrossFor(actor, 'spectrum', { where: { id: [...ids] } });
  return pointViews(inOrder(rows, ids));
}

/**
 * One absorbance off each of these spectra of a notebook by one rule, in the order asked for. A spectrum that
 * the rule cannot be followed on answers with `error`; the others are read all the same.
 *
 * @throws AppError NOT_FOUND when one of them is not in this notebook
 */
export async function readingsFromSpectra(
  actor: Actor,
  notebookId: string,
  spectrumIds: readonly string[],
  rule: ReadingRule,
): Promise<SpectrumReadingView[]> {
  const found = await listFor(actor, 'spectrum', notebookId, { where: { id: [...spectrumIds] } });
  const rows = inOrder(found, spectrumIds);
  const points = await pointViews(rows);
  const pathLengths = new Map(rows.map((row) => [row.id, row.pathLengthMm]));
  return points.map((view) => readPointsByRule(view, rule, pathLengths.get(view.id) ?? null));
}

/** @throws AppError NOT_FOUND, NOT_ALLOWED */
export function renameSpectrum(actor: Actor, id: string, name: string): Promise<SpectrumDetail> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'spectrum', 'edit', id);
    await changeFor(actor, row, { name });
    return getSpectrum(actor, id);
  });
}

/**
 * Set a spectrum aside with a reason, or bring it back with one. It is kept and stays visible on request.
 * @throws AppError NOT_FOUND, NOT_ALLOWED
 */
export function setSpectrumAside(
  actor: Actor,
  id: string,
  aside: boolean,
  reason: string,
): Promise<SpectrumDetail> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'spectrum', 'edit', id);
    const values = { voidedAt: aside ? new Date() : null, voidReason: aside ? reason : null };
    if ((row.voidedAt !== null) !== aside) await changeFor(actor, row, values, reason);
    return getSpectrum(actor, id);
  });
}
