import Link from 'next/link';
import { PlaceOnCurve } from '@/components/charts/place-on-curve';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { dilutionSentence, dilutionText } from '@/lib/batch/dilution-text';
import { meaningOf } from '@/lib/batch/meaning';
import { SIGNAL_SYMBOL, type ShownReading } from '@/lib/batch/reading-text';
import { unitWithBasis } from '@/lib/batch/unit-text';
import type { SampleResult } from '@/lib/batch/yardstick';
import type { DilutionStep } from '@/lib/engine';
import { significantText } from '@/lib/format/round';
import type { BatchMethodView } from '@/lib/views/batch';
import { alignResults, ResultCell, type AlignedResult } from './aligned-result';
import { MeaningCell } from './meaning-cell';
import { ReadingMark } from './reading-mark';

/** A sample with its result, saved or not yet. */
export interface ResultRow {
  readonly key: string;
  readonly sample: string;
  /** Where the determination opens; a result that is not saved opens nowhere. */
  readonly href?: string;
  readonly readings: readonly (ShownReading & { readonly origin: 'typed' | 'spectrum' })[];
  readonly pathLengthMm: number;
  readonly dilution: readonly DilutionStep[];
  readonly result: SampleResult;
}

type TableMethod = Pick<
  BatchMethodView,
  'unit' | 'basis' | 'signal' | 'pathLengthMm' | 'range' | 'confidence'
>;

function Dilution({ row }: { row: ResultRow }) {
  if (row.dilution.length === 0) return <span className="font-sans text-ink-2">none</span>;
  const factor = significantText(row.result.dilutionFactor.value, 4);
  return (
    <span title={dilutionSentence(row.dilution)} className="grid">
      <span>× {factor}</span>
      <span className="text-xs text-ink-2">{dilutionText(row.dilution)} mL</span>
    </span>
  );
}

/** What is not quantified has no place, whatever number lies behind it. */
const placeOf = ({ reportCase, measured }: SampleResult) =>
  reportCase === 'notQuantified' ? null : (measured?.value ?? null);

/** On a narrow screen the result stands under the name of its sample, where it is seen without scrolling. */
function ResultOnPhone({
  row,
  method,
  aligned,
}: {
  row: ResultRow;
  method: TableMethod;
  aligned: AlignedResult | null;
}) {
  const { result } = row;
  return (
    <span className="mt-1 grid gap-1 font-normal md:hidden">
      <span className="num">
        <ResultCell result={result} aligned={aligned} />
        {result.concentration && <span className="aside"> {method.unit}</span>}
      </span>
      {result.reportCase !== 'value' && (
        <MeaningCell result={result} range={method.range} unit={method.unit} />
      )}
    </span>
  );
}

function Row({
  row,
  method,
  aligned,
}: {
  row: ResultRow;
  method: TableMethod;
  aligned: AlignedResult | null;
}) {
  const { result } = row;
  const { tone } = meaningOf(result, method.range, method.unit);
  const k = result.concentration?.k;
  return (
    <tr className="align-top">
      <RowHead className="min-w-28">
        {row.href ? (
          <Link href={row.href} className="underline decoration-rule-strong underline-offset-2 hover:text-uv">
            {row.sample}
          </Link>
        ) : (
          row.sample
        )}
        <ResultOnPhone row={row} method={method} aligned={aligned} />
      </RowHead>
      <Td className="text-[0.84375rem]">
        <span className="flex flex-wrap gap-x-3 gap-y-0.5">
          {row.readings.map((reading, index) => (
            <ReadingMark key={index} reading={reading} origin={reading.origin} />
          ))}
        </span>
        {row.pathLengthMm !== method.pathLengthMm && (
          <span className="text-xs text-ink-2">in {row.pathLengthMm} mm</span>
        )}
      </Td>
      <Td numeric>
        <Dilution row={row} />
      </Td>
      <Td numeric className="text-base! max-md:hidden">
        <ResultCell result={result} aligned={aligned} />
      </Td>
      <Td numeric>{k === undefined ? '' : significantText(k, 3)}</Td>
      {method.range && (
        <Td>
          <PlaceOnCurve value={placeOf(result)} {...method.range} tone={tone} />
        </Td>
      )}
      <Td>
        <MeaningCell result={result} range={method.range} unit={method.unit} />
      </Td>
    </tr>
  );
}

/**
 * Samples and what came out: readings with their light discs, dilution, value ± U, the place on the curve where
 * there is one, and what it means. The unit and its basis stand in the head of the column; ± is the expanded uncertainty.
 */
export function ResultsTable({
  rows,
  method,
  label,
}: {
  rows: readonly ResultRow[];
  method: TableMethod;
  label: string;
}) {
  const aligned = alignResults(rows.map((row) => row.result));
  return (
    <Table label={label}>
      <thead>
        <tr>
          <Th>Sample</Th>
          <Th>Readings, {SIGNAL_SYMBOL[method.signal]} as read</Th>
          <Th numeric>Dilution</Th>
          <Th numeric className="max-md:hidden">
            c in the sample ± U, {unitWithBasis(method.unit, method.basis)}
          </Th>
          <Th numeric>k</Th>
          {method.range && <Th>Place on the curve</Th>}
          <Th>What it means</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row, index) => (
          <Row key={row.key} row={row} method={method} aligned={aligned[index] ?? null} />
        ))}
      </tbody>
    </Table>
  );
}
