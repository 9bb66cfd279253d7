import { EngineError } from '../errors';
import { type GapReasons, interpolateAt, meanOf, type PartReading, type SpectrumPoint } from './read-points';

export interface SpectrumPoints {
  /** Ascending. */
  readonly wavelengthNm: readonly number[];
  /** Null where the instrument gave no number. */
  readonly absorbance: readonly (number | null)[];
  /** Why a point has no number, by its position. */
  readonly gapReasons?: GapReasons;
}

export interface ReadingRule {
  readonly kind: 'point' | 'interpolated' | 'bandMean' | 'windowMaximum';
  /** For point, interpolated and bandMean (its middle). */
  readonly wavelengthNm?: number;
  /** For bandMean. */
  readonly halfWidthNm?: number;
  /** For windowMaximum. */
  readonly fromNm?: number;
  readonly toNm?: number;
  /** A second wavelength whose reading is subtracted, taken at its point or interpolated. */
  readonly minusNm?: number;
}

export interface SpectrumReading {
  readonly value: number | null;
  /** Why there is no value. */
  readonly reason?: string;
  /** Where it was read: the point, the middle of the band, the place of the maximum. */
  readonly atNm: number;
  /** The reading before the subtraction, and what was subtracted. */
  readonly mainValue: number | null;
  readonly minusValue?: number | null;
  /** The points of the spectrum that the reading rests on. */
  readonly points: readonly SpectrumPoint[];
}

/** Wavelengths are told apart to a millionth of a nanometre, so that 509.9999999 is 510. */
const SAME_NM = 1e-6;

/**
 * Read one absorbance off a spectrum by a rule: at the nearest point, linearly interpolated, the mean of the
 * points of a band, or the highest point of a window, each optionally minus the reading at a second wavelength.
 * A point without a number inside what is read gives null and the reason: a maximum or a mean could hide there.
 *
 * @throws EngineError SPECTRUM_EMPTY, LENGTH_MISMATCH, SPECTRUM_NOT_ASCENDING, WAVELENGTH_MISSING,
 *   WAVELENGTH_OUTSIDE, BAND_REVERSED, BAND_EMPTY, NO_POINT_THERE
 */
export function readSpectrum(spectrum: SpectrumPoints, rule: ReadingRule): SpectrumReading {
  checkSpectrum(spectrum);
  const main = readMain(spectrum, rule);
  if (rule.minusNm === undefined) return finish(main, main.value, main.reason);
  const minus = interpolateAt(spectrum, inside(spectrum, rule.minusNm));
  const both = main.value !== null && minus.value !== null;
  return {
    ...finish(
      main,
      both ? (main.value as number) - (minus.value as number) : null,
      main.reason ?? minus.reason,
    ),
    minusValue: minus.value,
    points: [...main.points, ...minus.points],
  };
}

function finish(main: PartReading, value: number | null, reason: string | undefined): SpectrumReading {
  return {
    value,
    ...(reason === undefined ? {} : { reason }),
    atNm: main.atNm,
    mainValue: main.value,
    points: main.points,
  };
}

export function checkSpectrum({ wavelengthNm, absorbance }: SpectrumPoints): void {
  if (wavelengthNm.length === 0) {
    throw new EngineError('SPECTRUM_EMPTY', 'readSpectrum needs at least one point, got 0');
  }
  if (wavelengthNm.length !== absorbance.length) {
    throw new EngineError(
      'LENGTH_MISMATCH',
      `readSpectrum needs as many absorbances as wavelengths, got ${absorbance.length} and ${wavelengthNm.length}`,
    );
  }
  for (let i = 1; i < wavelengthNm.length; i += 1) {
    if (!((wavelengthNm[i] as number) > (wavelengthNm[i - 1] as number))) {
      throw new EngineError(
        'SPECTRUM_NOT_ASCENDING',
        `readSpectrum needs ascending wavelengths, got ${wavelengthNm[i]} after ${wavelengthNm[i - 1]}`,
      );
    }
  }
}

