import { Disclosure } from '@/components/ui/disclosure';
import { EmptyState } from '@/components/ui/empty-state';
import { Table, Td, Th } from '@/components/ui/table';
import { formatDateTime } from '@/lib/format/dates';
import type { RecordEntryView } from '@/lib/views/notebook';

const VIA: Readonly<Record<string, string>> = {
  session: '',
  token: 'by access token',
  link: 'by link',
  script: '',
};

/** A value as a person reads it; ids and long structures are cut, the API gives them whole. */
export function recordedText(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'nothing';
  const text = typeof value === 'object' ? JSON.stringify(value) : String(value);
  return text.length > 120 ? `${text.slice(0, 117)}…` : text;
}

/** "wavelengthNm" as "wavelength nm". */
const columnWords = (name: string) => name.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();

const INTERNAL = /Id$/;

/** What a row was made with is folded away: it stands on the row's own page too. A change is always seen. */
function Changes({ entry }: { entry: RecordEntryView }) {
  const columns = Object.keys(entry.to ?? {}).filter((name) => !INTERNAL.test(name));
  if (columns.length === 0) return null;
  const list = <ChangeList entry={entry} columns={columns} />;
  if (entry.from || columns.length <= 3) return list;
  return <Disclosure summary={`with ${columns.length} values`}>{list}</Disclosure>;
}

function ChangeList({ entry, columns }: { entry: RecordEntryView; columns: readonly string[] }) {
  return (
    <ul className="grid gap-0.5">
      {columns.map((name) => (
        <li key={name} className="break-words">
          <span className="text-ink-2">{columnWords(name)}: </span>
          {entry.from && (
            <>
              <del className="text-ink-2">{recordedText(entry.from[name])}</del>
              <span aria-hidden="true" className="text-ink-2">
                {' '}
                ›{' '}
              </span>
            </>
          )}
          <ins className="no-underline">{recordedText(entry.to?.[name])}</ins>
        </li>
      ))}
    </ul>
  );
}

export function RecordTable({
  entries,
  timeZone,
}: {
  entries: readonly RecordEntryView[];
  timeZone: string;
}) {
  if (entries.length === 0) return <EmptyState title="No entries yet" />;
  return (
    <Table label="Record">
      <thead>
        <tr>
          <Th>When</Th>
          <Th>Who</Th>
          <Th>What</Th>
          <Th>From, to</Th>
          <Th>Why</Th>
        </tr>
      </thead>
      <tbody>
        {entries.map((entry) => (
          <tr key={entry.id} className="align-top">
            <Td className="align-top whitespace-nowrap">{formatDateTime(entry.at, timeZone)}</Td>
            <Td className="align-top">
              {entry.who} <span className="text-ink-2">{VIA[entry.via] ?? entry.via}</span>
            </Td>
            <Td className="align-top">
              {entry.kind} {entry.verb}
              {entry.subject && <span className="block text-ink-2">{entry.subject}</span>}
            </Td>
            <Td className="max-w-120 min-w-64 align-top text-sm">
              <Changes entry={entry} />
            </Td>
            <Td className="align-top">{entry.why}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
