import { CorrectionError } from './errors';
import { ontoGrid } from './interpolate';
import { SAME_NM, withValues } from './point-math';
import type { Points, StepOutcome } from './types';
import { count, warnIf } from './words';

/**
 * The mean of replicates on a common grid, and its standard uncertainty:
 *
 *     Ā = Σ A_i / n      s² = Σ (A_i - Ā)² / (n - 1)      u = s / √n
 *
 * The grid is that of the replicate with the fewest points in the range common to all (so that none is sharpened by
 * interpolation), and numbers are added in ascending order: the order of the replicates changes nothing. A gap in
 * one replicate is a gap in the mean, for a mean of fewer is another mean. The uncertainty that replicates bring
 * themselves is not added: their spread shows it.
 *
 * @throws CorrectionError NOT_ENOUGH_SPECTRA, RANGES_APART
 */
export function averageSpectra(spectra: readonly Points[]): StepOutcome {
  if (spectra.length < 2) {
    throw new CorrectionError('NOT_ENOUGH_SPECTRA', `an average needs two spectra, got ${spectra.length}`);
  }
  const grid = commonGrid(spectra);
  const placed = spectra.map((points) => ontoGrid(points, grid).absorbance);
  const values = grid.map((_, i) => meanWithU(placed.map((absorbance) => absorbance[i] as number | null)));
  const gaps = values.filter(({ a }) => a === null).length;
  return {
    points: withValues(grid, values),
    did: `Averaged ${spectra.length} replicates on ${count(grid.length, 'point')} from ${grid[0]} to ${grid.at(-1)} nm.`,
    warnings: warnIf(
      gaps > 0,
      'AVERAGE_GAPS',
      `${count(gaps, 'point')} of ${grid.length} have no number in at least one replicate and are gaps in the mean.`,
    ),
  };
}

function meanWithU(numbers: readonly (number | null)[]) {
  if (numbers.includes(null)) return { a: null, u: null };
  const sorted = (numbers as readonly number[]).toSorted((a, b) => a - b);
  const n = sorted.length;
  const a = sorted.reduce((sum, x) => sum + x, 0) / n;
  const squares = sorted.reduce((sum, x) => sum + (x - a) ** 2, 0);
  return { a, u: Math.sqrt(squares / (n - 1) / n) };
}

function commonGrid(spectra: readonly Points[]): readonly number[] {
  const from = Math.max(...spectra.map(({ wavelengthNm }) => wavelengthNm[0] as number));
  const to = Math.min(...spectra.map(({ wavelengthNm }) => wavelengthNm.at(-1) as number));
  const [grid = []] = spectra
    .map(({ wavelengthNm }) => wavelengthNm.filter((nm) => nm >= from - SAME_NM && nm <= to + SAME_NM))
    .sort((a, b) => a.length - b.length || firstDifference(a, b));
  if (grid.length > 0) return grid;
  throw new CorrectionError(
    'RANGES_APART',
    `the replicates have no range in common: the last begins at ${from} nm and the first ends at ${to} nm`,
  );
}

function firstDifference(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((nm, i) => nm !== b[i]);
  return at === -1 ? 0 : (a[at] as number) - (b[at] as number);
}
