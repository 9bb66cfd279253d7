import type { FitData } from '../regression/fit';

export interface Level {
  readonly concentration: number;
  readonly readings: number;
  /** Σ w (y - ȳ_w)² within the level. */
  readonly squares: number;
}

/** The fitted readings by concentration, in rising order. */
export function levelsOf({ x, y, w }: FitData): readonly Level[] {
  return [...new Set(x)]
    .sort((a, b) => a - b)
    .map((concentration) => {
      const own = x.flatMap((value, i) => (value === concentration ? [i] : []));
      const weight = own.reduce((sum, i) => sum + (w[i] ?? 0), 0);
      const mean = own.reduce((sum, i) => sum + (w[i] ?? 0) * (y[i] ?? 0), 0) / weight;
      const squares = own.reduce((sum, i) => sum + (w[i] ?? 0) * ((y[i] ?? 0) - mean) ** 2, 0);
      return { concentration, readings: own.length, squares };
    });
}
