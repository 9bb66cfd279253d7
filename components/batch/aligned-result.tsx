import type { SampleResult } from '@/lib/batch/yardstick';
import { PowerOfTen } from '@/components/flags/quantity';
import { alignAtPoint } from '@/lib/format/number';
import { formatPlusMinus } from '@/lib/format/quantity';

const FIGURE_SPACE = '\u2007';

/** value and U of one row, padded so that the points of the column stand below each other. */
export interface AlignedResult {
  readonly value: string;
  readonly spread: string;
  readonly exponent: number | null;
}

/** The results of a column together; null where a result has no number. */
export function alignResults(results: readonly SampleResult[]): readonly (AlignedResult | null)[] {
  const shown = results.map(({ concentration }) =>
    concentration ? formatPlusMinus(concentration.value, concentration.U) : null,
  );
  const pad = (texts: readonly string[]) =>
    alignAtPoint(texts).map(
      (part) =>
        FIGURE_SPACE.repeat(part.padBefore) + part.before + part.after + FIGURE_SPACE.repeat(part.padAfter),
    );
  const values = pad(shown.map((one) => one?.value ?? ''));
  const spreads = pad(shown.map((one) => one?.spread ?? ''));
  return shown.map((one, index) =>
    one ? { value: values[index] ?? '', spread: spreads[index] ?? '', exponent: one.exponent } : null,
  );
}

/** A result in a table's cell: value ± U, or the words that stand for it. A stop shows no number. */
export function ResultCell({ result, aligned }: { result: SampleResult; aligned: AlignedResult | null }) {
  if (!aligned) return <WithoutNumber result={result} />;
  return (
    <span className="font-medium whitespace-pre">
      {aligned.exponent !== null && '('}
      {aligned.value} <span className="aside">± {aligned.spread}</span>
      {aligned.exponent !== null && (
        <>
          )<PowerOfTen exponent={aligned.exponent} />
        </>
      )}
    </span>
  );
}

function WithoutNumber({ result }: { result: SampleResult }) {
  if (result.reportCase === 'belowCriticalValue') return <span className="font-medium">{result.report}</span>;
  return <span className="font-sans text-ink-2">no result</span>;
}
