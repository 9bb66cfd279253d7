import { coefficientOf, fittedVarianceAt, valueAt, type Fit } from '@/lib/engine/regression/fit';
import { fitLine } from '@/lib/engine/regression/fit-line';
import { CorrectionError } from './errors';
import { equalWeights, inQuadrature, mapPoints, numbersWithin, SAME_NM, uAt } from './point-math';
import type { CorrectionWarning, Points, StepOutcome } from './types';
import { count, say, sayWithU, warnIf } from './words';

const FEWEST_POINTS = 5;
/** Outside it the window holds more than scatter: 4 for particles far below the wavelength, towards 0 for large ones. */
const LOWEST_EXPONENT = 0;
const HIGHEST_EXPONENT = 4;
/** An exact λ⁻⁴ comes back as 4 but for rounding. */
const ROUNDING = 1e-6;
/** Residual sd of ln A, so relative: 5 %. */
const POOR_FIT = 0.05;
/** Durbin-Watson below it: residuals follow one another, so the line is bent. */
const BENT = 1;
/** Below this residual sd a bend is rounding. */
const EXACT_FIT = 1e-9;
const FEWEST_FOR_BEND = 8;

/**
 * Scatter by log-log extrapolation: in a window where nothing absorbs,
 *
 *     ln A = ln k - n ln λ        S(λ) = k λ^-n        A_corr = A - S
 *
 * fitted without weights. The fit's covariance gives u(n), u(S) = S u(ln S), and residual sd s of ln A, which is
 * relative. u of the corrected points carries u(S); S is one curve, so its errors at two wavelengths go together.
 *
 * @throws CorrectionError WAVELENGTHS_NOT_IN_ORDER; WINDOW_TOO_NARROW below 5 points; SCATTER_NOT_POSITIVE
 * @source Leach and Scheraga 1960, in our own words
 */
export function scatterCorrection(points: Points, fromNm: number, toNm: number): StepOutcome {
  const { x, y, fit } = fitWindow(points, fromNm, toNm);
  const slope = coefficientOf(fit, 1);
  const exponent = slope.value === 0 ? 0 : -slope.value;
  return {
    points: mapPoints(points, (a, nm, i) => {
      const scatter = Math.exp(valueAt(fit, Math.log(nm)));
      const u = scatter * Math.sqrt(fittedVarianceAt(fit, Math.log(nm)));
      return { a: a - scatter, u: inQuadrature(uAt(points, i), u) };
    }),
    did: `Subtracted scatter k λ^-n, fitted to ${count(x.length, 'point')} from ${fromNm} to ${toNm} nm and extrapolated: n = ${sayWithU(exponent, slope.u)}; residual sd ${say(100 * fit.residualSd, 2)} % of the absorbance.`,
    warnings: [
      ...exponentWarning(exponent, slope.u),
      ...fitWarnings(fit, x, y),
      ...absorbingWarning(points, toNm),
    ],
    found: [
      { name: 'scatter exponent n', value: exponent, u: slope.u, unit: '' },
      { name: 'residual sd of ln A', value: fit.residualSd, unit: '' },
    ],
  };
}

function fitWindow(points: Points, fromNm: number, toNm: number) {
  if (!(fromNm < toNm)) {
    throw new CorrectionError(
      'WAVELENGTHS_NOT_IN_ORDER',
      `the scatter window ends at ${toNm} nm before it begins at ${fromNm} nm`,
    );
  }
  const { x, y } = numbersWithin(points, fromNm, toNm);
  if (x.length < FEWEST_POINTS) {
    throw new CorrectionError(
      'WINDOW_TOO_NARROW',
      `the scatter window from ${fromNm} to ${toNm} nm has ${count(x.length, 'point')} with a number; it needs ${FEWEST_POINTS}`,
    );
  }
  const notPositive = y.filter((a) => a <= 0).length;
  if (notPositive > 0) {
    throw new CorrectionError(
      'SCATTER_NOT_POSITIVE',
      `${count(notPositive, 'point')} of ${y.length} from ${fromNm} to ${toNm} nm ${notPositive === 1 ? 'is' : 'are'} zero or below (lowest ${say(Math.min(...y))}), and their logarithm is needed. There may be no scatter to take off, or the blank is too high`,
    );
  }
  const fit = fitLine({ x: x.map(Math.log), y: y.map(Math.log), w: equalWeights(x) });
  return { x, y, fit };
}

function exponentWarning(exponent: number, u: number): readonly CorrectionWarning[] {
  return warnIf(
    exponent < LOWEST_EXPONENT - ROUNDING || exponent > HIGHEST_EXPONENT + ROUNDING,
    'SCATTER_EXPONENT',
    `The scatter exponent is ${sayWithU(exponent, u)}, outside ${LOWEST_EXPONENT} to ${HIGHEST_EXPONENT}: what the window holds does not behave as scatter. Look for an absorption or an offset there.`,
  );
}

function fitWarnings(fit: Fit, x: readonly number[], y: readonly number[]): readonly CorrectionWarning[] {
  const residuals = x.map((nm, i) => Math.log(y[i] as number) - valueAt(fit, Math.log(nm)));
  const squares = residuals.reduce((sum, r) => sum + r * r, 0);
  const steps = residuals.slice(1).reduce((sum, r, i) => sum + (r - (residuals[i] as number)) ** 2, 0);
  const durbinWatson = steps / squares;
  const bent = x.length >= FEWEST_FOR_BEND && fit.residualSd > EXACT_FIT && durbinWatson < BENT;
  return [
    ...warnIf(
      fit.residualSd > POOR_FIT,
      'SCATTER_FIT_POOR',
      `The points of the window lie ${say(100 * fit.residualSd, 2)} % about the fitted scatter (limit ${100 * POOR_FIT} %). Use a wider window, or one with more absorbance.`,
    ),
    ...warnIf(
      bent,
      'SCATTER_BENT',
      `The residuals of the scatter fit follow one another (Durbin-Watson ${say(durbinWatson, 2)}, limit ${BENT}): the line is bent, so the window holds more than scatter. Move it away from the band.`,
    ),
  ];
}

/** Scatter is known from the red side of a band; from its blue side the extrapolation runs the other way. */
function absorbingWarning({ wavelengthNm }: Points, toNm: number): readonly CorrectionWarning[] {
  const last = wavelengthNm.at(-1) as number;
  const above = wavelengthNm.filter((nm) => nm > toNm + SAME_NM).length;
  return warnIf(
    above > wavelengthNm.length / 2,
    'SCATTER_EXTRAPOLATED_RED',
    `${count(above, 'point')} lie above the window, up to ${last} nm: scatter is extrapolated towards the red there. A window on the red side of the band is safer.`,
  );
}
