import type { FittedCurve } from '../fit-curve';
import { std } from '../math';
import { normalise } from '../prepare-points';

/** The scatter of blanks, and how it becomes a concentration. */
export interface BlankScatter {
  readonly sd: number;
  readonly n: number;
  /** |dy/dc| at zero; 1 when the blanks are concentrations already. */
  readonly slope: number;
  readonly of: string;
}

export function scatterOf(values: readonly number[], slope: number, of: string): BlankScatter | null {
  if (values.length < 2) return null;
  return { sd: Number(std([...values])), n: values.length, slope, of };
}

/** Blank readings of a curve per 10 mm, or those of zero standards; null with fewer than two. */
export function blankScatter({ blanks, points }: FittedCurve, slope: number): BlankScatter | null {
  const ofBlanks = blanks.readings.map((blank) => normalise(blank.asRead, null, blank.pathLengthMm));
  const ofZero = points.flatMap((point) =>
    point.role === 'standard' &&
    point.concentration === 0 &&
    point.excludedBecause !== 'request' &&
    point.y !== null
      ? [point.y]
      : [],
  );
  return scatterOf(ofBlanks.length >= 2 ? ofBlanks : ofZero, slope, 'blank readings');
}
