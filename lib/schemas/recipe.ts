import { z } from 'zod';
import { CONSTITUENTS, type Recipe, RECIPE_VERSION } from '@/lib/corrections/recipe-types';

const MOST_STEPS = 50;
const MOST_REPLICATES = 100;

const name = z.string().trim().min(1, 'Name the step').max(100);
const nm = z.number().positive('Enter nanometres above zero').max(100_000);
const above = z.number().positive('Enter a number above zero');
const contains = z.array(z.enum(CONSTITUENTS)).max(CONSTITUENTS.length);
const spectrumId = z.string().min(1).max(100);
const windowPoints = z
  .number()
  .int()
  .min(5)
  .max(101)
  .refine((points) => points % 2 === 1, 'Enter an odd number of points');
const polynomial = z.number().int().min(1).max(5);
const window = { fromNm: nm, toNm: nm };

const step = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('subtractSpectrum'),
    name,
    role: z.enum(['blank', 'baseline']),
    spectrumId,
    contains,
  }),
  z.strictObject({
    kind: z.literal('sampleBlank'),
    name,
    spectrumId,
    contains,
    sampleDilution: above,
    blankDilution: above,
    ratioRelativeU: z.number().nonnegative().max(1).optional(),
  }),
  z.strictObject({ kind: z.literal('offsetAt'), name, wavelengthNm: nm }),
  z.strictObject({ kind: z.literal('offsetByWindow'), name, ...window }),
  z.strictObject({ kind: z.literal('straightBaseline'), name, lowNm: nm, highNm: nm }),
  z.strictObject({ kind: z.literal('threePointBaseline'), name, lowNm: nm, middleNm: nm, highNm: nm }),
  z.strictObject({ kind: z.literal('scatter'), name, ...window }),
  z.strictObject({ kind: z.literal('smooth'), name, windowPoints, polynomial }),
  z.strictObject({
    kind: z.literal('derivative'),
    name,
    order: z.number().int().min(1).max(4),
    windowPoints,
    polynomial,
  }),
  z.strictObject({
    kind: z.literal('average'),
    name,
    spectrumIds: z.array(spectrumId).min(1).max(MOST_REPLICATES),
  }),
  z.strictObject({ kind: z.literal('interpolate'), name, ...window, stepNm: above }),
  z.strictObject({
    kind: z.literal('normalisePath'),
    name,
    pathLengthMm: above.nullable(),
    uMm: z.number().nonnegative().optional(),
  }),
]);

/** A recipe as stored and as it comes over the API. What only the points can show is refused by applyRecipe. */
export const recipeSchema: z.ZodType<Recipe> = z.strictObject({
  version: z.literal(RECIPE_VERSION),
  steps: z.array(step).max(MOST_STEPS),
});
