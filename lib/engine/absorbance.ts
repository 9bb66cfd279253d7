import { EngineError } from './errors';
import type { Reading, Signal } from './types';

export type CensorReason = 'aboveRange' | 'belowRange' | 'noLight' | 'empty' | 'unreadable';

/** The absorbance of one reading, or why it has none. */
export interface Absorbance {
  readonly value: number | null;
  readonly censored?: {
    readonly reason: CensorReason;
    /** What came. */
    readonly text: string;
    /** The absorbance it is at least, where the text says so (">3.5"). */
    readonly atLeast?: number;
  };
}

export function absorbanceOf(reading: Reading, signal: Signal): Absorbance {
  if (typeof reading !== 'number') throw new EngineError('NOT_FINITE', 'absorbanceOf cannot read text yet');
  return {
    value:
      signal === 'absorbance' ? reading : -Math.log10(signal === 'transmittance' ? reading : reading / 100),
  };
}

/** T = 10^-A. */
export function transmittanceOf(absorbance: number): number {
  return 10 ** -absorbance;
}
