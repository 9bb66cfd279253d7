import type { FitData } from '../regression/fit';

export interface Level {
  readonly concentration: number;
  /** Positions of its readings in the data. */
  readonly members: readonly number[];
  readonly readings: number;
  /** Weighted mean of y. */
  readonly mean: number;
  /** Σ w (y - ȳ_w)² within the level. */
  readonly squares: number;
}

/** The fitted readings by concentration, in rising order. */
export function levelsOf({ x, y, w }: FitData): readonly Level[] {
  const groups = new Map<number, number[]>();
  x.forEach((concentration, i) => {
    const group = groups.get(concentration);
    if (group) group.push(i);
    else groups.set(concentration, [i]);
  });
  const levels = [...groups].map(([concentration, members]): Level => {
    let weight = 0;
    let sum = 0;
    for (const i of members) {
      weight += w[i] as number;
      sum += (w[i] as number) * (y[i] as number);
    }
    const mean = sum / weight;
    let squares = 0;
    for (const i of members) squares += (w[i] as number) * ((y[i] as number) - mean) ** 2;
    return { concentration, members, readings: members.length, mean, squares };
  });
  return levels.sort((a, b) => a.concentration - b.concentration);
}

/** Σ w (y - level mean)² stands as no scatter when it is this small a part of Σ w y²: identical readings. */
const NO_SCATTER = 1e-24;

/** The sum of squares below which readings of these data count as identical. */
export function noScatter({ y, w }: FitData): number {
  return NO_SCATTER * y.reduce((sum, value, i) => sum + (w[i] as number) * value * value, 0);
}
