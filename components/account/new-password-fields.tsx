import { Field } from '@/components/ui/field';
import type { FailedForm } from '@/lib/form-state';
import { PASSWORD_HINT } from '@/lib/password';

/** A new password, typed twice; what was typed is never sent back to the page. */
export function NewPasswordFields({ failed }: { failed?: FailedForm }) {
  return (
    <>
      <Field
        name="password"
        label="New password"
        type="password"
        autoComplete="new-password"
        hint={PASSWORD_HINT}
        failed={failed}
      />
      <Field
        name="passwordAgain"
        label="New password, again"
        type="password"
        autoComplete="new-password"
        failed={failed}
      />
    </>
  );
}
