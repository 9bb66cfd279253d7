import type { EngineErrorCode } from './errors';
import type { Model, ReportCase, ValueWithU, Weighting } from './types';
import type { LearnedVarianceFunction } from './weighting/learn-variance-function';

/** A reading that lies apart by a test: advice only. */
export interface OutlierAdvice {
  readonly test: 'Grubbs' | 'Dixon';
  /** Compared with the other readings of its level, or with the curve (Grubbs' test of its standardised residual). */
  readonly among: 'replicates' | 'residuals';
  readonly name: string;
  readonly standardIndex: number | null;
  readonly replicate: number;
  readonly concentration: number;
  /** Readings compared. */
  readonly n: number;
  readonly statistic: number;
  readonly critical: number;
  /** The highest level of confidence that it fails at. */
  readonly confidence: 0.95 | 0.99;
  readonly sentence: string;
}

export interface WeightingAdvice {
  /** Null when nothing can be said. */
  readonly advised: Weighting | null;
  readonly inUse: Weighting;
  readonly agrees: boolean;
  readonly basis: 'replicates' | 'residuals' | 'nothing';
  readonly sentence: string;
}

/** The intercept as a concentration beside half the lowest standard. */
export interface InterceptSize {
  readonly asConcentration: number;
  readonly halfLowest: number;
  readonly passed: boolean;
  readonly verdict: string;
}

/** What is said about a curve beside its tests. */
export interface CurveJudgements {
  readonly weighting: WeightingAdvice;
  /** v = s0² + (k y)² learned from the replicates, for absorbances per 10 mm; or why it cannot be. */
  readonly varianceFunction: LearnedVarianceFunction | { readonly reason: string };
  readonly outliers: readonly OutlierAdvice[];
  /** Null for a line through zero. */
  readonly interceptSize: InterceptSize | null;
}

/** Why a case of a comparison cannot be had. */
export interface Refusal {
  readonly code: EngineErrorCode;
  readonly reason: string;
}

/** One of today's unknowns under a changed curve, beside the curve in use. */
export interface UnknownUnder {
  readonly name: string;
  /** In the measured solution. */
  readonly measured: ValueWithU | null;
  /** In the sample; null when it is not quantified. */
  readonly concentration: ValueWithU | null;
  readonly reportCase: ReportCase;
  readonly report: string;
  /** Of the measured concentration; null where either has none. */
  readonly changePercent: number | null;
  /** The same change in standard uncertainties of the result in use. */
  readonly changeInU: number | null;
}

/** A model under a weighting, by its effect. */
export type ModelUnder = {
  readonly model: Model;
  readonly weighting: Weighting;
  /** True for what the request asks for. */
  readonly inUse: boolean;
} & (
  | {
      /** At weight one: comparable between models, not between weightings. */
      readonly residualSd: number;
      readonly degreesOfFreedom: number;
      /** Comparable between all. */
      readonly relativeStandardErrorPercent: number | null;
      readonly unknowns: readonly UnknownUnder[];
      readonly reason?: undefined;
    }
  | Refusal
);

/** What leaving out a standard, or one reading of it, changes. */
export type LeftOut = {
  readonly standardIndex: number;
  /** Counts from 1; null for the whole standard. */
  readonly replicate: number | null;
  readonly name: string;
  readonly concentration: number;
} & (
  | {
      readonly slope: number;
      readonly slopeChangePercent: number;
      readonly residualSd: number;
      readonly range: { readonly min: number; readonly max: number };
      readonly unknowns: readonly UnknownUnder[];
      readonly reason?: undefined;
    }
  | Refusal
);
