import { X_RANGES } from '../inspect/guesses';
import type { XUnit } from '../types';
import type { NumberColumn } from './number-table';

/** What a column's numbers look like, for telling x from y. */
export interface ColumnFacts {
  readonly numbers: number;
  readonly rows: number;
  readonly low: number;
  readonly high: number;
  /** 1 rising, −1 falling, 0 neither; strictly, over the cells that hold numbers. */
  readonly direction: -1 | 0 | 1;
  /** Share of steps that go the way most steps go. */
  readonly sorted: number;
  /** 1, 2, 3, … or 0, 1, 2, …: numbers of the rows. */
  readonly isIndex: boolean;
}

export function columnFacts(column: NumberColumn): ColumnFacts {
  const { values } = column;
  let [low, high] = [Infinity, -Infinity];
  let before = NaN;
  let [up, down, flat, units] = [0, 0, 0, 0];
  let first = NaN;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    if (value < low) low = value;
    if (value > high) high = value;
    if (Number.isNaN(first)) first = value;
    if (!Number.isNaN(before)) {
      if (value > before) up += 1;
      else if (value < before) down += 1;
      else flat += 1;
      if (value - before === 1) units += 1;
    }
    before = value;
  }
  const steps = up + down + flat;
  const direction = steps === 0 ? 1 : up === steps ? 1 : down === steps ? -1 : 0;
  const isIndex = steps > 0 && units === steps && (first === 0 || first === 1);
  return {
    numbers: column.numbers,
    rows: values.length,
    low,
    high,
    direction,
    sorted: steps === 0 ? 1 : Math.max(up, down) / steps,
    isIndex,
  };
}

/** Whether the numbers can be wavelengths, wavenumbers or energies in some unit (or in the unit given). */
export function inRange(facts: ColumnFacts, unit?: XUnit): boolean {
  const units = unit ? [unit] : (Object.keys(X_RANGES) as XUnit[]);
  return units.some((name) => facts.low >= X_RANGES[name][0] && facts.high <= X_RANGES[name][1]);
}
