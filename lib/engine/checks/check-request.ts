import { EngineError } from '../errors';
import type { BlankRequest, CurveRequest, OwnedGlassware, StandardRequest } from '../types';
import { CONCENTRATION_UNIT_NAMES, isMolar } from '../units';
import { checkRecovery, checkUnknown } from './check-unknown';
import {
  requireChoice,
  requireFinite,
  requireNotNegative,
  requirePositive,
  requireReadings,
} from './require';

const SIGNALS = ['absorbance', 'transmittance', 'percentTransmittance'];
const MODELS = ['linear', 'proportional', 'quadratic'];
const WEIGHTINGS = ['none', '1/x', '1/x2', '1/y', '1/y2', 'varianceFunction', 'replicates', 'given'];

/** Refuse a request that cannot be calculated, before anything is. What only the fit can see is refused there. */
export function checkRequest(request: CurveRequest): void {
  checkChoices(request);
  checkNumbers(request);
  if (request.blank) checkBlank(request.blank, request);
  if (request.standards.length === 0) {
    throw new EngineError('NO_STANDARDS', 'a standard curve needs standards, got none', '/standards');
  }
  request.standards.forEach((standard, i) => checkStandard(standard, `/standards/${i}`, request.weighting));
  request.unknowns.forEach((unknown, i) => checkUnknown(unknown, `/unknowns/${i}`));
}

function checkChoices(request: CurveRequest): void {
  requireChoice(request.signal, SIGNALS, 'the signal', '/signal');
  requireChoice(request.model, MODELS, 'the model', '/model');
  requireChoice(request.weighting, WEIGHTINGS, 'the weighting', '/weighting');
  requireChoice(request.unit, CONCENTRATION_UNIT_NAMES, 'the unit', '/unit');
  if (request.weighting === 'varianceFunction') {
    const given = request.varianceFunction;
    if (!given) {
      throw new EngineError(
        'VARIANCE_FUNCTION_MISSING',
        'weighting by a variance function needs its s0 and k',
        '/varianceFunction',
      );
    }
    requireNotNegative(given.s0, 's0', '/varianceFunction/s0');
    requireNotNegative(given.k, 'k', '/varianceFunction/k');
    requirePositive(given.s0 + given.k, 'WEIGHT_NOT_POSITIVE', 's0 or k', '/varianceFunction/s0');
  }
}

function checkNumbers(request: CurveRequest): void {
  requirePositive(request.pathLengthMm, 'PATH_LENGTH_NOT_POSITIVE', 'the path length (mm)', '/pathLengthMm');
  requireNotNegative(request.pathLengthUMm, 'the uncertainty of the path length (mm)', '/pathLengthUMm');
  requirePositive(
    request.formulaMass,
    'FORMULA_MASS_NOT_POSITIVE',
    'the formula mass (g/mol)',
    '/formulaMass',
  );
  if (isMolar(request.unit) && request.formulaMass === undefined) {
    throw new EngineError(
      'FORMULA_MASS_MISSING',
      `concentrations in ${request.unit} need the formula mass of what they are expressed as`,
      '/formulaMass',
    );
  }
  checkConfidence(request.confidence);
  requirePositive(request.absorbanceLimit, 'LIMIT_NOT_POSITIVE', 'the absorbance limit', '/absorbanceLimit');
  requireNotNegative(request.replicateLimit, 'the limit of replicates', '/replicateLimit');
  checkShared(request);
  checkRecovery(request.recovery, '/recovery');
  checkGlassware(request.glassware);
}

export function checkConfidence(confidence: number): void {
  requireFinite(confidence, 'the confidence', '/confidence');
  if (confidence <= 0 || confidence >= 1) {
    throw new EngineError(
      'CONFIDENCE_OUT_OF_RANGE',
      `the confidence must lie between 0 and 1, got ${confidence}`,
      '/confidence',
    );
  }
}

/** What all standards share. */
export function checkShared(request: Pick<CurveRequest, 'standardsRelativeU' | 'standardsShared'>): void {
  requireNotNegative(
    request.standardsRelativeU,
    'the relative uncertainty of the standards',
    '/standardsRelativeU',
  );
  request.standardsShared?.forEach(({ source, relativeU }, i) =>
    requireNotNegative(relativeU, `the relative uncertainty of ${source}`, `/standardsShared/${i}/relativeU`),
  );
}

export function checkGlassware(owned: OwnedGlassware | undefined): void {
  for (const list of ['pipettesMl', 'flasksMl'] as const) {
    owned?.[list].forEach((volume, i) =>
      requirePositive(volume, 'VOLUME_NOT_POSITIVE', 'the volume of a piece (mL)', `/glassware/${list}/${i}`),
    );
  }
}

function checkBlank(blank: BlankRequest, request: CurveRequest): void {
  requireChoice(blank.use, ['subtract', 'level'], 'the use of the blank', '/blank/use');
  if (blank.use === 'level' && request.model === 'proportional') {
    throw new EngineError(
      'BLANK_LEVEL_THROUGH_ZERO',
      'a line through zero takes no blank level; subtract the blank instead, or leave the intercept free',
      '/blank/use',
    );
  }
  const others = blank.otherPaths ?? [];
  if (others.length === 0) requireReadings(blank.readings, 'the blank', '/blank/readings');
  others.forEach((other, i) => {
    requirePositive(
      other.pathLengthMm,
      'PATH_LENGTH_NOT_POSITIVE',
      'the path length of the blank (mm)',
      `/blank/otherPaths/${i}/pathLengthMm`,
    );
    requireReadings(other.readings, 'the blank', `/blank/otherPaths/${i}/readings`);
  });
}

function checkStandard(
  standard: StandardRequest,
  pointer: string,
  weighting: CurveRequest['weighting'],
): void {
  requireFinite(standard.concentration, 'the concentration of a standard', `${pointer}/concentration`);
  if (standard.concentration < 0) {
    throw new EngineError(
      'CONCENTRATION_NEGATIVE',
      `the concentration of a standard must not be below zero, got ${standard.concentration}`,
      `${pointer}/concentration`,
    );
  }
  requireReadings(standard.readings, 'a standard', `${pointer}/readings`);
  requirePositive(
    standard.pathLengthMm,
    'PATH_LENGTH_NOT_POSITIVE',
    'the path length (mm)',
    `${pointer}/pathLengthMm`,
  );
  requirePositive(standard.weight, 'WEIGHT_NOT_POSITIVE', 'a weight', `${pointer}/weight`);
  if (weighting === 'given' && standard.weight === undefined && standard.excluded !== true) {
    throw new EngineError('WEIGHT_MISSING', 'given weights need one for every standard', `${pointer}/weight`);
  }
  for (const position of standard.excludedReadings ?? []) {
    if (!Number.isInteger(position) || position < 0 || position >= standard.readings.length) {
      throw new EngineError(
        'READING_INDEX_UNKNOWN',
        `reading ${position} is to be left out, but the standard has readings 0 to ${standard.readings.length - 1}`,
        `${pointer}/excludedReadings`,
      );
    }
  }
}
