'use client';

import { useActionState, useState } from 'react';
import { WithoutStandardsNotice } from '@/components/batch/batch-notices';
import { Button, LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { exampleOfTexts } from '@/lib/absorptivity/example-reading';
import type { AbsorptivityTexts } from '@/lib/absorptivity/form-start';
import type { FailedForm, FormState } from '@/lib/form-state';
import {
  AbsorptivityNotes,
  AnalyteFields,
  PlaceFields,
  ReadingFields,
  ValueFields,
} from './absorptivity-fields';

interface Version {
  readonly id: string;
  readonly version: number;
}

/** Somebody saved a newer version since the form was opened: the two ways on. */
function NewerVersion({
  failed,
  folder,
  onTakeOver,
}: {
  failed?: FailedForm;
  folder: string;
  onTakeOver: (base: Version) => void;
}) {
  const id = failed?.fields.newerId?.[0];
  const version = Number(failed?.fields.newerVersion?.[0]);
  if (id === undefined) return null;
  return (
    <div className="flex flex-wrap gap-2">
      <LinkButton href={`${folder}/${id}`} target="_blank">
        Look at version {version}
      </LinkButton>
      <Button onClick={() => onTakeOver({ id, version })}>Save mine after it</Button>
    </div>
  );
}

/**
 * The form of a known absorptivity, new or a new version, with a sentence that follows every key and says what a
 * reading would mean. Entries live in this component, so that a refusal loses nothing.
 */
export function AbsorptivityForm({
  notebookId,
  saveKey,
  start,
  base,
  save,
}: {
  notebookId: string;
  /** made by the server with the page, so that sending the form twice saves once */
  saveKey: string;
  start: AbsorptivityTexts;
  /** the version this one is made from; none for a new one */
  base?: Version;
  save: (state: FormState, form: FormData) => Promise<FormState>;
}) {
  const [state, submit] = useActionState(save, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  const [texts, setTexts] = useState<AbsorptivityTexts>({ ...start, ...failed?.values });
  const [newest, setNewest] = useState<Version | null>(null);
  const after = newest ?? base;
  const fields = { texts, onTexts: setTexts, failed };
  return (
    <form action={submit} noValidate className="grid gap-4.5">
      <FormAlert state={state} />
      {failed?.fields.newerId?.[0] !== newest?.id && (
        <NewerVersion
          failed={failed}
          folder={`/notebooks/${notebookId}/absorptivities`}
          onTakeOver={setNewest}
        />
      )}
      <input type="hidden" name="notebookId" value={notebookId} />
      <input type="hidden" name="saveKey" value={saveKey} />
      <input type="hidden" name="baseId" value={after?.id ?? ''} />
      <Columns share="even">
        <div className="grid gap-4.5">
          <Card title="What is measured">
            <AnalyteFields {...fields} />
          </Card>
          <Card title="The absorptivity">
            <ValueFields {...fields} />
          </Card>
        </div>
        <div className="grid gap-4.5">
          <Card title="What a reading means">
            <p aria-live="polite" className="font-serif text-fact">
              {exampleOfTexts(texts)}
            </p>
          </Card>
          <Card flush title="Where it holds and is read">
            <PlaceFields {...fields} />
          </Card>
          <Card title="Cell and readings">
            <ReadingFields {...fields} />
          </Card>
          <Card title="Notes">
            <AbsorptivityNotes {...fields} isNewVersion={after !== undefined} />
          </Card>
        </div>
      </Columns>
      <WithoutStandardsNotice />
      <div className="flex flex-wrap items-center gap-3">
        <SubmitButton>
          {after ? `Save as version ${after.version + 1}` : 'Save this absorptivity'}
        </SubmitButton>
        <p className="text-sm text-ink-2">
          A saved absorptivity is not edited: a change makes a new version.
        </p>
      </div>
    </form>
  );
}
