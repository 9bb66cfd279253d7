import type { FittedCurve } from '../fit-curve';
import { fittedVarianceAt, slopeAt, valueAt } from '../regression/fit';
import { detectionDelta } from '../stats/noncentral-t';
import { tQuantile } from '../stats/student-t';
import type { LimitAnswer } from '../types';

/** Probabilities of taking a blank for more, and of missing what is there. */
export interface Risks {
  readonly alpha: number;
  readonly beta: number;
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

const percent = (risk: number) => `${Number((100 * risk).toPrecision(6))} %`;

function risksText({ alpha, beta }: Risks): string {
  return alpha === beta ? `both risks ${percent(alpha)}` : `risks ${percent(alpha)} and ${percent(beta)}`;
}

/**
 * x_C = t(1 - α; ν) u(0) and x_D = δ(ν; α; β) u(0), δ from the non-central t.
 *
 * @source ISO 11843-2, in our own words
 */
export function iso11843Limits(curve: FittedCurve, readings: number, risks: Risks): readonly LimitAnswer[] {
  const nu = curve.fit.degreesOfFreedom;
  const u = uncertaintyAt(curve, 0, readings);
  const basis = `calibration, ${readingsText(readings)}, ${risksText(risks)}`;
  const source = 'ISO 11843-2';
  return [
    {
      name: 'ISO 11843-2 critical value',
      kind: 'critical',
      value: tQuantile(1 - risks.alpha, nu) * u,
      basis,
      formula: 't(1 - alpha; nu) * (s / b) * sqrt(1 / K + 1 / n + xbar^2 / Sxx)',
      alpha: risks.alpha,
      beta: null,
      source,
    },
    {
      name: 'ISO 11843-2 minimum detectable value',
      kind: 'detection',
      value: detectionDelta(nu, risks.alpha, risks.beta) * u,
      basis,
      formula: 'delta(nu; alpha; beta) * (s / b) * sqrt(1 / K + 1 / n + xbar^2 / Sxx)',
      alpha: risks.alpha,
      beta: risks.beta,
      source,
    },
  ];
}

/**
 * x_NG = t(0.99; ν) u(0), x_EG = 2 x_NG, and x_BG = k t(0.995; ν) u(x_BG) with k = 3, by iteration: the
 * concentration whose interval at 99 % is a third of it.
 *
 * @source DIN 32645, in our own words
 */
export function din32645Limits(curve: FittedCurve, readings: number): readonly LimitAnswer[] {
  const nu = curve.fit.degreesOfFreedom;
  const detection = tQuantile(0.99, nu) * uncertaintyAt(curve, 0, readings);
  const basis = `calibration, ${readingsText(readings)}, 99 %`;
  const quantification = solveQuantification(curve, readings, detection);
  const source = 'DIN 32645';
  const formula = 't(0.99; nu) * (s / b) * sqrt(1 / K + 1 / n + xbar^2 / Sxx)';
  return [
    {
      name: 'DIN 32645 detection limit',
      kind: 'detection',
      value: detection,
      basis,
      formula,
      alpha: 0.01,
      beta: 0.5,
      source,
    },
    {
      name: 'DIN 32645 identification limit',
      kind: 'identification',
      value: 2 * detection,
      basis,
      formula: `2 * ${formula}`,
      alpha: 0.01,
      beta: 0.01,
      source,
    },
    ...(quantification === null
      ? []
      : [
          {
            name: 'DIN 32645 quantification limit',
            kind: 'quantification' as const,
            value: quantification,
            basis: `${basis}, relative interval of a third`,
            formula: '3 * t(0.995; nu) * (s / b) * sqrt(1 / K + 1 / n + (x - xbar)^2 / Sxx), solved for x',
            alpha: null,
            beta: null,
            source,
          },
        ]),
  ];
}

/** Multiple of the top standard beyond which a quantification limit means nothing. */
const RUNAWAY = 1e3;
const ROUNDS = 200;

function solveQuantification(curve: FittedCurve, readings: number, start: number): number | null {
  const factor = 3 * tQuantile(0.995, curve.fit.degreesOfFreedom);
  let x = 3 * start;
  let next = factor * uncertaintyAt(curve, x, readings);
  const settled = () => Math.abs(next - x) <= 1e-12 * next;
  // A slope too uncertain for any concentration to be known to a third: the iteration runs away.
  for (let i = 0; i < ROUNDS && !settled() && next <= RUNAWAY * curve.range.max; i += 1) {
    x = next;
    next = factor * uncertaintyAt(curve, x, readings);
  }
  return settled() ? next : null;
}
