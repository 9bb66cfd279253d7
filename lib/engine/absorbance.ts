import { censoredText, type CensorReason, plainNumber } from './censoring';
import { EngineError } from './errors';
import { log10 } from './math';
import type { Reading, Signal, TwoWavelengthReading } from './types';

export type { CensorReason };

/** The absorbance of one reading, or why it has none. */
export interface Absorbance {
  /** What is calculated with. */
  readonly value: number | null;
  /** The two absorbances as they came, where `value` is their difference. */
  readonly two?: TwoWavelengthReading;
  readonly censored?: {
    readonly reason: CensorReason;
    /** What came. */
    readonly text: string;
    /** The absorbance it is at least, where the text says so (">3.5"). */
    readonly atLeast?: number;
  };
}

/**
 * Absorbance of one reading as it came.
 *
 *     A = -log10 T        T = (per cent transmittance) / 100
 *
 * Text is a reading without a number: it keeps what it said and why there is none. A light fraction of zero or
 * less is the same, for no light came through. Text that spells a plain number is that number.
 *
 * @throws EngineError NOT_FINITE for NaN and infinities
 * @source measurement model, section 1; A = -log10 T: Ph. Eur. 2.2.25
 */
export function absorbanceOf(reading: Reading, signal: Signal, pointer?: string): Absorbance {
  return typeof reading === 'object'
    ? differenceOf(reading, signal, pointer)
    : absorbanceOfOne(reading, signal, pointer);
}

function differenceOf(reading: TwoWavelengthReading, signal: Signal, pointer?: string): Absorbance {
  const main = absorbanceOfOne(reading.main, signal, pointer);
  const minus = absorbanceOfOne(reading.minus, signal, pointer);
  if (main.value === null) return main;
  if (minus.value === null) return minus;
  return { value: main.value - minus.value, two: { main: main.value, minus: minus.value } };
}

/** The absorbance as the instrument showed it: of the first wavelength, where a second was taken off. */
export function absorbanceAsRead({ value, two }: Absorbance): number | null {
  return two?.main ?? value;
}

/** The highest absorbance the instrument showed for a reading; -Infinity when it showed no number. */
export function highestAsRead({ value, two }: Absorbance): number {
  return two ? Math.max(two.main, two.minus) : (value ?? -Infinity);
}

/** A reading as it came, in words for a message. */
export function readingText(reading: Reading): string {
  return typeof reading === 'object' ? `${reading.main} - ${reading.minus}` : String(reading);
}

function absorbanceOfOne(reading: number | string, signal: Signal, pointer?: string): Absorbance {
  const number = typeof reading === 'number' ? reading : plainNumber(reading);
  if (number === null) return censoredText(String(reading), signal);
  if (!Number.isFinite(number)) {
    throw new EngineError('NOT_FINITE', `a reading must be a finite number or text, got ${number}`, pointer);
  }
  if (signal === 'absorbance') return { value: number };
  const fraction = signal === 'transmittance' ? number : number / 100;
  if (fraction <= 0) return { value: null, censored: { reason: 'noLight', text: String(reading) } };
  return { value: -log10(fraction) };
}

/** T = 10^-A. */
export function transmittanceOf(absorbance: number): number {
  return 10 ** -absorbance;
}
