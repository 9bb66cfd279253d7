import { absorbanceOf } from '@/lib/engine/absorbance';
import { parseDecimal } from '@/lib/schemas/decimal';

/** A reading as it is kept: a number, or why there is none and what stood there instead. */
export interface KeptReading {
  /** As it came, in its signal; with a second wavelength, the first one's. */
  readonly value: number | null;
  /** What the second wavelength of the reading rule read, to be taken off; null without one. */
  readonly minusValue?: number | null;
  readonly gapReason: 'aboveRange' | 'missing' | 'unreadable' | null;
  readonly gapText: string | null;
}

export type TypedReading =
  { readonly ok: true; readonly reading: KeptReading } | { readonly ok: false; readonly message: string };

const number = (value: number): TypedReading => ({
  ok: true,
  reading: { value, gapReason: null, gapText: null },
});

/**
 * A reading as it is typed: a number with point or comma, or what the instrument showed instead (OVER, >3.5).
 * Any other text is refused, and so is an empty cell; the message says what to do.
 */
export function typedReading(raw: string): TypedReading {
  const text = raw.trim();
  if (text === '') return { ok: false, message: 'Enter the reading' };
  const parsed = parseDecimal(text);
  if (parsed.ok) return number(parsed.value);
  if (/^(Is this|This number)/.test(parsed.message)) return parsed;
  const reason = absorbanceOf(text, 'absorbance').censored?.reason;
  if (reason === undefined || reason === 'unreadable' || reason === 'empty')
    return {
      ok: false,
      message: `"${text}" is not a reading. Enter a number, or what the instrument showed, such as OVER or >3.5`,
    };
  const gapReason = reason === 'belowRange' ? 'unreadable' : 'aboveRange';
  return { ok: true, reading: { value: null, gapReason, gapText: text } };
}
