import Link from 'next/link';
import { LightDisc } from '@/components/light-disc';
import { Button } from '@/components/ui/button';
import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { ReadingCell, StandardRowView } from '@/lib/curve/standard-rows';
import { formatDecimals, formatNumber } from '@/lib/format/number';
import { absorbanceText } from '@/lib/format/optical';

interface ReadingLook {
  cell?: ReadingCell;
  /** Where a spectrum is shown. */
  spectrumHref?: (spectrumId: string) => string;
}

function ReadingText({ cell, spectrumHref }: ReadingLook & { cell: ReadingCell }) {
  const text =
    cell.absorbanceAsRead === null ? (cell.gapText ?? 'no reading') : absorbanceText(cell.absorbanceAsRead);
  const look = cell.absorbanceAsRead === null ? 'text-amber italic' : undefined;
  const struck = cell.leftOutBecause ? (
    <s className="text-ink-2">{text}</s>
  ) : (
    <span className={look}>{text}</span>
  );
  if (cell.spectrumId === null || !spectrumHref) return struck;
  return (
    <Link href={spectrumHref(cell.spectrumId)} className="underline-offset-2 hover:underline">
      {struck}
    </Link>
  );
}

function Reading({ cell, spectrumHref }: ReadingLook) {
  if (!cell) return <Td />;
  return (
    <Td numeric title={cell.leftOutBecause ? `left out: ${cell.leftOutBecause}` : undefined}>
      <span className="inline-flex items-center gap-1.5">
        <LightDisc absorbance={cell.absorbanceAsRead} reason={cell.gapText ?? undefined} size={14} />
        <ReadingText cell={cell} spectrumHref={spectrumHref} />
      </span>
      {cell.leftOutBecause && <span className="sr-only">, left out: {cell.leftOutBecause}</span>}
    </Td>
  );
}

const signed = (percent: number) => `${percent > 0 ? '+' : ''}${formatDecimals(percent, 1)} %`;
const plain = (value: number) => String(Number(value.toPrecision(8)));

function LeftOutReasons({ rows }: { rows: readonly StandardRowView[] }) {
  const whole = rows.flatMap((row) =>
    row.leftOutBecause ? [{ key: row.name + row.index, what: row.name, why: row.leftOutBecause }] : [],
  );
  const single = rows.flatMap((row) =>
    row.leftOutBecause
      ? []
      : row.readings.flatMap((cell) =>
          cell.leftOutBecause
            ? [{ key: cell.pointId, what: `${row.name}, reading ${cell.position}`, why: cell.leftOutBecause }]
            : [],
        ),
  );
  const all = [...whole, ...single];
  if (all.length === 0) return null;
  return (
    <ul aria-label="Left out of the fit" className="grid gap-1 border-t px-4 py-2.5 text-sm">
      {all.map(({ key, what, why }) => (
        <li key={key}>
          <span className="font-medium">{what}</span> <span className="text-ink-2">left out: {why}</span>
        </li>
      ))}
    </ul>
  );
}

/** The standards with every reading as it came, read back through the line; what is left out stays, struck. */
export function StandardsTable({
  rows,
  unit,
  spectrumHref,
  onLeaveOut,
}: {
  rows: readonly StandardRowView[];
  unit: string;
  spectrumHref?: (spectrumId: string) => string;
  /** Opens the question for a standard; without it nothing can be changed. */
  onLeaveOut?: (row: StandardRowView) => void;
}) {
  const widest = Math.max(1, ...rows.map((row) => row.readings.length));
  const columns = Array.from({ length: widest }, (_, index) => index);
  return (
    <>
      <Table label="Standards">
        <thead>
          <tr>
            <Th>Standard</Th>
            <Th numeric>c, {unit}</Th>
            {columns.map((column) => (
              <Th key={column} numeric>
                A<sub>{column + 1}</sub>
              </Th>
            ))}
            <Th numeric>read back</Th>
            <Th numeric>error</Th>
            {onLeaveOut && <Th className="no-print">Fit</Th>}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.index}>
              <RowHead className="whitespace-nowrap">
                {row.name} {row.role === 'blank' && row.name.toLowerCase() !== 'blank' && <Pill>blank</Pill>}
              </RowHead>
              <Td numeric>
                {row.role === 'blank' ? <span className="aside">blank</span> : plain(row.concentration)}
              </Td>
              {columns.map((column) => (
                <Reading key={column} cell={row.readings[column]} spectrumHref={spectrumHref} />
              ))}
              <Td numeric>{row.backCalculated === null ? '–' : formatNumber(row.backCalculated, 4)}</Td>
              <Td numeric className={Math.abs(row.errorPercent ?? 0) > 10 ? 'text-amber' : 'text-ink-2'}>
                {row.errorPercent === null ? '–' : signed(row.errorPercent)}
              </Td>
              {onLeaveOut && (
                <Td className="no-print">
                  <Button
                    size="small"
                    variant="quiet"
                    aria-label={`Leave out ${row.name}, or a reading of it`}
                    onClick={() => onLeaveOut(row)}
                  >
                    {row.leftOutBecause ? 'Left out' : 'Leave out'}
                  </Button>
                </Td>
              )}
            </tr>
          ))}
        </tbody>
      </Table>
      <LeftOutReasons rows={rows} />
    </>
  );
}
