import { requirePositive } from '../checks/require';
import { interpolateAt } from './read-points';
import { checkSpectrum, type SpectrumPoints } from './read-spectrum';

export interface WingRequest {
  /** The scan whose band is too strong. */
  readonly sample: SpectrumPoints;
  readonly samplePathLengthMm: number;
  /** A scan of a standard of the same method, within range. */
  readonly standard: SpectrumPoints;
  readonly standardPathLengthMm: number;
  readonly standardConcentration: number;
  /** Absorbances of the sample that are used, as read; default 0.1 to 1.5. */
  readonly from?: number;
  readonly to?: number;
}

export type WingEstimate =
  | {
      /** In the solution of the scan, in the unit of the standard. */
      readonly concentration: number;
      readonly points: number;
      readonly fromNm: number;
      readonly toNm: number;
      /** Standard deviation of the concentrations of single points about it, relative. */
      readonly relativeSpread: number;
      readonly reason?: undefined;
    }
  | { readonly reason: string };

const USED = { from: 0.1, to: 1.5 } as const;

/** Below it the standard says nothing of the shape of the band. */
const LEAST_OF_STANDARD = 0.01;
const LEAST_POINTS = 3;

/**
 * How strong a solution is whose band is cut off: on the wing, where it still lets light through, its absorbance is
 * that of the standard times the ratio of the concentrations,
 *
 *     c = c_s · Σ A_s A / Σ A_s²        per unit of path, over the points with A within the limits
 *
 * An estimate for advice only: it trusts that both bands have one shape, that nothing else absorbs there, and that
 * stray light is small up to the upper limit. In practice it is good to 10 or 20 %.
 *
 * @source Beer-Lambert law at every wavelength of the wing, least squares through zero
 */
export function estimateFromWing(request: WingRequest): WingEstimate {
  const { sample, standard, samplePathLengthMm, standardPathLengthMm, standardConcentration } = request;
  checkSpectrum(sample);
  checkSpectrum(standard);
  requirePositive(
    samplePathLengthMm,
    'PATH_LENGTH_NOT_POSITIVE',
    'the path length (mm)',
    '/samplePathLengthMm',
  );
  requirePositive(
    standardPathLengthMm,
    'PATH_LENGTH_NOT_POSITIVE',
    'the path length (mm)',
    '/standardPathLengthMm',
  );
  requirePositive(
    standardConcentration,
    'CONCENTRATION_NEGATIVE',
    'the concentration of the standard',
    '/standardConcentration',
  );
  const { from = USED.from, to = USED.to } = request;
  const first = standard.wavelengthNm[0] as number;
  const last = standard.wavelengthNm.at(-1) as number;
  const wing = sample.wavelengthNm.flatMap((nm, i) => {
    const a = sample.absorbance[i] ?? NaN;
    if (!(a >= from && a <= to) || nm < first || nm > last) return [];
    const s = interpolateAt(standard, nm).value ?? NaN;
    return s >= LEAST_OF_STANDARD && s <= to
      ? [{ nm, a: a / samplePathLengthMm, s: s / standardPathLengthMm }]
      : [];
  });
  if (wing.length < LEAST_POINTS) {
    return {
      reason: `the wing needs at least ${LEAST_POINTS} points with absorbances of ${from} to ${to} where the standard absorbs too, got ${wing.length}`,
    };
  }
  const sum = (of: (point: (typeof wing)[number]) => number) =>
    wing.reduce((total, point) => total + of(point), 0);
  const ratio = sum(({ a, s }) => a * s) / sum(({ s }) => s * s);
  const squares = sum(({ a, s }) => (a / s / ratio - 1) ** 2);
  const places = wing.map(({ nm }) => nm);
  return {
    concentration: ratio * standardConcentration,
    points: wing.length,
    fromNm: Math.min(...places),
    toNm: Math.max(...places),
    relativeSpread: Math.sqrt(squares / (wing.length - 1)),
  };
}
