import { z } from 'zod';

const PLAIN_NUMBER = /^[+-]?(\d+[.,]?\d*|[.,]\d+)(e[+-]?\d+)?$/i;
/** "1,234" may be 1.234 or 1234: three digits behind a lone comma and one to three before it. */
const COULD_BE_GROUPED = /^[+-]?[1-9]\d{0,2},\d{3}$/;

/** Whether a text is a number that parseDecimal asks about instead of reading it. */
export function couldBeGrouped(text: string): boolean {
  return COULD_BE_GROUPED.test(text.trim().replace(/\u2212/g, '-'));
}

export type ParsedDecimal =
  { readonly ok: true; readonly value: number } | { readonly ok: false; readonly message: string };

/**
 * Read a number as people type it: one decimal mark, point or comma, no grouping; U+2212 counts as a minus.
 * Blank is an error and never 0. "1,234" is not guessed: the message asks.
 */
export function parseDecimal(text: string): ParsedDecimal {
  const plain = text.trim().replace(/\u2212/g, '-');
  if (plain === '') return { ok: false, message: 'Enter a number' };
  if (COULD_BE_GROUPED.test(plain)) {
    const [whole = '', rest = ''] = plain.split(',');
    return { ok: false, message: `Is this ${whole}.${rest} or ${whole}${rest}? Write it with a point` };
  }
  if (!PLAIN_NUMBER.test(plain)) return { ok: false, message: 'Enter a number, such as 0.25 or 0,25' };
  const value = Number(plain.replace(',', '.'));
  return Number.isFinite(value) ? { ok: true, value } : { ok: false, message: 'This number is too large' };
}

/** A decimal typed into a form field. */
export const decimal = z.string().transform((text, context) => {
  const parsed = parseDecimal(text);
  if (parsed.ok) return parsed.value;
  context.addIssue({ code: 'custom', message: parsed.message });
  return z.NEVER;
});

/** The same for a field that may stay empty: an empty one is null. */
export const optionalDecimal = z.string().transform((text, context) => {
  if (text.trim() === '') return null;
  const parsed = parseDecimal(text);
  if (parsed.ok) return parsed.value;
  context.addIssue({ code: 'custom', message: parsed.message });
  return z.NEVER;
});
