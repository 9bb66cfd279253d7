import { coefficientOf } from '../regression/fit';
import type { CurveRequest, LeftOut, StandardRequest } from '../types';
import { type Answered, answerUnder, orRefusal, unknownsBeside } from './answer-under';

/** Above so many readings only whole standards are left out in turn: every reading is a fit of all the others. */
const READINGS_AT_MOST = 200;

/**
 * What leaving out each standard, and each reading of a standard that has several, would change: shown before it is
 * done. Those already left out are passed over. A case that leaves too little to fit says why.
 *
 * @throws EngineError as calculateStandardCurve does, for the request as it stands
 */
export function effectOfLeavingOut(request: CurveRequest): readonly LeftOut[] {
  const inUse = answerUnder(request);
  const readings = request.standards.reduce((sum, standard) => sum + standard.readings.length, 0);
  return request.standards.flatMap((standard, index) => {
    if (standard.excluded === true) return [];
    const kept = standard.readings.flatMap((_, i) => (standard.excludedReadings?.includes(i) ? [] : [i]));
    const without = (changed: StandardRequest, replicate: number | null) =>
      effect(inUse, request, { index, replicate, changed });
    const whole = without({ ...standard, excluded: true }, null);
    if (kept.length < 2 || readings > READINGS_AT_MOST) return [whole];
    const single = kept.map((i) =>
      without({ ...standard, excludedReadings: [...(standard.excludedReadings ?? []), i] }, i + 1),
    );
    return [whole, ...single];
  });
}

interface Change {
  readonly index: number;
  readonly replicate: number | null;
  readonly changed: StandardRequest;
}

function effect(inUse: Answered, request: CurveRequest, { index, replicate, changed }: Change): LeftOut {
  const key = {
    standardIndex: index,
    replicate,
    name: changed.name ?? `standard ${index + 1}`,
    concentration: changed.concentration,
  };
  const standards = request.standards.map((standard, i) => (i === index ? changed : standard));
  const answer = orRefusal(() => answerUnder({ ...request, standards }));
  if ('reason' in answer) return { ...key, ...answer };
  const { fit, range } = answer.curve;
  const slope = coefficientOf(fit, 1).value;
  const before = coefficientOf(inUse.curve.fit, 1).value;
  return {
    ...key,
    slope,
    slopeChangePercent: (100 * (slope - before)) / before,
    residualSd: fit.residualSd,
    range,
    unknowns: unknownsBeside(answer.unknowns, inUse.unknowns),
  };
}
