import type { CorrectionWarning } from '@/lib/corrections/types';
import { say, warnIf } from '@/lib/corrections/words';
import type { Peak } from './find-peaks';

export interface PeakShift {
  readonly peak: Peak;
  /** Position of the peak minus the wavelength of the method. */
  readonly shiftNm: number;
  readonly warnings: readonly CorrectionWarning[];
}

/** The nearest peak to the method's wavelength and how far it is shifted; null when there is no peak. */
export function shiftFrom(peaks: readonly Peak[], methodNm: number, toleranceNm = 2): PeakShift | null {
  const distance = (peak: Peak) => Math.abs(peak.positionNm - methodNm);
  const [peak] = peaks.toSorted((a, b) => distance(a) - distance(b));
  if (!peak) return null;
  const shiftNm = peak.positionNm - methodNm;
  return {
    peak,
    shiftNm,
    warnings: warnIf(
      Math.abs(shiftNm) > toleranceNm,
      'PEAK_SHIFTED',
      `The nearest peak is at ${say(peak.positionNm, 5)} nm, ${say(Math.abs(shiftNm), 3)} nm ${shiftNm > 0 ? 'above' : 'below'} the method’s ${methodNm} nm (tolerance ${toleranceNm} nm). Check the wavelength scale, the solvent, the pH and what else absorbs.`,
    ),
  };
}
