import type { Flag } from './flags';
import type { CurveJudgements } from './types-judgements';
import type { ConcentrationUnit } from './units';
import type { WorkingStep } from './working/ledger';

export type * from './types-judgements';

/*
 * The request and the answer of one standard curve. Plain objects that survive JSON unchanged: they are the
 * body of the public API, the props of the live page and what is stored with a result.
 * Concentrations are in the request's unit; absorbances are per 10 mm unless named "as read".
 */

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

/** A test that was made, or why it could not be. */
export type TestAnswer =
  | {
      readonly statistic: number;
      readonly df1: number;
      readonly df2?: number;
      readonly p: number;
      /** What the statistic is compared with. */
      readonly critical: number;
      /** True when the null hypothesis stands: no lack of fit, a straight line, no intercept, equal variances. */
      readonly passed: boolean;
      readonly verdict: string;
      readonly reason?: undefined;
    }
  | { readonly reason: string };

export interface LimitAnswer {
  readonly name: string;
  readonly kind: 'critical' | 'detection' | 'identification' | 'quantification';
  /** In the measured solution. */
  readonly value: number;
  readonly basis: string;
  /** In symbols; absent, as the error probabilities, in results of engines before 1.1. */
  readonly formula?: string;
  /** Probability of taking a blank for more, and of missing this much; null where the rule states none. */
  readonly alpha?: number | null;
  readonly beta?: number | null;
  readonly source?: string;
}

export interface PointAnswer {
  readonly name: string;
  readonly role: 'standard' | 'blank';
  /** Position of the standard in the request; null for a blank level. */
  readonly standardIndex: number | null;
  /** Counts from 1 within its standard. */
  readonly replicate: number;
  readonly concentration: number;
  readonly pathLengthMm: number;
  /** Null for a censored reading; then `censored` holds what came. */
  readonly absorbanceAsRead: number | null;
  readonly censored?: string;
  /** Per 10 mm, after the blank. */
  readonly absorbance: number | null;
  /** Scaled so that the weights of the fitted points add up to n; 0 for a point left out. */
  readonly weight: number;
  readonly fitted: number;
  readonly residual: number | null;
  readonly backCalculated: number | null;
  /** Null at concentration zero. */
  readonly relativeErrorPercent: number | null;
  readonly leverage: number | null;
  /** r √w / (s √(1 - h)); null where it does not exist. Absent in results of engines before 1.1. */
  readonly standardisedResidual?: number | null;
  readonly cooksDistance: number | null;
  readonly excluded?: true;
  readonly excludedBecause?: 'request' | 'censored' | 'zeroWithReciprocalWeights';
}

/** One concentration of the curve, its fitted readings together. */
export interface LevelAnswer {
  readonly concentration: number;
  readonly readings: number;
  readonly meanAbsorbance: number;
  readonly meanBackCalculated: number | null;
  readonly relativeErrorPercent: number | null;
}

export interface MolarAbsorptivity extends ValueWithU {
  readonly unit: 'L/(mol cm)';
  /** What its u holds, in a sentence. */
  readonly covers: string;
}

export interface CurveResult {
  readonly model: Model;
  readonly weighting: Weighting;
  readonly unit: ConcentrationUnit;
  readonly confidence: number;
  readonly n: number;
  readonly degreesOfFreedom: number;
  readonly intercept: ValueWithU;
  readonly slope: ValueWithU;
  readonly quadratic?: ValueWithU;
  /** Rows and columns intercept, slope (and quadratic). */
  readonly covariance: readonly (readonly number[])[];
  readonly residualSd: number;
  readonly rSquared: number;
  /** Relative standard error of the back-calculated standards, per cent; null when there is none. */
  readonly relativeStandardErrorPercent: number | null;
  readonly meanConcentration: number;
  readonly sxx: number;
  /** Lowest non-zero and highest fitted standard. */
  readonly range: { readonly min: number; readonly max: number };
  /** For `criticalValueReadings` readings of an unknown: the fewest any unknown here has, else 1. */
  readonly criticalValue: number;
  readonly criticalValueReadings: number;
  readonly molarAbsorptivity?: MolarAbsorptivity;
  readonly tests: {
    readonly lackOfFit: TestAnswer;
    readonly mandel: TestAnswer;
    readonly intercept: TestAnswer;
    readonly homogeneity: TestAnswer;
    /** Absent, as `judgements`, in results of engines before 1.1. */
    readonly cochran?: TestAnswer;
    readonly levene?: TestAnswer;
  };
  readonly judgements?: CurveJudgements;
  readonly limits: readonly LimitAnswer[];
  readonly points: readonly PointAnswer[];
  readonly levels: readonly LevelAnswer[];
  readonly flags: readonly Flag[];
  readonly working: readonly WorkingStep[];
}

