import { toAscendingNm, toNm } from '@/lib/readers/to-ascending-nm';
import type { GapReason, ReadSpectrum } from '@/lib/readers/types';

/** A point of the reading form without a number: its place, why, and the words that stood in the file. */
export interface ReadingGap {
  readonly index: number;
  readonly wavelengthNm: number;
  readonly reason: GapReason;
  readonly text: string;
}

/** What plots and readings work on: nm strictly ascending, absorbance, null where there is no number. */
export interface ReadingForm {
  readonly wavelengthNm: number[];
  readonly absorbance: (number | null)[];
  readonly gaps: ReadingGap[];
  /** How many wavelengths stand more than once in the file. */
  readonly repeatedWavelengths: number;
}

/** The mean of what was read at one wavelength; without a number when one of them has none. */
function together(values: readonly number[]): number | null {
  if (values.some((value) => !Number.isFinite(value))) return null;
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** The words of the file at each gap, by wavelength. */
function gapTexts(spectrum: ReadSpectrum): Map<number, string> {
  return new Map(spectrum.gaps.map((gap) => [toNm(spectrum.x[gap.index] ?? NaN, spectrum.xUnit), gap.text]));
}

/**
 * Bring a spectrum to the form that is plotted and read. Points that fall on one wavelength are averaged;
 * a point without a finite wavelength (a wavenumber of 0) cannot be placed and stays in the raw points only.
 */
export function readingForm(spectrum: ReadSpectrum): ReadingForm {
  const ascending = toAscendingNm(spectrum);
  const texts = gapTexts(spectrum);
  const form = {
    wavelengthNm: [] as number[],
    absorbance: [] as (number | null)[],
    gaps: [] as ReadingGap[],
  };
  let repeatedWavelengths = 0;
  for (let i = 0, next = 0; i < ascending.wavelengthNm.length; i = next) {
    const nm = ascending.wavelengthNm[i] ?? NaN;
    for (next = i + 1; ascending.wavelengthNm[next] === nm;) next += 1;
    if (!Number.isFinite(nm)) continue;
    if (next - i > 1) repeatedWavelengths += 1;
    const value = together([...ascending.absorbance.subarray(i, next)]);
    if (value === null) {
      const places = Array.from({ length: next - i }, (_, offset) => i + offset);
      const reason = places.map((place) => ascending.gapReasons[place]).find((found) => found !== undefined);
      const index = form.wavelengthNm.length;
      form.gaps.push({ index, wavelengthNm: nm, reason: reason ?? 'missing', text: texts.get(nm) ?? '' });
    }
    form.wavelengthNm.push(nm);
    form.absorbance.push(value);
  }
  return { ...form, repeatedWavelengths };
}
