import type { GapReason, ReaderWarning, SignalKind, XUnit } from '@/lib/readers/types';
import type { ReadingGap } from '@/lib/spectrum/reading-form';

/** One line of a list of spectra. Times are ISO 8601. */
export interface SpectrumView {
  readonly id: string;
  readonly notebookId: string;
  readonly sourceFileId: string;
  readonly name: string;
  readonly fileName: string;
  readonly fromNm: number;
  readonly toNm: number;
  readonly pointCount: number;
  readonly gapCount: number;
  /** Null when the ordinate is not absorbance, or has no number. */
  readonly highestAbsorbance: number | null;
  readonly signal: SignalKind;
  readonly signalText: string;
  readonly xUnit: XUnit;
  /** As the file states it; null when it does not. */
  readonly pathLengthMm: number | null;
  readonly warningCount: number;
  readonly createdAt: string;
  readonly voided: boolean;
  readonly voidReason: string | null;
}

/** Everything that is known of one spectrum except its points. */
export interface SpectrumDetail extends SpectrumView {
  /** Which table, block or page of the file, from 1. */
  readonly block: number;
  readonly line: number;
  readonly position: number;
  readonly xUnitGuessed: boolean;
  readonly signalGuessed: boolean;
  readonly signalScale: number;
  readonly header: Readonly<Record<string, string>>;
  readonly warnings: readonly ReaderWarning[];
  readonly reader: string;
  readonly readerVersion: string;
  readonly dialect: string;
  readonly sha256: string;
}

/** What a curve or a batch of the notebook uses a spectrum as. */
export interface SpectrumUse {
  readonly role: 'standard' | 'sample' | 'blank';
  /** Of a standard, in its curve's unit. */
  readonly concentration?: number;
}

/** A spectrum ready for a plot: nm ascending, absorbance, null at each gap. */
export interface SpectrumPointsView {
  readonly id: string;
  readonly notebookId: string;
  readonly name: string;
  /** False when the ordinate is neither absorbance nor transmittance and is given as it stands. */
  readonly isAbsorbance: boolean;
  readonly wavelengthNm: readonly number[];
  readonly absorbance: readonly (number | null)[];
  readonly gaps: readonly ReadingGap[];
}

/** The points as the file gave them: its order, its units; null at each gap. */
export interface RawPointsView {
  readonly id: string;
  readonly xUnit: XUnit;
  readonly signal: SignalKind;
  readonly signalText: string;
  readonly signalScale: number;
  readonly x: readonly number[];
  readonly y: readonly (number | null)[];
  readonly gaps: readonly { readonly index: number; readonly reason: GapReason; readonly text: string }[];
}

/** Why a reading off a spectrum has no number, in the words that readings are stored with. */
export type SpectrumGapReason = 'aboveRange' | 'missing' | 'unreadable';

/** One number read off one spectrum by a rule: absorbance, as read, before blank and path length. */
export interface SpectrumReadingView {
  readonly spectrumId: string;
  readonly name: string;
  /** Null at a gap, or when the rule cannot be followed on this spectrum (then `error` says why). */
  readonly value: number | null;
  readonly gapReason: SpectrumGapReason | null;
  /** What stood in the file where the number should be. */
  readonly gapText: string | null;
  /** Where it was read: the point, the middle of the band, the place of the maximum. */
  readonly atNm: number | null;
  /** Before the subtraction of the second wavelength; the light disc and T belong to this one. */
  readonly mainValue: number | null;
  /** What was taken off; null without a second wavelength. */
  readonly minusValue: number | null;
  readonly absorbanceLimitExceeded: boolean;
  readonly pathLengthMm: number | null;
  readonly error?: string;
}
