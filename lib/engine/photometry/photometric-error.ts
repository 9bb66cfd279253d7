/**
 * Relative error of a concentration for an error ΔT in the transmittance, constant over the scale:
 *
 *     Δc/c = ΔA/A = ΔT / (T · A · ln 10)        T = 10^-A
 *
 * Smallest where A = log10 e = 0.4343 (T = 36.8 %), the optimum of Twyman and Lothian.
 *
 * @param absorbance A, above zero
 * @param transmittanceError ΔT as a fraction (0.01 is 1 %T)
 * @returns per cent of the concentration
 * @source Twyman and Lothian, Proc. Phys. Soc. 45 (1933) 643, in our own words
 */
export function photometricErrorPercent(absorbance: number, transmittanceError: number): number {
  return (100 * transmittanceError * 10 ** absorbance) / (Math.LN10 * absorbance);
}

/** Absorbance at which a constant error of the transmittance costs least: log10 e. */
export const LEAST_PHOTOMETRIC_ERROR_AT = Math.LOG10E;
