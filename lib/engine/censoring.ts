import type { Absorbance } from './absorbance';
import { log10 } from './math';
import type { Signal } from './types';

export type CensorReason = 'aboveRange' | 'belowRange' | 'noLight' | 'empty' | 'unreadable';

/** Reasons that mean too much absorbance, so that diluting helps. */
export function isAboveRange(reason: CensorReason): boolean {
  return reason === 'aboveRange' || reason === 'noLight';
}

const PLAIN = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i;
const GROUPED = /^[+-]?[1-9]\d{0,2},\d{3}$/;
const BOUND = /^([<>]|[<>]=|\u2264|\u2265)\s*(.+)$/;
const MARKED = /^(.*\d)\s*\*+$/;
const OVER = /^(over(\s*-?\s*(range|flow))?|o\.?r\.?|ovr|high|sat(urated)?|\*+|\+{2,}|inf(inity)?|\u221e)$/i;
const UNDER = /^(under(\s*-?\s*(range|flow))?|low|-{2,})$/i;

/** The number a text spells, decimal point or comma; null for anything else, "1,234" included: it may be 1.234 or 1234. */
export function plainNumber(text: string): number | null {
  const trimmed = text.trim().replace('\u2212', '-');
  if (!PLAIN.test(trimmed) || GROUPED.test(trimmed)) return null;
  return Number(trimmed.replace(',', '.'));
}

function toAbsorbance(value: number, signal: Signal): number | undefined {
  if (signal === 'absorbance') return value;
  const fraction = signal === 'transmittance' ? value : value / 100;
  return fraction > 0 ? -log10(fraction) : undefined;
}

/** A reading known to lie beyond a number: above range when that means too much absorbance, with the bound where it has one. */
function beyond(value: number, greater: boolean, signal: Signal, text: string): Absorbance {
  const above = signal === 'absorbance' ? greater : !greater;
  const atLeast = above ? toAbsorbance(value, signal) : undefined;
  return {
    value: null,
    censored: {
      reason: above ? 'aboveRange' : 'belowRange',
      text,
      ...(atLeast === undefined ? {} : { atLeast }),
    },
  };
}

/** A bound such as ">3.5", or "<0.03" in transmittance, which bounds the absorbance from the other side. */
function bounded(text: string, signal: Signal): Absorbance | null {
  const [, sign, rest] = BOUND.exec(text) ?? [];
  const value = rest === undefined ? null : plainNumber(rest);
  if (sign === undefined || value === null) return null;
  return beyond(value, sign.startsWith('>') || sign === '\u2265', signal, text);
}

/** What a reading that is text says: above or below what the instrument can show, empty, or nothing we know. */
export function censoredText(raw: string, signal: Signal): Absorbance {
  const text = raw.trim();
  const because = (reason: CensorReason): Absorbance => ({ value: null, censored: { reason, text } });
  if (text === '') return because('empty');
  const stated = bounded(text, signal);
  if (stated) return stated;
  if (OVER.test(text)) return because('aboveRange');
  if (UNDER.test(text)) return because('belowRange');
  const starred = plainNumber(MARKED.exec(text)?.[1] ?? '');
  // "3.500*": the number an instrument stops at, with a mark that the true one lies beyond.
  if (starred !== null) return beyond(starred, signal === 'absorbance', signal, text);
  return because('unreadable');
}
