import type { CurveRequest } from '../types';
import { parseUnit } from '../units';
import { checkRequest } from './check-request';

/**
 * The request with its unit as we write it, once it has passed its checks.
 *
 * @throws EngineError as checkRequest does
 */
export function acceptRequest(asked: CurveRequest): CurveRequest {
  const request = { ...asked, unit: parseUnit(asked.unit) ?? asked.unit };
  checkRequest(request);
  return request;
}
