import type { FittedCurve } from '../fit-curve';
import { NORMAL_PATH_MM } from '../prepare-points';
import { fittedVarianceAt } from '../regression/fit';
import type { CurveRequest, UnknownRequest } from '../types';
import { type BudgetTerm, factorTerm, type Scale } from '../uncertainty/budget-term';
import { combine, type Expanded } from '../uncertainty/combine';
import { errorSources, type Quantity } from '../uncertainty/quantity';
import type { ConvertedReadings } from './convert-readings';
import type { ReadBack } from './read-back';
import { RESULT_OF, type Scaling, scaleText } from './scaling';

/**
 * The budget of a concentration in the sample, C = c·F/R: u_c² = Σ (c_i u_i)². The lines that rest on the curve's
 * one estimate s (curve, readings, a common blank) count as one component with ν = n - q in ν_eff.
 *
 * @source JCGM 100:2008 (GUM), 5.1 and G.4; EURACHEM/CITAC Guide CG 4
 */
export function makeBudget(
  curve: FittedCurve,
  unknown: UnknownRequest,
  readings: ConvertedReadings,
  back: ReadBack,
  scaling: Scaling,
): Expanded {
  const value = back.c * scaling.value;
  const result = { of: 'result' as const, value, expression: 'C', from: RESULT_OF };
  const factors = [...sharedByStandards(curve.request), ...scaling.quantities];
  const terms = [
    ...ofTheCurve(curve, readings, back, scaling),
    ...factorTerms(factors, result, 'unknown.budget.factor'),
    ...ofThePaths(curve, unknown, readings, back, scaling),
  ];
  return combine(value, terms, curve.request.confidence, curve.fit.degreesOfFreedom);
}

/** A line for every independent error in the factors of a result or reading. */
export function factorTerms(
  quantities: readonly Quantity[],
  scale: Scale,
  id: string,
): readonly BudgetTerm[] {
  return errorSources(quantities).map((source, i) => factorTerm(source, scale, `${id}.${i + 1}`));
}

function ofTheCurve(
  curve: FittedCurve,
  readings: ConvertedReadings,
  back: ReadBack,
  scaling: Scaling,
): readonly BudgetTerm[] {
  const nu = curve.fit.degreesOfFreedom;
  const own = back.replicates.own;
  const perAbsorbance = scaling.value / back.slope;
  const part = (id: string) => ({
    expression: scaleText('u', scaling),
    from: { u: id, ...scaling.from },
  });
  const curveTerm: BudgetTerm = {
    source: 'curve',
    u: back.uCurve * scaling.value,
    inputU: Math.sqrt(fittedVarianceAt(curve.fit, back.c)),
    inputUnit: '',
    sensitivity: -perAbsorbance,
    sharesS: true,
    degreesOfFreedom: nu,
    working: part('unknown.u.curve'),
  };
  const readingsTerm: BudgetTerm = {
    source: 'readings',
    u: back.uReadings * scaling.value,
    inputU: Math.sqrt(back.varianceY0),
    inputUnit: '',
    sensitivity: perAbsorbance,
    // The unknown's own standard deviation is another estimate, with degrees of freedom of its own.
    sharesS: !own,
    degreesOfFreedom: own ? readings.y.length - 1 : nu,
    working: part('unknown.u.readings'),
  };
  const blanks = blankErrors(curve, readings, back).map((error): BudgetTerm => ({
    source: error.onlyPath ? 'blank' : `blank at ${error.pathLengthMm} mm`,
    u: Math.abs(error.sensitivity) * error.u * scaling.value,
    inputU: error.u,
    inputUnit: '',
    sensitivity: error.sensitivity * scaling.value,
    sharesS: true,
    degreesOfFreedom: nu,
    working: {
      how: 's / sqrt(p_b) through y0 and the slope',
      inputs: ['curve.s', 'curve.slope', 'unknown.result'],
    },
  }));
  return [curveTerm, readingsTerm, ...blanks.filter((term) => term.u > 0)];
}

/** The error of a mean blank and what it does to c in the measured solution. */
export interface BlankError {
  readonly pathLengthMm: number;
  readonly onlyPath: boolean;
  /** ∂c/∂δ, δ in absorbance as read. */
  readonly sensitivity: number;
  readonly u: number;
}

/**
 * The error of a subtracted mean blank, u² = s²/p_b, which all readings of its path have in common. With a free
 * intercept it cancels in c. Through zero it does not: it moves y0 and, through every standard, the slope, so that
 *
 *     ∂c/∂δ = (c Σ w x / Σ w x² - 1) / b        (one path)
 */
