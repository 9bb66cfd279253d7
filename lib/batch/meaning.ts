import type { Flag, FlagCode, ReportCase } from '@/lib/engine';
import { lightThroughText } from '@/lib/format/optical';
import { significantText } from '@/lib/format/round';
import type { StandardsRange } from '@/lib/views/batch';
import type { SampleResult } from './yardstick';

export type MeaningTone = 'order' | 'decide' | 'stop';

export interface Meaning {
  readonly tone: MeaningTone;
  /** What the result means, in one line, with what to do when something is to be done. */
  readonly sentence: string;
  readonly code?: FlagCode;
  /** Flags that the sentence does not already tell. */
  readonly others: readonly Flag[];
}

const TONE: Readonly<Record<ReportCase, MeaningTone>> = {
  value: 'order',
  belowLowestStandard: 'decide',
  belowCriticalValue: 'decide',
  aboveTopStandard: 'stop',
  notQuantified: 'stop',
};

/** The flags that stand for the case itself; the sentence of the case tells them. */
const TOLD: Readonly<Record<ReportCase, readonly FlagCode[]>> = {
  value: [],
  belowLowestStandard: ['UNDER_LOWEST_STANDARD'],
  belowCriticalValue: ['NOT_DETECTED'],
  aboveTopStandard: ['OVER_TOP_STANDARD'],
  notQuantified: [
    'READING_OVER_LIMIT',
    'READING_CENSORED',
    'READING_WITHOUT_NUMBER',
    'CURVE_GIVES_NO_ROOT',
    'OVER_TOP_STANDARD',
  ],
};

const dilute = ({ advice }: SampleResult) => (advice ? `. Dilute ${advice}` : '. Read it again');

function light({ absorbanceAsRead }: SampleResult): string {
  if (absorbanceAsRead === null) return 'The instrument gave no number';
  return `${lightThroughText(absorbanceAsRead)} of the light gets through`;
}

/** Without standards there is nothing to lie within; what a result rests on is said instead. */
function placeSentence(result: SampleResult, range: StandardsRange | null, unit: string): string {
  if (result.reportCase === 'value' || range === null)
    return range === null ? 'By the known absorptivity' : 'Within the standards';
  return result.reportCase === 'belowLowestStandard'
    ? `Detected, below the lowest standard (${significantText(range.min, 4)} ${unit})`
    : `Above the top standard (${significantText(range.max, 4)} ${unit})${dilute(result)}`;
}

function sentenceOf(result: SampleResult, range: StandardsRange | null, unit: string): string {
  switch (result.reportCase) {
    case 'value':
    case 'belowLowestStandard':
    case 'aboveTopStandard':
      return placeSentence(result, range, unit);
    case 'belowCriticalValue':
      return 'Not told from a blank';
    case 'notQuantified':
      return light(result) + dilute(result);
  }
}

/** What a result means for the person who measured it. A stop says what to do and holds no concentration. */
export function meaningOf(result: SampleResult, range: StandardsRange | null, unit: string): Meaning {
  const told = TOLD[result.reportCase];
  const code = result.flags.find((flag) => told.includes(flag.code))?.code;
  const others = result.flags.filter((flag) => !told.includes(flag.code));
  const worse = others.some((flag) => flag.level !== 'note') && TONE[result.reportCase] === 'order';
  return {
    tone: worse ? 'decide' : TONE[result.reportCase],
    sentence: sentenceOf(result, range, unit),
    ...(code ? { code } : {}),
    others,
  };
}
