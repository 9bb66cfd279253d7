'use client';

import { useActionState } from 'react';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import { LIMITS } from '@/lib/limits';
import { rename, setAside } from './actions';

export function RenameForm({ id, name }: { id: string; name: string }) {
  const [state, submit] = useActionState(rename, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid gap-3">
      <FormAlert state={state} />
      <input type="hidden" name="id" value={id} />
      <Field name="name" label="Name" initial={name} maxLength={LIMITS.name} failed={failed} />
      <SubmitButton variant="secondary" className="justify-self-start">
        Rename
      </SubmitButton>
    </form>
  );
}

/** Set a spectrum aside, or bring it back; either way with a reason, and nothing is deleted. */
export function AsideForm({ id, voided }: { id: string; voided: boolean }) {
  const [state, submit] = useActionState(setAside, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid gap-3">
      <FormAlert state={state} />
      <input type="hidden" name="id" value={id} />
      <input type="hidden" name="aside" value={voided ? 'no' : 'yes'} />
      <TextArea
        name="reason"
        label={voided ? 'Why it comes back' : 'Why it is set aside'}
        maxLength={LIMITS.reason}
        failed={failed}
        hint={
          voided
            ? 'It will be offered for curves and batches again.'
            : 'It is no longer offered for curves and batches. It is kept, and what used it stays as it is.'
        }
      />
      <SubmitButton variant={voided ? 'secondary' : 'danger'} className="justify-self-start">
        {voided ? 'Bring it back' : 'Set aside'}
      </SubmitButton>
    </form>
  );
}
