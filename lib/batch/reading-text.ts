import { absorbanceOf, type Signal } from '@/lib/engine';
import { withTrueMinus } from '@/lib/format/number';
import { significantText, toDecimals } from '@/lib/format/round';

/** A reading as it came, or what stood in its place. */
export interface ShownReading {
  readonly value: number | null;
  readonly gapText: string | null;
  readonly signal: Signal;
}

const DECIMALS: Readonly<Record<Signal, number>> = {
  absorbance: 4,
  transmittance: 4,
  percentTransmittance: 2,
};
const TYPED_DIGITS = 7;

/** The reading as it is shown: at least four decimals of an absorbance, more when more were typed. */
export function readingText({ value, gapText, signal }: ShownReading, origin: 'typed' | 'spectrum'): string {
  if (value === null) return gapText === null || gapText === '' ? 'empty' : gapText;
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
