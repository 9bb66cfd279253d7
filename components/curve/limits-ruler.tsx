import { Disclosure } from '@/components/ui/disclosure';
import { ToneShape, type Tone } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { classNames } from '@/components/ui/class-names';
import { limitScale, type LimitScale } from '@/lib/curve/limit-scale';
import type { LimitAnswer, LimitNotMade } from '@/lib/engine';
import { formatNumber } from '@/lib/format/number';

/** A result of today, in the measured solution. */
export interface RuledResult {
  readonly key: string;
  readonly name: string;
  readonly value: number;
  readonly tone: Tone;
}

const KIND_WORDS: Readonly<Record<LimitAnswer['kind'], string>> = {
  critical: 'told from a blank',
  detection: 'detected with few misses',
  identification: 'detected beyond doubt',
  quantification: 'put into figures',
};
const KIND_ORDER: Readonly<Record<LimitAnswer['kind'], number>> = {
  critical: 0,
  detection: 1,
  identification: 2,
  quantification: 3,
};

const percent = (share: number) => `${(100 * share).toFixed(2)}%`;

function Rail({ scale, children }: { scale: LimitScale; children: React.ReactNode }) {
  return (
    <div className="relative h-6 min-w-64">
      {scale.ticks.map((tick) => (
        <span
          key={tick}
          aria-hidden="true"
          className="absolute inset-y-0 w-px bg-rule"
          style={{ left: percent(scale.at(tick)) }}
        />
      ))}
      {children}
    </div>
  );
}

function Mark({ scale, value, className }: { scale: LimitScale; value: number; className: string }) {
  return (
    <span
      aria-hidden="true"
      className={classNames('absolute inset-y-0.5 w-1 -translate-x-1/2 rounded-full', className)}
      style={{ left: percent(scale.at(value)) }}
    />
  );
}

function Head({ scale, unit }: { scale: LimitScale; unit: string }) {
  return (
    <thead>
      <tr>
        <Th>Limit</Th>
        <Th className="w-1/2">
          <span className="sr-only">Place on a ruler from low to high, {unit}</span>
          <div aria-hidden="true" className="relative h-4 min-w-64 font-normal">
            {scale.ticks.map((tick) => (
              <span
                key={tick}
                className="num absolute -translate-x-1/2 text-[0.6875rem]"
                style={{ left: percent(scale.at(tick)) }}
              >
                {tick}
              </span>
            ))}
          </div>
        </Th>
        <Th numeric className="max-md:hidden">
          {unit}
        </Th>
        <Th>What it rests on</Th>
      </tr>
    </thead>
  );
}

function ResultsRow({ results, scale }: { results: readonly RuledResult[]; scale: LimitScale }) {
  const low = Math.min(...results.map(({ value }) => value));
  const high = Math.max(...results.map(({ value }) => value));
  return (
    <tr>
      <RowHead>Results of this batch</RowHead>
      <Td>
        <Rail scale={scale}>
          {results.map(({ key, name, value, tone }) => (
            <span
              key={key}
              title={`${name}: ${formatNumber(value, 3)}`}
              className="absolute top-1.5 -translate-x-1/2"
              style={{ left: percent(scale.at(value)) }}
            >
              <ToneShape tone={tone} />
            </span>
          ))}
        </Rail>
      </Td>
      <Td numeric className="max-md:hidden">
        {formatNumber(low, 2)} to {formatNumber(high, 3)}
      </Td>
      <Td className="text-sm text-ink-2">in the measured solution</Td>
    </tr>
  );
}

/**
 * Every limit that the data allow on one ruler, with the lowest standard and today's results. They answer different
 * questions, so each says which; a result is judged by the critical value alone.
 */
export function LimitsRuler({
  limits,
  notMade = [],
  range,
  unit,
  results = [],
}: {
  limits: readonly LimitAnswer[];
  /** Those that the data do not allow, each with its reason. */
  notMade?: readonly LimitNotMade[];
  range: { readonly min: number; readonly max: number };
  unit: string;
  results?: readonly RuledResult[];
}) {
  const scale = limitScale([
    ...limits.map(({ value }) => value),
    range.min,
    range.max,
    ...results.map(({ value }) => value),
  ]);
  const sorted = [...limits].sort((a, b) => KIND_ORDER[a.kind] - KIND_ORDER[b.kind] || a.value - b.value);
  return (
    <>
      <Table label="Limits on one ruler">
        <Head scale={scale} unit={unit} />
        <tbody>
          {results.length > 0 && <ResultsRow results={results} scale={scale} />}
          <tr>
            <RowHead>Lowest standard</RowHead>
            <Td>
              <Rail scale={scale}>
                <span
                  aria-hidden="true"
                  className="absolute inset-y-2 rounded-full bg-band"
                  style={{
                    left: percent(scale.at(range.min)),
                    width: percent(scale.at(range.max) - scale.at(range.min)),
                  }}
                />
                <Mark scale={scale} value={range.min} className="bg-ink" />
              </Rail>
            </Td>
            <Td numeric className="max-md:hidden">
              {formatNumber(range.min, 3)}
            </Td>
            <Td className="text-sm text-ink-2">results are read off from here up to the top standard</Td>
          </tr>
          {sorted.map((limit) => (
            <tr key={limit.name + limit.basis}>
              <RowHead>
                {limit.name}
                <span className="block text-xs font-normal text-ink-2">{KIND_WORDS[limit.kind]}</span>
                <span className="num block text-sm font-normal md:hidden">
                  {formatNumber(limit.value, 2)} {unit}
                </span>
              </RowHead>
              <Td>
                <Rail scale={scale}>
                  <Mark
                    scale={scale}
                    value={limit.value}
                    className={limit.kind === 'critical' ? 'bg-amber' : 'bg-uv'}
                  />
                </Rail>
              </Td>
              <Td numeric className="max-md:hidden">
                {formatNumber(limit.value, 2)}
              </Td>
              <Td className="max-w-80 min-w-48 text-sm text-ink-2">{limit.basis}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {notMade.length > 0 && (
        <div className="border-t px-4 py-2.5">
          <Disclosure summary={`${notMade.length} that these data do not allow`}>
            <ul className="grid gap-1 text-sm text-ink-2">
              {notMade.map(({ name, reason }) => (
                <li key={name}>
                  <span className="text-ink">{name}:</span> {reason}
                </li>
              ))}
            </ul>
          </Disclosure>
        </div>
      )}
    </>
  );
}
