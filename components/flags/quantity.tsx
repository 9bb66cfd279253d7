import { classNames } from '@/components/ui/class-names';
import { resultDigits } from '@/lib/batch/result-digits';
import { unitWithBasis } from '@/lib/batch/unit-text';
import type { UnknownResult } from '@/lib/engine';
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

/** The words that stand where a result has no number. */
function withoutNumber({ reportCase, report }: UnknownResult): string {
  return reportCase === 'notQuantified' ? 'not quantified' : (report.split(';')[0] ?? report);
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
  result: UnknownResult;
  unit: string;
  basis: string;
  confidence: number;
  large?: boolean;
}) {
  const digits = resultDigits(result);
  const size = large ? 'text-title leading-tight' : 'text-fact';
  const { concentration } = result;
  if (!digits || !concentration)
    return (
      <p className={classNames('font-medium', size, result.reportCase === 'belowCriticalValue' && 'num')}>
        {withoutNumber(result)}
      </p>
    );
  return (
    <div>
      <p className={classNames('num font-medium', size)}>
        {digits.exponent !== null && '('}
        {digits.value} <span className="aside">± {digits.expanded}</span>
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
