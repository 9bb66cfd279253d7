import { z } from 'zod';
import type { CurveRequest } from '@/lib/engine';
import { LIMITS } from '@/lib/limits';
import { unitName } from './method';

/*
 * Body of POST /api/v1/calculations/standard-curve. It says what a value must be to be read at all; what it
 * must be to be calculated with (positive, enough, distinct) the engine says, with the same JSON pointers.
 */

const reading = z.union(
  [z.number(), z.string().max(60), z.strictObject({ main: z.number(), minus: z.number() })],
  'A reading is a number, text, or {main, minus} for two wavelengths',
);
export const readings = z.array(reading).max(LIMITS.readingsPerStandard);
export const name = z.string().max(LIMITS.name).optional();
export const numbers = z.number().optional();

const ware = z
  .strictObject({
    toleranceMl: numbers,
    repeatabilityMl: numbers,
    temperatureRangeK: numbers,
    piece: z.string().max(LIMITS.name).optional(),
  })
  .optional();

const volumeStep = z.strictObject({
  takenMl: z.number(),
  toMl: z.number(),
  takenUMl: numbers,
  toUMl: numbers,
  takenWare: ware,
  toWare: ware,
});

const massStep = z.strictObject({
  takenG: z.number(),
  toG: z.number(),
  takenUG: numbers,
  toUG: numbers,
  densities: z
    .strictObject({
      takenGPerMl: z.number(),
      toGPerMl: z.number(),
      takenUGPerMl: numbers,
      toUGPerMl: numbers,
    })
    .optional(),
});

export const dilution = z
  .array(
    z.union([volumeStep, massStep], 'A dilution step is volumes (takenMl, toMl) or masses (takenG, toG)'),
  )
  .max(LIMITS.dilutionSteps)
  .optional();

export const recovery = z.strictObject({ value: z.number(), u: z.number() }).optional();
export const volumes = z.array(z.number()).max(LIMITS.glassware);

const standard = z.strictObject({
  name,
  concentration: z.number(),
  readings,
  pathLengthMm: numbers,
  weight: numbers,
  excluded: z.boolean().optional(),
  excludedReadings: z.array(z.number().int()).max(LIMITS.readingsPerStandard).optional(),
});

const unknown = z.strictObject({
  name,
  readings,
  pathLengthMm: numbers,
  pathLengthUMm: numbers,
  weight: numbers,
  dilution,
  recovery,
  wingEstimate: numbers,
});

export const standardCurveCalculation = z.strictObject({
  signal: z.enum(['absorbance', 'transmittance', 'percentTransmittance']),
  pathLengthMm: z.number().default(10),
  pathLengthUMm: numbers,
  pathLengthKnown: z.boolean().optional(),
  unit: unitName,
  formulaMass: numbers,
  model: z.enum(['linear', 'proportional', 'quadratic']),
  weighting: z.enum(['none', '1/x', '1/x2', '1/y', '1/y2', 'varianceFunction', 'replicates', 'given']),
  varianceFunction: z.strictObject({ s0: z.number(), k: z.number() }).optional(),
  confidence: z.number().default(0.95),
  absorbanceLimit: z.number().default(LIMITS.absorbance),
  replicateLimit: numbers,
  blank: z
    .strictObject({
      readings,
      use: z.enum(['subtract', 'level']),
      otherPaths: z
        .array(z.strictObject({ pathLengthMm: z.number(), readings }))
        .max(LIMITS.readingsPerStandard)
        .optional(),
    })
    .optional(),
  standards: z.array(standard).max(LIMITS.standards),
  standardsRelativeU: numbers,
  standardsShared: z
    .array(z.strictObject({ source: z.string().min(1).max(LIMITS.name), relativeU: z.number() }))
    .max(LIMITS.dilutionSteps)
    .optional(),
  recovery,
  glassware: z.strictObject({ pipettesMl: volumes, flasksMl: volumes }).optional(),
  unknowns: z.array(unknown).max(LIMITS.determinations).default([]),
}) satisfies z.ZodType<CurveRequest>;
