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
  const { lines } = ordinates;
  const agreed = Number.isNaN(header.count) || header.count === n ? grids.slice(0, 1) : [];
  const fitting =
    agreed.find((grid) => passesThrough(grid, lines, header.xFactor)) ??
    grids.find((grid) => stepsExactly(grid, lines, steps, header.xFactor)) ??
    grids.find((grid) => passesThrough(grid, lines, header.xFactor));
  const fromLines = gridFromLines(lines, steps, header.xFactor);
  const whole = fromLines && passesThrough(fromLines, lines, header.xFactor);
  const chosen =
    fitting ?? (whole ? undefined : grids.find((grid) => stepsWell(grid, lines, steps, header.xFactor)));
  if (chosen) {
    checkDelta(header, chosen.deltaX, warnings);
    return { ...chosen, warnings };
  }
  if (fromLines && !countsPoints(lines)) {
    const code = grids.length === 0 ? 'X_FROM_LINES' : 'X_HEADER_WRONG';
    const why =
      grids.length === 0
        ? 'The header gives no LASTX or DELTAX'
        : 'FIRSTX, LASTX and DELTAX do not fit the data lines';
    warnings.push({ code, message: `${why}; x was taken from the abscissae of the data lines` });
    return { ...fromLines, warnings };
  }
  const [first] = lines;
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

type Grid = Omit<XGrid, 'warnings'>;

/** The abscissae lie on the grid, as far as their own rounding goes. */
function passesThrough(grid: Grid, lines: readonly TableLine[], xFactor: number): boolean {
  const on = lines.filter((line) => {
    const off =
      line.abscissa * xFactor -
      (grid.firstX + abscissaIndex(line) * (Number.isFinite(grid.deltaX) ? grid.deltaX : 0));
    return Math.abs(off) <= 1.001 * line.rounding * Math.abs(xFactor) + 1e-6 * Math.abs(grid.deltaX || 0);
  });
  return on.length >= 0.9 * lines.length;
}

/** The steps are those of the grid to the last digit, and the start is off by less than a cut digit. */
function stepsExactly(
  grid: Grid,
  lines: readonly TableLine[],
  steps: readonly LineStep[],
  xFactor: number,
): boolean {
  const exact = steps.filter(
    (step) => Math.abs(step.x - step.points * grid.deltaX) <= 1e-6 * Math.abs(grid.deltaX),
  );
  return steps.length > 0 && exact.length >= 0.9 * steps.length && startOff(grid, lines, xFactor) < 2;
}

/** Most steps are those of the grid: cut digits, or a damaged line or two, disturb the rest. */
function stepsWell(
  grid: Grid,
  lines: readonly TableLine[],
  steps: readonly LineStep[],
  xFactor: number,
): boolean {
  const good = steps.filter(
    (step) => Math.abs(step.x - step.points * grid.deltaX) <= step.tolerance + 0.1 * Math.abs(grid.deltaX),
  );
  const near =
    startOff(grid, lines, xFactor) <
    2 + (0.3 * Math.abs(grid.deltaX)) / ((lines[0]?.rounding ?? 1) * Math.abs(xFactor));
  return good.length >= AGREE * steps.length && near;
}

/** How far the first abscissa is from the grid's start, in half units of its last digit. */
function startOff(grid: Grid, lines: readonly TableLine[], xFactor: number): number {
  const [first] = lines;
  return first ? Math.abs(first.abscissa * xFactor - grid.firstX) / (first.rounding * Math.abs(xFactor)) : 0;
}

function gridFromLines(
  lines: readonly TableLine[],
  steps: readonly LineStep[],
  xFactor: number,
): Grid | undefined {
  const deltaX = stepFromLines(steps);
  const [first] = lines;
  return first && Number.isFinite(deltaX) ? { firstX: first.abscissa * xFactor, deltaX } : undefined;
}

/** The whole way by all points, unless a damaged line spoils it: then the middle one of all steps. */
function stepFromLines(steps: readonly LineStep[]): number {
  let x = 0;
  let points = 0;
  const single: number[] = [];
  for (const step of steps) {
    x += step.x;
    points += step.points;
    if (step.points > 0) single.push(step.x / step.points);
  }
  if (!(points > 0) || x === 0) return NaN;
  single.sort((a, b) => a - b);
  const middle = single[Math.floor(single.length / 2)] ?? NaN;
  return Math.abs(x / points - middle) <= 0.01 * Math.abs(middle) ? x / points : middle;
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
