import { type CalculatedReading, readingInSignal } from '@/lib/curve/reading-in-signal';
import type { CurveRequest, DilutionStep, Signal, UnknownRequest } from '@/lib/engine';

export interface UnknownSample {
  readonly sample: string;
  readonly pathLengthMm: number;
  readonly pathLengthUMm?: number | null;
  readonly dilution: readonly DilutionStep[];
  readonly readings: readonly CalculatedReading[];
}

export function unknownOf(sample: UnknownSample, signal: Signal): UnknownRequest {
  return {
    name: sample.sample,
    readings: sample.readings.map((reading) => readingInSignal(reading, signal)),
    pathLengthMm: sample.pathLengthMm,
    ...(typeof sample.pathLengthUMm === 'number' ? { pathLengthUMm: sample.pathLengthUMm } : {}),
    dilution: sample.dilution,
  };
}

/** The calculation of some samples on a curve: the curve's own request with these as its unknowns. */
export function requestWith(curve: CurveRequest, samples: readonly UnknownSample[]): CurveRequest {
  return { ...curve, unknowns: samples.map((sample) => unknownOf(sample, curve.signal)) };
}