export function blankErrors(
  curve: FittedCurve,
  readings: ConvertedReadings,
  back: ReadBack,
): readonly BlankError[] {
  const { fit, blanks, data, active } = curve;
  const slope = fit.beta[1] as number;
  if (fit.model !== 'proportional' || blanks.use !== 'subtract') return [];
  const wx = data.x.map((x, i) => x * (data.w[i] as number));
  const squares = data.x.reduce((sum, x, i) => sum + x * (wx[i] as number), 0);
  const paths = [...new Set(blanks.readings.map((blank) => blank.pathLengthMm))];
  return paths.map((pathLengthMm) => {
    const lever = active.reduce(
      (sum, point, i) => (point.pathLengthMm === pathLengthMm ? sum + (wx[i] as number) : sum),
      0,
    );
    const direct = readings.pathLengthMm === pathLengthMm ? 1 : 0;
    const perMm = NORMAL_PATH_MM / pathLengthMm;
    // s²/(p_b w): the blank is a reading at the absorbance zero, in its own path.
    const weight = curve.weightAt(0, 0, pathLengthMm) * perMm ** 2;
    return {
      pathLengthMm,
      onlyPath: paths.length === 1,
      sensitivity: ((back.c * lever) / squares - direct) * (perMm / slope),
      u: fit.residualSd / Math.sqrt(blanks.countAt(pathLengthMm) * weight),
    };
  });
}

/** What all standards share (stock, purity, common ware): each a factor of the result, counted once. */
export function sharedByStandards(
  request: Pick<CurveRequest, 'standardsRelativeU' | 'standardsShared'>,
): readonly Quantity[] {
  const shared = [
    { source: 'standards', relativeU: request.standardsRelativeU ?? 0 },
    ...(request.standardsShared ?? []),
  ];
  return shared.map(({ source, relativeU }): Quantity => ({
    id: '',
    label: source,
    symbol: 'f',
    unit: '',
    value: 1,
    power: 1,
    spreads: [{ shape: 'normal', u: relativeU }],
    source: 'concentrations of the standards as stated',
  }));
}

/**
 * Path lengths: one cell for standards and unknown cancels in c. In different cells u(l)/l of each is a line, and
 * what it scales is the whole absorbance: y0/f'(c), which is c for a curve through zero.
 */
function ofThePaths(
  curve: FittedCurve,
  unknown: UnknownRequest,
  readings: ConvertedReadings,
  back: ReadBack,
  scaling: Scaling,
): readonly BudgetTerm[] {
  if (!isOtherCell(curve, unknown)) return [];
  const slope = curve.fit.model === 'quadratic' ? 'unknown.slope' : 'curve.slope';
  const scale: Scale = {
    of: 'reading',
    value: ((readings.meanY as number) / back.slope) * scaling.value,
    expression: scaleText('(y0 / b)', scaling),
    from: { y0: 'unknown.mean', b: slope, ...scaling.from },
  };
  return factorTerms(pathQuantities(curve.request, unknown, readings), scale, 'unknown.budget.path');
}

export function pathQuantities(
  request: Pick<CurveRequest, 'pathLengthMm' | 'pathLengthUMm'>,
  unknown: Pick<UnknownRequest, 'pathLengthUMm'>,
  readings: ConvertedReadings,
): readonly Quantity[] {
  const path = (whose: 'unknown' | 'standards', value: number, u: number, power: 1 | -1): Quantity => ({
    id: whose === 'unknown' ? 'unknown.path' : 'unknown.standardsPath',
    label: `path length of the ${whose}`,
    symbol: 'l',
    unit: 'mm',
    value,
    power,
    spreads: [{ shape: 'normal', u }],
    source: 'given',
  });
  return [
    path('unknown', readings.pathLengthMm, unknown.pathLengthUMm ?? 0, -1),
    path('standards', request.pathLengthMm, request.pathLengthUMm ?? 0, 1),
  ];
}

/** Another path length than the standards', or an uncertainty of its own: another cell. */
export function isOtherCell(
  { request }: { readonly request: Pick<CurveRequest, 'pathLengthMm'> },
  unknown: Pick<UnknownRequest, 'pathLengthMm' | 'pathLengthUMm'>,
): boolean {
  const path = unknown.pathLengthMm ?? request.pathLengthMm;
  return unknown.pathLengthUMm !== undefined || path !== request.pathLengthMm;
}
