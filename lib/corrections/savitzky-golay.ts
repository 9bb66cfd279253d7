import { sgg } from 'ml-savitzky-golay-generalized';
import { CorrectionError } from './errors';
import { scaled, uAt, withValues } from './point-math';
import type { CorrectionWarning, Points, StepOutcome } from './types';
import { count, say, warnIf } from './words';

export interface Filter {
  /** Points of the window: odd, 5 to 101. */
  readonly windowPoints: number;
  /** Degree of the polynomial: 1 to 5, below the points of the window. */
  readonly polynomial: number;
}

const SMALLEST_WINDOW = 5;
const LARGEST_WINDOW = 101;
const HIGHEST_POLYNOMIAL = 5;
/** Spacings may differ by this part of their mean: wavelengths are printed rounded. */
const UNEVEN = 0.01;

/**
 * Savitzky-Golay smoothing: each point becomes the value at its wavelength of a polynomial fitted to the window
 * about it; near an end, the window that ends there. Gaps stay gaps: each run of numbers is filtered by itself,
 * and a run shorter than the window becomes a gap.
 *
 * When the points carry a u it becomes u √Σc², with the coefficients c of the middle of the window: right for
 * independent errors of one size; neighbours are no longer independent afterwards.
 *
 * @throws CorrectionError FILTER_IMPOSSIBLE, STEP_UNEVEN, WINDOW_TOO_NARROW
 * @source Savitzky and Golay 1964; ends by Gorry 1990, in the package
 */
export function smooth(points: Points, filter: Filter): StepOutcome {
  const { filtered, warnings } = filterRuns(points, filter, 0);
  const change = largestChange(points, filtered);
  return {
    points: filtered,
    did: `Smoothed (Savitzky-Golay, ${filter.windowPoints} points, degree ${filter.polynomial}); the largest change is ${say(change.by, 2)} at ${change.atNm} nm. Not for quantitation unless the method says so.`,
    warnings,
    found: [{ name: `largest change by smoothing, at ${change.atNm} nm`, value: change.by, unit: '' }],
  };
}

/**
 * Derivative dᵏA/dλᵏ by Savitzky-Golay, k = 1 to 4, in absorbance per nmᵏ. Gaps, ends, u and errors as in `smooth`;
 * the polynomial's degree is at least k.
 */
export function derivative(points: Points, filter: Filter, order: number): StepOutcome {
  const { filtered, stepNm, warnings } = filterRuns(points, filter, order);
  return {
    points: filtered,
    did: `Derivative ${order} of absorbance by wavelength (Savitzky-Golay, ${filter.windowPoints} points of ${say(stepNm)} nm, degree ${filter.polynomial}), in nm^-${order}.`,
    warnings,
  };
}

/** The filter on every run of numbers, with the spacing it used. */
export function filterRuns(points: Points, filter: Filter, order: number) {
  refuseFilter(filter, order);
  const stepNm = evenStep(points.wavelengthNm);
  const { windowPoints, polynomial } = filter;
  const options = { windowSize: windowPoints, polynomial, derivative: order };
  const gain = Math.hypot(...coefficients(options)) / stepNm ** order;
  const values = points.absorbance.map((): { a: number | null; u: number | null } => ({ a: null, u: null }));
  let lost = 0;
  for (const { start, numbers } of runsOf(points.absorbance)) {
    if (numbers.length < windowPoints) {
      lost += numbers.length;
      continue;
    }
    sgg(numbers, stepNm, options).forEach((a, i) => {
      values[start + i] = { a, u: scaled(uAt(points, start + i), gain) };
    });
  }
  refuseNothingLeft(values, windowPoints);
  const warnings: readonly CorrectionWarning[] = warnIf(
    lost > 0,
    'FILTER_GAPS',
    `${count(lost, 'point')} between gaps stand in runs shorter than the window of ${windowPoints} points and became gaps.`,
  );
  return { filtered: withValues(points.wavelengthNm, values), stepNm, warnings };
}

/** The filter's answer to a single 1, which is its coefficients. */
function coefficients(options: { windowSize: number; polynomial: number; derivative: number }) {
  const half = (options.windowSize - 1) / 2;
  return Array.from({ length: options.windowSize }, (_, i) => {
    const impulse = new Array<number>(options.windowSize).fill(0);
    impulse[i] = 1;
    return sgg(impulse, 1, options)[half] as number;
  });
}

function refuseFilter({ windowPoints, polynomial }: Filter, order: number): void {
  const window = Number.isInteger(windowPoints) && windowPoints % 2 === 1;
  const sized = windowPoints >= SMALLEST_WINDOW && windowPoints <= LARGEST_WINDOW;
  const degree = Number.isInteger(polynomial) && polynomial >= 1 && polynomial <= HIGHEST_POLYNOMIAL;
  const fits = polynomial < windowPoints && Number.isInteger(order) && order >= 0 && order <= 4;
  if (window && sized && degree && fits && polynomial >= order) return;
  throw new CorrectionError(
    'FILTER_IMPOSSIBLE',
    `a filter needs an odd window of ${SMALLEST_WINDOW} to ${LARGEST_WINDOW} points, a degree of 1 to ${HIGHEST_POLYNOMIAL} below the window, and a derivative up to 4 not above the degree; got window ${windowPoints}, degree ${polynomial}, derivative ${order}`,
  );
}

function refuseNothingLeft(values: readonly { a: number | null }[], windowPoints: number): void {
  if (values.some(({ a }) => a !== null)) return;
  throw new CorrectionError(
    'WINDOW_TOO_NARROW',
    `no run of numbers in this spectrum is as long as the window of ${windowPoints} points; use a shorter window`,
  );
}

/** @throws CorrectionError STEP_UNEVEN with the narrowest and widest spacing */
function evenStep(wavelengthNm: readonly number[]): number {
  const steps = wavelengthNm.slice(1).map((nm, i) => nm - (wavelengthNm[i] as number));
  const mean = ((wavelengthNm.at(-1) as number) - (wavelengthNm[0] as number)) / steps.length;
  const narrow = steps.reduce((least, step) => Math.min(least, step), Infinity);
  const wide = steps.reduce((most, step) => Math.max(most, step), 0);
  if (steps.length > 0 && wide - narrow > UNEVEN * mean) {
    throw new CorrectionError(
      'STEP_UNEVEN',
      `this filter needs evenly spaced wavelengths; here they stand ${say(narrow)} to ${say(wide)} nm apart. Interpolate onto an even grid first`,
    );
  }
  return steps.length > 0 ? mean : 1;
}

function runsOf(absorbance: readonly (number | null)[]) {
  const runs: { start: number; numbers: number[] }[] = [];
  absorbance.forEach((a, i) => {
    if (a === null) return;
    const run = runs.at(-1);
    if (run && run.start + run.numbers.length === i) run.numbers.push(a);
    else runs.push({ start: i, numbers: [a] });
  });
  return runs;
}

function largestChange(before: Points, after: Points): { by: number; atNm: number } {
  let best = { by: 0, atNm: before.wavelengthNm[0] as number };
  after.absorbance.forEach((a, i) => {
    if (a === null) return;
    const by = a - (before.absorbance[i] as number);
    if (Math.abs(by) > Math.abs(best.by)) best = { by, atNm: before.wavelengthNm[i] as number };
  });
  return best;
}
