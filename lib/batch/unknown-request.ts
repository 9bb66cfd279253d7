import {
  absorbanceOf,
  type CurveRequest,
  type DilutionStep,
  type Reading,
  type Signal,
  type UnknownRequest,
} from '@/lib/engine';

/** A reading of an unknown, typed or read from a spectrum, before it is calculated with. */
export interface UnknownReading {
  readonly value: number | null;
  readonly gapText: string | null;
  readonly signal: Signal;
}

export interface UnknownSample {
  readonly sample: string;
  readonly pathLengthMm: number;
  readonly pathLengthUMm?: number | null;
  readonly dilution: readonly DilutionStep[];
  readonly readings: readonly UnknownReading[];
}

const FACTOR = { transmittance: 1, percentTransmittance: 100 } as const;

/** A reading in the signal of the curve. A spectrum is read in absorbance; the curve may have been typed in per cent T. */
function inSignal(reading: UnknownReading, signal: Signal): Reading {
  if (reading.value === null) return reading.gapText ?? '';
  if (reading.signal === signal) return reading.value;
  const { value } = absorbanceOf(reading.value, reading.signal);
  if (value === null) return 'OVER';
  return signal === 'absorbance' ? value : FACTOR[signal] * 10 ** -value;
}

export function unknownOf(sample: UnknownSample, signal: Signal): UnknownRequest {
  return {
    name: sample.sample,
    readings: sample.readings.map((reading) => inSignal(reading, signal)),
    pathLengthMm: sample.pathLengthMm,
    ...(typeof sample.pathLengthUMm === 'number' ? { pathLengthUMm: sample.pathLengthUMm } : {}),
    dilution: sample.dilution,
  };
}

/** The calculation of some samples on a curve: the curve's own request with these as its unknowns. */
export function requestWith(curve: CurveRequest, samples: readonly UnknownSample[]): CurveRequest {
  return { ...curve, unknowns: samples.map((sample) => unknownOf(sample, curve.signal)) };
}
