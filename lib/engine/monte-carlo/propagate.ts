import type { Spread } from '../uncertainty/spread';
import { drawAll } from './draw';
import { type Simulated, simulate } from './simulate';

/** An independent input: its estimate and the spread of its errors, which add up. */
export interface Input {
  readonly value: number;
  readonly spreads: readonly Spread[];
}

export interface Propagation {
  readonly inputs: readonly Input[];
  /** The quantity from its inputs, in their order; the array is used again for the next trial. */
  readonly model: (inputs: Float64Array) => number;
  readonly trials: number;
  readonly seed: number;
  readonly confidence: number;
}

/**
 * Propagate the distributions of independent inputs through any model.
 *
 * @source JCGM 101:2008, 5 and 7
 */
export function propagate({ inputs, model, trials, seed, confidence }: Propagation): Simulated {
  const drawn = new Float64Array(inputs.length);
  return simulate({
    trial: (random) => {
      let i = 0;
      for (const { value, spreads } of inputs) {
        drawn[i] = value + drawAll(spreads, random);
        i += 1;
      }
      return model(drawn);
    },
    trials,
    seed,
    confidence,
  });
}
