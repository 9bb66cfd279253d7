export type Encoding = 'UTF-8' | 'UTF-16 LE' | 'UTF-16 BE' | 'windows-1252';

export interface DecodedText {
  readonly text: string;
  readonly encoding: Encoding;
  /** False when the encoding was concluded from the bytes, true when a byte order mark says it. */
  readonly marked: boolean;
}

/** Bytes looked at to tell UTF-16 without a mark; a table shows its pattern long before. */
const NUL_SAMPLE = 65_536;

/**
 * Decode the bytes of a text file.
 *
 * A byte order mark decides; else NUL in more than 30 % of the bytes means UTF-16, its order by the parity of
 * the NULs; else strict UTF-8; else windows-1252, which reads any byte. Padding (NUL, Ctrl-Z) at the end is cut.
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  const [b0, b1, b2] = bytes;
  if (b0 === 0xef && b1 === 0xbb && b2 === 0xbf) return utf8OrWestern(bytes.subarray(3), true);
  if (b0 === 0xff && b1 === 0xfe) return decoded(bytes.subarray(2), 'utf-16le', 'UTF-16 LE', true);
  if (b0 === 0xfe && b1 === 0xff) return decoded(bytes.subarray(2), 'utf-16be', 'UTF-16 BE', true);
  const order = utf16Order(bytes);
  if (order === 'little') return decoded(bytes, 'utf-16le', 'UTF-16 LE', false);
  if (order === 'big') return decoded(bytes, 'utf-16be', 'UTF-16 BE', false);
  return utf8OrWestern(bytes, false);
}

function utf16Order(bytes: Uint8Array): 'little' | 'big' | undefined {
  const n = Math.min(bytes.length, NUL_SAMPLE);
  let even = 0;
  let odd = 0;
  for (let i = 0; i < n; i++) {
    if (bytes[i] !== 0) continue;
    if (i % 2 === 0) even += 1;
    else odd += 1;
  }
  if (even + odd <= 0.3 * n) return undefined;
  if (odd > 4 * even) return 'little';
  if (even > 4 * odd) return 'big';
  return undefined;
}

function utf8OrWestern(bytes: Uint8Array, marked: boolean): DecodedText {
  try {
    const text = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
    return { text: withoutPadding(text), encoding: 'UTF-8', marked };
  } catch {
    // Not UTF-8: the decoder's only way to say so is to throw.
    const { text } = decoded(bytes, 'windows-1252', 'windows-1252', false);
    return { text: text.replace(/[\u0080-\u009f]/g, westernSign), encoding: 'windows-1252', marked: false };
  }
}

/** What windows-1252 has at 0x80 to 0x9F; a blank in this list is a place it leaves empty. */
const WESTERN =
  '\u20ac \u201a\u0192\u201e\u2026\u2020\u2021\u02c6\u2030\u0160\u2039\u0152 \u017d  \u2018\u2019\u201c\u201d\u2022\u2013\u2014\u02dc\u2122\u0161\u203a\u0153 \u017e\u0178';

/** Node 20 decodes windows-1252 as Latin-1, browsers as the standard says; this makes both the same. */
function westernSign(control: string): string {
  const sign = WESTERN[control.charCodeAt(0) - 0x80];
  return sign === undefined || sign === ' ' ? control : sign;
}

function decoded(bytes: Uint8Array, label: string, encoding: Encoding, marked: boolean): DecodedText {
  return { text: withoutPadding(new TextDecoder(label).decode(bytes)), encoding, marked };
}

function withoutPadding(text: string): string {
  let end = text.length;
  while (end > 0) {
    const code = text.charCodeAt(end - 1);
    if (code !== 0 && code !== 0x1a) break;
    end -= 1;
  }
  return end === text.length ? text : text.slice(0, end);
}
