/** Unit of the x axis as the file states it. */
export type XUnit = 'nm' | '1/cm' | 'um' | 'angstrom' | 'eV';

/** What the ordinate is. A fraction T and a percentage %T are kept apart: they differ by two in absorbance. */
export type SignalKind = 'absorbance' | 'transmittance' | 'percentTransmittance' | 'other';

/** Why a point has no number. A reading above range must never become a standard; a missing one only leaves a hole. */
export type GapReason = 'aboveRange' | 'belowRange' | 'missing' | 'unreadable';

/** One point without a number: its place in the spectrum (file order) and the words that stood there. */
export interface Gap {
  readonly index: number;
  readonly reason: GapReason;
  readonly text: string;
}

/** Something a person should know about what was read. `line` counts from 1 in the file. */
export interface ReaderWarning {
  readonly code: string;
  readonly message: string;
  readonly line?: number;
  readonly value?: number;
}

/** One answer to a question: the options to read the file again with. */
export interface QuestionChoice {
  readonly label: string;
  readonly options: ReadOptions;
}

/** What only a person can decide. Until it is answered the spectra are the reader's best proposal. */
export interface Question {
  readonly code: string;
  readonly message: string;
  readonly choices: readonly QuestionChoice[];
}

/** A setting that no word of the file decides, and what was taken for it; `about` names the option that replaces it. */
export interface Guess {
  readonly about: Exclude<keyof ReadOptions, 'onSteps'>;
  readonly sentence: string;
}

/** The ends of a table as texts, to be looked at before anything is kept. */
export interface TablePreview {
  readonly columns: readonly string[];
  readonly first: readonly (readonly string[])[];
  /** Empty when `first` holds all rows. */
  readonly last: readonly (readonly string[])[];
  readonly rows: number;
}

/** One spectrum as the file holds it: file order, file unit, nothing converted, nothing dropped. */
export interface ReadSpectrum {
  readonly name: string;
  readonly x: Float64Array;
  readonly xUnit: XUnit;
  readonly xUnitGuessed: boolean;
  /** NaN where there is a gap; `gaps` says why. */
  readonly y: Float64Array;
  readonly signal: SignalKind;
  readonly signalGuessed: boolean;
  /** The ordinate's unit as the file words it, e.g. `Abs.`, `mAU`, `%T`; empty when the file says nothing. */
  readonly signalText: string;
  /** What an ordinate is multiplied with to be in the unit of `signal`: 0.001 for mAU, otherwise 1. */
  readonly signalScale: number;
  readonly gaps: readonly Gap[];
  /** Which table, block or page of the file, from 0. */
  readonly block: number;
  /** First line of its data, from 1. */
  readonly line: number;
  readonly header: Readonly<Record<string, string>>;
  readonly warnings: readonly ReaderWarning[];
}

/** A table of numbers that is no spectrum, offered as what it is. */
export interface NotASpectrum {
  readonly kind: 'readings' | 'kinetics' | 'plate' | 'calibration' | 'table' | 'peaks';
  readonly message: string;
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

export interface ReadResult {
  readonly reader: string;
  readonly readerVersion: string;
  /** What was understood, in one sentence. */
  readonly dialect: string;
  readonly spectra: readonly ReadSpectrum[];
  readonly headerText: string;
  readonly trailerText: string;
  readonly warnings: readonly ReaderWarning[];
  readonly questions: readonly Question[];
  /** Empty when the file decides everything; answered guesses are none. */
  readonly guesses: readonly Guess[];
  readonly preview: TablePreview;
  readonly notASpectrum?: NotASpectrum;
  /** The settings behind this reading; handing them back as options gives the same reading. */
  readonly settings: ReadOptions;
  /**
   * Files of one shape (same reader, dialect, columns, header words, what was asked) carry the same key, whatever was
   * answered, so that one answer serves all.
   */
  readonly shape: string;
}

export type Delimiter = ',' | ';' | 'tab' | 'blank' | '|' | 'fixed';
export type Orientation = 'columns' | 'pairs' | 'rows' | 'long' | 'stacked';

/** Every guess of a reader can be replaced by the person's word. Columns and rows count from 0. */
export interface ReadOptions {
  readonly delimiter?: Delimiter;
  readonly decimalMark?: '.' | ',';
  /** Lines of the file before the first data row. */
  readonly headerRows?: number;
  readonly orientation?: Orientation;
  readonly xColumn?: number;
  /** Line of the file that holds the wavelengths of spectra in rows. */
  readonly xRow?: number;
  readonly yColumns?: readonly number[];
  readonly xUnit?: XUnit;
  readonly signal?: SignalKind;
  /** For tables that hold no wavelengths. */
  readonly firstX?: number;
  readonly stepX?: number;
  /** Which of several tables; all when absent. */
  readonly table?: number;
  /** Equal x with different y. */
  readonly equalX?: 'first' | 'mean' | 'keep';
  /** A scan that turns round: two spectra, or one as it stands. */
  readonly turnRound?: 'split' | 'keep';
  /** Values that mean "no reading"; an empty list says that no value does. */
  readonly missingValues?: readonly number[];
  /** Called with the number of bytes or cells just looked at: lets a test bound the work. */
  readonly onSteps?: (steps: number) => void;
}

/** The only error a reader throws. The message says what the file is and what to do. */
export class ReaderError extends Error {
  readonly code: string;
  readonly line?: number;

  constructor(code: string, message: string, line?: number) {
    super(message);
    this.name = 'ReaderError';
    this.code = code;
    if (line !== undefined) this.line = line;
  }
}
