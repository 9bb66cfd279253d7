import { calculateStandardCurve, EngineError, type CurveRequest, type UnknownResult } from '@/lib/engine';
import { requestWith, type UnknownSample } from './unknown-request';

/** What the engine says of a sample that is being typed: a result, or why there is none. */
export type LiveResult =
  | { readonly ok: true; readonly sample: UnknownSample; readonly result: UnknownResult }
  | { readonly ok: false; readonly sample: UnknownSample; readonly message: string };

function together(curve: CurveRequest, samples: readonly UnknownSample[]): LiveResult[] {
  const { unknowns } = calculateStandardCurve(requestWith(curve, samples));
  return samples.flatMap((sample, index) => {
    const result = unknowns[index];
    return result ? [{ ok: true, sample, result } as const] : [];
  });
}

/**
 * Results while a person types. Nothing of this is sent: the server calculates again from the readings it
 * stores. When the engine refuses one sample the others are calculated all the same.
 */
export function liveResults(curve: CurveRequest, samples: readonly UnknownSample[]): LiveResult[] {
  if (samples.length === 0) return [];
  try {
    return together(curve, samples);
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    const [sample, ...more] = samples;
    if (sample && more.length === 0) return [{ ok: false, sample, message: error.message }];
    return samples.flatMap((one) => liveResults(curve, [one]));
  }
}