/** The wavelength, held inside the spectrum. */
function inside({ wavelengthNm }: SpectrumPoints, nm: number): number {
  const first = wavelengthNm[0] as number;
  const last = wavelengthNm.at(-1) as number;
  if (!(nm >= first - SAME_NM && nm <= last + SAME_NM)) {
    throw new EngineError(
      'WAVELENGTH_OUTSIDE',
      `${nm} nm is outside this spectrum, which runs from ${first} to ${last} nm`,
    );
  }
  return Math.min(Math.max(nm, first), last);
}

function needed(value: number | undefined, what: string): number {
  if (value === undefined || !Number.isFinite(value)) {
    throw new EngineError('WAVELENGTH_MISSING', `the reading rule needs ${what}`);
  }
  return value;
}

function readMain(spectrum: SpectrumPoints, rule: ReadingRule): PartReading {
  switch (rule.kind) {
    case 'point':
      return nearestPoint(spectrum, inside(spectrum, needed(rule.wavelengthNm, 'a wavelength')));
    case 'interpolated':
      return interpolateAt(spectrum, inside(spectrum, needed(rule.wavelengthNm, 'a wavelength')));
    case 'bandMean': {
      const middle = needed(rule.wavelengthNm, 'a wavelength');
      const half = needed(rule.halfWidthNm, 'the half-width of the band');
      return { ...meanOf(band(spectrum, middle - half, middle + half)), atNm: middle };
    }
    case 'windowMaximum':
      return highest(
        band(
          spectrum,
          needed(rule.fromNm, 'where the window begins'),
          needed(rule.toNm, 'where the window ends'),
        ),
      );
  }
}

function pointAt({ wavelengthNm, absorbance, gapReasons }: SpectrumPoints, i: number): SpectrumPoint {
  const reason = gapReasons?.[i];
  return {
    wavelengthNm: wavelengthNm[i] as number,
    absorbance: absorbance[i] as number | null,
    ...(reason === undefined ? {} : { reason }),
  };
}

function nearestPoint(spectrum: SpectrumPoints, nm: number): PartReading {
  const { wavelengthNm } = spectrum;
  const nearest = wavelengthNm.reduce(
    (best, x, i) => (Math.abs(x - nm) < Math.abs((wavelengthNm[best] as number) - nm) - SAME_NM ? i : best),
    0,
  );
  const here = wavelengthNm[nearest] as number;
  const steps = [
    here - (wavelengthNm[nearest - 1] ?? -Infinity),
    (wavelengthNm[nearest + 1] ?? Infinity) - here,
  ];
  if (Math.abs(here - nm) > Math.min(...steps) / 2 + SAME_NM) {
    throw new EngineError(
      'NO_POINT_THERE',
      `this spectrum has no point near ${nm} nm (the nearest is at ${here} nm); use the interpolated reading instead`,
    );
  }
  return meanOf([pointAt(spectrum, nearest)]);
}

function band(spectrum: SpectrumPoints, fromNm: number, toNm: number): readonly SpectrumPoint[] {
  if (fromNm > toNm) {
    throw new EngineError('BAND_REVERSED', `the band ends at ${toNm} nm before it begins at ${fromNm} nm`);
  }
  inside(spectrum, fromNm);
  inside(spectrum, toNm);
  const found = spectrum.wavelengthNm.flatMap((nm, i) =>
    nm >= fromNm - SAME_NM && nm <= toNm + SAME_NM ? [pointAt(spectrum, i)] : [],
  );
  if (found.length === 0) {
    throw new EngineError(
      'BAND_EMPTY',
      `this spectrum has no point between ${fromNm} and ${toNm} nm; use a wider band or the interpolated reading`,
    );
  }
  return found;
}

function highest(points: readonly SpectrumPoint[]): PartReading {
  const mean = meanOf(points);
  if (mean.value === null) return mean;
  const top = points.reduce((best, point) =>
    (point.absorbance as number) > (best.absorbance as number) ? point : best,
  );
  return { value: top.absorbance, atNm: top.wavelengthNm, points: [top] };
}
