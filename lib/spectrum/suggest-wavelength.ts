import { LIMITS } from '@/lib/limits';
import type { SpectrumPointsView } from '@/lib/views/spectrum';

/** Where the strongest of these spectra that stays under the absorbance limit is highest; null without points. */
export function suggestWavelength(spectra: readonly SpectrumPointsView[]): number | null {
  const peaks = spectra.flatMap((spectrum) => {
    let best = -1;
    spectrum.absorbance.forEach((value, i) => {
      if (value !== null && value > (spectrum.absorbance[best] ?? -Infinity)) best = i;
    });
    const [nm, value] = [spectrum.wavelengthNm[best], spectrum.absorbance[best]];
    return nm === undefined || value === undefined || value === null ? [] : [{ nm, value }];
  });
  const within = peaks.filter((peak) => peak.value <= LIMITS.absorbance);
  const [first, ...rest] = within.length > 0 ? within : peaks;
  if (!first) return null;
  return rest.reduce((best, peak) => (peak.value > best.value ? peak : best), first).nm;
}
