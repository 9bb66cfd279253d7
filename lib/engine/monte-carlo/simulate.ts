import { type Random, randomOf } from './random';

/** What the trials of a Monte Carlo run say about a quantity. */
export interface Simulated {
  readonly trials: number;
  /** Trials whose inputs gave no result; they are left out. */
  readonly failed: number;
  readonly mean: number;
  /** Standard deviation of the trials. */
  readonly u: number;
  /** Probabilistically symmetric coverage interval. */
  readonly interval: readonly [number, number];
  /** Standard error of either end. */
  readonly intervalError: readonly [number, number];
  /** Shortest coverage interval. */
  readonly shortest: readonly [number, number];
}

export interface Simulation {
  /** One trial: a value of the quantity, NaN when the drawn inputs give none. Must not allocate. */
  readonly trial: (random: Random) => number;
  readonly trials: number;
  readonly seed: number;
  readonly confidence: number;
}

/**
 * Propagation of distributions: so many trials, their mean, standard deviation and coverage intervals.
 *
 * @source JCGM 101:2008, 7.5 to 7.7
 */
export function simulate({ trial, trials, seed, confidence }: Simulation): Simulated {
  const random = randomOf(seed);
  const all = new Float64Array(trials);
  let count = 0;
  for (let i = 0; i < trials; i += 1) {
    const value = trial(random);
    all[count] = value;
    // A trial without a result leaves its place to the next one.
    if (value === value) count += 1;
  }
  const values = all.subarray(0, count);
  const { mean, sd } = momentsOf(values);
  values.sort();
  return {
    trials,
    failed: trials - count,
    mean,
    u: sd,
    interval: symmetricInterval(values, confidence),
    intervalError: errorsOfEnds(values, confidence),
    shortest: shortestInterval(values, confidence),
  };
}

function momentsOf(values: Float64Array): { readonly mean: number; readonly sd: number } {
  let sum = 0;
  for (const value of values) sum += value;
  const mean = sum / values.length;
  let squares = 0;
  for (const value of values) squares += (value - mean) ** 2;
  return { mean, sd: Math.sqrt(squares / (values.length - 1)) };
}

/** Trials that a coverage interval spans, q = p·M. */
function spanOf(count: number, confidence: number): number {
  return Math.min(count - 1, Math.round(confidence * count));
}

function symmetricInterval(sorted: Float64Array, confidence: number): [number, number] {
  const span = spanOf(sorted.length, confidence);
  const low = Math.floor((sorted.length - span) / 2);
  return [sorted[low] as number, sorted[low + span] as number];
}

function shortestInterval(sorted: Float64Array, confidence: number): [number, number] {
  const span = spanOf(sorted.length, confidence);
  let best: [number, number] = symmetricInterval(sorted, confidence);
  for (let low = 0; low + span < sorted.length; low += 1) {
    const from = sorted[low] as number;
    const to = sorted[low + span] as number;
    if (to - from < best[1] - best[0]) best = [from, to];
  }
  return best;
}

/**
 * Standard error of the ends, from the order statistics about them: the place of a quantile among M trials is known
 * to √(M q (1 - q)) places, whatever the distribution. Infinity where the run ends before twice that.
 */
function errorsOfEnds(sorted: Float64Array, confidence: number): [number, number] {
  const tail = (1 - confidence) / 2;
  const places = Math.ceil(2 * Math.sqrt(sorted.length * tail * (1 - tail)));
  const low = Math.floor((sorted.length - spanOf(sorted.length, confidence)) / 2);
  const errorAt = (place: number) =>
    place < places || place + places >= sorted.length
      ? Infinity
      : ((sorted[place + places] as number) - (sorted[place - places] as number)) / 4;
  return [errorAt(low), errorAt(low + spanOf(sorted.length, confidence))];
}
