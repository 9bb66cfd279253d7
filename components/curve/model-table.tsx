import { Disclosure } from '@/components/ui/disclosure';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { modelComparison, type ComparedModel } from '@/lib/curve/model-comparison';
import type { ModelUnder } from '@/lib/engine';
import { formatDecimals, formatNumber, formatPercent } from '@/lib/format/number';

const signed = (value: number, decimals: number) =>
  `${value > 0 ? '+' : ''}${formatDecimals(value, decimals)}`;

function Row({ row, names }: { row: ComparedModel; names: readonly string[] }) {
  return (
    <tr className={row.inUse ? 'bg-uv-wash' : undefined}>
      <RowHead className="whitespace-nowrap">
        {row.words}
        {row.inUse && <span className="block text-xs font-normal text-ink-2">in use</span>}
      </RowHead>
      <Td numeric>
        {row.relativeStandardErrorPercent === null ? '–' : formatPercent(row.relativeStandardErrorPercent)}
      </Td>
      <Td numeric>{formatNumber(row.residualSd, 2)}</Td>
      {names.length > 0 && (
        <Td numeric>
          {row.largestChangeInU === null ? '–' : signed(row.largestChangeInU, 1)}
          {row.largestOf !== null && <span className="block text-xs text-ink-2">{row.largestOf}</span>}
        </Td>
      )}
      {names.map((name, index) => {
        const one = row.unknowns[index];
        return (
          <Td key={name + index} numeric>
            {one?.measured ? formatNumber(one.measured.value, 4) : '–'}
            {one && !row.inUse && one.changePercent !== null && (
              <span className="block text-xs text-ink-2">{signed(one.changePercent, 1)} %</span>
            )}
          </Td>
        );
      })}
    </tr>
  );
}

/**
 * Models and weightings side by side by what they make of today's results, not by r²: the change of each measured
 * concentration, and the largest change in standard uncertainties of the result in use.
 */
export function ModelTable({ models, unit }: { models: readonly ModelUnder[]; unit: string }) {
  const { rows, refused, names } = modelComparison(models);
  return (
    <>
      <Table label="Models and weightings">
        <thead>
          <tr>
            <Th>Model, weighting</Th>
            <Th numeric>RSE of standards</Th>
            <Th numeric>s, A</Th>
            {names.length > 0 && <Th numeric>largest change, in u</Th>}
            {names.map((name, index) => (
              <Th key={name + index} numeric>
                {name}, {unit}
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={row.words} row={row} names={names} />
          ))}
        </tbody>
      </Table>
      {refused.length > 0 && (
        <div className="border-t px-4 py-2.5">
          <Disclosure summary={`${refused.length} cannot be had with these standards`}>
            <ul className="grid gap-1 text-sm text-ink-2">
              {refused.map(({ words, reason }) => (
                <li key={words}>
                  <span className="text-ink">{words}:</span> {reason}
                </li>
              ))}
            </ul>
          </Disclosure>
        </div>
      )}
    </>
  );
}
