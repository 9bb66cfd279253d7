import type { KeptReading } from '@/lib/batch/typed-reading';
import type { ConcentrationUnit, Model, ReadingRule, Signal, Weighting } from '@/lib/engine';

/*
 * A standard curve as it is kept: the method, the standards and their readings, nothing calculated. The live
 * page makes one from what is typed, the database from its rows; both calculate from it in the same way.
 */

export type BlankRule = 'none' | 'level' | 'subtract';

export interface StoredMethod {
  readonly analyte: string;
  /** What the concentration counts, such as Fe. */
  readonly basis: string;
  /** g/mol of the basis. */
  readonly formulaMass: number | null;
  readonly unit: ConcentrationUnit;
  readonly signal: Signal;
  readonly wavelengthNm: number;
  readonly readingRule: ReadingRule;
  readonly pathLengthMm: number;
  readonly pathLengthUMm: number | null;
  /** False when the path is an assumption: then no molar absorptivity is claimed. */
  readonly pathLengthKnown: boolean;
  readonly standardsRelativeU: number | null;
  readonly blankRule: BlankRule;
  readonly model: Model;
  readonly weighting: Weighting;
  /** s² = s0² + (k A)², for weights by a variance function; null for others. */
  readonly varianceFunction: { readonly s0: number; readonly k: number } | null;
  readonly confidence: number;
  readonly absorbanceLimit: number;
  readonly hazardNote: string;
}

/** What the calculation needs of a method. */
export type CalculatedMethod = Omit<
  StoredMethod,
  'analyte' | 'basis' | 'wavelengthNm' | 'readingRule' | 'hazardNote'
>;

export interface StoredReading extends KeptReading {
  readonly signal: Signal;
  readonly origin: 'typed' | 'spectrum';
  readonly spectrumId: string | null;
  readonly rule: ReadingRule | null;
  /** Why it is left out of the fit; null when it is in. */
  readonly excludedReason: string | null;
}

export interface StoredStandard {
  readonly role: 'standard' | 'blank';
  readonly name: string;
  readonly concentration: number;
  readonly pathLengthMm: number;
  readonly excludedReason: string | null;
  readonly readings: readonly StoredReading[];
}

export interface StoredCurve {
  readonly method: StoredMethod;
  readonly standards: readonly StoredStandard[];
}
