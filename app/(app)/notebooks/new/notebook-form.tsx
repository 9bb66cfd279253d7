'use client';

import { useActionState } from 'react';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { Select } from '@/components/ui/select';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import { LIMITS } from '@/lib/limits';
import type { PersonName } from '@/lib/views/notebook';
import { create } from './actions';

export function NotebookForm({ owners, ownerId }: { owners: readonly PersonName[]; ownerId: string }) {
  const [state, submit] = useActionState(create, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <Field
        name="title"
        label="Title"
        hint="What is measured, and in what: “Dissolved iron, Tessel weirs”"
        maxLength={LIMITS.title}
        failed={failed}
        autoFocus
      />
      <TextArea name="purpose" label="Purpose" optional hint="What the results are for" failed={failed} />
      <Select
        name="ownerId"
        label="Owner"
        hint="The PI who answers for the numbers and may share them"
        initial={ownerId}
        options={owners.map(({ id, name }) => ({ value: id, label: name }))}
        failed={failed}
      />
      <div>
        <SubmitButton>Create notebook</SubmitButton>
      </div>
    </form>
  );
}
