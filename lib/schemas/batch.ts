import { z } from 'zod';
import { LIMITS } from '@/lib/limits';
import { reason } from './notebook';

/** Made once by the form and sent with it: the same form sent twice saves once. */
export const submissionKey = z.uuid('Reload the page and try again');

export const batchParams = z.object({ batchId: z.uuid() });

/** "spreadsheet" puts a byte order mark before the text. */
export const resultsQuery = z.object({ for: z.enum(['program', 'spreadsheet']).default('program') });

/** Ids of spectra, with commas between. */
export const spectrumReadingsQuery = z.object({
  spectra: z
    .string()
    .transform((text) => text.split(','))
    .pipe(z.array(z.uuid()).min(1).max(LIMITS.pageSize)),
});

/** What a batch is read on, as one field of a form: the kind, a space and the id. */
const readOn = z.string().transform((text, context): { curveId?: string; absorptivityId?: string } => {
  const [kind, id] = text.split(' ');
  if (z.uuid().safeParse(id).success) {
    if (kind === 'curve') return { curveId: id };
    if (kind === 'absorptivity') return { absorptivityId: id };
  }
  context.addIssue({
    code: 'custom',
    message: 'Choose the standard curve or the known absorptivity that the samples are read on',
  });
  return z.NEVER;
});

/** A batch is read on a standard curve or on a known absorptivity: exactly one of the two. */
export const newBatch = z
  .object({
    notebookId: z.uuid(),
    submissionKey,
    readOn,
    title: z.string().trim().min(1, 'Give the batch a title').max(LIMITS.title),
    note: z.string().trim().max(LIMITS.note).default(''),
  })
  .transform(({ readOn: on, ...batch }) => ({ ...batch, ...on }));
export type NewBatch = z.infer<typeof newBatch>;

export const voidBatch = z.object({ batchId: z.uuid(), reason });
export type VoidBatch = z.infer<typeof voidBatch>;

export const newBatchVersion = z.object({
  batchId: z.uuid(),
  submissionKey,
  curveId: z.uuid('Choose the curve to read the samples on'),
  reason,
});
export type NewBatchVersion = z.infer<typeof newBatchVersion>;
