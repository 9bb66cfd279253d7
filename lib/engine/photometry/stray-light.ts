import { requireNotNegative, requirePositive } from '../checks/require';

/*
 * Stray light: light of other wavelengths that reaches the detector and is not absorbed. It makes absorbances come
 * out low, the more so the higher they are, and sets a plateau that no solution passes.
 */

/** A fraction of the light without a sample: 0.0005 is 0.05 %. */
export type StrayFraction = number;

export interface StrayBias {
  readonly trueAbsorbance: number;
  readonly shownAbsorbance: number;
  /** Shown minus true; never above zero for an absorbance above zero. */
  readonly bias: number;
  /** The bias in per cent of the true absorbance; at zero its limit. */
  readonly biasPercent: number;
}

export interface StrayCeiling {
  readonly trueAbsorbance: number;
  readonly shownAbsorbance: number;
}

/**
 * The absorbance an instrument shows:
 *
 *     A_obs = -log10((T + s) / (1 + s))        T = 10^-A
 *
 * written as -log10(1 - (1 - T)/(1 + s)), which keeps its digits near A = 0.
 *
 * @param absorbance A, the true absorbance of the solution in its cell
 * @param stray s, stray light as a fraction of the light without a sample
 * @throws EngineError UNCERTAINTY_NEGATIVE for a stray fraction below zero, NOT_FINITE
 * @source follows from Beer-Lambert with s added to both beams; e.g. Ph. Eur. 2.2.25 on stray light
 */
export function strayAbsorbance(absorbance: number, stray: StrayFraction): number {
  requireNotNegative(stray, 'the stray light (fraction)', '/stray');
  const absorbed = -Math.expm1(-absorbance * Math.LN10);
  return -Math.log1p(-absorbed / (1 + stray)) / Math.LN10;
}

/** The bias to expect at a true absorbance, absolute and in per cent; at A = 0 the limit -100 s/(1 + s) %. */
export function strayBias(absorbance: number, stray: StrayFraction): StrayBias {
  const shown = strayAbsorbance(absorbance, stray);
  const bias = shown - absorbance;
  return {
    trueAbsorbance: absorbance,
    shownAbsorbance: shown,
    bias,
    biasPercent: 100 * (absorbance === 0 ? -stray / (1 + stray) : bias / absorbance),
  };
}

/** The highest absorbance the instrument can ever show, -log10(s/(1 + s)); Infinity without stray light. */
export function strayPlateau(stray: StrayFraction): number {
  requireNotNegative(stray, 'the stray light (fraction)', '/stray');
  return Math.log10((1 + stray) / stray);
}

/** Above it 10^-A is lost beside any stray light worth a name. */
const HIGHEST_SEARCHED = 12;

/**
 * The absorbance ceiling: where the relative bias reaches the stated per cent. The bias of A grows steadily with A
 * (A_obs is concave in A and zero at zero), so there is one such place, found by halving.
 *
 * @param percent size of the bias that is still allowed, 1 for -1 %
 * @returns null when the bias is that large at every absorbance; true and shown absorbance otherwise, Infinity both
 *   when it never is
 * @throws EngineError LIMIT_NOT_POSITIVE for a per cent that is not above zero
 */
export function strayCeiling(stray: StrayFraction, percent = 1): StrayCeiling | null {
  requirePositive(percent, 'LIMIT_NOT_POSITIVE', 'the allowed bias (per cent)', '/percent');
  const allowed = -percent;
  if (strayBias(0, stray).biasPercent <= allowed) return null;
  let low = 0;
  let high = HIGHEST_SEARCHED;
  // At the end of the search a trace of stray light may still bias less than that.
  if (strayBias(high, stray).biasPercent > allowed) {
    return { trueAbsorbance: Infinity, shownAbsorbance: Infinity };
  }
  while (high - low > 1e-13) {
    const middle = (low + high) / 2;
    if (strayBias(middle, stray).biasPercent > allowed) low = middle;
    else high = middle;
  }
  return { trueAbsorbance: high, shownAbsorbance: strayAbsorbance(high, stray) };
}
