import type { Question, ReaderWarning, SignalKind, XUnit } from '@/lib/readers/types';
import type { SpectrumView } from './spectrum';

/** One uploaded file. Times are ISO 8601. */
export interface SourceFileView {
  readonly id: string;
  readonly notebookId: string;
  readonly name: string;
  /** SHA-256 of the bytes as they came, hexadecimal. */
  readonly sha256: string;
  readonly sizeBytes: number;
  readonly reader: string;
  readonly readerVersion: string;
  /** What was understood, in one sentence. */
  readonly dialect: string;
  /** Of the file and of its spectra together. */
  readonly warnings: readonly ReaderWarning[];
  readonly spectrumCount: number;
  readonly pointCount: number;
  readonly signals: readonly SignalKind[];
  readonly xUnits: readonly XUnit[];
  readonly createdAt: string;
}

export interface SourceFileDetail extends SourceFileView {
  readonly headerText: string;
  readonly trailerText: string;
  readonly uploadedBy: string | null;
  readonly spectra: readonly SpectrumView[];
}

/** An upload that was left out: nothing of it is stored but this line of the record. */
export interface RefusedUploadView {
  readonly entryId: number;
  readonly name: string;
  /** What the file is and what to do. */
  readonly sentence: string;
  readonly line: number | null;
  readonly by: string;
  readonly at: string;
}

/** The same bytes in another notebook that the person may read. */
export interface FileElsewhere {
  readonly sourceFileId: string;
  readonly notebookId: string;
  readonly notebookTitle: string;
  readonly name: string;
}

/** What became of one upload. A refusal is thrown instead, as the reader's error. */
export type UploadOutcome =
  | {
      readonly verdict: 'stored';
      readonly sourceFile: SourceFileView;
      readonly spectra: readonly SpectrumView[];
      readonly elsewhere: readonly FileElsewhere[];
    }
  | {
      readonly verdict: 'alreadyHere';
      readonly sourceFile: SourceFileView;
      readonly spectra: readonly SpectrumView[];
    }
  | {
      readonly verdict: 'asks';
      readonly dialect: string;
      /** Files of one shape carry the same text, so that one answer serves all. */
      readonly shape: string;
      readonly questions: readonly Question[];
    };
