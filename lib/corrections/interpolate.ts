import { CorrectionError } from './errors';
import { inQuadrature, SAME_NM, scaled, uAt, withValues } from './point-math';
import type { Points, StepOutcome } from './types';
import { count } from './words';

/** More points than any instrument gives. */
const MOST_POINTS = 100_000;

/**
 * A spectrum on other wavelengths, linearly between neighbours:
 *
 *     p = (λ - λ1)/(λ2 - λ1)     A(λ) = (1 - p) A1 + p A2     u² = (1 - p)² u1² + p² u2²
 *
 * A wavelength outside the spectrum, or beside a gap, becomes a gap: nothing is extrapolated or bridged. A
 * wavelength that is there (to 1e-6 nm) takes its own value even beside a gap. Errors of neighbours are taken as
 * independent. `grid` ascends.
 */
export function ontoGrid(points: Points, grid: readonly number[]): Points {
  const { wavelengthNm: x, absorbance } = points;
  let next = 0;
  const values = grid.map((nm) => {
    while (next < x.length && (x[next] as number) < nm - SAME_NM) next += 1;
    if (next === x.length) return { a: null, u: null };
    const here = absorbance[next] as number | null;
    if (Math.abs((x[next] as number) - nm) <= SAME_NM) return { a: here, u: uAt(points, next) };
    const before = next === 0 ? null : (absorbance[next - 1] as number | null);
    if (before === null || here === null) return { a: null, u: null };
    const low = x[next - 1] as number;
    const p = (nm - low) / ((x[next] as number) - low);
    return {
      a: (1 - p) * before + p * here,
      u: inQuadrature(scaled(uAt(points, next - 1), 1 - p), scaled(uAt(points, next), p)),
    };
  });
  return withValues(grid, values);
}

/** fromNm, fromNm + stepNm, … up to toNm, each from its index so that no error adds up. */
export function evenGrid(fromNm: number, toNm: number, stepNm: number): readonly number[] {
  const intervals = Math.floor((toNm - fromNm) / stepNm + SAME_NM);
  if (!(stepNm > 0) || !(intervals >= 0) || intervals >= MOST_POINTS) {
    throw new CorrectionError(
      'GRID_TOO_FINE',
      `a grid from ${fromNm} to ${toNm} nm in steps of ${stepNm} nm must have between 1 and ${MOST_POINTS} points`,
    );
  }
  return Array.from({ length: intervals + 1 }, (_, i) => Number((fromNm + i * stepNm).toFixed(9)));
}

/**
 * Interpolation onto an even grid.
 *
 * @throws CorrectionError GRID_TOO_FINE; RANGES_APART when no point of the grid lies in the spectrum
 */
export function interpolate(points: Points, fromNm: number, toNm: number, stepNm: number): StepOutcome {
  const grid = evenGrid(fromNm, toNm, stepNm);
  const first = points.wavelengthNm[0] as number;
  const last = points.wavelengthNm.at(-1) as number;
  const inside = grid.filter((nm) => nm >= first - SAME_NM && nm <= last + SAME_NM);
  if (inside.length === 0) {
    throw new CorrectionError(
      'RANGES_APART',
      `the grid from ${fromNm} to ${toNm} nm has no point in this spectrum, which runs from ${first} to ${last} nm`,
    );
  }
  const outside = grid.length - inside.length;
  const text = `${count(outside, 'point')} of the grid outside ${first} to ${last} nm ${outside === 1 ? 'was' : 'were'} left out: a spectrum is not extrapolated.`;
  return {
    points: ontoGrid(points, inside),
    did: `Interpolated linearly onto ${count(inside.length, 'point')} from ${inside[0]} to ${inside.at(-1)} nm, every ${stepNm} nm.`,
    warnings: outside > 0 ? [{ code: 'GRID_OUTSIDE', text }] : [],
  };
}
