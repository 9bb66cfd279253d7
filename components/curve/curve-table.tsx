import Link from 'next/link';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { formatDate } from '@/lib/format/dates';
import { formatNumber } from '@/lib/format/number';
import type { CurveSummary } from '@/lib/views/curve';
import { CurveStatusPill } from './curve-status';
import { ShortQuantity } from './short-quantity';

const plain = (value: number) => String(Number(value.toPrecision(6)));

/** Curves of a notebook, a line each. */
export function CurveTable({
  label,
  curves,
  timeZone,
}: {
  label: string;
  curves: readonly CurveSummary[];
  timeZone: string;
}) {
  return (
    <Table label={label}>
      <thead>
        <tr>
          <Th>Curve</Th>
          <Th>Version</Th>
          <Th numeric>Slope, A per 10 mm</Th>
          <Th numeric>Residual SD</Th>
          <Th numeric>Standards</Th>
          <Th>Saved</Th>
        </tr>
      </thead>
      <tbody>
        {curves.map((curve) => (
          <tr key={curve.id}>
            <RowHead className="min-w-48">
              <Link
                href={`/notebooks/${curve.notebookId}/curves/${curve.id}`}
                className="text-uv underline-offset-2 hover:underline"
              >
                {curve.title}
              </Link>
            </RowHead>
            <Td className="whitespace-nowrap">
              <span className="num mr-2">{curve.version}</span>
              <CurveStatusPill curve={curve} />
            </Td>
            <Td numeric>
              <ShortQuantity {...curve.slope} />
            </Td>
            <Td numeric>{formatNumber(curve.residualSd, 2)}</Td>
            <Td numeric>
              {plain(curve.range.min)} to {plain(curve.range.max)}{' '}
              <span className="aside font-sans text-sm">{unitWithBasis(curve.unit, curve.basis)}</span>
            </Td>
            <Td className="text-sm whitespace-nowrap text-ink-2">
              {formatDate(curve.createdAt, timeZone)}, {curve.createdBy}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
