import { z } from 'zod';
import { isMolar } from '@/lib/engine';
import { LIMITS } from '@/lib/limits';
import { optionalNotNegative, optionalPositive, positive, SIGNALS, unitName } from './method';
import { reason } from './notebook';
import { spectrumRule } from './spectrum-rule';

/* A known absorptivity as its form holds it: texts in, numbers out. */

export const ABSORPTIVITY_KINDS = ['molar', 'percent', 'specific'] as const;

const text = (most: number) => z.string().trim().max(most, `Keep it under ${most} characters`);

/** What a concentration follows from, besides the reading. */
export const absorptivityFigures = z
  .object({
    kind: z.enum(ABSORPTIVITY_KINDS, 'Choose which absorptivity it is'),
    value: positive('The absorptivity'),
    u: optionalNotNegative('The uncertainty'),
    unit: unitName,
    formulaMass: optionalPositive('The formula mass'),
    pathLengthMm: positive('The path length'),
    pathLengthUMm: optionalNotNegative('The uncertainty'),
  })
  .superRefine(({ kind, unit, formulaMass }, context) => {
    if (formulaMass !== null || (kind === 'molar') === isMolar(unit)) return;
    context.addIssue({
      code: 'custom',
      path: ['formulaMass'],
      message: `Between ${kind === 'molar' ? 'a molar absorptivity' : 'an absorptivity by mass'} and ${unit} stands the formula mass: enter it`,
    });
  });

const about = z.object({
  notebookId: z.uuid(),
  /** Made once with the form, so that sending it twice saves once. */
  saveKey: z.string().min(8).max(100),
  /** The version that the form was opened on; empty for a new absorptivity. */
  baseId: z.union([z.literal(''), z.uuid()]),
  title: text(LIMITS.title),
  analyte: text(LIMITS.name).min(1, 'Say what is measured'),
  basis: text(LIMITS.name),
  source: text(LIMITS.purpose).min(1, 'Say where the value comes from: book, certificate, method, own work'),
  conditions: text(LIMITS.purpose),
  signal: z.enum(SIGNALS, 'Choose what the readings are'),
  readingSd: optionalNotNegative('The scatter'),
  confidence: z.enum(['0.9', '0.95', '0.99'], 'Choose a level of confidence').transform(Number),
  absorbanceLimit: positive('The absorbance limit'),
  hazardNote: text(LIMITS.note),
  reason: text(LIMITS.reason).default(''),
});

/** Each part says what is wrong in it, also when another part is wrong too. */
export const saveAbsorptivityForm = about
  .and(absorptivityFigures)
  .and(spectrumRule.transform((readingRule) => ({ readingRule })));
export type SaveAbsorptivity = z.output<typeof saveAbsorptivityForm>;

export const voidAbsorptivityForm = z.object({ absorptivityId: z.uuid(), reason });
export type VoidAbsorptivity = z.output<typeof voidAbsorptivityForm>;

export const absorptivityParams = z.object({ absorptivityId: z.uuid() });
