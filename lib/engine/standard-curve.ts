import { EngineError } from './errors';
import type { CurveAnswer, CurveRequest } from './types';

export function calculateStandardCurve(request: CurveRequest): CurveAnswer {
  throw new EngineError('NO_STANDARDS', `calculateStandardCurve cannot fit ${request.model} yet`);
}
