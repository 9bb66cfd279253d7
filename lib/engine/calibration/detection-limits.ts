import type { FittedCurve } from '../fit-curve';
import { normalise } from '../prepare-points';
import { coefficientOf, fittedVarianceAt, slopeAt, valueAt } from '../regression/fit';
import { detectionDelta } from '../stats/noncentral-t';
import { tQuantile } from '../stats/student-t';
import type { LimitAnswer } from '../types';

/**
 * The family of limits, in the measured solution, each with its name, what it decides and what it rests on. They
 * answer different questions; a result is judged by the critical value alone.
 *
 * @param readings K, the number of readings of an unknown
 */
export function detectionLimits(curve: FittedCurve, readings: number): readonly LimitAnswer[] {
  return [...ich(curve), ...currie(curve), ...iso11843(curve, readings), ...din32645(curve, readings)];
}

/** Standard deviation of the blank readings, or of those of zero standards, per 10 mm; null with fewer than two. */
function blankSd({ blanks, points }: FittedCurve): { readonly sd: number; readonly n: number } | null {
  const ofBlanks = blanks.readings.map((blank) => normalise(blank.asRead, null, blank.pathLengthMm));
  const ofZero = points.flatMap((point) =>
    point.role === 'standard' &&
    point.concentration === 0 &&
    point.excludedBecause !== 'request' &&
    point.y !== null
      ? [point.y]
      : [],
  );
  const values = ofBlanks.length >= 2 ? ofBlanks : ofZero;
  if (values.length < 2) return null;
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return { sd: Math.sqrt(squares / (values.length - 1)), n: values.length };
}

/**
 * 3.3 σ/S and 10 σ/S with three choices of σ: they differ, so each is named.
 *
 * @source ICH Q2(R2), in our own words
 */
function ich(curve: FittedCurve): readonly LimitAnswer[] {
  const { fit } = curve;
  const slope = Math.abs(slopeAt(fit, 0));
  const blank = blankSd(curve);
  const interceptU = coefficientOf(fit, 0).u;
  const sigmas = [
    { sd: fit.residualSd, of: 'the residual standard deviation' },
    ...(fit.model === 'proportional'
      ? []
      : [{ sd: interceptU, of: 'the standard uncertainty of the intercept' }]),
    ...(blank ? [{ sd: blank.sd, of: `the standard deviation of ${blank.n} blank readings` }] : []),
  ];
  return sigmas.flatMap(({ sd, of }): readonly LimitAnswer[] => [
    {
      name: 'ICH Q2 detection limit',
      kind: 'detection',
      value: (3.3 * sd) / slope,
      basis: `3.3 times ${of} over the slope`,
    },
    {
      name: 'ICH Q2 quantitation limit',
      kind: 'quantification',
      value: (10 * sd) / slope,
      basis: `10 times ${of} over the slope`,
    },
  ]);
}

/**
 * L_C = t(0.95; n - 1) s_blank √(1 + 1/n) / S, L_D = 2 L_C.
 *
 * @source Currie, IUPAC Recommendations 1995, in our own words
 */
function currie(curve: FittedCurve): readonly LimitAnswer[] {
  const blank = blankSd(curve);
  if (!blank) return [];
  const t = tQuantile(0.95, blank.n - 1);
  const value = (t * blank.sd * Math.sqrt(1 + 1 / blank.n)) / Math.abs(slopeAt(curve.fit, 0));
  const basis = `${blank.n} blank readings, one-sided 95 %`;
  return [
    { name: 'Currie critical level', kind: 'critical', value, basis },
    {
      name: 'Currie detection limit',
      kind: 'detection',
      value: 2 * value,
      basis: `twice the critical level; ${basis}`,
    },
  ];
}

/** u(c) of an unknown at x by the general variance, K readings at the curve's own path. */
function uncertaintyAt(curve: FittedCurve, x: number, readings: number): number {
  const { fit, request } = curve;
  const weight = curve.weightAt(x, valueAt(fit, x), request.pathLengthMm);
  const variance = fit.residualSd ** 2 / (readings * weight) + fittedVarianceAt(fit, x);
  return Math.sqrt(variance) / Math.abs(slopeAt(fit, x));
}

function readingsText(readings: number): string {
  return `${readings} ${readings === 1 ? 'reading' : 'readings'} of the unknown`;
}

/**
 * x_C = t(0.95; ν) u(0) and x_D = δ(ν; 0.05; 0.05) u(0), δ from the non-central t.
 *
 * @source ISO 11843-2, in our own words
 */
function iso11843(curve: FittedCurve, readings: number): readonly LimitAnswer[] {
  const nu = curve.fit.degreesOfFreedom;
  const u = uncertaintyAt(curve, 0, readings);
  const basis = `calibration, ${readingsText(readings)}, both risks 5 %`;
  return [
    { name: 'ISO 11843-2 critical value', kind: 'critical', value: tQuantile(0.95, nu) * u, basis },
    {
      name: 'ISO 11843-2 minimum detectable value',
      kind: 'detection',
      value: detectionDelta(nu, 0.05, 0.05) * u,
      basis,
    },
  ];
}

/**
 * x_NG = t(0.99; ν) u(0), x_EG = 2 x_NG, and x_BG = k t(0.995; ν) u(x_BG) with k = 3, by iteration: the
 * concentration whose interval at 99 % is a third of it.
 *
 * @source DIN 32645, in our own words
 */
function din32645(curve: FittedCurve, readings: number): readonly LimitAnswer[] {
  const nu = curve.fit.degreesOfFreedom;
  const detection = tQuantile(0.99, nu) * uncertaintyAt(curve, 0, readings);
  const basis = `calibration, ${readingsText(readings)}, 99 %`;
  const quantification = solveQuantification(curve, readings, detection);
  return [
    { name: 'DIN 32645 detection limit', kind: 'detection', value: detection, basis },
    { name: 'DIN 32645 identification limit', kind: 'identification', value: 2 * detection, basis },
    ...(quantification === null
      ? []
      : [
          {
            name: 'DIN 32645 quantification limit',
            kind: 'quantification' as const,
            value: quantification,
            basis: `${basis}, relative interval of a third`,
          },
        ]),
  ];
}

/** Multiple of the top standard beyond which a quantification limit means nothing. */
const RUNAWAY = 1e3;

function solveQuantification(curve: FittedCurve, readings: number, start: number): number | null {
  const factor = 3 * tQuantile(0.995, curve.fit.degreesOfFreedom);
  let x = 3 * start;
  for (let i = 0; i < 200; i += 1) {
    const next = factor * uncertaintyAt(curve, x, readings);
    // A slope too uncertain for any concentration to be known to a third: the iteration runs away.
    if (!(next <= RUNAWAY * curve.range.max)) return null;
    if (Math.abs(next - x) <= 1e-12 * next) return next;
    x = next;
  }
  return null;
}
