/**
 * Few round ticks within an axis, a step of 1, 2 or 5 times a power of ten.
 *
 * @param target about how many are wanted; the answer has between half and twice as many
 */
export function ticksBetween(min: number, max: number, target = 6): { at: number[]; decimals: number } {
  const span = max - min;
  if (!(span > 0) || !Number.isFinite(span)) return { at: [], decimals: 0 };
  const rough = span / target;
  const power = 10 ** Math.floor(Math.log10(rough));
  // the factor nearest to the wish, as ratios go: the boundaries are √2, √10 and √50
  const step =
    power *
    (rough / power < Math.SQRT2
      ? 1
      : rough / power < Math.sqrt(10)
        ? 2
        : rough / power < Math.sqrt(50)
          ? 5
          : 10);
  const first = Math.ceil(min / step - 1e-9);
  const last = Math.floor(max / step + 1e-9);
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const at = Array.from({ length: last - first + 1 }, (_, i) =>
    Number(((first + i) * step).toFixed(decimals)),
  );
  return { at, decimals };
}

/** A tick's number with a true minus sign. */
export function tickText(value: number, decimals: number): string {
  return value
    .toFixed(Math.min(decimals, 12))
    .replace(/^-(?=[\d.]*[1-9])/, '\u2212')
    .replace(/^-/, '');
}

/** An axis that holds all values with a little air on both sides. Equal values get a span around them. */
export function axisAround(
  values: readonly number[],
  { below = 0.03, above = 0.05 } = {},
): { min: number; max: number } {
  let min = Infinity;
  let max = -Infinity;
  for (const value of values) {
    if (!Number.isFinite(value)) continue;
    if (value < min) min = value;
    if (value > max) max = value;
  }
  if (min > max) return { min: 0, max: 1 };
  const span = max - min || Math.abs(max) || 1;
  return { min: min - below * span, max: max + above * span };
}
