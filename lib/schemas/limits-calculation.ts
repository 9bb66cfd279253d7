import { z } from 'zod';
import type { LimitsRequest } from '@/lib/engine';
import { LIMITS } from '@/lib/limits';
import { numbers, readings, standardCurveCalculation } from './calculation';
import { unitName } from './method';

/* Body of POST /api/v1/calculations/limits. */

const sample = z.strictObject({
  value: z.number().nullable(),
  batch: z.string().max(LIMITS.name).optional(),
  date: z.string().max(LIMITS.name).optional(),
});
const samples = z.array(sample).max(LIMITS.determinations);

export const limitsCalculation = z.strictObject({
  unit: unitName,
  curve: standardCurveCalculation.optional(),
  readings: numbers,
  blankReadings: readings.optional(),
  alpha: numbers,
  beta: numbers,
  factor: numbers,
  study: z.strictObject({ spikeLevel: numbers, spikes: samples, blanks: samples }).optional(),
}) satisfies z.ZodType<LimitsRequest>;
