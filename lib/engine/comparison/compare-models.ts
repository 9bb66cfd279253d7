import { acceptRequest } from '../checks/accept-request';
import type { CurveRequest, ModelUnder, Model, Refusal, Weighting } from '../types';
import { learnVarianceFunction } from '../weighting/learn-variance-function';
import { replicateScatter } from '../weighting/replicate-scatter';
import { type Answered, answerUnder, orRefusal, unknownsBeside } from './answer-under';

const MODELS: readonly Model[] = ['linear', 'proportional', 'quadratic'];
const WEIGHTINGS: readonly Weighting[] = [
  'none',
  '1/x',
  '1/x2',
  '1/y',
  '1/y2',
  'varianceFunction',
  'replicates',
];

/**
 * Every model under every weighting, by what it makes of today's unknowns rather than by r²: a choice that moves no
 * result by a good part of its uncertainty is no choice to lose sleep over. One that cannot be had says why. Given
 * weights are compared where there are any; the variance function is the request's, or else the one its replicates
 * teach when they have the degrees of freedom for it.
 *
 * @throws EngineError for a request that is wrong under every model
 */
export function compareModels(request: CurveRequest): readonly ModelUnder[] {
  // Lines through zero refuse a blank level and given weights may be missing: that is said in their rows.
  acceptRequest({ ...request, model: 'linear', weighting: 'none' });
  const inUse = orRefusal(() => answerUnder(request));
  const varianceFunction = request.varianceFunction ?? learned(request);
  const hasWeights = request.standards.some((standard) => standard.weight !== undefined);
  const weightings: readonly Weighting[] = hasWeights ? [...WEIGHTINGS, 'given'] : WEIGHTINGS;
  return MODELS.flatMap((model) =>
    weightings.map((weighting) =>
      rowOf(
        { ...request, model, weighting, ...(varianceFunction ? { varianceFunction } : {}) },
        request,
        inUse,
      ),
    ),
  );
}

/** The function that replicates teach, when they are enough. */
function learned(request: CurveRequest): CurveRequest['varianceFunction'] {
  const plain = orRefusal(() => answerUnder({ ...request, model: 'linear', weighting: 'none' }));
  if ('reason' in plain) return undefined;
  const found = learnVarianceFunction(replicateScatter(plain.curve.active));
  return found && !found.adviceOnly ? { s0: found.s0, k: found.k } : undefined;
}

function rowOf(changed: CurveRequest, request: CurveRequest, inUse: Answered | Refusal): ModelUnder {
  const { model, weighting } = changed;
  const key = { model, weighting, inUse: model === request.model && weighting === request.weighting };
  const answer = orRefusal(() => answerUnder(changed));
  if ('reason' in answer) return { ...key, ...answer };
  const { curve, unknowns } = answer;
  return {
    ...key,
    residualSd: curve.fit.residualSd,
    degreesOfFreedom: curve.fit.degreesOfFreedom,
    relativeStandardErrorPercent: answer.relativeStandardErrorPercent,
    unknowns: unknownsBeside(unknowns, 'reason' in inUse ? null : inUse.unknowns),
  };
}