export interface BudgetLine {
  /** "curve", "readings", "blank", "standards", "dilution 1, volume taken", "path length of the unknown", "recovery" ... */
  readonly source: string;
  /** Contribution to u of the concentration in the sample, in its unit. */
  readonly u: number;
  /** u² over the sum of all u²; the shares add up to 1. */
  readonly share: number;
  /**
   * Standard uncertainty of the quantity behind the line, in its own unit (empty for a ratio or an absorbance).
   * Absent, as the two after it, in results of engines before 1.1.
   */
  readonly inputU?: number;
  readonly inputUnit?: string;
  /** ∂C/∂(that quantity), with its sign: u = |sensitivity| inputU. */
  readonly sensitivity?: number;
  /** Null when infinite. */
  readonly degreesOfFreedom?: number | null;
  /** True on the lines that rest on the curve's one residual standard deviation. */
  readonly sharesS?: true;
}

export interface Concentration extends ValueWithU {
  readonly U: number;
  readonly k: number;
  /** Effective degrees of freedom, not rounded; null when infinite. */
  readonly degreesOfFreedom: number | null;
  readonly interval: readonly [number, number];
  readonly unit: ConcentrationUnit;
}

/** Which row of the table of report texts a determination fell into. */
export type ReportCase =
  'notQuantified' | 'aboveTopStandard' | 'value' | 'belowLowestStandard' | 'belowCriticalValue';

export interface DilutionAdvice {
  /** Made up to this many times the volume taken, on top of the dilution already made. */
  readonly factor: number;
  readonly atLeast: boolean;
  /** Absorbance as read to expect after it; null when it cannot be foretold. */
  readonly expectedAbsorbance: number | null;
  /** The glassware that makes it, of what the laboratory owns; absent when none was stated. */
  readonly by?: readonly { readonly takenMl: number; readonly toMl: number }[];
  /** True when it rests on the wing of the band, since the reading itself says too little. */
  readonly fromWing?: true;
}

export interface UnknownResult {
  readonly name: string;
  /** Mean of the readings as they came; null when one is censored. */
  readonly absorbanceAsRead: number | null;
  /** When one is censored and its bound is known: the mean is at least this. */
  readonly absorbanceAtLeast: number | null;
  /** Mean per 10 mm after blank; null when one is censored. */
  readonly absorbance: number | null;
  readonly transmittance: number | null;
  readonly measured: ValueWithU | null;
  readonly dilutionFactor: ValueWithU;
  /** What the result was divided by, when a recovery was given. */
  readonly recovery?: ValueWithU;
  readonly concentration: Concentration | null;
  /** The signed number behind the report, in the sample; for the working only. */
  readonly computed: number | null;
  readonly fieller: readonly [number, number] | null;
  /** For this unknown's number of readings, in the measured solution. */
  readonly criticalValue: number;
  readonly budget: readonly BudgetLine[];
  readonly reportCase: ReportCase;
  readonly report: string;
  readonly flags: readonly Flag[];
  readonly advice?: string;
  readonly dilutionAdvice?: DilutionAdvice;
  readonly working: readonly WorkingStep[];
}

export interface CurveAnswer {
  readonly engine: string;
  readonly curve: CurveResult;
  readonly unknowns: readonly UnknownResult[];
}
