import { z } from 'zod';
import { passwordProblem } from '@/lib/password';

/** A password that somebody chooses. One that is typed to sign in is taken as it comes. */
export const newPassword = z.string().superRefine((text, context) => {
  const problem = passwordProblem(text);
  if (problem) context.addIssue({ code: 'custom', message: problem });
});

const again = z.string().default('');
const same = (form: { password: string; passwordAgain: string }) => form.password === form.passwordAgain;
const NOT_THE_SAME = {
  path: ['passwordAgain'],
  message: 'This differs from the password above; type both again',
};

/** Add the second typing of a new password to a form. */
export function withNewPassword<T extends z.ZodRawShape>(shape: T) {
  return z
    .object({ ...shape, password: newPassword, passwordAgain: again })
    .refine((form) => same(form as { password: string; passwordAgain: string }), NOT_THE_SAME);
}

export const passwordByLink = withNewPassword({ token: z.string().min(1).max(200) });
export type PasswordByLink = z.infer<typeof passwordByLink>;

export const passwordChange = withNewPassword({
  currentPassword: z.string().min(1, 'Enter the password you have now').max(1000),
});
export type PasswordChange = z.infer<typeof passwordChange>;
