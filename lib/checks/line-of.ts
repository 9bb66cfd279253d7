import { type CurveAnswer, type CurveRequest, calculateStandardCurve } from '@/lib/engine';
import { once } from './once';

/** x and y of a published line; a weight for each point where there are some. */
export interface PublishedLine {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly weights?: readonly number[];
}

/**
 * Have the engine fit published data, one reading a standard, and read `signals` back (each a list of the readings
 * of one unknown). Books fit intensities and temperatures as well, so the absorbance limit is out of the way.
 */
export function lineOf(
  { x, y, weights }: PublishedLine,
  signals: readonly (readonly number[])[] = [],
  changes: Partial<CurveRequest> = {},
): () => CurveAnswer {
  return once(() =>
    calculateStandardCurve({
      signal: 'absorbance',
      pathLengthMm: 10,
      unit: 'mg/L',
      model: 'linear',
      weighting: weights ? 'given' : 'none',
      confidence: 0.95,
      absorbanceLimit: 1e6,
      standards: x.map((concentration, i) => ({
        concentration,
        readings: y.slice(i, i + 1),
        weight: weights?.[i],
      })),
      unknowns: signals.map((readings) => ({ readings })),
      ...changes,
    }),
  );
}

/** Concentration of the unknown at a position, with its u; NaN where the engine gives none. */
export function readBack(answer: CurveAnswer, i: number): { readonly value: number; readonly u: number } {
  return answer.unknowns[i]?.measured ?? { value: NaN, u: NaN };
}
