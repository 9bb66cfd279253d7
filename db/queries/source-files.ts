import { Op, type WhereOptions } from 'sequelize';
import { createFor, listAcrossFor, listFor, listNotebooksFor, loadFor } from '@/db/access';
import type { SourceFileRow, SpectrumRow } from '@/db/models/spectra';
import { namesOf } from '@/db/names';
import { pageOf } from '@/db/page';
import { recordEvent } from '@/db/record';
import { inTransaction } from '@/db/sequelize';
import { insertBytes, packBytes, sha256Of, unpackBytes } from '@/db/source-bytes';
import { insertSpectra, prepareSpectra, type PreparedSpectrum } from '@/db/spectrum-rows';
import { sourceFileView } from '@/db/views/source-file';
import { spectrumView } from '@/db/views/spectrum';
import { AppError } from '@/lib/errors';
import { LIMITS } from '@/lib/limits';
import type { Actor } from '@/lib/policies/actor';
import { readFile } from '@/lib/readers/read-file';
import { ReaderError, type ReadOptions, type ReadResult } from '@/lib/readers/types';
import type { Page, PageQuery } from '@/lib/schemas/page-query';
import type {
  FileElsewhere,
  RefusedUploadView,
  SourceFileDetail,
  SourceFileView,
  UploadOutcome,
} from '@/lib/views/source-file';

export interface Upload {
  readonly name: string;
  readonly bytes: Uint8Array;
  /** SHA-256 taken while the bytes came in; what is stored must still give it. */
  readonly sha256?: string;
  /** The person's word where the reader would guess. */
  readonly options?: ReadOptions;
  /** Take the reader's proposal where it would ask; what it asked is kept as warnings. */
  readonly acceptProposal?: boolean;
}

/** The last part of a path, without control characters; the end of a name says more than its beginning. */
function fileName(name: string): string {
  const last =
    name
      .replace(/\p{Cc}/gu, '')
      .split(/[\\/]/)
      .at(-1) ?? '';
  return last.trim().slice(-LIMITS.fileName) || 'unnamed';
}

/** Whether the actor may bring files into this notebook. @throws AppError NOT_FOUND, NOT_ALLOWED */
export async function checkMayUpload(actor: Actor, notebookId: string): Promise<void> {
  await loadFor(actor, 'notebook', 'edit', notebookId);
}

const spectraOfFiles = (actor: Actor, files: readonly SourceFileRow[]): Promise<SpectrumRow[]> =>
  listAcrossFor(actor, 'spectrum', {
    where: { sourceFileId: files.map((file) => file.id) },
    attributes: { exclude: ['header', 'gaps'] },
    order: [['position', 'ASC']],
  });

async function alreadyHere(actor: Actor, file: SourceFileRow): Promise<UploadOutcome> {
  const spectra = await spectraOfFiles(actor, [file]);
  return {
    verdict: 'alreadyHere',
    sourceFile: sourceFileView(file, spectra),
    spectra: spectra.map((row) => spectrumView(row, file.name)),
  };
}

/** The same bytes among the files the actor may read: in this notebook, and in others. */
async function sameBytes(actor: Actor, notebookId: string, sha256: string) {
  const files = await listAcrossFor(actor, 'sourceFile', { where: { sha256, voidedAt: null } });
  return {
    here: files.find((file) => file.notebookId === notebookId),
    others: files.filter((file) => file.notebookId !== notebookId),
  };
}

async function elsewhere(actor: Actor, files: readonly SourceFileRow[]): Promise<FileElsewhere[]> {
  if (files.length === 0) return [];
  const notebooks = await listNotebooksFor(actor);
  const titles = new Map(notebooks.map((notebook) => [notebook.id, notebook.title]));
  return files.map((file) => ({
    sourceFileId: file.id,
    notebookId: file.notebookId,
    notebookTitle: titles.get(file.notebookId) ?? '',
    name: file.name,
  }));
}

interface Prepared {
  readonly result: ReadResult;
  readonly spectra: readonly PreparedSpectrum[];
}

/** Note that a file was left out, so that nobody looks for it in vain. */
function noteRefusal(actor: Actor, notebookId: string, name: string, error: ReaderError): Promise<void> {
  const to = { code: error.code, line: error.line ?? null };
  const event = {
    kind: 'source file',
    verb: 'refused',
    notebookId,
    subjectName: name,
    to,
    why: error.message,
  };
  return inTransaction(() => recordEvent(actor, event));
}

async function readOrRefuse(
  actor: Actor,
  notebookId: string,
  upload: Upload,
  name: string,
): Promise<Prepared> {
  try {
    const result = readFile(upload.bytes, name, upload.options ?? {});
    return { result, spectra: prepareSpectra(result) };
  } catch (error) {
    if (error instanceof ReaderError) await noteRefusal(actor, notebookId, name, error);
    throw error;
  }
}

function fileValues(
  notebookId: string,
  name: string,
  upload: Upload,
  sha256: string,
  { result, spectra }: Prepared,
) {
  const open = result.questions.map(({ code, message }) => ({ code, message }));
  return {
    notebookId,
    name,
    sha256,
    sizeBytes: upload.bytes.length,
    reader: result.reader,
    readerVersion: result.readerVersion,
    dialect: result.dialect,
    settings: result.settings,
    headerText: result.headerText,
    trailerText: result.trailerText,
    warnings: [...result.warnings, ...open],
    spectrumCount: spectra.length,
    pointCount: spectra.reduce((sum, { read }) => sum + read.x.length, 0),
  };
}

