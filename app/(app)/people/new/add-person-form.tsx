'use client';

import { useActionState } from 'react';
import { LinkButton } from '@/components/ui/button';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { add } from '@/app/(app)/people/actions';
import { NewLink } from '@/app/(app)/people/new-link';
import { PersonFields } from '@/app/(app)/people/person-fields';

export function AddPersonForm() {
  const [state, submit] = useActionState(add, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      {state.status === 'done' && state.shownOnce && <NewLink link={state.shownOnce} />}
      <PersonFields failed={failed} />
      <div className="flex flex-wrap gap-2">
        <SubmitButton pendingLabel="Adding…">Add and make a link</SubmitButton>
        <LinkButton href="/people" variant="quiet">
          Back to people
        </LinkButton>
      </div>
    </form>
  );
}
