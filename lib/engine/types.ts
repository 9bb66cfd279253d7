import type { Flag } from './flags';
import type { CurveJudgements } from './types-judgements';
import type { Model, ValueWithU, Weighting } from './types-request';
import type { ConcentrationUnit } from './units';
import type { WorkingStep } from './working/ledger';

export type * from './types-judgements';
export type * from './types-request';

/*
 * The request and the answer of one standard curve. Plain objects that survive JSON unchanged: they are the
 * body of the public API, the props of the live page and what is stored with a result.
 * Concentrations are in the request's unit; absorbances are per 10 mm unless named "as read".
 */

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
