import { FLAG_TONE } from '@/components/flags/flag-tone';
import { Pill } from '@/components/ui/pill';
import { meaningOf } from '@/lib/batch/meaning';
import type { SampleResult } from '@/lib/batch/yardstick';
import type { StandardsRange } from '@/lib/views/batch';

/** The first sentence of a flag; the whole of it stands on the page of the determination. */
const firstSentence = (message: string) =>
  /^.*?[.:](?=\s|$)/.exec(message)?.[0].replace(/[.:]$/, '') ?? message;

/** What a result means, in words, with what to do; further flags under it. */
export function MeaningCell({
  result,
  range,
  unit,
}: {
  result: SampleResult;
  range: StandardsRange | null;
  unit: string;
}) {
  const { tone, sentence, code, others } = meaningOf(result, range, unit);
  const quiet = tone === 'order' || (tone === 'decide' && result.reportCase === 'value');
  return (
    <div className="grid min-w-56 justify-items-start gap-1 py-0.5">
      <Pill tone={result.reportCase === 'value' ? 'order' : tone} quiet={quiet} code={code}>
        {sentence}
      </Pill>
      {others.map((flag) => (
        <Pill
          key={flag.code + flag.message}
          tone={FLAG_TONE[flag.level]}
          quiet={flag.level === 'note'}
          code={flag.code}
        >
          {firstSentence(flag.message)}
        </Pill>
      ))}
    </div>
  );
}
