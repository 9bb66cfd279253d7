'use client';

import { useActionState } from 'react';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { confirm } from './actions';

export function ConfirmForm() {
  const [state, submit] = useActionState(confirm, { status: 'idle' });
  return (
    <form action={submit}>
      <FormAlert state={state} />
      <SubmitButton pendingLabel="Going on…">I have read this, go on</SubmitButton>
    </form>
  );
}
