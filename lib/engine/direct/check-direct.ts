import { checkRecovery, checkUnknown } from '../checks/check-unknown';
import { checkConfidence, checkGlassware, checkShared } from '../checks/check-request';
import { requireChoice, requireNotNegative, requirePositive, requireReadings } from '../checks/require';
import { CONCENTRATION_UNIT_NAMES, parseUnit } from '../units';
import type { DirectRequest } from './types';
import type { CurveRequest } from '../types';

type Common = DirectRequest & Pick<CurveRequest, 'standardsRelativeU' | 'standardsShared'>;

/**
 * The request with its unit as we write it, once it has passed the checks of every method without a curve.
 *
 * @throws EngineError as on a curve, with JSON pointers
 */
export function acceptDirect<R extends Common>(asked: R): R {
  const request = { ...asked, unit: parseUnit(asked.unit) ?? asked.unit };
  checkDirect(request);
  return request;
}

function checkDirect(request: Common): void {
  requireChoice(
    request.signal,
    ['absorbance', 'transmittance', 'percentTransmittance'],
    'the signal',
    '/signal',
  );
  requireChoice(request.unit, CONCENTRATION_UNIT_NAMES, 'the unit', '/unit');
  requirePositive(request.pathLengthMm, 'PATH_LENGTH_NOT_POSITIVE', 'the path length (mm)', '/pathLengthMm');
  requireNotNegative(request.pathLengthUMm, 'the uncertainty of the path length (mm)', '/pathLengthUMm');
  requireNotNegative(request.readingSd, 'the standard deviation of a reading', '/readingSd');
  requirePositive(request.absorbanceLimit, 'LIMIT_NOT_POSITIVE', 'the absorbance limit', '/absorbanceLimit');
  checkConfidence(request.confidence);
  checkShared(request);
  checkRecovery(request.recovery, '/recovery');
  checkGlassware(request.glassware);
  if (request.blank) {
    const others = request.blank.otherPaths ?? [];
    if (others.length === 0) requireReadings(request.blank.readings, 'the blank', '/blank/readings');
  }
  request.unknowns.forEach((unknown, i) => checkUnknown(unknown, `/unknowns/${i}`));
}
