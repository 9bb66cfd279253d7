import { Facts, type Fact } from '@/components/ui/facts';
import { coverage } from '@/components/flags/quantity';
import { dilutionSentence } from '@/lib/batch/dilution-text';
import { formatDecimals, formatNumber } from '@/lib/format/number';
import { absorbanceText, lightThroughText } from '@/lib/format/optical';
import { roundPair, significantText } from '@/lib/format/round';
import type { BatchMethodView } from '@/lib/views/batch';
import type { DeterminationView } from '@/lib/views/determination';

/** An interval to the place that its U ends at. */
function intervalText([low, high]: readonly [number, number], expanded: number): string {
  const { decimals, exponent } = roundPair(high, expanded, 2);
  const digits = (x: number) => (exponent === null ? formatDecimals(x, decimals) : formatNumber(x, 4));
  return `${digits(low)} to ${digits(high)}`;
}

function resultFacts({ result }: DeterminationView, method: BatchMethodView): Fact[] {
  const { unit, confidence, range } = method;
  const { concentration, fieller } = result;
  if (!concentration) return [];
  const { U, u, k, degreesOfFreedom, interval } = concentration;
  return [
    {
      label: 'Standard uncertainty u',
      value: (
        <>
          {significantText(u, 2)} <small>{unit}</small>
        </>
      ),
      note: `degrees of freedom ${degreesOfFreedom === null ? 'infinite' : significantText(degreesOfFreedom, 3)}`,
    },
    {
      label: 'Expanded uncertainty U',
      value: (
        <>
          {significantText(U, 2)} <small>{unit}</small>
        </>
      ),
      note: `k = ${significantText(k, 4)}, ${coverage(confidence)} coverage`,
    },
    {
      label: 'Interval',
      value: (
        <>
          {intervalText(interval, U)} <small>{unit}</small>
        </>
      ),
      // Fieller's interval belongs to a slope that was fitted
      note: fieller
        ? `Fieller: ${intervalText(fieller, U)} ${unit}`
        : range
          ? 'Fieller: not bounded'
          : undefined,
    },
  ];
}

function pathNote(pathLengthMm: number, { range, pathLengthMm: usual }: BatchMethodView): string {
  if (pathLengthMm === usual) return range ? 'as the curve' : 'as stated with the absorptivity';
  return range ? `the curve has ${usual} mm` : `stated with the absorptivity: ${usual} mm`;
}

/** The figures beside a result: its uncertainty, what was measured, and how the sample was diluted. */
export function DeterminationFacts({
  determination,
  method,
}: {
  determination: DeterminationView;
  method: BatchMethodView;
}) {
  const { result, dilution, pathLengthMm } = determination;
  const { absorbanceAsRead } = result;
  return (
    <Facts
      label="Figures of this determination"
      facts={[
        ...resultFacts(determination, method),
        {
          label: 'Mean absorbance as read',
          value: absorbanceAsRead === null ? '–' : absorbanceText(absorbanceAsRead),
          note:
            absorbanceAsRead === null
              ? 'a reading has no number'
              : `${lightThroughText(absorbanceAsRead)} of the light gets through`,
        },
        {
          label: 'Dilution factor',
          value: significantText(result.dilutionFactor.value, 6),
          note: dilutionSentence(dilution),
        },
        {
          label: 'Path length',
          value: (
            <>
              {significantText(pathLengthMm, 5)} <small>mm</small>
            </>
          ),
          note: pathNote(pathLengthMm, method),
        },
      ]}
    />
  );
}
