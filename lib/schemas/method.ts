import { z } from 'zod';
import { CONCENTRATION_UNIT_NAMES, isMolar, parseUnit } from '@/lib/engine/units';
import { LIMITS } from '@/lib/limits';
import { decimal, optionalDecimal } from './decimal';

/* The fields of a method as a form holds them: texts in, numbers out. */

export const BLANK_RULES = ['none', 'level', 'subtract'] as const;
export const FORM_MODELS = ['linear', 'proportional', 'quadratic'] as const;
export const FORM_WEIGHTINGS = [
  'none',
  '1/x',
  '1/x2',
  '1/y',
  '1/y2',
  'varianceFunction',
  'replicates',
] as const;
export const SIGNALS = ['absorbance', 'transmittance', 'percentTransmittance'] as const;

export const positive = (what: string) => decimal.pipe(z.number().positive(`${what} must be above zero`));
export const optionalPositive = (what: string) =>
  optionalDecimal.pipe(z.number().positive(`${what} must be above zero, or stay empty`).nullable());
export const optionalNotNegative = (what: string) =>
  optionalDecimal.pipe(z.number().min(0, `${what} cannot be below zero`).nullable());

/** A concentration unit with either micro sign. */
export const unitName = z.string().transform((text, context) => {
  const unit = parseUnit(text);
  if (unit) return unit;
  context.addIssue({ code: 'custom', message: `Choose one of ${CONCENTRATION_UNIT_NAMES.join(', ')}` });
  return z.NEVER;
});

export const aboutFields = z.object({
  title: z.string().trim().max(LIMITS.title, `A title has at most ${LIMITS.title} letters`),
  analyte: z.string().trim().min(1, 'Say what is measured').max(LIMITS.name, 'This name is too long'),
  basis: z.string().trim().max(LIMITS.name, 'This is too long'),
  hazardNote: z.string().trim().max(LIMITS.note, 'This note is too long'),
  reason: z.string().trim().max(LIMITS.reason, 'This reason is too long'),
});

export const calculationFields = z
  .object({
    signal: z.enum(SIGNALS, 'Choose what the readings are'),
    unit: unitName,
    formulaMass: optionalPositive('The formula mass'),
    pathLengthMm: positive('The path length'),
    pathLengthKnown: z.boolean(),
    pathLengthUMm: optionalNotNegative('The uncertainty'),
    blankRule: z.enum(BLANK_RULES, 'Choose what is done with the blank'),
    model: z.enum(FORM_MODELS, 'Choose a line'),
    weighting: z.enum(FORM_WEIGHTINGS, 'Choose a weighting'),
    varianceS0: optionalNotNegative('The constant part'),
    varianceK: optionalNotNegative('The proportional part'),
    confidence: z.enum(['0.9', '0.95', '0.99'], 'Choose a level of confidence').transform(Number),
    absorbanceLimit: positive('The absorbance limit'),
    standardsRelativeUPercent: optionalNotNegative('The uncertainty'),
  })
  .superRefine((fields, context) => {
    if (isMolar(fields.unit) && fields.formulaMass === null)
      context.addIssue({
        code: 'custom',
        path: ['formulaMass'],
        message: `${fields.unit} counts particles: enter the formula mass of what is counted`,
      });
    if (
      fields.weighting === 'varianceFunction' &&
      !((fields.varianceS0 ?? 0) > 0 || (fields.varianceK ?? 0) > 0)
    )
      context.addIssue({
        code: 'custom',
        path: ['varianceS0'],
        message: 'Enter the constant part, the proportional part, or both',
      });
    if (fields.blankRule === 'level' && fields.model === 'proportional')
      context.addIssue({
        code: 'custom',
        path: ['blankRule'],
        message: 'A line through zero takes no blank level. Subtract the blank, or leave the intercept free',
      });
  })
  .transform(({ standardsRelativeUPercent: percent, varianceS0, varianceK, ...fields }) => ({
    ...fields,
    varianceFunction:
      fields.weighting === 'varianceFunction' ? { s0: varianceS0 ?? 0, k: varianceK ?? 0 } : null,
    standardsRelativeU: percent === null ? null : percent / 100,
  }));
