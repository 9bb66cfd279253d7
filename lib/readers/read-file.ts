import { looksLikeAniml, readAniml } from './animl/read-animl';
import { checkAnswers } from './check-answers';
import { decodeText } from './decode-text';
import { readDelimited } from './delimited/read-delimited';
import { looksLikeJcamp } from './jcamp/records';
import { readJcamp } from './jcamp/read-jcamp';
import { refuseSignature, refuseText } from './refuse';
import { shapeKey } from './shape-key';
import { ReaderError, type ReadOptions, type ReadResult } from './types';

/** Every guess a person can replace. */
export type ReadAnswers = Omit<ReadOptions, 'onSteps'>;

/**
 * Read a spectrum file: bytes in; spectra, header text, warnings and open questions out. Pure.
 *
 * @param bytes    the file as it came
 * @param fileName used for the name of a nameless spectrum, never to decide the format
 * @param options  the person's word where the reader would guess
 * @throws ReaderError when there is nothing to read, or an answer does not fit; its message says what to do
 */
export function readFile(bytes: Uint8Array, fileName: string, options: ReadOptions = {}): ReadResult {
  checkAnswers(options);
  const { onSteps, ...answers } = options;
  const result = readOnce(bytes, fileName, options);
  if (Object.values(answers).every((answer) => answer === undefined)) return result;
  return { ...result, shape: shapeUnanswered(bytes, fileName, onSteps ? { onSteps } : {}) };
}

/** Read a file again with a person's answers in place of the reader's guesses; those not answered stay guesses. */
export function readWith(bytes: Uint8Array, fileName: string, answers: ReadAnswers): ReadResult {
  return readFile(bytes, fileName, answers);
}

/** The key that the file has before anything was answered: answers are remembered under it. */
function shapeUnanswered(bytes: Uint8Array, fileName: string, options: ReadOptions): string {
  try {
    return readOnce(bytes, fileName, options).shape;
  } catch (error) {
    if (error instanceof ReaderError) return shapeKey('refused', [error.code]);
    throw error;
  }
}

function readOnce(bytes: Uint8Array, fileName: string, options: ReadOptions): ReadResult {
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
