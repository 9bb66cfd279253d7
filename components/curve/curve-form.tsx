'use client';

import { useActionState, useEffect, useRef, useState, type FormEvent } from 'react';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { Notice } from '@/components/ui/notice';
import { SubmitButton } from '@/components/ui/submit-button';
import { draftIssues, issuesOfAnswer, type DraftIssues } from '@/lib/curve/draft-issues';
import type { FormStart } from '@/lib/curve/form-start';
import type { FailedForm, FormState } from '@/lib/form-state';
import type { SpectrumView } from '@/lib/views/spectrum';
import { LivePanel } from './live-panel';
import { AboutFields, FitFields, NoteFields } from './method-fields';
import { StandardsEditor } from './standards-editor';
import { useCurveForm, type CurveFormState } from './use-curve-form';

export interface CurveFormProps {
  notebookId: string;
  /** Made by the server with the page, so that sending the form twice saves once. */
  saveKey: string;
  start: FormStart;
  /** The version this one is made from; none for a new curve. */
  base?: { readonly id: string; readonly version: number };
  spectra: readonly SpectrumView[];
  save: (state: FormState, form: FormData) => Promise<FormState>;
}

/** Somebody saved a newer version since the form was opened: who and when, and the two ways on. */
function NewerVersion({
  failed,
  notebookId,
  onTakeOver,
}: {
  failed: FailedForm;
  notebookId: string;
  onTakeOver: (base: { id: string; version: number }) => void;
}) {
  const id = failed.fields.newerId?.[0];
  const version = Number(failed.fields.newerVersion?.[0]);
  if (id === undefined) return null;
  return (
    <div role="alert">
      <Notice
        tone="decide"
        title={failed.message}
        action={
          <div className="flex flex-wrap gap-2">
            <LinkButton href={`/notebooks/${notebookId}/curves/${id}`} target="_blank">
              Look at version {version}
            </LinkButton>
            <button type="button" className="text-uv underline" onClick={() => onTakeOver({ id, version })}>
              Save mine after it
            </button>
          </div>
        }
      >
        Look at it in another tab. “Save mine after it” makes yours the version that follows; theirs stays
        too.
      </Notice>
    </div>
  );
}

/** Why the form cannot be sent yet, and what the server said when it was. */
function blockedBy(form: CurveFormState, issues: DraftIssues, live = form.live): string | null {
  const count = Object.keys(issues).length;
  if (count > 0)
    return `${count === 1 ? 'One entry needs' : `${count} entries need`} another look: each says why at its place`;
  if (form.source === 'spectra' && form.readings.loading) return 'The spectra are still being read';
  return live.answer ? null : live.sentence;
}

/** Before the form was sent, only what has a usual value and was made wrong speaks up; the rest may yet come. */
const whileTyping = (issues: DraftIssues): DraftIssues =>
  Object.fromEntries(Object.entries(issues).filter(([path]) => path.startsWith('calculation.')));

function useSaving({ notebookId, start, base, spectra, save }: CurveFormProps) {
  const form = useCurveForm(notebookId, start, spectra);
  const [answer, send] = useActionState(save, { status: 'idle' });
  const [onTopOf, setOnTopOf] = useState<{ id: string; version: number } | null>(null);
  const [tried, setTried] = useState(false);
  const element = useRef<HTMLFormElement>(null);
  const failed = answer.status === 'failed' ? answer : undefined;
  const own = draftIssues(form.draft);
  const issues = tried ? { ...(failed ? issuesOfAnswer(failed.fields) : {}), ...own } : whileTyping(own);
  const blocked = blockedBy(form, own);

  function onSubmit(event: FormEvent) {
    setTried(true);
    if (blockedBy(form, own, form.liveNow()) !== null) event.preventDefault();
  }
  // once the sentences stand at their fields, the keyboard is taken to the first of them
  useEffect(() => {
    if (tried) element.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [tried, failed]);
  return {
    form,
    failed,
    send,
    issues,
    element,
    onSubmit,
    onTopOf,
    setOnTopOf,
    tried,
    blocked,
    base: onTopOf ?? base,
  };
}

/**
 * The form of a curve, new or a new version, with its result beside it. Entries live in this component alone,
 * so that a refusal, a conflict or a slow answer loses nothing.
 */
export function CurveForm(props: CurveFormProps) {
  const { form, failed, send, issues, element, onSubmit, ...saving } = useSaving(props);
  const { notebookId, saveKey, spectra } = props;
  const shared = { calculation: form.calculation, onCalculation: form.setCalculation, issues };
  const about = { about: form.about, onAbout: form.setAbout, issues };
  const version = saving.base ? saving.base.version + 1 : 1;
  const conflict = failed?.fields.newerId !== undefined && saving.onTopOf === null;
  return (
    <form ref={element} action={send} onSubmit={onSubmit} noValidate>
      <input type="hidden" name="notebookId" value={notebookId} />
      <input type="hidden" name="saveKey" value={saveKey} />
      <input type="hidden" name="baseId" value={saving.base?.id ?? ''} />
      <input type="hidden" name="draft" value={JSON.stringify(form.draft)} />
      <Columns share="even">
        <div className="grid gap-4.5">
          {conflict && (
            <NewerVersion failed={failed} notebookId={notebookId} onTakeOver={saving.setOnTopOf} />
          )}
          <Card title="What is measured">
            <AboutFields {...about} {...shared} />
          </Card>
          <Card title="Standards">
            <StandardsEditor
              form={form}
              issues={issues}
              spectra={spectra}
              uploadHref={`/notebooks/${notebookId}/spectra`}
            />
          </Card>
          <Card title="Blank and fit">
            <FitFields {...shared} />
          </Card>
          <Card title="Notes">
            <NoteFields {...about} isNewVersion={saving.base !== undefined} />
          </Card>
          <div className="grid gap-2">
            {saving.tried && saving.blocked !== null && (
              <p role="alert" className="text-red">
                ▲ {saving.blocked}
              </p>
            )}
            {failed && !conflict && failed.fields.newerId === undefined && saving.blocked === null && (
              <p role="alert" className="text-red">
                ▲ {failed.message}
              </p>
            )}
            <div className="flex flex-wrap items-center gap-3">
              <SubmitButton disabled={conflict}>
                {saving.base ? `Save as version ${version}` : 'Save this curve'}
              </SubmitButton>
              <p className="text-sm text-ink-2">
                A saved curve is not edited: a change makes a new version. The numbers are calculated again
                when it is saved.
              </p>
            </div>
          </div>
        </div>
        <section aria-label="Result so far" className="min-w-0 xl:sticky xl:top-4">
          <LivePanel form={form} />
        </section>
      </Columns>
    </form>
  );
}
