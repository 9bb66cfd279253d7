import type { StoredMethod, StoredReading, StoredStandard } from '@/lib/curve/stored-curve';
import type { CurveAnswer, CurveRequest } from '@/lib/engine';

export type CurveStatus = 'saved' | 'superseded' | 'void';

export interface MethodView extends StoredMethod {
  readonly id: string;
  readonly version: number;
}

export interface StandardReadingView extends StoredReading {
  readonly id: string;
  /** Counts from 1 within its standard. */
  readonly position: number;
  /** The spectrum it was read from, by name; null for a typed one. */
  readonly spectrumName: string | null;
}

export interface StandardView extends Omit<StoredStandard, 'readings'> {
  readonly id: string;
  readonly position: number;
  readonly readings: readonly StandardReadingView[];
}

/** One version of a curve, in the list of its versions. Times are ISO 8601. */
export interface CurveVersionView {
  readonly id: string;
  readonly version: number;
  readonly status: CurveStatus;
  readonly createdAt: string;
  readonly createdBy: string;
  /** Why it was made; null for a first version. */
  readonly reason: string | null;
  readonly voidReason: string | null;
}

export interface CurveSummary extends CurveVersionView {
  readonly notebookId: string;
  readonly lineageId: string;
  readonly title: string;
  readonly analyte: string;
  readonly basis: string;
  readonly unit: string;
  readonly wavelengthNm: number;
  readonly slope: { readonly value: number; readonly u: number };
  readonly residualSd: number;
  /** Readings in the fit. */
  readonly n: number;
  readonly range: { readonly min: number; readonly max: number };
  /** The newest version of the same curve that is not void, when it is a later one. */
  readonly newer: { readonly id: string; readonly version: number } | null;
}

/** A saved curve with everything behind it: what was read, what was asked of the engine, what it answered. */
export interface CurveView extends CurveSummary {
  readonly engineVersion: string;
  readonly method: MethodView;
  readonly standards: readonly StandardView[];
  readonly request: CurveRequest;
  readonly result: CurveAnswer;
  /** Newest first. */
  readonly versions: readonly CurveVersionView[];
  /** Whether the reader may make a version or declare it void. Never the guard itself. */
  readonly mayEdit: boolean;
}
