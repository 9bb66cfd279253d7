import { isBlank } from '../number-cell';
import type { TextLines } from '../text-lines';

/** One labelled data record. `from`..`to` are the lines below the label's own. */
export interface JcampRecord {
  readonly label: string;
  readonly value: string;
  readonly line: number;
  readonly from: number;
  readonly to: number;
}

const HASH = 35;
const DOLLAR = 36;

/** Labels are equal when they differ only in case, blanks, hyphens, slashes and underscores. */
export function normalLabel(label: string): string {
  return label.replace(/[\s\-/_]/g, '').toUpperCase();
}

/** Where the data of a line end: at its comment, if it has one. */
export function dataEnd(lines: TextLines, line: number): number {
  const start = lines.start[line] ?? 0;
  const end = lines.end[line] ?? 0;
  for (let i = start; i + 1 < end; i++) {
    if (lines.text.charCodeAt(i) === DOLLAR && lines.text.charCodeAt(i + 1) === DOLLAR) return i;
  }
  return end;
}

/** Whether a line starts a record: "##", whatever blanks stand before it. */
function labelStart(lines: TextLines, line: number): number {
  let at = lines.start[line] ?? 0;
  const end = lines.end[line] ?? 0;
  while (at < end && isBlank(lines.text.charCodeAt(at))) at += 1;
  return lines.text.charCodeAt(at) === HASH && lines.text.charCodeAt(at + 1) === HASH && at + 1 < end
    ? at + 2
    : -1;
}

/** The records of a file in order. Comment records ("##=") are left out; "##END" is one with or without "=". */
export function jcampRecords(lines: TextLines): JcampRecord[] {
  const records: JcampRecord[] = [];
  let open: { label: string; value: string; line: number } | undefined;
  const close = (to: number): void => {
    if (open && open.label !== '') records.push({ ...open, from: open.line + 1, to });
  };
  for (let line = 0; line < lines.count; line++) {
    const at = labelStart(lines, line);
    if (at < 0) continue;
    close(line);
    const end = dataEnd(lines, line);
    const content = lines.text.slice(at, Math.max(at, end));
    const equals = content.indexOf('=');
    const label = normalLabel(equals < 0 ? content : content.slice(0, equals));
    open = { label, value: equals < 0 ? '' : content.slice(equals + 1).trim(), line };
    if (equals < 0 && label !== 'END') open = undefined;
  }
  close(lines.count);
  return records;
}

/** A record's whole value: its own line and those below, without comments. */
export function recordText(lines: TextLines, record: JcampRecord): string {
  const parts = [record.value];
  for (let line = record.from; line < record.to; line++) {
    parts.push(lines.text.slice(lines.start[line] ?? 0, dataEnd(lines, line)).trim());
  }
  return parts.filter((part) => part !== '').join('\n');
}

const FIRST_LABELS = new Set([
  'TITLE',
  'JCAMPDX',
  'JCAMPCS',
  'DATATYPE',
  'DATACLASS',
  'XYDATA',
  'XYPOINTS',
  'XUNITS',
  'NPOINTS',
  'PEAKTABLE',
  'ORIGIN',
  'END',
]);

/** Labels that no other kind of file has, wherever they stand. */
const SURE_LABELS = new Set(['TITLE', 'JCAMPDX', 'XYDATA', 'XYPOINTS']);

/** Whether a text is JCAMP-DX: its first line but for blanks and comments starts a record with a label of that format. */
export function looksLikeJcamp(text: string): boolean {
  const [first, ...more] = text
    .slice(0, 20_000)
    .split(/[\r\n]/)
    .map((line) => line.trimStart())
    .filter((line) => line !== '');
  if (first === undefined || !/^(?:\$\$|##)/.test(first)) return false;
  const records = [first, ...more].filter((line) => line.startsWith('##')).map(labelOf);
  const leading = [first, ...more].find((line) => !line.startsWith('$$'));
  if (leading?.startsWith('##') && FIRST_LABELS.has(records[0] ?? '')) return true;
  return records.some((label) => SURE_LABELS.has(label));
}

/** The label of a line that starts a record; empty when no equals sign follows it. */
function labelOf(line: string): string {
  const equals = line.indexOf('=');
  return equals < 0 || equals > 42 ? '' : normalLabel(line.slice(2, equals));
}
