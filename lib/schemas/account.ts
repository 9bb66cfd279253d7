import { z } from 'zod';
import { LIMITS } from '@/lib/limits';
import { isTimeZone } from '@/lib/time-zones';
import { withNewPassword } from './password';
import { email, personName } from './people';

export const signInForm = z.object({
  email,
  password: z.string().min(1, 'Enter your password').max(1000, 'This is longer than any password here'),
});
export type SignInForm = z.infer<typeof signInForm>;

export const ownName = z.object({ name: personName });

/** The first form of a new laboratory. */
export const setUpForm = withNewPassword({
  code: z.string().trim().min(1, 'Enter the code that the terminal printed').max(100),
  laboratory: z
    .string()
    .trim()
    .min(1, 'Give the laboratory a name')
    .max(LIMITS.name, `A name may have ${LIMITS.name} characters at most`),
  timeZone: z.string().refine(isTimeZone, 'Choose a time zone from the list'),
  name: personName,
  email,
});
export type SetUpForm = z.infer<typeof setUpForm>;

const DAYS = `Enter whole days, from 1 to ${LIMITS.tokenDaysMax}`;

export const newToken = z.object({
  name: z
    .string()
    .trim()
    .min(1, 'Say what the token is for')
    .max(LIMITS.name, `This may have ${LIMITS.name} characters at most`),
  scope: z.enum(['read', 'write'], 'Choose what the token may do'),
  days: z
    .string()
    .trim()
    .regex(/^\d{1,4}$/, DAYS)
    .transform(Number)
    .pipe(z.number().min(1, DAYS).max(LIMITS.tokenDaysMax, DAYS)),
});
export type NewToken = z.infer<typeof newToken>;

export const oneToken = z.object({ id: z.string().max(64) });
export const oneSession = z.object({ id: z.string().max(64) });
export const nothing = z.object({});
