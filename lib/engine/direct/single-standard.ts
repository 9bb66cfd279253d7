import { requireNotNegative, requirePositive, requireReadings } from '../checks/require';
import { EngineError } from '../errors';
import { type Flag, flag } from '../flags';
import { sharedByStandards } from '../unknown/budget';
import { mean } from '../unknown/convert-readings';
import { calculateDirect } from './calculate-direct';
import { acceptDirect } from './check-direct';
import { directBlanks } from './direct-blanks';
import { judgeApart } from './judge-direct';
import type { DirectMethod } from './method';
import { standardReading, type StandardReading } from './standard-reading';
import type { DirectAnswer, SingleStandardRequest } from './types';

const DRIFT_LIMIT = 0.02;

/** An unknown may read this many times the standard, or its reciprocal, before a flag says so. */
const FAR = 2;

/**
 * Concentrations by comparison with one standard, c = c_s · y0 / y_s: a line through zero and the standard. The
 * standard may be read before and after the unknowns; all its readings make one mean, and a change is flagged.
 *
 *     u²(c) = (c/y0)² u²(y0) + (c/y_s)² u²(y_s) + (c u_rel)² + ...
 *
 * @throws EngineError STANDARD_WITHOUT_NUMBER, ZERO_SLOPE and those of any unknown
 */
export function resultFromSingleStandard(asked: SingleStandardRequest): DirectAnswer {
  const request = acceptDirect(asked);
  const { concentration, readings } = request.standard;
  requirePositive(
    concentration,
    'CONCENTRATION_NEGATIVE',
    'the concentration of the standard',
    '/standard/concentration',
  );
  requireReadings(readings, 'the standard', '/standard/readings');
  requireNotNegative(request.driftLimit, 'the limit of drift', '/driftLimit');
  return calculateDirect(singleStandardMethod(request));
}

function singleStandardMethod(request: SingleStandardRequest): DirectMethod {
  const { standard, pathLengthMm, unit } = request;
  const blanks = directBlanks(request);
  const before = standardReading(request, blanks, standard.readings, '/standard/readings');
  const after = standard.readingsAfter ?? [];
  const all = standardReading(request, blanks, [...standard.readings, ...after], '/standard/readings');
  if (all.mean === 0)
    throw new EngineError('ZERO_SLOPE', 'the standard reads nothing above its blank', '/standard/readings');
  const perAbsorbance = standard.concentration / all.mean;
  return {
    request,
    measuring: { request, blanks, range: { min: 0, max: Infinity } },
    basis: `one standard of ${standard.concentration} ${unit}`,
    flags: [...judgeStandard(all), ...judgeDrift(request, before.mean, all.mean)],
    pathCancels: true,
    absorbanceAt: (concentration) => concentration / perAbsorbance,
    read: (y0) => ({
      c: y0 * perAbsorbance,
      perAbsorbance,
      perExpression: 'abs(c_s / y_s)',
      expression: 'c_s * y0 / y_s',
      source: 'line through zero and the standard',
      from: { c_s: 'method.concentration', y_s: 'method.standard' },
      errors: [
        {
          source: 'readings of the standard',
          u: all.u,
          degreesOfFreedom: all.degreesOfFreedom,
          sensitivity: (-y0 * perAbsorbance) / all.mean,
          expression: 'abs(c / y_s)',
          from: { c: 'unknown.measured', y_s: 'method.standard' },
          uId: 'method.standard.u',
          pathLengthMm,
        },
      ],
    }),
    factors: sharedByStandards(request),
    record: (ledger) => {
      ledger.given(
        {
          id: 'method.concentration',
          label: 'Concentration of the standard',
          symbol: 'c_s',
          unit,
          source: 'given',
        },
        standard.concentration,
      );
      all.record(ledger, 'method.standard', 'the standard', 'y_s');
    },
    judge: (readings) => {
      const ratio = (readings.meanY as number) / all.mean;
      return ratio > FAR || ratio < 1 / FAR ? [flag('FAR_FROM_STANDARD', { value: ratio, limit: FAR })] : [];
    },
  };
}

export function judgeStandard(reading: StandardReading, name = 'The standard'): readonly Flag[] {
  return reading.sd === null
    ? [flag('READING_WITHOUT_U', { name })]
    : judgeApart(reading, 'These are readings of a standard. ');
}

function judgeDrift(request: SingleStandardRequest, before: number, all: number): readonly Flag[] {
  const { readings, readingsAfter = [] } = request.standard;
  if (readingsAfter.length === 0) return [];
  // From the two means: all = (n·before + m·after) / (n + m).
  const total = readings.length + readingsAfter.length;
  const after = (all * total - before * readings.length) / readingsAfter.length;
  const change = (after - before) / mean([before, after]);
  const limit = request.driftLimit ?? DRIFT_LIMIT;
  return Math.abs(change) > limit
    ? [flag('STANDARD_DRIFTED', { value: 100 * change, limit: 100 * limit })]
    : [];
}
