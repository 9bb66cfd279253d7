/** A spectrum in work: wavelengths ascending, null where there is no number. */
export interface Points {
  readonly wavelengthNm: readonly number[];
  readonly absorbance: readonly (number | null)[];
  /**
   * Standard uncertainty of each ordinate, as far as it is known: what came in with the points and what the
   * steps added in quadrature. Left out when nothing is known; a step then adds what its own formula gives.
   */
  readonly u?: readonly (number | null)[];
}

/** What makes a result doubtful, with the numbers in its text. */
export interface CorrectionWarning {
  readonly code: string;
  readonly text: string;
}

/** A number that a step found on its way, such as the exponent of the scatter. */
export interface Found {
  readonly name: string;
  readonly value: number;
  /** Standard uncertainty; left out where the formula gives none. */
  readonly u?: number;
  /** Empty for a pure number. */
  readonly unit: string;
}

/** What one step gives. */
export interface StepOutcome {
  readonly points: Points;
  /** What was done, in words, for the record and under the plot. */
  readonly did: string;
  readonly warnings: readonly CorrectionWarning[];
  readonly found?: readonly Found[];
}
