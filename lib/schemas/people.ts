import { z } from 'zod';
import { LIMITS } from '@/lib/limits';
import { ROLES } from '@/lib/policies/actor';

export const personName = z
  .string()
  .trim()
  .min(1, 'Enter a name')
  .max(LIMITS.name, `A name may have ${LIMITS.name} characters at most`);

export const email = z
  .string()
  .trim()
  .toLowerCase()
  .max(LIMITS.email, `An e-mail address has ${LIMITS.email} characters at most`)
  .pipe(z.email('Enter an e-mail address, such as name@example.org'));

export const personDetails = z.object({
  name: personName,
  email,
  role: z.enum(ROLES, 'Choose a role'),
});
export type PersonDetails = z.infer<typeof personDetails>;

const personId = z.string().max(64);

export const changedPerson = personDetails.extend({ personId });
export const onePerson = z.object({ personId });

export const personAccess = z.object({
  personId,
  active: z.enum(['yes', 'no']).transform((word) => word === 'yes'),
  why: z.string().trim().max(LIMITS.reason, `A reason may have ${LIMITS.reason} characters at most`),
});
