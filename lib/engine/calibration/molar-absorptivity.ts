import type { FittedCurve } from '../fit-curve';
import { coefficientOf } from '../regression/fit';
import type { CurveRequest, MolarAbsorptivity } from '../types';
import { CONCENTRATION_UNITS } from '../units';

/** From a slope per 10 mm and unit concentration to L/(mol cm); the formula mass, known by then, enters for mass units only. */
export function epsilonFactor(request: CurveRequest): number {
  const { isMolar, perLitre } = CONCENTRATION_UNITS[request.unit];
  return (isMolar ? 1 : (request.formulaMass as number)) / perLitre;
}

/**
 * Molar absorptivity of the basis the concentration is expressed as: ε = b × M / (unit in g/L), with b per 10 mm,
 * so per cm. (u_ε/ε)² = (u_b/b)² + u_rel(standards)² + (u(l)/l)².
 *
 * @returns undefined when the formula mass is not known (mass units) or the path is an assumption
 * @source Beer-Lambert law; measurement model, section 5
 */
export function molarAbsorptivity(curve: FittedCurve): MolarAbsorptivity | undefined {
  const { request, fit } = curve;
  if (request.pathLengthKnown === false || request.formulaMass === undefined) return undefined;
  const { value: b, u: uSlope } = coefficientOf(fit, 1);
  const value = b * epsilonFactor(request);
  const slope = uSlope / Math.abs(b);
  const shared = (request.standardsShared ?? []).map((item) => item.relativeU);
  const standards = Math.hypot(request.standardsRelativeU ?? 0, ...shared);
  const path = (request.pathLengthUMm ?? 0) / request.pathLengthMm;
  return {
    value,
    u: Math.abs(value) * Math.hypot(slope, standards, path),
    unit: 'L/(mol cm)',
    covers: coverage(standards > 0, path > 0),
  };
}

function coverage(standards: boolean, path: boolean): string {
  if (standards && path)
    return 'Its uncertainty holds the slope, what the standards share, and the path length.';
  if (standards)
    return 'Its uncertainty holds the slope and what the standards share, but not the path length, which was not given one.';
  if (path)
    return 'Its uncertainty holds the slope and the path length, but not the standards, which were not given one.';
  return 'Only the slope is in its uncertainty: none was given for the standards or for the path length.';
}
