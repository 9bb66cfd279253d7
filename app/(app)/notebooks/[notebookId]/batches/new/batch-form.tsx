'use client';

import { useActionState, useState } from 'react';
import { CurveSelect } from '@/components/batch/curve-select';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import { LIMITS } from '@/lib/limits';
import type { CurveSummary } from '@/lib/views/curve';
import { create } from './actions';

export function BatchForm({
  notebookId,
  submissionKey,
  curves,
  asked,
}: {
  notebookId: string;
  submissionKey: string;
  curves: readonly CurveSummary[];
  /** the curve that the person came from */
  asked?: string;
}) {
  const [state, submit] = useActionState(create, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  const newest = curves.find((curve) => curve.status === 'saved') ?? curves[0];
  const [curveId, setCurveId] = useState(curves.find((curve) => curve.id === asked)?.id ?? newest?.id ?? '');
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
      <CurveSelect curves={curves} value={curveId} onChange={setCurveId} failed={failed} />
      <TextArea name="note" label="Note" optional hint="Preparation, deviations, weather" failed={failed} />
      <div>
        <SubmitButton>Create batch</SubmitButton>
      </div>
    </form>
  );
}