async function store(
  actor: Actor,
  values: ReturnType<typeof fileValues>,
  packed: Buffer,
  spectra: readonly PreparedSpectrum[],
): Promise<UploadOutcome> {
  const createdById = actor.personId;
  if (createdById === null) throw new AppError('NOT_ALLOWED', 'A file is brought in by a person');
  const { here, others } = await sameBytes(actor, values.notebookId, values.sha256);
  if (here) return alreadyHere(actor, here);
  const file = await createFor(actor, 'sourceFile', { ...values, createdById });
  await insertBytes(file.id, packed);
  const rows = await insertSpectra(actor, file, spectra);
  return {
    verdict: 'stored',
    sourceFile: sourceFileView(file, rows),
    spectra: rows.map((row) => spectrumView(row, file.name)),
    elsewhere: await elsewhere(actor, others),
  };
}

/**
 * Bring one file into a notebook: its bytes as they came, its spectra and their raw points, all in one
 * transaction. The same bytes are not stored twice in a notebook; where the reader would have to guess, nothing
 * is stored and the questions come back.
 *
 * @throws AppError NOT_FOUND, NOT_ALLOWED, CONFLICT (the bytes changed on the way)
 * @throws ReaderError when there is nothing to read; only a line of the record is kept
 */
export async function uploadSourceFile(
  actor: Actor,
  notebookId: string,
  upload: Upload,
): Promise<UploadOutcome> {
  await checkMayUpload(actor, notebookId);
  const name = fileName(upload.name);
  const sha256 = sha256Of(upload.bytes);
  if (upload.sha256 !== undefined && upload.sha256 !== sha256)
    throw new AppError('CONFLICT', `${name} changed on its way here. Send it again`);
  const { here } = await sameBytes(actor, notebookId, sha256);
  if (here) return alreadyHere(actor, here);
  const prepared = await readOrRefuse(actor, notebookId, upload, name);
  const { dialect, questions, shape } = prepared.result;
  if (questions.length > 0 && !upload.acceptProposal) return { verdict: 'asks', dialect, shape, questions };
  const packed = await packBytes(upload.bytes);
  const values = fileValues(notebookId, name, upload, sha256, prepared);
  return inTransaction(() => store(actor, values, packed, prepared.spectra));
}

/** What was uploaded, newest first. @throws AppError NOT_FOUND */
export async function listSourceFiles(
  actor: Actor,
  notebookId: string,
  query: PageQuery,
): Promise<Page<SourceFileView>> {
  const page = await pageOf(
    query,
    (part) =>
      listFor(actor, 'sourceFile', notebookId, {
        where: { [Op.and]: [{ voidedAt: null }, part.where] } as WhereOptions,
        order: part.order,
        limit: part.limit,
        attributes: { exclude: ['headerText', 'trailerText', 'settings'] },
      }),
    (row) => row,
  );
  const spectra = await spectraOfFiles(actor, page.items);
  const items = page.items.map((file) =>
    sourceFileView(
      file,
      spectra.filter((row) => row.sourceFileId === file.id),
    ),
  );
  return { items, nextCursor: page.nextCursor };
}

/** Uploads that were left out, newest first. @throws AppError NOT_FOUND */
export async function listRefusedUploads(
  actor: Actor,
  notebookId: string,
  limit: number,
): Promise<RefusedUploadView[]> {
  const entries = await listFor(actor, 'recordEntry', notebookId, {
    where: { kind: 'source file', verb: 'refused' },
    order: [['id', 'DESC']],
    limit,
  });
  return entries.map((entry) => ({
    entryId: entry.id,
    name: entry.subjectName ?? '',
    sentence: entry.why ?? '',
    line: typeof entry.to?.line === 'number' ? entry.to.line : null,
    by: entry.actorName,
    at: entry.at.toISOString(),
  }));
}

/** One file; with `notebookId` only when it is in that notebook. @throws AppError NOT_FOUND */
export async function getSourceFile(
  actor: Actor,
  id: string,
  notebookId?: string,
): Promise<SourceFileDetail> {
  const file = await loadFor(actor, 'sourceFile', 'read', id);
  if (notebookId !== undefined && file.notebookId !== notebookId) throw new AppError('NOT_FOUND');
  const spectra = await spectraOfFiles(actor, [file]);
  const names = await namesOf([file.createdById]);
  return {
    ...sourceFileView(file, spectra),
    headerText: file.headerText,
    trailerText: file.trailerText,
    uploadedBy: names.get(file.createdById) ?? null,
    spectra: spectra.map((row) => spectrumView(row, file.name)),
  };
}

export interface SourceBytes {
  readonly name: string;
  readonly sha256: string;
  readonly bytes: Uint8Array;
  /** Whether the stored bytes still give the hash that was written down when they came. */
  readonly intact: boolean;
}

/** The bytes as they came, their hash checked again now. @throws AppError NOT_FOUND */
export async function readSourceBytes(actor: Actor, id: string): Promise<SourceBytes> {
  const file = await loadFor(actor, 'sourceFile', 'read', id);
  return { name: file.name, sha256: file.sha256, ...(await unpackBytes(file)) };
}

/** Whether the stored bytes still give their hash; null when the file is larger than `upToBytes`. @throws AppError NOT_FOUND */
export async function checkSourceBytes(actor: Actor, id: string, upToBytes: number): Promise<boolean | null> {
  const file = await loadFor(actor, 'sourceFile', 'read', id);
  return file.sizeBytes > upToBytes ? null : (await unpackBytes(file)).intact;
}
