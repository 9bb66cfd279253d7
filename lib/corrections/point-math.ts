import type { Points } from './types';

/** Wavelengths are told apart to a millionth of a nanometre. */
export const SAME_NM = 1e-6;

interface Value {
  readonly a: number | null;
  readonly u: number | null;
}

/** Each point with a number given anew by `change`; gaps stay gaps, and u is kept where it is known. */
export function mapPoints(points: Points, change: (a: number, nm: number, i: number) => Value): Points {
  const values = points.absorbance.map((a, i): Value =>
    a === null ? { a: null, u: null } : change(a, points.wavelengthNm[i] as number, i),
  );
  return withValues(points.wavelengthNm, values);
}

/** Points of these values; `u` is left out when no value has one. */
export function withValues(wavelengthNm: readonly number[], values: readonly Value[]): Points {
  const absorbance = values.map(({ a }) => a);
  const known = values.some(({ u }) => u !== null);
  return { wavelengthNm: [...wavelengthNm], absorbance, ...(known ? { u: values.map(({ u }) => u) } : {}) };
}

export function uAt(points: Points, i: number): number | null {
  return points.u?.[i] ?? null;
}

/** √Σu² of what is known; null when nothing is. */
export function inQuadrature(...parts: readonly (number | null | undefined)[]): number | null {
  const known = parts.filter((u): u is number => u !== null && u !== undefined);
  return known.length === 0 ? null : Math.hypot(...known);
}

/** u times |factor|; unknown stays unknown. */
export function scaled(u: number | null, factor: number): number | null {
  return u === null ? null : Math.abs(factor) * u;
}

/** Points from `fromNm` to `toNm` that have a number. */
export function numbersWithin({ wavelengthNm, absorbance }: Points, fromNm: number, toNm: number) {
  const x: number[] = [];
  const y: number[] = [];
  wavelengthNm.forEach((nm, i) => {
    const a = absorbance[i];
    if (a === null || a === undefined || nm < fromNm - SAME_NM || nm > toNm + SAME_NM) return;
    x.push(nm);
    y.push(a);
  });
  return { x, y };
}

/** Weights of 1, for a line through points that count alike. */
export function equalWeights(x: readonly number[]): readonly number[] {
  return x.map(() => 1);
}
