import type { Signal } from '@/lib/engine';
import { absorbanceOf } from '@/lib/engine/absorbance';
import { withTrueMinus } from '@/lib/format/number';
import { significantText, toDecimals } from '@/lib/format/round';

/** A reading as it came, or what stood in its place. */
export interface ShownReading {
  readonly value: number | null;
  /** What a second wavelength takes off. */
  readonly minusValue?: number | null;
  readonly gapText: string | null;
  readonly signal: Signal;
}

const DECIMALS: Readonly<Record<Signal, number>> = {
  absorbance: 4,
  transmittance: 4,
  percentTransmittance: 2,
};
const TYPED_DIGITS = 7;

/** The reading as it is shown, with what a second wavelength takes off: "0.8123 - 0.0456", with a true minus. */
export function readingText(reading: ShownReading, origin: 'typed' | 'spectrum'): string {
  const { value, minusValue, gapText, signal } = reading;
  if (value === null) return gapText === null || gapText === '' ? 'empty' : gapText;
  const main = numberText(value, signal, origin);
  if (minusValue === null || minusValue === undefined) return main;
  const minus = numberText(minusValue, signal, origin);
  return `${main} \u2212 ${minusValue < 0 ? `(${minus})` : minus}`;
}

/** At least four decimals of an absorbance, more when more were typed. */
function numberText(value: number, signal: Signal, origin: 'typed' | 'spectrum'): string {
  const short = toDecimals(value, DECIMALS[signal]);
  return withTrueMinus(
    origin === 'spectrum' || Number(short) === value ? short : significantText(value, TYPED_DIGITS),
  );
}

/** The absorbance that the light disc beside a reading is drawn from; null when there is none. */
export function discAbsorbance({ value, signal }: ShownReading): number | null {
  return value === null ? null : absorbanceOf(value, signal).value;
}

/** What readings of this signal are called in a column's head. */
export const SIGNAL_SYMBOL: Readonly<Record<Signal, string>> = {
  absorbance: 'A',
  transmittance: 'T',
  percentTransmittance: '%T',
};
