import { z } from 'zod';
import { parseDilution } from '@/lib/batch/parse-dilution';
import type { DilutionStep } from '@/lib/engine';

/** A dilution typed into a field, as its steps. */
export const dilution = z.string().transform((text, context): readonly DilutionStep[] => {
  const parsed = parseDilution(text);
  if (parsed.ok) return parsed.steps;
  context.addIssue({ code: 'custom', message: parsed.message });
  return z.NEVER;
});
