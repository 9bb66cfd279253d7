import { classNames } from '@/components/ui/class-names';
import { unitWithBasis } from '@/lib/batch/unit-text';
import type { SampleResult } from '@/lib/batch/yardstick';
import type { ReportCase } from '@/lib/engine';
import { formatPlusMinus } from '@/lib/format/quantity';
import { significantText } from '@/lib/format/round';

/** "× 10" with its exponent set as one. */
export function PowerOfTen({ exponent }: { exponent: number }) {
  return (
    <>
      {' × 10'}
      <sup>{String(exponent).replace('-', '\u2212')}</sup>
    </>
  );
}

const WITHOUT_NUMBER: Readonly<Partial<Record<ReportCase, string>>> = {
  notQuantified: 'not quantified',
  aboveTopStandard: 'above the top standard',
};

/** The words that stand where a result has no number, with the advice of a stop. */
function WithoutNumber({ result, size }: { result: SampleResult; size: string }) {
  const { reportCase, report, advice } = result;
  const words = WITHOUT_NUMBER[reportCase];
  return (
    <div>
      <p className={classNames('font-medium', size, words === undefined && 'num')}>{words ?? report}</p>
      {advice && <p className="text-red">Dilute {advice}</p>}
    </div>
  );
}

/**
 * A result as it may be shown: value ± U with its unit and k, or the words that stand for it. A result that
 * stops shows no number of its own; its flags say how to dilute. "±" is always the expanded uncertainty.
 */
export function Quantity({
  result,
  unit,
  basis,
  confidence,
  large = false,
}: {
  result: SampleResult;
  unit: string;
  basis: string;
  confidence: number;
  large?: boolean;
}) {
  const size = large ? 'text-title leading-tight' : 'text-fact';
  const { concentration } = result;
  if (!concentration) return <WithoutNumber result={result} size={size} />;
  const digits = formatPlusMinus(concentration.value, concentration.U);
  return (
    <div>
      <p className={classNames('num font-medium', size)}>
        {digits.exponent !== null && '('}
        {digits.value} <span className="aside">± {digits.spread}</span>
        {digits.exponent !== null && ')'}
        {digits.exponent !== null && <PowerOfTen exponent={digits.exponent} />}{' '}
        <span className="aside font-sans text-sm">{unitWithBasis(unit, basis)}</span>
      </p>
      <p className="text-sm text-ink-2">
        ± is U with k = <span className="num">{significantText(concentration.k, 3)}</span>,{' '}
        {coverage(confidence)} coverage
      </p>
    </div>
  );
}

export function coverage(confidence: number): string {
  return `${significantText(100 * confidence, 4)} %`;
}
