'use client';

import { useActionState } from 'react';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import { LIMITS } from '@/lib/limits';
import type { NotebookView } from '@/lib/views/notebook';
import { archive, change } from './actions';

export function NotebookForm({ notebook }: { notebook: NotebookView }) {
  const [state, submit] = useActionState(change, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="id" value={notebook.id} />
      <input type="hidden" name="version" value={notebook.version} />
      <Field name="title" label="Title" initial={notebook.title} maxLength={LIMITS.title} failed={failed} />
      <TextArea name="purpose" label="Purpose" optional initial={notebook.purpose} failed={failed} />
      <div>
        <SubmitButton>Save</SubmitButton>
      </div>
    </form>
  );
}

export function ArchiveForm({ notebook }: { notebook: NotebookView }) {
  const [state, submit] = useActionState(archive, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="id" value={notebook.id} />
      <input type="hidden" name="archive" value={notebook.archived ? 'no' : 'yes'} />
      <p className="text-ink-2">
        {notebook.archived
          ? 'Work can go on in it again. Everything that is in it stayed.'
          : 'An archived notebook stays readable, with everything in it, and takes no change.'}
      </p>
      <Field name="reason" label="Reason" maxLength={LIMITS.reason} failed={failed} />
      <div>
        <SubmitButton variant="secondary">
          {notebook.archived ? 'Take it out of the archive' : 'Archive this notebook'}
        </SubmitButton>
      </div>
    </form>
  );
}
