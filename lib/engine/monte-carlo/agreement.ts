import { decimalsFor, significantText } from '../../format/round';
import type { Simulated } from './simulate';

/** A budget's interval held against the trials. */
export interface Agreement {
  readonly verdict: 'agree' | 'differ' | 'undecided';
  /** δ: half a unit in the first significant digit of u. */
  readonly tolerance: number;
  /** |y - U - y_low| and |y + U - y_high|. */
  readonly differences: readonly [number, number];
  readonly sentence: string;
}

/** Standard errors of an end that its difference may be off by. */
const SURE = 2;

/**
 * Do the interval C ± U and that of the trials agree at one significant digit of u? Both ends must lie within
 *
 *     δ = ½ · 10^l        u = c · 10^l, c of one digit
 *
 * Where an end is not known well enough to say on which side of δ it lies, the run was too short to decide.
 *
 * @source JCGM 101:2008, clause 8 and 7.9.2
 */
export function agreementOf(
  result: { readonly value: number; readonly u: number; readonly U: number; readonly unit: string },
  run: Simulated,
): Agreement {
  const { value, u, U, unit } = result;
  const tolerance = u > 0 ? 10 ** -decimalsFor(u, 1) / 2 : 0;
  const differences = [Math.abs(value - U - run.interval[0]), Math.abs(value + U - run.interval[1])] as const;
  const margins = run.intervalError.map((error) => SURE * error);
  const far = differences.some((difference, i) => difference - (margins[i] as number) > tolerance);
  const near = differences.every((difference, i) => difference + (margins[i] as number) <= tolerance);
  const verdict = far ? 'differ' : near ? 'agree' : 'undecided';
  const largest = significantText(Math.max(...differences), 2);
  const allowed = significantText(tolerance, 2);
  const margin = significantText(Math.max(...margins), 2);
  const sentences = {
    agree: `The ends of the interval agree: they differ by at most ${largest} ${unit}, within the ${allowed} that the first digit of u allows.`,
    differ: `The ends of the interval differ by ${largest} ${unit}, more than the ${allowed} that the first digit of u allows: prefer the interval of the trials.`,
    undecided: `The run is too short to decide: the ends differ by ${largest} ${unit}, known to ${margin}, and ${allowed} is allowed. Run more trials.`,
  };
  return {
    verdict,
    tolerance,
    differences,
    sentence: `${run.trials} trials${run.failed > 0 ? `, ${run.failed} of them without a result` : ''}. ${sentences[verdict]}`,
  };
}
