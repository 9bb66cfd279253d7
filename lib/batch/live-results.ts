import { EngineError } from '@/lib/engine';
import type { UnknownSample } from './unknown-request';
import { calculateSamples, type SampleResult, type Yardstick } from './yardstick';

/** What the engine says of a sample that is being typed: a result, or why there is none. */
export type LiveResult =
  | { readonly ok: true; readonly sample: UnknownSample; readonly result: SampleResult }
  | { readonly ok: false; readonly sample: UnknownSample; readonly message: string };

function together(yardstick: Yardstick, samples: readonly UnknownSample[]): LiveResult[] {
  const { unknowns } = calculateSamples(yardstick, samples);
  return samples.flatMap((sample, index) => {
    const result = unknowns[index];
    return result ? [{ ok: true, sample, result } as const] : [];
  });
}

/**
 * Results while a person types. Nothing of this is sent: the server calculates again from the readings it
 * stores. When the engine refuses one sample the others are calculated all the same.
 */
export function liveResults(yardstick: Yardstick, samples: readonly UnknownSample[]): LiveResult[] {
  if (samples.length === 0) return [];
  try {
    return together(yardstick, samples);
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    const [sample, ...more] = samples;
    if (sample && more.length === 0) return [{ ok: false, sample, message: error.message }];
    return samples.flatMap((one) => liveResults(yardstick, [one]));
  }
}
