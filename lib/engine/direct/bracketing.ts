import { requireFinite, requireReadings } from '../checks/require';
import { EngineError } from '../errors';
import { sharedByStandards } from '../unknown/budget';
import { calculateDirect } from './calculate-direct';
import { acceptDirect } from './check-direct';
import { directBlanks } from './direct-blanks';
import type { DirectMethod, MethodError } from './method';
import { judgeStandard } from './single-standard';
import { standardReading, type StandardReading } from './standard-reading';
import type { BracketingRequest, DirectAnswer } from './types';

/**
 * Concentrations between two standards that enclose the unknown, on the straight line through both:
 *
 *     c = c1 + (y0 - y1)(c2 - c1)/(y2 - y1)
 *
 * with ∂c/∂y1 = -(c2 - c)/(y2 - y1) and ∂c/∂y2 = -(c - c1)/(y2 - y1). Outside the bracket nothing is claimed.
 *
 * @throws EngineError BRACKET_REVERSED, STANDARD_WITHOUT_NUMBER, ZERO_SLOPE and those of any unknown
 */
export function resultFromBracketing(asked: BracketingRequest): DirectAnswer {
  const request = acceptDirect(asked);
  for (const end of ['low', 'high'] as const) {
    requireFinite(request[end].concentration, 'the concentration of a standard', `/${end}/concentration`);
    requireReadings(request[end].readings, 'a standard', `/${end}/readings`);
  }
  if (request.low.concentration < 0 || request.high.concentration <= request.low.concentration) {
    throw new EngineError(
      'BRACKET_REVERSED',
      `a bracket needs 0 <= low < high, got ${request.low.concentration} and ${request.high.concentration}`,
      '/high/concentration',
    );
  }
  return calculateDirect(bracketingMethod(request));
}

function bracketingMethod(request: BracketingRequest): DirectMethod {
  const { low, high, unit } = request;
  const blanks = directBlanks(request);
  const y1 = standardReading(request, blanks, low.readings, '/low/readings');
  const y2 = standardReading(request, blanks, high.readings, '/high/readings');
  const rise = y2.mean - y1.mean;
  if (rise === 0)
    throw new EngineError('ZERO_SLOPE', 'both standards of the bracket read the same', '/high/readings');
  const span = high.concentration - low.concentration;
  const perAbsorbance = span / rise;
  const from = { c1: 'method.low', c2: 'method.high', y1: 'method.low.mean', y2: 'method.high.mean' };
  const read = (y0: number) => low.concentration + (y0 - y1.mean) * perAbsorbance;
  return {
    request,
    measuring: { request, blanks, range: { min: low.concentration, max: high.concentration } },
    basis: `two standards of ${low.concentration} and ${high.concentration} ${unit}`,
    flags: [...judgeStandard(y1, 'The lower standard'), ...judgeStandard(y2, 'The upper standard')],
    pathCancels: true,
    absorbanceAt: (concentration) => y1.mean + (concentration - low.concentration) / perAbsorbance,
    read: (y0) => ({
      c: read(y0),
      perAbsorbance,
      perExpression: 'abs((c2 - c1) / (y2 - y1))',
      expression: 'c1 + (y0 - y1) * (c2 - c1) / (y2 - y1)',
      source: 'line through both standards',
      from,
      errors: [
        endError('low', y1, (read(y0) - high.concentration) / rise, request.pathLengthMm),
        endError('high', y2, (low.concentration - read(y0)) / rise, request.pathLengthMm),
      ],
    }),
    factors: sharedByStandards(request),
    record: (ledger) => {
      const given = (id: 'low' | 'high', symbol: string, value: number) =>
        ledger.given(
          { id: `method.${id}`, label: `Concentration of the ${id} standard`, symbol, unit, source: 'given' },
          value,
        );
      given('low', 'c1', low.concentration);
      given('high', 'c2', high.concentration);
      y1.record(ledger, 'method.low.mean', 'the low standard', 'y1');
      y2.record(ledger, 'method.high.mean', 'the high standard', 'y2');
    },
    judge: () => [],
  };
}

function endError(
  end: 'low' | 'high',
  reading: StandardReading,
  sensitivity: number,
  pathLengthMm: number,
): MethodError {
  const other = end === 'low' ? 'c2' : 'c1';
  return {
    source: `readings of the ${end} standard`,
    u: reading.u,
    degreesOfFreedom: reading.degreesOfFreedom,
    sensitivity,
    expression: `abs((c - ${other}) / (y2 - y1))`,
    from: {
      c: 'unknown.measured',
      [other]: end === 'low' ? 'method.high' : 'method.low',
      y1: 'method.low.mean',
      y2: 'method.high.mean',
    },
    uId: `method.${end}.mean.u`,
    pathLengthMm,
  };
}
