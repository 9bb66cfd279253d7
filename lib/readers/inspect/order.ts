/** How x runs through a spectrum, in file order. */
export type XOrder =
  | { readonly kind: 'ascending' | 'descending' }
  | { readonly kind: 'turnRound'; readonly at: number }
  | { readonly kind: 'restarts'; readonly starts: readonly number[] }
  | { readonly kind: 'unsorted' };

/** A leg shorter than this is a slip, not a scan. */
const SHORTEST_LEG = 3;

/**
 * Judge the order of x. Equal neighbours do not break a run. One change of direction is a scan there and back;
 * several runs in one direction over the same range are scans one after the other.
 */
export function xOrder(x: Float64Array): XOrder {
  const turns: number[] = [];
  let direction = 0;
  let up = 0;
  let down = 0;
  for (let i = 1; i < x.length; i++) {
    const step = Math.sign((x[i] ?? 0) - (x[i - 1] ?? 0));
    if (step > 0) up += 1;
    if (step < 0) down += 1;
    if (step === 0) continue;
    if (direction !== 0 && step !== direction) turns.push(i);
    direction = step;
  }
  if (down === 0) return { kind: 'ascending' };
  if (up === 0) return { kind: 'descending' };
  return turnedOrder(x, turns, up >= down ? 1 : -1);
}

function turnedOrder(x: Float64Array, turns: readonly number[], main: number): XOrder {
  const [at] = turns;
  if (turns.length === 1 && at !== undefined && at >= SHORTEST_LEG && x.length - at >= SHORTEST_LEG - 1) {
    return overlap(x, 0, at, at, x.length) > 0.5 ? { kind: 'turnRound', at } : { kind: 'unsorted' };
  }
  const starts = [0];
  for (let i = 1; i < x.length; i++) {
    const step = (x[i] ?? 0) - (x[i - 1] ?? 0);
    if (step * main < 0) starts.push(i);
  }
  const long = starts.every((start, k) => (starts[k + 1] ?? x.length) - start >= SHORTEST_LEG);
  const [, second] = starts;
  if (long && second !== undefined && overlap(x, 0, second, second, starts[2] ?? x.length) > 0.5)
    return { kind: 'restarts', starts };
  return { kind: 'unsorted' };
}

/** The part of the shorter of two stretches of x that the other covers, too. */
function overlap(x: Float64Array, from1: number, to1: number, from2: number, to2: number): number {
  const [a1 = 0, b1 = 0] = [x[from1], x[to1 - 1]];
  const [a2 = 0, b2 = 0] = [x[from2], x[to2 - 1]];
  const low = Math.max(Math.min(a1, b1), Math.min(a2, b2));
  const high = Math.min(Math.max(a1, b1), Math.max(a2, b2));
  const shorter = Math.min(Math.abs(b1 - a1), Math.abs(b2 - a2));
  return shorter > 0 ? (high - low) / shorter : 0;
}
