import 'server-only';
import type { IncomingMessage } from 'node:http';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { Readable } from 'node:stream';
import type { ReadableStream as NodeWebStream } from 'node:stream/web';
import formidable, { errors as formErrors } from 'formidable';
import { AppError } from '@/lib/errors';
import { LIMITS } from '@/lib/limits';
import { uploadFields } from '@/lib/schemas/spectrum-upload';
import type { Upload } from '@/db/queries/source-files';

const MEGABYTE = 1024 * 1024;
/** Boundaries and the small fields beside the file. */
const AROUND_THE_FILE = MEGABYTE;
const FIELD_BYTES = 64 * 1024;

const tooLarge = () =>
  new AppError(
    'TOO_LARGE',
    `This file is larger than ${LIMITS.fileBytes / MEGABYTE} MB. Split it, or export fewer spectra at a time`,
  );

/** What formidable says by number, in a sentence. */
function refusal(error: unknown): unknown {
  if (!(error instanceof formErrors.default)) return error;
  if (error.code === formErrors.maxFilesExceeded)
    return new AppError('MALFORMED', 'Send one file a request, in the field "file"');
  if (error.httpCode === 413) return tooLarge();
  if (error.code === formErrors.noParser || error.httpCode === 415)
    return new AppError('MALFORMED', 'Send the file as multipart/form-data, in the field "file"');
  return new AppError('MALFORMED', 'The upload broke off before the end. Send the file again');
}

function asNodeRequest(request: Request): IncomingMessage {
  if (!request.body)
    throw new AppError('MALFORMED', 'Send the file as multipart/form-data, in the field "file"');
  const stream = Readable.fromWeb(request.body as NodeWebStream);
  const headers = Object.fromEntries(request.headers);
  // formidable reads the stream and these three and nothing else of a request
  return Object.assign(stream, {
    headers,
    method: request.method,
    url: request.url,
  }) as unknown as IncomingMessage;
}

async function parse(request: Request, uploadDir: string) {
  const form = formidable({
    uploadDir,
    maxFiles: 1,
    maxFileSize: LIMITS.fileBytes,
    maxTotalFileSize: LIMITS.fileBytes,
    maxFields: 4,
    maxFieldsSize: FIELD_BYTES,
    minFileSize: 0,
    allowEmptyFiles: true,
    hashAlgorithm: 'sha256',
  });
  try {
    return await form.parse(asNodeRequest(request));
  } catch (error) {
    throw refusal(error);
  }
}

/**
 * Take in one file: streamed to a temporary folder of its own and hashed on the way; the folder is gone when
 * `work` is done, whatever happens.
 *
 * @throws AppError TOO_LARGE, MALFORMED
 */
export async function receiveUpload<T>(request: Request, work: (upload: Upload) => Promise<T>): Promise<T> {
  if (Number(request.headers.get('content-length')) > LIMITS.fileBytes + AROUND_THE_FILE) throw tooLarge();
  const folder = await mkdtemp(path.join(tmpdir(), 'halflight-upload-'));
  try {
    const [fields, files] = await parse(request, folder);
    const file = Object.values(files).flatMap((list) => list ?? [])[0];
    if (!file)
      throw new AppError('MALFORMED', 'There is no file in this request. Put it in the field "file"');
    const given = Object.fromEntries(Object.entries(fields).map(([name, values]) => [name, values?.[0]]));
    const { options, proposal } = uploadFields.parse(given);
    return await work({
      name: file.originalFilename ?? '',
      bytes: await readFile(file.filepath),
      sha256: typeof file.hash === 'string' ? file.hash : undefined,
      options,
      acceptProposal: proposal === 'accept',
    });
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
