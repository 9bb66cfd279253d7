import type { Reading, Signal } from '@/lib/engine';
import { absorbanceOf } from '@/lib/engine/absorbance';

/** A reading that is kept, before it is calculated with. */
export interface CalculatedReading {
  readonly value: number | null;
  readonly minusValue?: number | null;
  readonly gapText: string | null;
  readonly signal: Signal;
}

const SCALE = { transmittance: 1, percentTransmittance: 100 } as const;

/** A number in another signal; null for a light fraction of zero or less, which has no absorbance. */
function converted(value: number, from: Signal, to: Signal): number | null {
  if (from === to) return value;
  const absorbance = absorbanceOf(value, from).value;
  if (absorbance === null || to === 'absorbance') return absorbance;
  return SCALE[to] * 10 ** -absorbance;
}

/**
 * A kept reading as the engine takes it: the number in the curve's signal, both numbers where a second wavelength
 * is taken off, or the text that came instead. A spectrum is read in absorbance; the curve may have been typed in
 * per cent transmittance.
 */
export function readingInSignal(reading: CalculatedReading, signal: Signal): Reading {
  const { value, minusValue, gapText } = reading;
  if (value === null) return gapText ?? '';
  const main = converted(value, reading.signal, signal);
  if (main === null) return 'OVER';
  if (minusValue === null || minusValue === undefined) return main;
  const minus = converted(minusValue, reading.signal, signal);
  return minus === null ? 'OVER' : { main, minus };
}
