import type { CorrectionWarning } from '@/lib/corrections/types';
import { say, warnIf } from '@/lib/corrections/words';
import type { Reading } from './over-baseline';

export interface Ratio {
  /** Null when the denominator is zero. */
  readonly value: number | null;
  readonly u: number | null;
  readonly warnings: readonly CorrectionWarning[];
}

/** A ratio says little with a larger u, or when its weaker reading is below this absorbance. */
const WEAK_U = 0.1;
const WEAK_ABSORBANCE = 0.1;

/**
 * Ratio of two readings: r = a/b, u² = (u_a² + r² u_b²)/b², errors of the two independent (a common offset makes
 * them not so: subtract it first, and its error stays small against both).
 *
 * `leastAbsorbance` 0 for readings that are no absorbances (areas, derivatives).
 */
export function ratio(above: Reading, below: Reading, leastAbsorbance = WEAK_ABSORBANCE): Ratio {
  if (below.value === 0) {
    const text = 'The second reading is zero, so there is no ratio. Read where it absorbs.';
    return { value: null, u: null, warnings: [{ code: 'RATIO_OF_ZERO', text }] };
  }
  const value = above.value / below.value;
  const u =
    above.u === null || below.u === null
      ? null
      : Math.hypot(above.u, value * below.u) / Math.abs(below.value);
  const weaker = Math.min(Math.abs(above.value), Math.abs(below.value));
  return {
    value,
    u,
    warnings: [
      ...warnIf(
        u !== null && u > WEAK_U,
        'RATIO_WEAK',
        `The ratio ${say(value)} has a standard uncertainty of ${say(u ?? 0, 2)} (limit ${WEAK_U}). Measure at a higher absorbance.`,
      ),
      ...warnIf(
        weaker < leastAbsorbance,
        'RATIO_WEAK_READING',
        `The weaker reading of the ratio is ${say(weaker)}, below ${leastAbsorbance}: blank and offset errors weigh on it. Measure a stronger solution.`,
      ),
    ],
  };
}
