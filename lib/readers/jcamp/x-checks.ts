import type { Gap, ReaderWarning } from '../types';
import type { Ordinates, TableLine } from './ordinates';
import { abscissaIndex, type XGrid } from './x-axis';

export interface PlacedOrdinates {
  readonly raw: Float64Array;
  readonly gaps: Map<number, Omit<Gap, 'index'>>;
  readonly warnings: ReaderWarning[];
}

/** More disagreeing lines than this and the grid is in doubt, not the lines. */
const FEW = 0.25;

/**
 * Hold each data line's abscissa against the grid. Where a line's own points do not fill the way to the next line's
 * abscissa, some were lost or made up by damage: which, nobody can tell, so the points of that line become gaps
 * and the lines after it keep their places.
 */
export function placeOrdinates(ordinates: Ordinates, grid: XGrid, xFactor: number): PlacedOrdinates {
  const { raw, lines } = ordinates;
  const warnings: ReaderWarning[] = [];
  const same = { raw: raw.toArray(), gaps: ordinates.gaps, warnings };
  if (!Number.isFinite(grid.deltaX) || grid.deltaX === 0 || lines.length < 2) return same;
  const shifts = lines.map((line) => shiftOf(line, grid, xFactor));
  const habit = constantShift(shifts);
  const jumps: number[] = [];
  let before = habit;
  for (let k = 0; k < lines.length; k++) {
    const shift = shifts[k] ?? 0;
    if (shift === before) continue;
    jumps.push(k);
    before = shift;
  }
  if (jumps.length === 0) return same;
  const bad = jumps[0] ?? 0;
  const where = lines[bad];
  if (jumps.length > FEW * lines.length + 1 || bad === 0) {
    warnings.push({
      code: 'X_CHECK',
      message: `The abscissae of ${jumps.length} data lines do not fit the others`,
      value: jumps.length,
    });
    return same;
  }
  for (const k of jumps.slice(0, 20)) {
    const line = lines[k];
    if (line)
      warnings.push({
        code: 'X_CHECK',
        message: `Line ${line.line + 1} begins at ${line.abscissa * xFactor}, which the points before it do not reach or pass`,
        line: line.line + 1,
      });
  }
  return where ? refill(ordinates, shifts, habit, warnings) : same;
}

/** By how many points a line's abscissa is away from the place of its ordinate. */
function shiftOf(line: TableLine, grid: XGrid, xFactor: number): number {
  const expected = (line.abscissa * xFactor - grid.firstX) / grid.deltaX;
  const off = expected - abscissaIndex(line);
  const tolerance = (line.rounding * Math.abs(xFactor)) / Math.abs(grid.deltaX) + 0.3;
  return Math.abs(off) <= tolerance ? 0 : Math.round(off);
}

/** Programs that write the abscissa of the first new point after a check are one off on every line but the first. */
function constantShift(shifts: readonly number[]): number {
  let zero = 0;
  let one = 0;
  for (const shift of shifts) {
    if (shift === 0) zero += 1;
    if (shift === 1) one += 1;
  }
  return one > 2 && one >= shifts.length - 1 - zero && zero <= 1 ? 1 : 0;
}

function refill(
  ordinates: Ordinates,
  shifts: readonly number[],
  habit: number,
  warnings: ReaderWarning[],
): PlacedOrdinates {
  const { raw, lines } = ordinates;
  const most = raw.length * 2 + 64;
  const out: number[] = [];
  const gaps = new Map<number, Omit<Gap, 'index'>>();
  for (let k = 0; k < lines.length; k++) {
    const line = lines[k];
    if (!line) continue;
    const next = lines[k + 1];
    const from = line.firstIndex;
    const to = next ? next.firstIndex : raw.length;
    const shift = (next ? (shifts[k + 1] ?? 0) : (shifts[k] ?? 0)) - (shifts[k] ?? 0);
    const settled = k === 0 || !next ? shift === 0 || shift === habit : shift === 0;
    const wanted = settled ? to - from : Math.max(0, to - from + shift);
    if (!settled && out.length + wanted > most) {
      warnings.push({
        code: 'X_CHECK',
        message: `Line ${line.line + 1} leaves a hole too wide to be filled with gaps`,
        line: line.line + 1,
      });
      return { raw: raw.toArray(), gaps: ordinates.gaps, warnings };
    }
    for (let i = 0; i < wanted; i++) {
      const gap = settled
        ? ordinates.gaps.get(from + i)
        : { reason: 'unreadable' as const, text: 'damaged line' };
      if (gap) gaps.set(out.length, gap);
      out.push(settled ? raw.at(from + i) : NaN);
    }
  }
  return { raw: Float64Array.from(out), gaps, warnings };
}
