import type { Weighting } from './types';
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
