'use client';

import { useActionState, useState } from 'react';
import { choiceValue, YardstickSelect, type YardstickChoice } from '@/components/batch/yardstick-select';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import { LIMITS } from '@/lib/limits';
import { create } from './actions';

export function BatchForm({
  notebookId,
  submissionKey,
  choices,
  asked,
}: {
  notebookId: string;
  submissionKey: string;
  choices: readonly YardstickChoice[];
  /** the curve or absorptivity that the person came from, by its id */
  asked?: string;
}) {
  const [state, submit] = useActionState(create, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  const newest = choices.find((choice) => choice.status === 'saved') ?? choices[0];
  const first = choices.find((choice) => choice.id === asked) ?? newest;
  const [readOn, setReadOn] = useState(failed?.values.readOn ?? (first ? choiceValue(first) : ''));
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="notebookId" value={notebookId} />
      <input type="hidden" name="submissionKey" value={submissionKey} />
      <Field
        name="title"
        label="Title"
        hint="Which samples: “Tessel weirs, 12 July”"
        maxLength={LIMITS.title}
        failed={failed}
        autoFocus
      />
      <YardstickSelect choices={choices} value={readOn} onChange={setReadOn} failed={failed} />
      <TextArea name="note" label="Note" optional hint="Preparation, deviations, weather" failed={failed} />
      <div>
        <SubmitButton>Create batch</SubmitButton>
      </div>
    </form>
  );
}
