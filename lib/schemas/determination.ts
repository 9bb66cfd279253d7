import { z } from 'zod';
import { typedReading, type KeptReading } from '@/lib/batch/typed-reading';
import { LIMITS } from '@/lib/limits';
import { submissionKey } from './batch';
import { decimal } from './decimal';
import { dilution } from './dilution';
import { optionalNotNegative } from './method';
import { reason } from './notebook';

export const determinationParams = z.object({ determinationId: z.uuid() });

const PATH_MAX_MM = 1000;

export const pathLengthMm = decimal.pipe(
  z
    .number()
    .positive('A path length must be above zero')
    .max(PATH_MAX_MM, `A path length is at most ${PATH_MAX_MM} mm`),
);

export const reading = z.string().transform((text, context): KeptReading => {
  const typed = typedReading(text);
  if (typed.ok) return typed.reading;
  context.addIssue({ code: 'custom', message: typed.message });
  return z.NEVER;
});

/** Cells of a row that were left empty are no readings; a row needs one at least. */
const readings = z
  .array(z.string())
  .max(LIMITS.readingsPerStandard, `A sample takes ${LIMITS.readingsPerStandard} readings at most`)
  .transform((cells, context): KeptReading[] => {
    const kept: KeptReading[] = [];
    cells.forEach((cell, index) => {
      if (cell.trim() === '') return;
      const typed = typedReading(cell);
      if (typed.ok) kept.push(typed.reading);
      else context.addIssue({ code: 'custom', message: typed.message, path: [index] });
    });
    if (cells.every((cell) => cell.trim() === ''))
      context.addIssue({ code: 'custom', message: 'Enter at least one reading', path: [0] });
    return kept;
  });

export const sampleName = z
  .string()
  .trim()
  .min(1, 'Name the sample')
  .max(LIMITS.name, `Keep the name under ${LIMITS.name} characters`);

const sampleRow = { sample: sampleName, pathLengthMm, dilution };
export const typedRow = z.object({ ...sampleRow, readings });
const spectrumRow = z.object({
  ...sampleRow,
  spectrumIds: z
    .array(z.uuid())
    .min(1, 'Choose at least one spectrum')
    .max(LIMITS.readingsPerStandard, `A sample takes ${LIMITS.readingsPerStandard} readings at most`),
});

/** A list of rows that a form sends as the JSON text of one field. */
function rowsOf<S extends z.ZodType>(row: S, none: string) {
  return z
    .string()
    .transform((text, context): unknown => {
      try {
        return JSON.parse(text);
      } catch {
        context.addIssue({ code: 'custom', message: 'The rows could not be read. Reload the page' });
        return z.NEVER;
      }
    })
    .pipe(
      z
        .array(row)
        .min(1, none)
        .max(LIMITS.determinations, `A batch takes ${LIMITS.determinations} samples at most`),
    );
}

export const addTypedSamples = z.object({
  batchId: z.uuid(),
  submissionKey,
  samples: rowsOf(typedRow, 'Enter at least one sample with its reading'),
});
export type AddTypedSamples = z.infer<typeof addTypedSamples>;

export const addSpectrumSamples = z.object({
  batchId: z.uuid(),
  submissionKey,
  samples: rowsOf(spectrumRow, 'Choose at least one spectrum'),
});
export type AddSpectrumSamples = z.infer<typeof addSpectrumSamples>;

/** Which version of a determination the person was looking at when they changed it. */
const seenVersion = z.coerce.number().int().min(1);

export const correctReading = z.object({
  determinationId: z.uuid(),
  readingId: z.uuid(),
  version: seenVersion,
  reading,
  reason,
});
export type CorrectReading = z.infer<typeof correctReading>;

export const changeConditions = z.object({
  determinationId: z.uuid(),
  version: seenVersion,
  sample: sampleName,
  pathLengthMm,
  /** Standard uncertainty; empty for the cell of the standards, or when it is not known. */
  pathLengthUMm: optionalNotNegative('The uncertainty').default(null),
  dilution,
  reason,
});
export type ChangeConditions = z.infer<typeof changeConditions>;

export const voidDetermination = z.object({ determinationId: z.uuid(), version: seenVersion, reason });
export type VoidDetermination = z.infer<typeof voidDetermination>;
