/** Every correction that cannot be made, with what it means. What is only doubtful carries a warning instead. */
export const CORRECTION_ERRORS = {
  RANGES_APART: 'two spectra whose wavelengths do not overlap',
  SPECTRUM_UNKNOWN: 'a step that names a spectrum which was not handed over',
  FACTOR_NOT_POSITIVE: 'a dilution factor or path length of zero or less',
  NOT_ENOUGH_SPECTRA: 'an average of fewer than two spectra',
  AVERAGE_NOT_FIRST: 'replicates averaged after one of them was corrected',
  READING_IS_GAP: 'a reading that a correction rests on and that has no number',
  WAVELENGTHS_NOT_IN_ORDER: 'wavelengths of a baseline that do not ascend',
  WINDOW_TOO_NARROW: 'a window with too few points for what is asked of it',
  SCATTER_NOT_POSITIVE: 'absorbances of zero or less where their logarithm is needed',
  STEP_UNEVEN: 'a filter on wavelengths that are not evenly spaced',
  FILTER_IMPOSSIBLE: 'a filter whose window, polynomial and derivative do not fit each other',
  AFTER_DERIVATIVE: 'a correction of absorbances after a derivative was taken',
  PATH_MISSING: 'a path length that nobody has given',
  GRID_TOO_FINE: 'a grid of no points or of more than the limit',
  TAKEN_OFF_TWICE: 'the same thing taken off twice',
  RECIPE_VERSION: 'a recipe of a version that is not known',
  STANDARD_IS_FLAT: 'a standard without any absorbance to compare a shape with',
} as const;

export type CorrectionErrorCode = keyof typeof CORRECTION_ERRORS;

/** A correction that cannot be made. `pointer` is a JSON pointer into the recipe, where there is one. */
export class CorrectionError extends Error {
  override readonly name = 'CorrectionError';

  constructor(
    readonly code: CorrectionErrorCode,
    message: string,
    readonly pointer?: string,
  ) {
    super(message);
  }
}
