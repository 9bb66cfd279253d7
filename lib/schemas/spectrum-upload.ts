import { z } from 'zod';
import type { ReadOptions } from '@/lib/readers/types';

export const sourceFileParams = z.object({ sourceFileId: z.uuid() });

const column = z.number().int().min(0);

/** A person's word where a reader would guess. */
const readOptions = z.strictObject({
  delimiter: z.enum([',', ';', 'tab', 'blank', '|', 'fixed']).optional(),
  decimalMark: z.enum(['.', ',']).optional(),
  headerRows: column.optional(),
  orientation: z.enum(['columns', 'pairs', 'rows', 'long', 'stacked']).optional(),
  xColumn: column.optional(),
  xRow: column.optional(),
  yColumns: z.array(column).optional(),
  xUnit: z.enum(['nm', '1/cm', 'um', 'angstrom', 'eV']).optional(),
  signal: z.enum(['absorbance', 'transmittance', 'percentTransmittance', 'other']).optional(),
  firstX: z.number().optional(),
  stepX: z.number().optional(),
  table: column.optional(),
  equalX: z.enum(['first', 'mean', 'keep']).optional(),
  turnRound: z.enum(['split', 'keep']).optional(),
  missingValues: z.array(z.number()).optional(),
}) satisfies z.ZodType<ReadOptions>;

function parsedJson(text: string, context: z.RefinementCtx): unknown {
  try {
    return JSON.parse(text);
  } catch {
    context.addIssue({ code: 'custom', message: 'The options are not JSON' });
    return z.NEVER;
  }
}

/** What may come beside the file: options as JSON, and whether the reader's proposal is taken where it asks. */
export const uploadFields = z.object({
  options: z.string().default('{}').transform(parsedJson).pipe(readOptions),
  proposal: z.enum(['ask', 'accept']).default('ask'),
});
