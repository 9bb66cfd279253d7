import Link from 'next/link';
import { CurveStatusPill } from '@/components/curve/curve-status';
import { ShortQuantity } from '@/components/curve/short-quantity';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { ABSORPTIVITY_WORDS } from '@/lib/absorptivity/absorptivity-words';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { formatDate } from '@/lib/format/dates';
import type { AbsorptivitySummary } from '@/lib/views/absorptivity';

/** Known absorptivities of a notebook, a line each. */
export function AbsorptivityTable({
  label,
  absorptivities,
  timeZone,
}: {
  label: string;
  absorptivities: readonly AbsorptivitySummary[];
  timeZone: string;
}) {
  return (
    <Table label={label}>
      <thead>
        <tr>
          <Th>Absorptivity</Th>
          <Th>Version</Th>
          <Th numeric>Value</Th>
          <Th>Source</Th>
          <Th>Results in</Th>
          <Th>Saved</Th>
        </tr>
      </thead>
      <tbody>
        {absorptivities.map((one) => (
          <tr key={one.id}>
            <RowHead className="min-w-48">
              <Link
                href={`/notebooks/${one.notebookId}/absorptivities/${one.id}`}
                className="text-uv underline-offset-2 hover:underline"
              >
                {one.title}
              </Link>
            </RowHead>
            <Td className="whitespace-nowrap">
              <span className="num mr-2">{one.version}</span>
              <CurveStatusPill curve={one} />
            </Td>
            <Td numeric className="whitespace-nowrap">
              <ShortQuantity value={one.value} u={one.u ?? 0} />{' '}
              <span className="aside font-sans text-sm">{ABSORPTIVITY_WORDS[one.kind].unit}</span>
            </Td>
            <Td className="max-w-72 min-w-40 text-sm text-ink-2">{one.source}</Td>
            <Td>{unitWithBasis(one.unit, one.basis)}</Td>
            <Td className="text-sm whitespace-nowrap text-ink-2">
              {formatDate(one.createdAt, timeZone)}, {one.createdBy}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
