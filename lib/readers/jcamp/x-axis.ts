import type { ReaderWarning } from '../types';
import type { Ordinates, TableLine } from './ordinates';

/** What the header says of x; NaN where it says nothing. */
export interface XHeader {
  readonly firstX: number;
  readonly lastX: number;
  readonly deltaX: number;
  readonly count: number;
  readonly xFactor: number;
}

export interface XGrid {
  readonly firstX: number;
  readonly deltaX: number;
  /** x of the last point, when the header gives it: interpolating keeps both ends exact. */
  readonly lastX?: number;
  readonly lastIndex?: number;
  readonly warnings: ReaderWarning[];
}

/** Lines that may disagree before a grid is given up. */
const AGREE = 0.75;

/**
 * The x grid of (X++(Y..Y)).
 *
 * FIRSTX, LASTX and NPOINTS come first, then FIRSTX and LASTX with the true count, then FIRSTX and DELTAX; each
 * is held against the steps between the abscissae of the data lines, and where none agrees the abscissae decide.
 * NPOINTS and DELTAX are wrong often enough that neither is believed against the lines.
 */
export function chooseGrid(header: XHeader, ordinates: Ordinates): XGrid {
  const n = ordinates.raw.length;
  const warnings: ReaderWarning[] = [];
  if (Number.isFinite(header.count) && header.count !== n) {
    const message = `NPOINTS says ${header.count}, but ${n} ${n === 1 ? 'point was' : 'points were'} read`;
    warnings.push({ code: 'NPOINTS', message, value: n });
  }
  const steps = lineSteps(ordinates.lines, header.xFactor);
  const grids = headerGrids(header, n);
  const fitting = grids.find((grid) => agreement(grid.deltaX, steps) >= AGREE);
  if (fitting) {
    checkDelta(header, fitting.deltaX, warnings);
    return { ...fitting, warnings };
  }
  const first = ordinates.lines[0];
  const fromLines = stepFromLines(steps);
  if (first && Number.isFinite(fromLines) && !countsPoints(ordinates.lines)) {
    const firstX = first.abscissa * header.xFactor;
    const code = grids.length === 0 ? 'X_FROM_LINES' : 'X_HEADER_WRONG';
    const why =
      grids.length === 0
        ? 'The header gives no LASTX or DELTAX'
        : 'FIRSTX, LASTX and DELTAX do not fit the data lines';
    warnings.push({ code, message: `${why}; x was taken from the abscissae of the data lines` });
    return { firstX, deltaX: fromLines, warnings };
  }
  const best = grids[0];
  if (best) {
    if (steps.length > 0) {
      warnings.push({
        code: 'X_LINES_WRONG',
        message: 'The abscissae of the data lines do not fit FIRSTX and LASTX; x was taken from the header',
      });
    }
    return { ...best, warnings };
  }
  return { firstX: first ? first.abscissa * header.xFactor : header.firstX, deltaX: header.deltaX, warnings };
}

function headerGrids(header: XHeader, n: number): Omit<XGrid, 'warnings'>[] {
  const { firstX, lastX, deltaX, count } = header;
  const grids: Omit<XGrid, 'warnings'>[] = [];
  for (const points of count === n || !(count > 1) ? [n] : [count, n]) {
    const step = (lastX - firstX) / (points - 1);
    if (Number.isFinite(step) && step !== 0)
      grids.push({ firstX, deltaX: step, lastX, lastIndex: points - 1 });
  }
  if (Number.isFinite(firstX) && Number.isFinite(deltaX) && deltaX !== 0) grids.push({ firstX, deltaX });
  if (n === 1 && Number.isFinite(firstX)) grids.push({ firstX, deltaX: NaN });
  return grids;
}

interface LineStep {
  readonly x: number;
  readonly points: number;
  readonly tolerance: number;
}

/** Step in x and in points from each data line to the next. */
function lineSteps(lines: readonly TableLine[], xFactor: number): LineStep[] {
  const steps: LineStep[] = [];
  for (let k = 1; k < lines.length; k++) {
    const before = lines[k - 1];
    const line = lines[k];
    if (!before || !line) continue;
    steps.push({
      x: (line.abscissa - before.abscissa) * xFactor,
      points: abscissaIndex(line) - abscissaIndex(before),
      tolerance: (line.rounding + before.rounding) * Math.abs(xFactor),
    });
  }
  return steps;
}

/** The point that a line's abscissa belongs to: the checked one, where the line begins with a y-check. */
export function abscissaIndex(line: TableLine): number {
  return line.checked ? line.firstIndex - 1 : line.firstIndex;
}

function agreement(deltaX: number, steps: readonly LineStep[]): number {
  if (steps.length === 0) return 1;
  let agree = 0;
  for (const step of steps) {
    // One point more or less is the other habit of counting at a y-check; only the first step can show it.
    const off = Math.abs(step.x - step.points * deltaX);
    if (off <= step.tolerance + 0.25 * Math.abs(deltaX)) agree += 1;
  }
  return steps.length === 1 &&
    agree === 0 &&
    Math.abs((steps[0]?.x ?? 0) / deltaX - (steps[0]?.points ?? 0)) < 1.01
    ? 1
    : agree / steps.length;
}

function stepFromLines(steps: readonly LineStep[]): number {
  let x = 0;
  let points = 0;
  for (const step of steps) {
    x += step.x;
    points += step.points;
  }
  return points > 0 && x !== 0 ? x / points : NaN;
}

/** Some programs write the number of the point in place of the abscissa. */
function countsPoints(lines: readonly TableLine[]): boolean {
  const offset = lines[0]?.abscissa ?? NaN;
  if (offset !== 0 && offset !== 1) return false;
  return lines.every((line) => Math.abs(line.abscissa - offset - line.firstIndex) <= 1);
}

function checkDelta(header: XHeader, deltaX: number, warnings: ReaderWarning[]): void {
  if (!Number.isFinite(header.deltaX) || Math.abs(header.deltaX - deltaX) <= 2e-3 * Math.abs(deltaX)) return;
  warnings.push({
    code: 'DELTAX',
    message: `DELTAX says ${header.deltaX}, but the points are ${deltaX} apart`,
    value: header.deltaX,
  });
}

/** x of every point of a grid. */
export function gridX(grid: XGrid, n: number): Float64Array {
  const x = new Float64Array(n);
  const { firstX, deltaX, lastX, lastIndex } = grid;
  const span = lastX !== undefined && lastIndex !== undefined && lastIndex > 0;
  for (let i = 0; i < n; i++)
    x[i] = i === 0 ? firstX : span ? firstX + (i * (lastX - firstX)) / lastIndex : firstX + i * deltaX;
  return x;
}
