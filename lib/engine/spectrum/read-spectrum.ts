import { EngineError } from '../errors';

export interface SpectrumPoints {
  /** Ascending. */
  readonly wavelengthNm: readonly number[];
  /** Null where the instrument gave no number. */
  readonly absorbance: readonly (number | null)[];
  /** Why a point has no number, by its position. */
  readonly gapReasons?: Readonly<Record<number, string>>;
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
  /** A second wavelength whose reading is subtracted. */
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
  readonly points: readonly { readonly wavelengthNm: number; readonly absorbance: number | null }[];
}

export function readSpectrum(spectrum: SpectrumPoints, rule: ReadingRule): SpectrumReading {
  throw new EngineError(
    'SPECTRUM_EMPTY',
    `readSpectrum cannot read ${spectrum.wavelengthNm.length} points by ${rule.kind} yet`,
  );
}
