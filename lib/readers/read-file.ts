import { looksLikeAniml, readAniml } from './animl/read-animl';
import { decodeText } from './decode-text';
import { readDelimited } from './delimited/read-delimited';
import { looksLikeJcamp } from './jcamp/records';
import { readJcamp } from './jcamp/read-jcamp';
import { refuseSignature, refuseText } from './refuse';
import type { ReadOptions, ReadResult } from './types';

/**
 * Read a spectrum file: bytes in; spectra, header text, warnings and open questions out. Pure.
 *
 * @param bytes    the file as it came
 * @param fileName used for the name of a nameless spectrum, never to decide the format
 * @param options  the person's word where the reader would guess
 * @throws ReaderError when there is nothing to read; its message says what the file is and what to do
 */
export function readFile(bytes: Uint8Array, fileName: string, options: ReadOptions = {}): ReadResult {
  refuseSignature(bytes);
  const { text, encoding } = decodeText(bytes);
  options.onSteps?.(bytes.length);
  const name = baseName(fileName);
  if (looksLikeJcamp(text)) return readJcamp(text, name, options);
  if (looksLikeAniml(text)) return readAniml(text, name, options);
  refuseText(text);
  return readDelimited(text, name, encoding, options);
}

/** The file's name without folder and extension. */
function baseName(fileName: string): string {
  const name = fileName.replace(/^.*[\\/]/, '').trim();
  return name.replace(/\.[A-Za-z0-9]{1,8}$/, '').trim() || name;
}
