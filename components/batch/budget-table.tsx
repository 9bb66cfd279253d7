import { Card } from '@/components/ui/card';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { BudgetLine } from '@/lib/engine';
import { formatNumber, formatPercent } from '@/lib/format/number';
import { significantText } from '@/lib/format/round';

/** What makes up the uncertainty of a result: each line with its share of u², as a bar and in figures. */
export function BudgetTable({ budget, unit }: { budget: readonly BudgetLine[]; unit: string }) {
  const shares = budget.filter((line) => line.sharesS).length;
  const detailed = budget.some(({ sensitivity }) => sensitivity !== undefined);
  return (
    <Card flush title="Where the uncertainty comes from" aside="shares of u²">
      <Table label="Uncertainty budget">
        <thead>
          <tr>
            <Th>Source</Th>
            {detailed && <Th numeric>u of the input</Th>}
            {detailed && <Th numeric>sensitivity</Th>}
            <Th numeric>u, {unit}</Th>
            <Th>Share</Th>
            <Th numeric>
              <span className="sr-only">Share in per cent</span>
            </Th>
          </tr>
        </thead>
        <tbody>
          {budget.map((line) => (
            <tr key={line.source}>
              <RowHead className="font-normal">
                {line.source}
                {line.sharesS && shares > 1 && <sup className="ml-0.5 text-uv">s</sup>}
              </RowHead>
              {detailed && (
                <Td numeric>
                  {line.inputU === undefined
                    ? '–'
                    : `${significantText(line.inputU, 2)} ${line.inputUnit ?? ''}`}
                </Td>
              )}
              {detailed && (
                <Td numeric>{line.sensitivity === undefined ? '–' : formatNumber(line.sensitivity, 3)}</Td>
              )}
              <Td numeric>{significantText(line.u, 2)}</Td>
              <Td className="w-2/5 min-w-28">
                <span aria-hidden="true" className="block h-2.5 rounded-full bg-raised">
                  <span
                    className="block h-full min-w-0.5 rounded-full bg-uv"
                    style={{ width: `${(100 * line.share).toFixed(2)}%` }}
                  />
                </span>
              </Td>
              <Td numeric>{formatPercent(100 * line.share)}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {shares > 1 && (
        <p className="border-t px-4 py-2.5 text-sm text-ink-2">
          <sup className="text-uv">s</sup> rest on the one standard deviation s of the curve and count as one
          component in the degrees of freedom.
        </p>
      )}
    </Card>
  );
}
