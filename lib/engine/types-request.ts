import type { ConcentrationUnit } from './units';

/* What is asked: the request of one standard curve. */

export type Signal = 'absorbance' | 'transmittance' | 'percentTransmittance';
export type Model = 'linear' | 'proportional' | 'quadratic';
export type Weighting =
  'none' | '1/x' | '1/x2' | '1/y' | '1/y2' | 'varianceFunction' | 'replicates' | 'given';

/** A reading as it came: a number in the request's signal, or the text the instrument showed instead. */
export type Reading = number | string | TwoWavelengthReading;

/**
 * Two readings of one solution in the request's signal: A = A(main) - A(minus), each converted by itself. The
 * absorbance limit and the light disc refer to the readings as they came, not to the difference.
 */
export interface TwoWavelengthReading {
  readonly main: number;
  readonly minus: number;
}

/** What is known about a volumetric vessel: one filling's standard uncertainty is made from it. */
export interface Ware {
  /** Half-width of the tolerance, taken as triangular. */
  readonly toleranceMl?: number;
  /** Standard deviation of filling it again and again. */
  readonly repeatabilityMl?: number;
  /** Half-width of the room's temperature range about 20 °C, taken as rectangular. */
  readonly temperatureRangeK?: number;
  /** Names the very piece: its tolerance is one and the same error wherever the piece is named again. */
  readonly piece?: string;
}

export interface DilutionStep {
  readonly takenMl: number;
  readonly toMl: number;
  /** Standard uncertainty of the volume; give this or the ware, not both. */
  readonly takenUMl?: number;
  readonly toUMl?: number;
  readonly takenWare?: Ware;
  readonly toWare?: Ware;
}

/** A dilution by weighing. Without densities the solutions are taken as equally dense. */
export interface MassDilutionStep {
  readonly takenG: number;
  readonly toG: number;
  /** Standard uncertainties. */
  readonly takenUG?: number;
  readonly toUG?: number;
  readonly densities?: {
    readonly takenGPerMl: number;
    readonly toGPerMl: number;
    readonly takenUGPerMl?: number;
    readonly toUGPerMl?: number;
  };
}

export type AnyDilutionStep = DilutionStep | MassDilutionStep;

/** What all standards share under a name of its own: the purity of the material, the flask of the stock. */
export interface SharedUncertainty {
  readonly source: string;
  /** Relative standard uncertainty. */
  readonly relativeU: number;
}

export interface BlankRequest {
  /** Readings at the curve's own path length. */
  readonly readings: readonly Reading[];
  readonly use: 'subtract' | 'level';
  /** Blank readings in cells of another path length; each reading is blanked by its own path. */
  readonly otherPaths?: readonly { readonly pathLengthMm: number; readonly readings: readonly Reading[] }[];
}

export interface StandardRequest {
  readonly name?: string;
  readonly concentration: number;
  readonly readings: readonly Reading[];
  readonly pathLengthMm?: number;
  /** For weighting "given": w, up to a factor common to the curve. */
  readonly weight?: number;
  /** Left out of the fit, still shown. */
  readonly excluded?: boolean;
  /** Positions (from 0) of single readings left out of the fit, still shown. */
  readonly excludedReadings?: readonly number[];
}

export interface UnknownRequest {
  readonly name?: string;
  readonly readings: readonly Reading[];
  readonly pathLengthMm?: number;
  /** Standard uncertainty of the path; giving it says that this is another cell than the standards'. */
  readonly pathLengthUMm?: number;
  readonly weight?: number;
  readonly dilution?: readonly AnyDilutionStep[];
  /** Recovery of the method as a fraction, which the result is divided by; instead of the request's. */
  readonly recovery?: ValueWithU;
  /** Concentration in the measured solution as estimated from the wing of its band, for advice only. */
  readonly wingEstimate?: number;
}

export interface OwnedGlassware {
  readonly pipettesMl: readonly number[];
  readonly flasksMl: readonly number[];
}

export interface CurveRequest {
  readonly signal: Signal;
  readonly pathLengthMm: number;
  /** Standard uncertainty of the standards' path; enters ε, and c when an unknown is in another cell. */
  readonly pathLengthUMm?: number;
  /** False when the path is an assumption: then no molar absorptivity is claimed. Default true. */
  readonly pathLengthKnown?: boolean;
  readonly unit: ConcentrationUnit;
  /** g/mol of the basis the concentration is expressed as (Fe, N, P ...). */
  readonly formulaMass?: number;
  readonly model: Model;
  readonly weighting: Weighting;
  readonly varianceFunction?: { readonly s0: number; readonly k: number };
  readonly confidence: number;
  readonly absorbanceLimit: number;
  /** Largest allowed range of an unknown's replicates (absorbance as read); default: studentized range. */
  readonly replicateLimit?: number;
  readonly blank?: BlankRequest;
  readonly standards: readonly StandardRequest[];
  /** Relative standard uncertainty of what all standards share (stock, purity, common ware). */
  readonly standardsRelativeU?: number;
  /** The same, by name: each is a line of its own, beside standardsRelativeU. */
  readonly standardsShared?: readonly SharedUncertainty[];
  /** Recovery of the method as a fraction, which every result is divided by. */
  readonly recovery?: ValueWithU;
  /** Pipettes and flasks that dilutions are to be made with; without them, a usual set. */
  readonly glassware?: OwnedGlassware;
  readonly unknowns: readonly UnknownRequest[];
}

export interface ValueWithU {
  readonly value: number;
  readonly u: number;
}
