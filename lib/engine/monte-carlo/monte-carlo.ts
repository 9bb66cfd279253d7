import { acceptRequest } from '../checks/accept-request';
import { requirePositive } from '../checks/require';
import { EngineError } from '../errors';
import { fitCurve } from '../fit-curve';
import type { CurveRequest } from '../types';
import { makeBudget } from '../unknown/budget';
import { convertReadings } from '../unknown/convert-readings';
import { readBack } from '../unknown/read-back';
import { scalingOf } from '../unknown/scaling';
import { curveCore } from './curve-core';
import { type MonteCarloAnswer, type MonteCarloOptions, simulateResult } from './simulate-result';

/** Trials that decide for most results; JCGM 101 asks for 10 000 times 1/(1 - confidence) where nothing is known. */
export const MONTE_CARLO_TRIALS = 100_000;

/** Nobody waits for more. */
const MOST_TRIALS = 10_000_000;

/**
 * A Monte Carlo run (JCGM 101) for one unknown of a curve, beside its budget. Pure and seeded: the same request,
 * seed and trials give the same answer, in a worker, on a page or on the server.
 *
 * @param index position of the unknown in the request
 * @returns null when the unknown has no concentration to draw about (censored, or no root)
 * @throws EngineError UNKNOWN_MISSING, TRIALS_OUT_OF_RANGE and those of the curve
 */
export function monteCarlo(
  asked: CurveRequest,
  index: number,
  options: MonteCarloOptions,
): MonteCarloAnswer | null {
  const request = acceptRequest(asked);
  checkOptions(options);
  const unknown = request.unknowns[index];
  if (!unknown) {
    throw new EngineError(
      'UNKNOWN_MISSING',
      `the request has ${request.unknowns.length} unknowns, and none at position ${index}`,
      '/unknowns',
    );
  }
  const curve = fitCurve(request);
  const readings = convertReadings(curve, unknown, `/unknowns/${index}`);
  const back = readBack(curve, readings, unknown);
  if (!back) return null;
  const scaling = scalingOf(unknown.dilution, unknown.recovery ?? request.recovery);
  const budget = makeBudget(curve, unknown, readings, back, scaling);
  const { unit, confidence } = request;
  return simulateResult(
    curveCore(curve, readings, back),
    scaling.value,
    budget,
    { unit, confidence },
    options,
  );
}

export function checkOptions({ trials }: MonteCarloOptions): void {
  requirePositive(trials, 'TRIALS_OUT_OF_RANGE', 'the number of trials', '/trials');
  if (!Number.isInteger(trials) || trials < 100 || trials > MOST_TRIALS) {
    throw new EngineError(
      'TRIALS_OUT_OF_RANGE',
      `a Monte Carlo run takes 100 to ${MOST_TRIALS} trials, got ${trials}`,
      '/trials',
    );
  }
}
