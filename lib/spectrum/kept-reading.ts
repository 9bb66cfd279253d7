import type { KeptReading } from '@/lib/batch/typed-reading';
import type { SpectrumReadingView } from '@/lib/views/spectrum';

/**
 * What was read off a spectrum, as a reading to keep: the reading as it came and, beside it, what the second
 * wavelength reads. Only the calculation takes one off the other, so that the absorbance limit and the light disc
 * see what the instrument saw.
 */
export function keptReading(read: SpectrumReadingView): KeptReading {
  if (read.value === null)
    return {
      value: null,
      minusValue: null,
      gapReason: read.gapReason ?? 'missing',
      gapText: textOfGap(read),
    };
  const [value, minusValue] =
    read.minusValue === null ? [read.value, null] : [read.mainValue ?? read.value, read.minusValue];
  return { value, minusValue, gapReason: null, gapText: null };
}

/** The engine knows a gap by its text; words of ours for "above range" become the one it knows. */
function textOfGap({ gapReason, gapText }: SpectrumReadingView): string {
  if (gapReason === 'aboveRange') return /\d|over/i.test(gapText ?? '') ? (gapText ?? 'OVER') : 'OVER';
  return gapText ?? '';
}
