import { ReaderError } from './types';

interface Signature {
  readonly code: string;
  readonly bytes: readonly number[];
  readonly message: string;
}

const ascii = (text: string): number[] => Array.from(text, (letter) => letter.charCodeAt(0));

const SIGNATURES: readonly Signature[] = [
  {
    code: 'ZIP',
    bytes: [0x50, 0x4b, 0x03, 0x04],
    message:
      'This is a zip archive, most likely a spreadsheet (.xlsx, .ods). Open it and save the sheet as CSV, or unpack the archive.',
  },
  {
    code: 'ZIP',
    bytes: [0x50, 0x4b, 0x05, 0x06],
    message: 'This is an empty zip archive. Upload the files it was meant to hold.',
  },
  {
    code: 'OLD_SPREADSHEET',
    bytes: [0xd0, 0xcf, 0x11, 0xe0],
    message: 'This is an old office document (.xls, .doc). Open it and save the sheet as CSV.',
  },
  { code: 'PDF', bytes: ascii('%PDF'), message: 'This is a PDF. Export the data as CSV, text or JCAMP-DX.' },
  {
    code: 'RTF',
    bytes: ascii('{\\rtf'),
    message: 'This is a formatted document (RTF). Save it as plain text.',
  },
  {
    code: 'GZIP',
    bytes: [0x1f, 0x8b],
    message: 'This is a compressed file (gzip). Unpack it and upload what is inside.',
  },
  {
    code: 'IMAGE',
    bytes: [0x89, 0x50, 0x4e, 0x47],
    message: 'This is a picture (PNG). Upload the numbers behind it.',
  },
  {
    code: 'IMAGE',
    bytes: [0xff, 0xd8, 0xff],
    message: 'This is a picture (JPEG). Upload the numbers behind it.',
  },
  { code: 'IMAGE', bytes: ascii('GIF8'), message: 'This is a picture (GIF). Upload the numbers behind it.' },
  {
    code: 'HDF5',
    bytes: [0x89, 0x48, 0x44, 0x46],
    message: 'This is an HDF5 or netCDF-4 file. Export the spectrum as CSV.',
  },
  {
    code: 'NETCDF',
    bytes: ascii('CDF\u0001'),
    message: 'This is a netCDF file. Export the spectrum as CSV.',
  },
  {
    code: 'DATABASE',
    bytes: ascii('SQLite format 3'),
    message: 'This is a database. Export the spectrum as CSV.',
  },
];

/** Refuse what is known by its first bytes. */
export function refuseSignature(bytes: Uint8Array): void {
  if (bytes.length === 0) throw new ReaderError('EMPTY', 'This file is empty (0 bytes). Export it again.');
  for (const signature of SIGNATURES) {
    if (signature.bytes.every((byte, i) => bytes[i] === byte))
      throw new ReaderError(signature.code, signature.message);
  }
}

/** Characters looked at to tell binary from text. */
const CONTROL_SAMPLE = 100_000;

/** Refuse text that is not a table: web pages, pointers, links, bytes that are no text at all. */
export function refuseText(text: string): void {
  const start = text.slice(0, 2000).trimStart();
  if (start.length === 0 && text.trim().length === 0) {
    throw new ReaderError('EMPTY', 'This file holds only blank lines. Export it again.');
  }
  if (/^version https:\/\/git-lfs\.github\.com\/spec\//.test(start)) {
    throw new ReaderError(
      'LFS_POINTER',
      'This is a Git LFS pointer, not the data. Fetch the file itself (git lfs pull) and upload that.',
    );
  }
  if (/^(?:<!doctype html|<html|<head|<body)/i.test(start)) {
    const title = /<title[^>]*>([^<]{1,80})/i.exec(start)?.[1]?.trim();
    const which = title ? ` ("${title}")` : '';
    throw new ReaderError(
      'HTML',
      `This is a web page${which}, saved in place of the data. Download the file again.`,
    );
  }
  if (/^[{[]\s*(?:"|\{|\[|\]|\})/.test(start)) {
    throw new ReaderError(
      'JSON',
      'This is JSON, which has no settled form for spectra. Export the data as CSV or JCAMP-DX.',
    );
  }
  if (/^<(?:\?xml|[A-Za-z!][^>\n]*>)/.test(start)) {
    throw new ReaderError(
      'XML',
      'This is an XML document of a kind that is not read here. Export the data as CSV or JCAMP-DX.',
    );
  }
  if (/^(?:\.{0,2}\/)?[\w. -]+(?:\/[\w. -]+)+$/.test(start.trimEnd()) && text.length < 1000) {
    throw new ReaderError(
      'LINK_TEXT',
      'This holds only the path of another file (a link). Upload that file itself.',
      1,
    );
  }
  refuseBinary(text);
}

function refuseBinary(text: string): void {
  const n = Math.min(text.length, CONTROL_SAMPLE);
  let controls = 0;
  for (let i = 0; i < n; i++) {
    const code = text.charCodeAt(i);
    if (code < 32 ? code !== 9 && code !== 10 && code !== 13 && code !== 12 && code !== 11 : code === 0xfffd)
      controls += 1;
  }
  if (controls > 0.02 * n + 2) {
    throw new ReaderError(
      'BINARY',
      'This is a binary file, not text. Export the data from the instrument as CSV, text or JCAMP-DX.',
    );
  }
}
