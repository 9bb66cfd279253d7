/**
 * Fewer points for a still picture, peaks kept: of each run of points its lowest and its highest, in their order.
 * A gap (null) stays a gap. Never used where numbers are read.
 */
export function thinLine(
  x: readonly number[],
  y: readonly (number | null)[],
  most = 400,
): { x: number[]; y: (number | null)[] } {
  if (x.length <= most) return { x: [...x], y: [...y] };
  const run = Math.ceil(x.length / (most / 2));
  const kept: number[] = [];
  for (let start = 0; start < x.length; start += run) {
    let low = -1;
    let high = -1;
    let gap = -1;
    for (let i = start; i < Math.min(start + run, x.length); i++) {
      const value = y[i] ?? null;
      if (value === null) gap = i;
      else {
        if (low < 0 || value < (y[low] ?? Infinity)) low = i;
        if (high < 0 || value > (y[high] ?? -Infinity)) high = i;
      }
    }
    kept.push(...[...new Set([low, high, gap])].filter((i) => i >= 0).sort((a, b) => a - b));
  }
  const last = x.length - 1;
  if (kept[0] !== 0) kept.unshift(0);
  if (kept.at(-1) !== last) kept.push(last);
  return { x: kept.map((i) => x[i] ?? NaN), y: kept.map((i) => y[i] ?? null) };
}
