import { z } from 'zod';
import type { KnownAbsorptivityRequest } from '@/lib/engine';
import { LIMITS } from '@/lib/limits';
import { dilution, name, numbers, readings, recovery, volumes } from './calculation';
import { SIGNALS, unitName } from './method';

/* Body of POST /api/v1/calculations/known-absorptivity: same members as for a curve where they mean the same. */

const unknown = z.strictObject({
  name,
  readings,
  pathLengthMm: numbers,
  pathLengthUMm: numbers,
  dilution,
  recovery,
  wingEstimate: numbers,
});

export const knownAbsorptivityCalculation = z.strictObject({
  signal: z.enum(SIGNALS),
  pathLengthMm: z.number().default(10),
  pathLengthUMm: numbers,
  unit: unitName,
  formulaMass: numbers,
  confidence: z.number().default(0.95),
  absorbanceLimit: z.number().default(LIMITS.absorbance),
  absorptivity: z.strictObject({
    kind: z.enum(['molar', 'percent', 'specific']),
    value: z.number(),
    u: z.number(),
    source: z.string().max(LIMITS.purpose),
    conditions: z.string().max(LIMITS.purpose).optional(),
  }),
  blank: z
    .strictObject({
      readings,
      otherPaths: z
        .array(z.strictObject({ pathLengthMm: z.number(), readings }))
        .max(LIMITS.readingsPerStandard)
        .optional(),
    })
    .optional(),
  readingSd: numbers,
  recovery,
  glassware: z.strictObject({ pipettesMl: volumes, flasksMl: volumes }).optional(),
  unknowns: z.array(unknown).max(LIMITS.determinations),
}) satisfies z.ZodType<KnownAbsorptivityRequest>;
