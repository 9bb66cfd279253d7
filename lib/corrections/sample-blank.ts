import { CorrectionError } from './errors';
import { subtractSpectrum } from './subtract-spectrum';
import type { Points, StepOutcome } from './types';
import { say } from './words';

export interface SampleBlank {
  readonly name: string;
  readonly points: Points;
  /** By how much the sample was diluted before it was measured; 1 for undiluted. */
  readonly sampleDilution: number;
  readonly blankDilution: number;
  /** Relative standard uncertainty of the ratio of the two. */
  readonly ratioRelativeU?: number;
}

/**
 * Subtract a sample blank: the sample without the colour reagent, so its own colour and turbidity. What it shows
 * at its dilution D_b the sample shows at D_s as
 *
 *     f = D_b / D_s       A = A_s - f A_b       u_f = f u_rel
 *
 * This holds while colour and turbidity are proportional to concentration.
 *
 * @throws CorrectionError FACTOR_NOT_POSITIVE, RANGES_APART
 */
export function subtractSampleBlank(points: Points, blank: SampleBlank): StepOutcome {
  const { name, sampleDilution, blankDilution, ratioRelativeU = 0 } = blank;
  if (!(sampleDilution > 0) || !(blankDilution > 0)) {
    throw new CorrectionError(
      'FACTOR_NOT_POSITIVE',
      `dilution factors are above zero, got ${sampleDilution} for the sample and ${blankDilution} for its blank`,
    );
  }
  const factor = blankDilution / sampleDilution;
  const outcome = subtractSpectrum(points, {
    name,
    points: blank.points,
    factor,
    factorU: factor * ratioRelativeU,
  });
  return {
    ...outcome,
    did: `Subtracted the sample blank “${name}” times ${say(factor)} (the blank is diluted ${say(blankDilution)}-fold, the sample ${say(sampleDilution)}-fold).`,
  };
}
