import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import { crossing } from '../stats/quadrature';

/** The scatter of the readings of one level: s² about their mean, with ν degrees of freedom. */
export interface LevelScatter {
  readonly meanY: number;
  readonly variance: number;
  readonly degreesOfFreedom: number;
}

export interface LearnedVarianceFunction {
  readonly s0: number;
  readonly k: number;
  /** ν of all levels together. */
  readonly degreesOfFreedom: number;
  /** True below ten degrees of freedom: too little to weight a fit by. */
  readonly adviceOnly: boolean;
  /** One-sided p of k = 0, from the ratio of likelihoods: small when the scatter grows with the absorbance. */
  readonly pConstant: number;
  readonly reason?: undefined;
}

export const DEGREES_OF_FREEDOM_NEEDED = 10;

/** λ = ln(k² y²_max / s0²) is looked for in steps, from where one term is nothing to where the other is. */
const STEPS = 48;
const NOTHING = 1e-8;
/** A gain in -2 ln L that is rounding: an edge is as good. */
const NO_BETTER = 1e-9;

/**
 * The variance function v = s0² + (k y)² that makes the observed variances most likely, s0 ≥ 0, k ≥ 0.
 *
 * Level variances of normal readings are scaled χ², so -2 ln L = Σ ν_i [ln v_i + s_i²/v_i] up to a constant. For a
 * given ratio of the two terms, v = c·u with u = 1 + e^λ z and z = (y/y_max)², the best c is Σ ν s²/u / Σ ν; what is
 * left is a function of λ alone, which is looked through in steps and then solved where its slope crosses zero. Both
 * edges, k = 0 and s0 = 0, stand for themselves.
 *
 * @param levels two levels or more that differ in y, with some scatter
 * @returns null when there are none such, or when readings at y = 0 are all the same (any s0 would be too large)
 * @source Davidian and Carroll, J. Am. Stat. Assoc. 82 (1987) 1079; checked with scipy's optimisers
 */
export function learnVarianceFunction(levels: readonly LevelScatter[]): LearnedVarianceFunction | null {
  const squares = levels.map(({ meanY }) => meanY ** 2);
  const largest = Math.max(...squares);
  const smallest = Math.min(...squares);
  if (levels.length < 2 || largest - smallest <= NOTHING * largest) return null;
  const still = levels.filter(({ variance }) => variance === 0);
  if (still.length === levels.length || still.some(({ meanY }) => meanY ** 2 <= NOTHING * largest))
    return null;
  const z = squares.map((square) => square / largest);
  const constant = profile(levels, z, 1, 0);
  const proportional = profile(levels, z, 0, 1);
  const inner = insideProfile(levels, z, smallest / largest);
  const edge = proportional.value < constant.value ? proportional : constant;
  const best = inner.value < edge.value - NO_BETTER ? inner : edge;
  const degreesOfFreedom = levels.reduce((sum, level) => sum + level.degreesOfFreedom, 0);
  return {
    s0: Math.sqrt(best.floor * best.scale),
    k: Math.sqrt((best.ratio * best.scale) / largest),
    degreesOfFreedom,
    adviceOnly: degreesOfFreedom < DEGREES_OF_FREEDOM_NEEDED,
    // Half a χ² with one degree of freedom, since k = 0 lies on the edge of what k may be.
    pConstant: normalCdf(-Math.sqrt(Math.max(0, constant.value - best.value)), 0, 1),
  };
}

interface Profile {
  /** c. */
  readonly scale: number;
  /** -2 ln L up to a constant. */
  readonly value: number;
  /** u = floor + ratio·z: 1 and e^λ, or an edge. */
  readonly floor: number;
  readonly ratio: number;
}

/** -2 ln L of u = floor + ratio·z at its best c; infinite where a level that scatters is given no variance. */
function profile(
  levels: readonly LevelScatter[],
  z: readonly number[],
  floor: number,
  ratio: number,
): Profile {
  let nu = 0;
  let logs = 0;
  let sum = 0;
  for (let i = 0; i < levels.length; i += 1) {
    const { variance, degreesOfFreedom } = levels[i] as LevelScatter;
    const u = floor + ratio * (z[i] as number);
    nu += degreesOfFreedom;
    logs += degreesOfFreedom * Math.log(u);
    sum += (degreesOfFreedom * variance) / u;
  }
  const scale = sum / nu;
  const value = nu * Math.log(scale) + logs;
  return { scale, value: Number.isNaN(value) ? Infinity : value, floor, ratio };
}

/** Slope of the profile in λ: Σ ν p - N Σ ν s² p/u / Σ ν s²/u, p = e^λ z/u. */
function profileSlope(levels: readonly LevelScatter[], z: readonly number[], lambda: number): number {
  const ratio = Math.exp(lambda);
  let nu = 0;
  let parts = 0;
  let sum = 0;
  let weighted = 0;
  levels.forEach(({ variance, degreesOfFreedom }, i) => {
    const u = 1 + ratio * (z[i] as number);
    const p = (ratio * (z[i] as number)) / u;
    const term = (degreesOfFreedom * variance) / u;
    nu += degreesOfFreedom;
    parts += degreesOfFreedom * p;
    sum += term;
    weighted += term * p;
  });
  return parts - (nu * weighted) / sum;
}

/** The best λ between the edges: the deepest step, then the zero of the slope beside it. */
function insideProfile(levels: readonly LevelScatter[], z: readonly number[], lowest: number): Profile {
  const from = Math.log(NOTHING);
  const to = -Math.log(NOTHING * Math.max(lowest, NOTHING));
  const step = (to - from) / STEPS;
  const at = (lambda: number) => profile(levels, z, 1, Math.exp(lambda));
  let best = 0;
  let deepest = Infinity;
  for (let i = 0; i <= STEPS; i += 1) {
    const { value } = at(from + i * step);
    if (value < deepest) [best, deepest] = [i, value];
  }
  const low = from + Math.max(0, best - 1) * step;
  const high = from + Math.min(STEPS, best + 1) * step;
  const slope = (lambda: number) => profileSlope(levels, z, lambda);
  // At an end of the range the slope does not cross: the edge itself is as good.
  const crosses = slope(low) < 0 && slope(high) > 0;
  return at(crosses ? crossing(slope, low, high) : from + best * step);
}
