import type { StoredAbsorptivity } from '@/lib/absorptivity/stored-absorptivity';
import type { Flag, KnownAbsorptivityRequest, WorkingStep } from '@/lib/engine';
import type { CurveVersionView } from './curve';

/** One version of a known absorptivity. */
export interface AbsorptivitySummary extends StoredAbsorptivity, CurveVersionView {
  readonly notebookId: string;
  readonly lineageId: string;
  readonly title: string;
  /** The newest version of the same absorptivity that is not void, when it is a later one. */
  readonly newer: { readonly id: string; readonly version: number } | null;
}

/** The same with what the engine says of it before anything is read. */
export interface AbsorptivityView extends AbsorptivitySummary {
  readonly request: KnownAbsorptivityRequest;
  readonly flags: readonly Flag[];
  readonly working: readonly WorkingStep[];
  /** Newest first. */
  readonly versions: readonly CurveVersionView[];
  /** Whether the reader may make a version or declare it void. Never the guard itself. */
  readonly mayEdit: boolean;
}
