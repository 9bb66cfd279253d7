import { significantText } from '@/lib/format/round';
import type { CorrectionWarning } from './types';

/** A number for a sentence. */
export function say(x: number, digits = 4): string {
  return significantText(x, digits);
}

/** "0.0123 ± 0.0004 (standard uncertainty)". */
export function sayWithU(x: number, u: number): string {
  return `${say(x)} ± ${say(u, 2)} (standard uncertainty)`;
}

export function count(n: number, one: string, many = `${one}s`): string {
  return `${n} ${n === 1 ? one : many}`;
}

export function warning(code: string, text: string): CorrectionWarning {
  return { code, text };
}

/** The warning when its condition holds, else nothing. */
export function warnIf(holds: boolean, code: string, text: string): readonly CorrectionWarning[] {
  return holds ? [warning(code, text)] : [];
}
