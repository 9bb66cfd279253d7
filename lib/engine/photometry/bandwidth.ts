import normalCdf from '@stdlib/stats-base-dists-normal-cdf';

/*
 * What the width of the slit does to a band. Both formulas take the absorbance small enough for the mean over the
 * slit to be a mean of absorbances; at A = 1 the loss is somewhat larger.
 */

/** erf by the normal distribution: erf(x) = 2 Φ(x√2) - 1. */
function erf(x: number): number {
  return 2 * normalCdf(x * Math.SQRT2, 0, 1) - 1;
}

/**
 * Share of the true peak that is seen at the top of a Gaussian band through a triangular slit:
 *
 *     ∫ (1 - |x|/r)/r · exp(-4 ln2 x²) dx over -r..r  =  √(π/k)/r · erf(r√k) - (1 - exp(-k r²))/(k r²),   k = 4 ln 2
 *
 * @param ratio r, spectral bandwidth of the instrument over natural bandwidth of the band, both as full widths at
 *   half height
 * @source own derivation; gives the rule "a tenth of the band keeps 99.5 % of the peak"
 */
export function peakSeenThroughSlit(ratio: number): number {
  const k = 4 * Math.LN2;
  // Below this the closed form is a difference of equal numbers; its series is 1 - k r²/6.
  if (ratio < 1e-3) return 1 - (k * ratio * ratio) / 6;
  const squared = k * ratio * ratio;
  return (Math.sqrt(Math.PI / k) / ratio) * erf(ratio * Math.sqrt(k)) + Math.expm1(-squared) / squared;
}

/**
 * How much lower an absorbance is read on the side of a band, where it changes by `change` across a square slit:
 * A_mean - A_obs = log10(sinh(z)/z), z = ln10 · change / 2.
 *
 * @source mean of the transmittance over a linear slope, own derivation
 */
export function slopeLoss(change: number): number {
  const z = (Math.LN10 * Math.abs(change)) / 2;
  return z < 1e-4 ? (z * z) / (6 * Math.LN10) : Math.log10(Math.sinh(z) / z);
}
