/** Every wrong call the engine names, with what it means. Doubtful data are not here: they carry a flag. */
export const ENGINE_ERRORS = {
  UNKNOWN_CHOICE: 'a signal, model, weighting, blank use or unit that does not exist',
  NOT_FINITE: 'a number that is not finite',
  NO_READINGS: 'a standard, blank or unknown without a reading',
  NO_STANDARDS: 'a curve without a standard',
  TOO_FEW_STANDARDS: 'fewer distinct concentrations than the model needs',
  STANDARDS_COINCIDE: 'all standards have the same concentration',
  CONCENTRATION_NEGATIVE: 'a standard of a concentration below zero',
  READING_INDEX_UNKNOWN: 'a left-out reading that the standard does not have',
  PATH_LENGTH_NOT_POSITIVE: 'a path length of zero or less',
  UNCERTAINTY_NEGATIVE: 'an uncertainty, tolerance or limit below zero',
  LIMIT_NOT_POSITIVE: 'an absorbance limit of zero or less',
  CONFIDENCE_OUT_OF_RANGE: 'a level of confidence that is not between 0 and 1',
  FORMULA_MASS_MISSING: 'a molar unit without the formula mass of its basis',
  FORMULA_MASS_NOT_POSITIVE: 'a formula mass of zero or less',
  VOLUME_NOT_POSITIVE: 'a volume of zero or less',
  DILUTION_BELOW_TAKEN: 'a dilution made up to less than was taken',
  MASS_NOT_POSITIVE: 'a mass or density of zero or less',
  RECOVERY_NOT_POSITIVE: 'a recovery of zero or less',
  ESTIMATE_NOT_POSITIVE: 'an estimated concentration of zero or less',
  ABSORPTIVITY_NOT_POSITIVE: 'an absorptivity of zero or less',
  SOURCE_MISSING: 'a known absorptivity without where it comes from',
  STANDARD_WITHOUT_NUMBER: 'a standard without a reading that is a number',
  BRACKET_REVERSED: 'a bracket whose standards are not in ascending order',
  UNKNOWN_MISSING: 'a position that has no unknown',
  TRIALS_OUT_OF_RANGE: 'a number of trials that no run is made with',
  SERIES_BROKEN: 'a solution of a series made from one that does not stand before it',
  VOLUME_U_TWICE: 'the uncertainty of a volume given both as a number and as ware',
  BLANK_LEVEL_THROUGH_ZERO: 'a blank level in a line through zero',
  BLANK_PATH_MISSING: 'a reading to be blanked without a blank reading of the same path length',
  BLANK_CENSORED: 'a blank reading without a number',
  VARIANCE_FUNCTION_MISSING: 'weighting by a variance function without s0 and k',
  WEIGHT_MISSING: 'given weights with a standard that has none',
  WEIGHT_NOT_POSITIVE: 'a weight of zero or less',
  FITTED_NOT_POSITIVE: 'weights 1/y where the fitted absorbance is zero or less',
  REPLICATES_TOO_FEW: 'weights from replicates with fewer than four readings at a level',
  REPLICATES_WITHOUT_SPREAD: 'weights from replicates with identical readings at a level',
  ZERO_SLOPE: 'readings that do not change with concentration',
  CURVE_TURNS: 'a quadratic that turns round inside the range of the standards',
  QUADRATIC_LEVELS: 'a quadratic with fewer than six levels',
  LENGTH_MISMATCH: 'lists that must have the same length and do not',
  SPECTRUM_EMPTY: 'a spectrum without a point',
  SPECTRUM_NOT_ASCENDING: 'wavelengths that do not ascend',
  WAVELENGTH_MISSING: 'a reading rule without the wavelengths it needs',
  WAVELENGTH_OUTSIDE: 'a wavelength outside the spectrum',
  BAND_REVERSED: 'a band that ends before it begins',
  BAND_EMPTY: 'a band without a point of the spectrum',
  NO_POINT_THERE: 'a reading at the point where the spectrum has no point',
} as const;

export type EngineErrorCode = keyof typeof ENGINE_ERRORS;

/** A call the engine cannot answer. `pointer` is a JSON pointer to the member of the request at fault. */
export class EngineError extends Error {
  override readonly name = 'EngineError';

  constructor(
    readonly code: EngineErrorCode,
    message: string,
    readonly pointer?: string,
  ) {
    super(message);
  }
}

/** Refusals of one part of a request, told from the whole: their pointers start at the part. */
export function below<T>(part: string, work: () => T): T {
  try {
    return work();
  } catch (error) {
    // Every refusal of a part names its place; anything else is a bug and passes as it is.
    throw error instanceof EngineError
      ? new EngineError(error.code, error.message, part + error.pointer)
      : error;
  }
}
