import { CircleSlash } from 'lucide-react';
import Link from 'next/link';
import { LightDisc } from '@/components/light-disc';
import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { ReadingCell, StandardRowView } from '@/lib/curve/standard-rows';
import { formatDecimals } from '@/lib/format/number';
import { absorbanceText } from '@/lib/format/optical';

interface ReadingLook {
  cell?: ReadingCell;
  /** Where a spectrum is shown. */
  spectrumHref?: (spectrumId: string) => string;
}

function ReadingText({ cell, spectrumHref }: ReadingLook & { cell: ReadingCell }) {
  const read =
    cell.absorbanceAsRead === null ? (cell.gapText ?? 'no reading') : absorbanceText(cell.absorbanceAsRead);
  const text = cell.takenOff === null ? read : `${read} − ${absorbanceText(cell.takenOff)}`;
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
  if (!cell) return <Td className={CLOSE} />;
  return (
    <Td
      numeric
      className={CLOSE}
      title={cell.leftOutBecause ? `left out: ${cell.leftOutBecause}` : undefined}
    >
      <span className="inline-flex items-center gap-1">
        <LightDisc absorbance={cell.absorbanceAsRead} reason={cell.gapText ?? undefined} size={13} />
        <ReadingText cell={cell} spectrumHref={spectrumHref} />
      </span>
      {cell.leftOutBecause && <span className="sr-only">, left out: {cell.leftOutBecause}</span>}
    </Td>
  );
}

const signed = (percent: number) => `${percent > 0 ? '+' : ''}${formatDecimals(percent, 1)} %`;
/** Cells stand closer here than in other tables: many readings, one line. */
const CLOSE = 'not-last:px-1.5!';

/** Decimals that give the top standard four digits; all read-backs share them, so that their points align. */
function decimalsOf(rows: readonly StandardRowView[]): number {
  const top = Math.max(...rows.map(({ concentration }) => concentration), 0);
  return top > 0 ? Math.min(8, Math.max(0, 3 - Math.floor(Math.log10(top)))) : 3;
}

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
  const decimals = decimalsOf(rows);
  const columns = Array.from({ length: widest }, (_, index) => index);
  return (
    <>
      <Table label="Standards">
        <thead>
          <tr>
            <Th>Standard</Th>
            <Th numeric className={CLOSE}>
              c, {unit}
            </Th>
            {columns.map((column) => (
              <Th key={column} numeric className={CLOSE}>
                A<sub>{column + 1}</sub>
              </Th>
            ))}
            <Th numeric className={CLOSE}>
              read back
            </Th>
            <Th numeric className={CLOSE}>
              error
            </Th>
            {onLeaveOut && (
              <Th className="no-print px-1!">
                <span className="sr-only">Leave out</span>
              </Th>
            )}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.index}>
              <RowHead className="whitespace-nowrap">
                {row.name} {row.role === 'blank' && row.name.toLowerCase() !== 'blank' && <Pill>blank</Pill>}
              </RowHead>
              <Td numeric className={CLOSE}>
                {row.role === 'blank' ? <span className="aside">blank</span> : plain(row.concentration)}
              </Td>
              {columns.map((column) => (
                <Reading key={column} cell={row.readings[column]} spectrumHref={spectrumHref} />
              ))}
              <Td numeric className={CLOSE}>
                {row.backCalculated === null ? '–' : formatDecimals(row.backCalculated, decimals)}
              </Td>
              <Td
                numeric
                className={`${CLOSE} ${Math.abs(row.errorPercent ?? 0) > 10 ? 'text-amber' : 'text-ink-2'}`}
              >
                {row.errorPercent === null ? '–' : signed(row.errorPercent)}
              </Td>
              {onLeaveOut && (
                <Td className="no-print px-1!">
                  <button
                    type="button"
                    title={`Leave out ${row.name}, or a reading of it`}
                    aria-label={`Leave out ${row.name}, or a reading of it`}
                    className="grid size-7 place-items-center rounded-control text-ink-2 hover:bg-raised hover:text-ink"
                    onClick={() => onLeaveOut(row)}
                  >
                    <CircleSlash aria-hidden="true" className="size-4" />
                  </button>
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
