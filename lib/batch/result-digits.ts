import type { UnknownResult } from '@/lib/engine';
import { roundPair } from '@/lib/format/round';

/** The digits of a result as it is shown: value and U ending at the same place, an exponent split off. */
export interface ResultDigits {
  readonly value: string;
  readonly expanded: string;
  readonly exponent: number | null;
}

const EXPANDED_DIGITS = 2;

/** Null when the result has no number: then its report says what is known. */
export function resultDigits({ concentration }: UnknownResult): ResultDigits | null {
  if (!concentration) return null;
  const pair = roundPair(concentration.value, concentration.U, EXPANDED_DIGITS);
  return { value: pair.value.replace('-', '\u2212'), expanded: pair.spread, exponent: pair.exponent };
}
