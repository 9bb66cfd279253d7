import type { DeterminationView } from './determination';
import type { AbsorptivityKind, ConcentrationUnit, Flag, ReadingRule, Signal } from '@/lib/engine';

/** The version of a curve or of a known absorptivity that a batch is read on, and where it stands among the others. */
export interface YardstickView {
  readonly id: string;
  readonly title: string;
  readonly version: number;
  readonly status: 'saved' | 'superseded' | 'void';
  readonly voidReason: string | null;
  /** The newest saved version of the same, when it is another one. */
  readonly newer: { readonly id: string; readonly version: number } | null;
}

export interface StandardsRange {
  readonly min: number;
  readonly max: number;
}

export interface BatchSummary {
  readonly id: string;
  readonly notebookId: string;
  readonly title: string;
  readonly note: string;
  readonly version: number;
  readonly status: 'open' | 'superseded' | 'void';
  readonly voidReason: string | null;
  /** What it is read on: exactly one of the two is there. */
  readonly curve: YardstickView | null;
  readonly absorptivity: YardstickView | null;
  /** Samples that are not void. */
  readonly sampleCount: number;
  readonly createdAt: string;
}

/** The known absorptivity behind the results of a batch. */
export interface BatchAbsorptivityView {
  readonly kind: AbsorptivityKind;
  readonly value: number;
  /** Standard uncertainty; null when none was stated. */
  readonly u: number | null;
  readonly source: string;
  readonly conditions: string;
  /** What the engine says of it, whatever the samples. */
  readonly flags: readonly Flag[];
}

/** What a batch needs to know of how its samples are read. */
export interface BatchMethodView {
  readonly analyte: string;
  readonly basis: string;
  readonly unit: ConcentrationUnit;
  readonly wavelengthNm: number;
  readonly readingRule: ReadingRule;
  readonly pathLengthMm: number;
  readonly confidence: number;
  readonly absorbanceLimit: number;
  readonly signal: Signal;
  readonly hazardNote: string;
  /** Lowest non-zero and highest standard, in the measured solution; null where no standards were measured. */
  readonly range: StandardsRange | null;
  /** Null on a curve. */
  readonly knownAbsorptivity: BatchAbsorptivityView | null;
}

/** A batch without its samples. */
export interface BatchHead extends BatchSummary {
  readonly method: BatchMethodView;
  /** Whether the reader may add, correct and void. Never the guard itself. */
  readonly mayEdit: boolean;
  readonly supersedes: { readonly id: string; readonly version: number } | null;
  readonly supersededBy: { readonly id: string; readonly version: number } | null;
}

export interface BatchView extends BatchHead {
  readonly determinations: readonly DeterminationView[];
}
