import { NORMAL_PATH_MM } from '../prepare-points';
import type { UnknownRequest } from '../types';
import { type BudgetTerm, type Scale } from '../uncertainty/budget-term';
import { combine, type Expanded } from '../uncertainty/combine';
import type { Quantity } from '../uncertainty/quantity';
import { factorTerms, isOtherCell, pathQuantities } from '../unknown/budget';
import type { ConvertedReadings } from '../unknown/convert-readings';
import { RESULT_OF, type Scaling, scaleText } from '../unknown/scaling';
import { blankLineId } from '../working/record-readings';
import { blankMean } from './direct-blanks';
import type { MeanReading } from './mean-reading';
import type { DirectMethod, DirectRead } from './method';

export interface DirectFacts {
  readonly method: DirectMethod;
  readonly unknown: UnknownRequest;
  readonly readings: ConvertedReadings;
  readonly mean: MeanReading;
  readonly read: DirectRead;
  readonly scaling: Scaling;
}

/**
 * The budget of a result without a curve: its readings, those of the standards, the blank that all have in common,
 * then the factors (absorptivity, what standards share, path, dilution, recovery). Same rules as on a curve.
 *
 * @source JCGM 100:2008 (GUM), 5.1 and G.4
 */
export function directBudget(facts: DirectFacts): Expanded {
  const { method, read, scaling } = facts;
  const value = read.c * scaling.value;
  const result = { of: 'result' as const, value, expression: 'C', from: RESULT_OF };
  const terms = [
    ofTheReadings(facts),
    ...ofTheStandards(facts),
    ...ofTheBlanks(facts),
    ...factorTerms([...method.factors, ...scaling.quantities], result, 'unknown.budget.factor'),
    ...ofThePath(facts, result),
  ].filter((term) => term.u > 0);
  return combine(value, terms, method.request.confidence, Infinity);
}

function ofTheReadings({ mean, read, scaling }: DirectFacts): BudgetTerm {
  const sensitivity = read.perAbsorbance * scaling.value;
  return {
    source: 'readings',
    u: Math.abs(sensitivity) * mean.u,
    inputU: mean.u,
    inputUnit: '',
    sensitivity,
    sharesS: false,
    degreesOfFreedom: mean.degreesOfFreedom,
    working: {
      expression: scaleText(`u * ${read.perExpression}`, scaling),
      from: { ...read.from, ...scaling.from, u: 'unknown.u.mean' },
    },
  };
}

function ofTheStandards({ read, scaling }: DirectFacts): readonly BudgetTerm[] {
  return read.errors.map((error): BudgetTerm => ({
    source: error.source,
    u: Math.abs(error.sensitivity) * error.u * scaling.value,
    inputU: error.u,
    inputUnit: '',
    sensitivity: error.sensitivity * scaling.value,
    sharesS: false,
    degreesOfFreedom: error.degreesOfFreedom,
    working: {
      expression: scaleText(`u * ${error.expression}`, scaling),
      from: { ...error.from, ...scaling.from, u: error.uId },
    },
  }));
}

/**
 * The error of a subtracted mean blank: every reading of its path moves by it together, the unknown's and the
 * standards', ∂c/∂δ = -(10 mm / l) Σ ∂c/∂y.
 */
function ofTheBlanks({ method, readings, read, scaling }: DirectFacts): readonly BudgetTerm[] {
  const { request, measuring } = method;
  const paths = [...new Set(measuring.blanks.readings.map((blank) => blank.pathLengthMm))];
  return paths.map((pathLengthMm): BudgetTerm => {
    const { u: inputU, degreesOfFreedom } = blankMean(request, measuring.blanks, pathLengthMm) as MeanReading;
    const moved = [
      { pathLengthMm: readings.pathLengthMm, sensitivity: read.perAbsorbance },
      ...read.errors,
    ].filter((item) => item.pathLengthMm === pathLengthMm);
    const sum = moved.reduce((total, item) => total + item.sensitivity, 0);
    const sensitivity = (-sum * NORMAL_PATH_MM * scaling.value) / pathLengthMm;
    return {
      source: paths.length === 1 ? 'blank' : `blank at ${pathLengthMm} mm`,
      u: Math.abs(sensitivity) * inputU,
      inputU,
      inputUnit: '',
      sensitivity,
      sharesS: false,
      degreesOfFreedom,
      working: {
        how: 'u of the mean blank through every reading of its path',
        inputs: [blankLineId(pathLengthMm), 'unknown.measured', 'unknown.factor'],
      },
    };
  });
}

/** The path divides a result by a known absorptivity; between standards and unknowns in one cell it cancels. */
function ofThePath(facts: DirectFacts, result: Scale): readonly BudgetTerm[] {
  const { method, unknown, readings, mean, read, scaling } = facts;
  const { request, pathCancels } = method;
  if (!pathCancels) {
    const path: Quantity = {
      id: 'unknown.path',
      label: 'path length',
      symbol: 'l',
      unit: 'mm',
      value: readings.pathLengthMm,
      power: -1,
      spreads: [{ shape: 'normal', u: pathU(facts) }],
      source: 'given',
    };
    return factorTerms([path], result, 'unknown.budget.path');
  }
  if (!isOtherCell({ request }, unknown)) return [];
  const scale: Scale = {
    of: 'reading',
    value: mean.mean * read.perAbsorbance * scaling.value,
    expression: scaleText(`(y0 * ${read.perExpression})`, scaling),
    from: { ...read.from, ...scaling.from, y0: 'unknown.mean' },
  };
  return factorTerms(pathQuantities(request, unknown, readings), scale, 'unknown.budget.path');
}

/** The unknown's own path uncertainty, else that of the request when it is the same cell. */
export function pathU({ method, unknown }: Pick<DirectFacts, 'method' | 'unknown'>): number {
  const { request } = method;
  const same = unknown.pathLengthMm === undefined || unknown.pathLengthMm === request.pathLengthMm;
  return unknown.pathLengthUMm ?? (same ? (request.pathLengthUMm ?? 0) : 0);
}
