import type { Flag } from '../flags';
import type { Quantity } from '../uncertainty/quantity';
import type { Measuring } from '../unknown/measuring';
import type { ConvertedReadings } from '../unknown/convert-readings';
import type { From, Ledger } from '../working/ledger';
import type { DirectRequest } from './types';

/** An error of the method that is not a factor: the mean reading of a standard. */
export interface MethodError {
  readonly source: string;
  /** Of the mean, per 10 mm. */
  readonly u: number;
  readonly degreesOfFreedom: number;
  /** ∂c/∂(that mean), in the measured solution. */
  readonly sensitivity: number;
  /** The size of the sensitivity in symbols of lines that are there, and u(y) of the line `uId`. */
  readonly expression: string;
  readonly from: From;
  readonly uId: string;
  /** Path the standard was read in, which a common blank moves too. */
  readonly pathLengthMm: number;
}

/** A concentration in the measured solution by a method without a curve. */
export interface DirectRead {
  readonly c: number;
  /** ∂c/∂y0. */
  readonly perAbsorbance: number;
  /** Its size in symbols. */
  readonly perExpression: string;
  /** c in symbols. */
  readonly expression: string;
  readonly source: string;
  /** Ids behind the symbols of both. */
  readonly from: From;
  readonly errors: readonly MethodError[];
}

/** A way from an absorbance to a concentration that is not a fitted curve. */
export interface DirectMethod {
  readonly request: DirectRequest;
  readonly measuring: Measuring;
  readonly basis: string;
  readonly flags: readonly Flag[];
  /** Does the path length cancel, standards and unknowns being read in the same cell? */
  readonly pathCancels: boolean;
  read(y0: number): DirectRead;
  absorbanceAt(concentration: number): number;
  /** Factors of every result: an absorptivity, what standards share. */
  readonly factors: readonly Quantity[];
  /** Lines that all unknowns rest on. */
  record(ledger: Ledger): void;
  /** What is worth saying about one unknown. */
  judge(readings: ConvertedReadings, c: number): readonly Flag[];
}
