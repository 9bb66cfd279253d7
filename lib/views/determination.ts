import type { SampleResult } from '@/lib/batch/yardstick';
import type { DilutionStep, ReadingRule, Signal } from '@/lib/engine';

/** One reading of an unknown as it is kept, with where it came from. */
export interface DeterminationReadingView {
  readonly id: string;
  readonly position: number;
  readonly value: number | null;
  /** What the second wavelength read; null without one. */
  readonly minusValue: number | null;
  readonly gapReason: 'aboveRange' | 'missing' | 'unreadable' | null;
  readonly gapText: string | null;
  readonly signal: Signal;
  readonly origin: 'typed' | 'spectrum';
  readonly spectrumId: string | null;
  readonly rule: ReadingRule | null;
  readonly pathLengthMm: number;
  /** The reading this one replaces, and why. */
  readonly supersedesId: string | null;
  readonly reason: string | null;
  readonly supersededAt: string | null;
  readonly createdAt: string;
}

/** One sample of a batch: its current readings, how it was measured, and what came out. */
export interface DeterminationView {
  readonly id: string;
  readonly notebookId: string;
  readonly batchId: string;
  readonly position: number;
  readonly sample: string;
  readonly note: string;
  readonly pathLengthMm: number;
  readonly pathLengthUMm: number | null;
  readonly dilution: readonly DilutionStep[];
  /** Readings in use; those that a correction replaced are in `DeterminationDetail.superseded`. */
  readonly readings: readonly DeterminationReadingView[];
  readonly result: SampleResult;
  readonly engineVersion: string;
  /** Rises with every change; a change must name the one it was made from. */
  readonly version: number;
  readonly voidedAt: string | null;
  readonly voidReason: string | null;
  readonly createdAt: string;
}

/** One entry of the record about a determination or its readings, in words. */
export interface DeterminationChange {
  readonly at: string;
  readonly who: string;
  readonly what: string;
  readonly why: string | null;
}

export interface DeterminationDetail extends DeterminationView {
  readonly superseded: readonly DeterminationReadingView[];
  /** Newest last. */
  readonly history: readonly DeterminationChange[];
}

/** What a spectrum reads by the method's rule, before it is saved; `error` says why it cannot be read. */
export interface SpectrumPreview {
  readonly spectrumId: string;
  readonly value: number | null;
  readonly minusValue: number | null;
  readonly gapText: string | null;
  readonly atNm: number | null;
  readonly error: string | null;
}
