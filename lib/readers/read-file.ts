import { ReaderError, type ReadOptions, type ReadResult } from './types';

/**
 * Read a spectrum file: bytes in; spectra, header text, warnings and open questions out. Pure.
 *
 * @param bytes    the file as it came
 * @param fileName used for the name of a nameless spectrum, never to decide the format
 * @param options  the person's word where the reader would guess
 * @throws ReaderError when there is nothing to read; its message says what the file is and what to do
 */
export function readFile(bytes: Uint8Array, fileName: string, options: ReadOptions = {}): ReadResult {
  if (bytes.length === 0) throw new ReaderError('EMPTY', 'This file is empty (0 bytes). Export it again.');
  throw new ReaderError('UNKNOWN', `No reader for ${fileName} (${Object.keys(options).length} options)`);
}
