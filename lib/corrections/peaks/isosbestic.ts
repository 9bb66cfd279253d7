import { CorrectionError } from '@/lib/corrections/errors';
import { ontoGrid } from '@/lib/corrections/interpolate';
import { SAME_NM } from '@/lib/corrections/point-math';
import type { Points } from '@/lib/corrections/types';

export interface IsosbesticPoint {
  /** Mean of the crossings of all pairs. */
  readonly positionNm: number;
  /** From the lowest to the highest of them. */
  readonly spreadNm: number;
  /** Mean absorbance of the set there, and from its lowest to its highest. */
  readonly absorbance: number;
  readonly absorbanceSpread: number;
}

export interface IsosbesticOptions {
  /** Crossings of all pairs lie within so many nm of the first pair's. */
  readonly toleranceNm?: number;
  /** A pair must differ by this much on either side of its crossing, else noise would cross all the time. */
  readonly leastDifference?: number;
}

/**
 * Isosbestic points of a set: wavelengths where every pair crosses, within a tolerance. Spectra are compared on the
 * wavelengths of the first; a crossing lies where the difference of two changes its sign, linear between points, and
 * counts when the difference reaches `leastDifference` on both sides before it crosses again. A pair that never
 * differs so much says nothing and is left out; when all are such there is no isosbestic point to tell.
 *
 * @throws CorrectionError NOT_ENOUGH_SPECTRA
 */
export function isosbesticPoints(
  spectra: readonly Points[],
  { toleranceNm = 1, leastDifference = 0.002 }: IsosbesticOptions = {},
): readonly IsosbesticPoint[] {
  const [first] = spectra;
  if (!first || spectra.length < 2) {
    throw new CorrectionError(
      'NOT_ENOUGH_SPECTRA',
      `isosbestic points need two spectra, got ${spectra.length}`,
    );
  }
  const placed = spectra.map((points) => ontoGrid(points, first.wavelengthNm));
  const pairs = pairsOf(placed)
    .map(([a, b]) => difference(a, b))
    .filter(({ d }) => d.some((x) => x !== null && Math.abs(x) >= leastDifference))
    .map((pair) => crossings(pair, leastDifference));
  const [start = [], ...others] = pairs;
  return start.flatMap((nm) => {
    const nearest = others.map((list) => nearestTo(list, nm));
    if (nearest.some((x) => x === null || Math.abs(x - nm) > toleranceNm + SAME_NM)) return [];
    return [pointOf([nm, ...(nearest as number[])], placed)];
  });
}

function pairsOf(spectra: readonly Points[]): readonly (readonly [Points, Points])[] {
  return spectra.flatMap((a, i) => spectra.slice(i + 1).map((b) => [a, b] as const));
}

interface Difference {
  readonly x: readonly number[];
  readonly d: readonly (number | null)[];
}

function difference(a: Points, b: Points): Difference {
  const d = a.absorbance.map((y, i) => {
    const other = b.absorbance[i] as number | null;
    return y === null || other === null ? null : y - other;
  });
  return { x: a.wavelengthNm, d };
}

/** Where the difference goes from beyond +least to beyond -least or back, without a gap between. */
function crossings({ x, d }: Difference, least: number): readonly number[] {
  const found: number[] = [];
  let side = 0;
  let changes: number[] = [];
  let last: { nm: number; d: number } | null = null;
  x.forEach((nm, i) => {
    const here = d[i] as number | null;
    if (here === null) {
      side = 0;
      last = null;
      changes = [];
      return;
    }
    if (last !== null && here !== 0 && Math.sign(here) !== Math.sign(last.d)) {
      changes.push(last.nm + ((nm - last.nm) * last.d) / (last.d - here));
    }
    if (here !== 0) last = { nm, d: here };
    if (Math.abs(here) < least) return;
    // noise may cross an odd number of times on the way over: the middle one stands for them
    if (side === -Math.sign(here)) found.push(changes[(changes.length - 1) / 2] as number);
    side = Math.sign(here);
    changes = [];
  });
  return found;
}

function nearestTo(list: readonly number[], nm: number): number | null {
  return list.reduce<number | null>(
    (best, x) => (best === null || Math.abs(x - nm) < Math.abs(best - nm) ? x : best),
    null,
  );
}

function pointOf(crossed: readonly number[], spectra: readonly Points[]): IsosbesticPoint {
  const mean = (list: readonly number[]) => list.reduce((sum, x) => sum + x, 0) / list.length;
  const spread = (list: readonly number[]) => Math.max(...list) - Math.min(...list);
  const positionNm = mean(crossed);
  const heights = spectra
    .map((points) => ontoGrid(points, [positionNm]).absorbance[0] as number | null)
    .filter((a): a is number => a !== null);
  return {
    positionNm,
    spreadNm: spread(crossed),
    absorbance: mean(heights),
    absorbanceSpread: spread(heights),
  };
}
