import { z } from 'zod';
import { LIMITS } from '@/lib/limits';
import { decimal } from './decimal';
import { aboutFields, calculationFields } from './method';
import { spectrumRule } from './spectrum-rule';

const reason = z
  .string()
  .trim()
  .min(1, 'Say why it is left out')
  .max(LIMITS.reason, 'This reason is too long')
  .nullable();

/** A reading is typed, or read on the server from a spectrum by the rule. No result is ever taken. */
const readingDraft = z.union([
  z.strictObject({ text: z.string().max(60, 'This is too long for a reading'), leftOut: reason }),
  z.strictObject({ spectrumId: z.uuid(), leftOut: reason }),
]);

const standardDraft = z
  .strictObject({
    role: z.enum(['standard', 'blank']),
    name: z.string().trim().min(1, 'Give the standard a name').max(LIMITS.name, 'This name is too long'),
    concentration: z.string(),
    leftOut: reason,
    readings: z
      .array(readingDraft)
      .min(1, 'Enter a reading')
      .max(LIMITS.readingsPerStandard, `At most ${LIMITS.readingsPerStandard} readings`),
  })
  .transform((standard, context) => {
    if (standard.role === 'blank') return { ...standard, concentration: 0 };
    const parsed = decimal
      .pipe(z.number().min(0, 'A concentration cannot be below zero'))
      .safeParse(standard.concentration);
    if (parsed.success) return { ...standard, concentration: parsed.data };
    context.addIssue({
      code: 'custom',
      path: ['concentration'],
      message: parsed.error.issues[0]?.message ?? 'Enter a number',
    });
    return z.NEVER;
  });

export const standardDrafts = z
  .array(standardDraft)
  .min(1, 'Enter the standards')
  .max(LIMITS.standards, `At most ${LIMITS.standards} standards`);

/** What the form of a curve holds. */
export const curveDraft = z.object({
  about: aboutFields,
  rule: spectrumRule,
  calculation: calculationFields,
  standards: standardDrafts,
});
export type CurveDraftInput = z.input<typeof curveDraft>;
export type CurveDraft = z.output<typeof curveDraft>;
export type StandardDraft = CurveDraft['standards'][number];
export type StandardDraftInput = CurveDraftInput['standards'][number];

const json = z.string().transform((text, context) => {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    context.addIssue({ code: 'custom', message: 'The form could not be read. Load the page again' });
    return z.NEVER;
  }
});

export const saveCurveForm = z.object({
  notebookId: z.uuid(),
  /** Made once with the form, so that sending it twice saves once. */
  saveKey: z.string().min(8).max(100),
  /** The version that the form was opened on; empty for a new curve. */
  baseId: z.union([z.literal(''), z.uuid()]),
  draft: json.pipe(curveDraft),
});
export type SaveCurve = z.output<typeof saveCurveForm>;

export const voidCurveForm = z.object({
  curveId: z.uuid(),
  reason: z.string().trim().min(1, 'Say why it is void').max(LIMITS.reason, 'This reason is too long'),
});
export type VoidCurve = z.output<typeof voidCurveForm>;

/** Spectra to be read by a rule, before anything is saved. */
export const readingsPreview = z.object({
  spectrumIds: z.array(z.uuid()).min(1).max(LIMITS.spectraAtOnce),
  rule: spectrumRule,
});

export const curveParams = z.object({ curveId: z.uuid() });
