import {
  calculateStandardCurve,
  resultFromKnownAbsorptivity,
  type CurveRequest,
  type KnownAbsorptivityRequest,
  type Signal,
  type UnknownResult,
} from '@/lib/engine';
import { unknownOf, type UnknownSample } from './unknown-request';

/** What samples are measured against: the standards of a curve, or an absorptivity that is known. */
export type Yardstick =
  | { readonly kind: 'curve'; readonly request: CurveRequest }
  | { readonly kind: 'absorptivity'; readonly request: KnownAbsorptivityRequest };

/** The result of a sample on either; without standards a critical value exists only where the scatter is known. */
export interface SampleResult extends Omit<UnknownResult, 'criticalValue'> {
  readonly criticalValue: number | null;
}

export interface SampleAnswer {
  readonly engine: string;
  readonly unknowns: readonly SampleResult[];
}

/** In which signal the readings of its samples are calculated. */
export const signalOf = ({ request }: Yardstick): Signal => request.signal;

/** What the engine says of some samples on a yardstick: the one place where the two ways part. @throws EngineError */
export function calculateSamples(yardstick: Yardstick, samples: readonly UnknownSample[]): SampleAnswer {
  const unknowns = samples.map((sample) => unknownOf(sample, signalOf(yardstick)));
  return yardstick.kind === 'curve'
    ? calculateStandardCurve({ ...yardstick.request, unknowns })
    : resultFromKnownAbsorptivity({ ...yardstick.request, unknowns });
}
