/**
 * Places on one ruler, as shares of its length. The limits of a method and today's results span decades, so the
 * ruler is logarithmic; a value of zero or less has no place on it and stands before its beginning.
 */
export interface LimitScale {
  readonly from: number;
  readonly to: number;
  /** 0 to 1; 0 for what lies before the ruler. */
  at(value: number): number;
  readonly ticks: readonly number[];
}

const STEPS = [1, 2, 5] as const;

/** @param values at least one above zero */
export function limitScale(values: readonly number[]): LimitScale {
  const positive = values.filter((value) => value > 0 && Number.isFinite(value));
  const low = Math.min(...positive) / 1.6;
  const high = Math.max(...positive) * 1.25;
  const span = Math.log(high / low);
  const decades = Array.from(
    { length: Math.ceil(Math.log10(high)) - Math.floor(Math.log10(low)) + 1 },
    (_, index) => Math.floor(Math.log10(low)) + index,
  );
  const ticks = decades.flatMap((power) => STEPS.map((step) => Number(`${step}e${power}`)));
  const within = ticks.filter((tick) => tick >= low && tick <= high);
  return {
    from: low,
    to: high,
    at: (value) => (value <= low ? 0 : Math.min(1, Math.log(value / low) / span)),
    // many decades: only the powers of ten
    ticks: within.length > 8 ? within.filter((tick) => Number.isInteger(Math.log10(tick))) : within,
  };
}
