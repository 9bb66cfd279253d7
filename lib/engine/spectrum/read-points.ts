export type GapReasons = Readonly<Record<number, string>>;

export interface SpectrumPoint {
  readonly wavelengthNm: number;
  readonly absorbance: number | null;
  /** Why it has no number. */
  readonly reason?: string;
}

/** A reading before any subtraction. */
export interface PartReading {
  readonly value: number | null;
  readonly reason?: string;
  readonly atNm: number;
  readonly points: readonly SpectrumPoint[];
}

interface Points {
  readonly wavelengthNm: readonly number[];
  readonly absorbance: readonly (number | null)[];
  readonly gapReasons?: GapReasons;
}

function gapSentence(gap: SpectrumPoint): string {
  const because = gap.reason === undefined ? '' : ` (${gap.reason})`;
  return `the spectrum has no number at ${gap.wavelengthNm} nm${because}`;
}

/** The mean of points, or why there is none. */
export function meanOf(points: readonly SpectrumPoint[]): PartReading {
  const first = (points[0] as SpectrumPoint).wavelengthNm;
  const last = (points.at(-1) as SpectrumPoint).wavelengthNm;
  const atNm = (first + last) / 2;
  const gap = points.find((point) => point.absorbance === null);
  if (gap) return { value: null, reason: gapSentence(gap), atNm, points };
  const value = points.reduce((sum, point) => sum + (point.absorbance as number), 0) / points.length;
  return { value, atNm, points };
}

/** A(λ) between the two neighbouring points, linearly; the point itself where there is one. */
export function interpolateAt(spectrum: Points, nm: number): PartReading {
  const { wavelengthNm, absorbance, gapReasons } = spectrum;
  const at = (i: number): SpectrumPoint => ({
    wavelengthNm: wavelengthNm[i] as number,
    absorbance: absorbance[i] as number | null,
    ...(gapReasons?.[i] === undefined ? {} : { reason: gapReasons[i] }),
  });
  const next = wavelengthNm.findIndex((x) => x >= nm - 1e-6);
  const high = at(next);
  if (Math.abs(high.wavelengthNm - nm) <= 1e-6) return meanOf([high]);
  const low = at(next - 1);
  const both = meanOf([low, high]);
  if (low.absorbance === null || high.absorbance === null) return { ...both, atNm: nm };
  const part = (nm - low.wavelengthNm) / (high.wavelengthNm - low.wavelengthNm);
  const value = low.absorbance + part * (high.absorbance - low.absorbance);
  return { value, atNm: nm, points: [low, high] };
}
