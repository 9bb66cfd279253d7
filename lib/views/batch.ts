import type { DeterminationView } from './determination';
import type { ConcentrationUnit, ReadingRule, Signal } from '@/lib/engine';

/** The version of a standard curve that a batch is read on, and where it stands among its versions. */
export interface BatchCurveView {
  readonly id: string;
  readonly title: string;
  readonly version: number;
  readonly status: 'saved' | 'superseded' | 'void';
  readonly voidReason: string | null;
  /** The newest saved version of the same curve, when it is another one. */
  readonly newer: { readonly id: string; readonly version: number } | null;
}

export interface BatchSummary {
  readonly id: string;
  readonly notebookId: string;
  readonly title: string;
  readonly note: string;
  readonly version: number;
  readonly status: 'open' | 'superseded' | 'void';
  readonly voidReason: string | null;
  readonly curve: BatchCurveView;
  /** Samples that are not void. */
  readonly sampleCount: number;
  readonly createdAt: string;
}

/** What a batch needs to know of its curve's method. */
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
  /** Lowest non-zero and highest standard, in the measured solution. */
  readonly range: { readonly min: number; readonly max: number };
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
