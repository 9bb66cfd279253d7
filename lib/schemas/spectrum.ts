import { z } from 'zod';
import { LIMITS } from '@/lib/limits';
import { pageQuery } from './page-query';
import { spectrumRule } from './spectrum-rule';

export const spectrumParams = z.object({ spectrumId: z.uuid() });

const name = z
  .string()
  .trim()
  .min(1, 'Give the spectrum a name')
  .max(LIMITS.name, `Keep the name under ${LIMITS.name} characters`);
const reason = z
  .string()
  .trim()
  .min(1, 'Say why, in a few words')
  .max(LIMITS.reason, `Keep the reason under ${LIMITS.reason} characters`);

export const spectrumName = z.object({ id: z.uuid(), name });
export const spectrumAside = z.object({ id: z.uuid(), aside: z.enum(['yes', 'no']), reason });

/** Body of PATCH: a new name, or setting aside (true) and bringing back (false) with a reason. */
export const spectrumChange = z.union([
  z.strictObject({ name }),
  z.strictObject({ voided: z.boolean(), reason }),
]);

export const spectraQuery = pageQuery.extend({
  search: z.string().max(LIMITS.name).optional(),
  voided: z.enum(['include', 'leaveOut']).default('leaveOut'),
});

const ids = z
  .string({ error: 'Name the spectra: ids=one,two' })
  .transform((text) => text.split(',').filter((id) => id !== ''))
  .pipe(
    z
      .array(z.uuid('This is not the id of a spectrum'))
      .min(1, 'Name the spectra: ids=one,two')
      .max(LIMITS.spectraAtOnce, `Ask for ${LIMITS.spectraAtOnce} spectra at most at once`),
  );

export const manySpectraQuery = z.object({ ids });
export const spectrumQuery = z.object({ raw: z.enum(['0', '1']).default('0') });
export const readingsQuery = z.looseObject({ ids }).transform((query, context) => {
  const rule = spectrumRule.safeParse(query);
  if (rule.success) return { ids: query.ids, rule: rule.data };
  for (const issue of rule.error.issues)
    context.addIssue({ code: 'custom', path: issue.path, message: issue.message });
  return z.NEVER;
});
