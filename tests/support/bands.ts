import type { Points } from '@/lib/corrections/types';

/** FWHM of a Gaussian over its sigma, 2 √(2 ln 2). */
export const FWHM = 2 * Math.sqrt(2 * Math.log(2));

export const gaussian = (middle: number, sigma: number, height: number) => (nm: number) =>
  height * Math.exp(-((nm - middle) ** 2) / (2 * sigma ** 2));

/** A function of the wavelength, sampled evenly. */
export function sampled(f: (nm: number) => number, from = 300, to = 700, step = 1): Points {
  const wavelengthNm = Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step);
  return { wavelengthNm, absorbance: wavelengthNm.map(f) };
}

/** The same spectrum without a number at one wavelength. */
export function withGap(points: Points, nm: number): Points {
  return {
    ...points,
    absorbance: points.absorbance.map((a, i) => (points.wavelengthNm[i] === nm ? null : a)),
  };
}

export const at = (points: Points, nm: number) => points.absorbance[points.wavelengthNm.indexOf(nm)];
