import { Card } from '@/components/ui/card';
import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { CheckSource, PublishedCheck } from '@/lib/checks/types';
import { formatLikePrinted } from '@/lib/format/like-printed';
import { withTrueMinus } from '@/lib/format/number';
import { type BothResults, digitsText, verdictWords } from './check-words';

/** A number of ours in the form of the printed one. */
function Ours({ value, published }: { value: number | null | undefined; published: string }) {
  if (value === undefined) return <span className="font-sans text-ink-2">not yet</span>;
  if (value === null) return <span className="font-sans text-red">no number</span>;
  return formatLikePrinted(value, published);
}

function CheckLine({
  check,
  both,
  withKind,
}: {
  check: PublishedCheck;
  both: BothResults;
  withKind: boolean;
}) {
  const { id, what, kind, published } = check;
  const { tone, words } = verdictWords(check, both);
  const digits = digitsText(check, both);
  const verdict = (
    <Pill tone={tone} quiet={tone !== 'stop'}>
      {words}
    </Pill>
  );
  return (
    <tr id={id} className={tone === 'stop' ? 'scroll-mt-4 bg-red-wash' : 'scroll-mt-4'}>
      <RowHead className="min-w-44 md:min-w-64">
        {what}
        {withKind && <span className="block text-xs font-normal text-ink-2">{kind}</span>}
        <span className="mt-1 grid justify-items-start gap-0.5 font-normal md:hidden">
          {verdict}
          <span className="text-xs text-ink-2">{digits}</span>
        </span>
      </RowHead>
      <Td numeric>{withTrueMinus(published)}</Td>
      <Td numeric>
        <Ours value={both.browser[id]} published={published} />
      </Td>
      <Td numeric>
        <Ours value={both.server[id]} published={published} />
      </Td>
      <Td className="whitespace-nowrap max-md:hidden">{digits}</Td>
      <Td className="whitespace-nowrap max-md:hidden">{verdict}</Td>
    </tr>
  );
}

/** What one publication gives to check against, with the numbers of both places. */
export function SourceCard({ source, both }: { source: CheckSource; both: BothResults }) {
  const { title, checks } = source;
  const kinds = [...new Set(checks.map(({ kind }) => kind))];
  return (
    <Card title={title} aside={kinds.join(', ')} flush>
      <p className="border-b px-4 py-2 text-sm text-ink-2">{source.source}</p>
      <Table label={`Published and calculated: ${title}`}>
        <thead>
          <tr>
            <Th>What is checked</Th>
            <Th numeric>Published</Th>
            <Th numeric>This browser</Th>
            <Th numeric>The server</Th>
            <Th className="max-md:hidden">Digits that agree</Th>
            <Th className="max-md:hidden">Verdict</Th>
          </tr>
        </thead>
        <tbody>
          {checks.map((check) => (
            <CheckLine key={check.id} check={check} both={both} withKind={kinds.length > 1} />
          ))}
        </tbody>
      </Table>
    </Card>
  );
}
