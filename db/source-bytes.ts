import { createHash } from 'node:crypto';
import { promisify } from 'node:util';
import { gunzip, gzip } from 'node:zlib';
import { insertRaw, readRaw } from './access';
import type { SourceFileRow } from './models/spectra';

/** The bytes of a source file as they lie in the database. */
interface StoredBytes {
  readonly encoding: string;
  readonly bytes: Buffer;
}

const ENCODING = 'gzip';

const compress = promisify<Uint8Array, Buffer>(gzip);
const decompress = promisify<Buffer, Buffer>(gunzip);

export const sha256Of = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

/** Compress before the transaction begins: others are waiting for it. */
export function packBytes(bytes: Uint8Array): Promise<Buffer> {
  return compress(bytes);
}

export function insertBytes(sourceFileId: string, packed: Buffer): Promise<void> {
  return insertRaw('source_bytes', ['source_file_id', 'encoding', 'bytes'], [sourceFileId, ENCODING, packed]);
}

/** The bytes as they came, and whether they still give the hash that was written down with them. */
export async function unpackBytes(file: SourceFileRow): Promise<{ bytes: Buffer; intact: boolean }> {
  const stored = await readRaw<StoredBytes>('source_bytes', file);
  if (stored?.encoding !== ENCODING)
    throw new Error(`source file ${file.id} has no bytes of a known encoding`);
  const bytes = await decompress(stored.bytes).catch(() => null); // damaged: said below, not thrown away
  return { bytes: bytes ?? Buffer.alloc(0), intact: bytes !== null && sha256Of(bytes) === file.sha256 };
}
