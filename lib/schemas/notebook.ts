import { z } from 'zod';
import { LIMITS } from '@/lib/limits';
import { MEMBER_ROLES } from '@/lib/policies/actor';

const title = z
  .string()
  .trim()
  .min(1, 'Give the notebook a title')
  .max(LIMITS.title, `Keep the title under ${LIMITS.title} characters`);
const purpose = z.string().trim().max(LIMITS.purpose, `Keep the purpose under ${LIMITS.purpose} characters`);

export const newNotebook = z.object({ title, purpose, ownerId: z.uuid('Choose who answers for it') });
export type NewNotebook = z.infer<typeof newNotebook>;

export const notebookChange = z.object({
  id: z.uuid(),
  title,
  purpose,
  version: z.coerce.number().int(),
});
export type NotebookChange = z.infer<typeof notebookChange>;

export const reason = z
  .string()
  .trim()
  .min(1, 'Say why, in a few words')
  .max(LIMITS.reason, `Keep the reason under ${LIMITS.reason} characters`);

export const notebookArchiving = z.object({ id: z.uuid(), archive: z.enum(['yes', 'no']), reason });
export type NotebookArchiving = z.infer<typeof notebookArchiving>;

export const newMember = z.object({
  notebookId: z.uuid(),
  personId: z.uuid('Choose a person'),
  role: z.enum(MEMBER_ROLES, 'Choose what they may do'),
});
export type NewMember = z.infer<typeof newMember>;

export const memberEnd = z.object({ membershipId: z.uuid() });

export const newShareLink = z.object({
  notebookId: z.uuid(),
  label: z.string().trim().min(1, 'Say who the link is for').max(LIMITS.name),
  days: z.coerce
    .number('Enter a number of days')
    .int('Enter whole days')
    .min(1, 'A link lasts at least a day')
    .max(LIMITS.shareDaysMax, `A link lasts at most ${LIMITS.shareDaysMax} days`),
});
export type NewShareLink = z.infer<typeof newShareLink>;

export const shareLinkEnd = z.object({ shareLinkId: z.uuid() });

/** The address of everything inside a notebook. An id of the wrong shape is as good as none. */
export const notebookParams = z.object({ notebookId: z.string() });
