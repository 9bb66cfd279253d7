const KEY =
  /path[\s_-]*length|optical[\s_-]*path|cell[\s_-]*(?:path|length)|schichtdicke|cuvette[\s_-]*length/i;
const VALUE = /^\s*(\d+(?:[.,]\d+)?)\s*(mm|cm)?\s*$/i;
const UNIT_IN_KEY = /\b(mm|cm)\b/i;

/**
 * The path length that a file states in its header, in mm; null when it states none or no unit with it.
 * A bare number in JCAMP-DX is in cm, as its definition says.
 */
export function pathLengthFromHeader(
  header: Readonly<Record<string, string>>,
  reader: string,
): number | null {
  for (const [key, text] of Object.entries(header)) {
    if (!KEY.test(key)) continue;
    const [, digits = '', written] = VALUE.exec(text) ?? [];
    const unit = (written ?? UNIT_IN_KEY.exec(key)?.[1] ?? (/jcamp/i.test(reader) ? 'cm' : '')).toLowerCase();
    const value = Number(digits.replace(',', '.'));
    if (unit === '' || !(value > 0)) continue;
    // digits moved, not multiplied: 0.1 cm is 1 mm, not 1.0000000000000002
    return unit === 'cm' ? Number(`${value}e1`) : value;
  }
  return null;
}
