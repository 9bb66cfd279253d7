'use client';

import { useActionState, useMemo, useState } from 'react';
import { LiveTable } from '@/components/batch/live-table';
import { useSpectrumReadings } from '@/components/batch/use-spectrum-readings';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { liveResults } from '@/lib/batch/live-results';
import { chosenSamples, liveSample, NOTHING_CHOSEN, sentSamples } from '@/lib/batch/spectrum-choice';
import { readingRuleWords } from '@/lib/curve/reading-rule-words';
import type { Yardstick } from '@/lib/batch/yardstick';
import type { BatchMethodView } from '@/lib/views/batch';
import type { SpectrumView } from '@/lib/views/spectrum';
import { addFromSpectra } from './actions';
import { ChosenSamplesCard } from './chosen-samples-card';
import { SpectrumPicker } from './spectrum-picker';

/** Samples made from spectra: chosen, put together by name, read by the method's rule, calculated at once. */
export function SpectrumSamplesForm({
  batchId,
  submissionKey,
  method,
  yardstick,
  spectra,
}: {
  batchId: string;
  submissionKey: string;
  method: BatchMethodView;
  yardstick: Yardstick;
  spectra: readonly SpectrumView[];
}) {
  const [state, submit] = useActionState(addFromSpectra, { status: 'idle' });
  const [choice, setChoice] = useState(NOTHING_CHOSEN);
  const byId = useMemo(() => new Map(spectra.map((spectrum) => [spectrum.id, spectrum])), [spectra]);
  const samples = useMemo(
    () => chosenSamples(choice, byId, method.pathLengthMm),
    [choice, byId, method.pathLengthMm],
  );
  const { read, error } = useSpectrumReadings(batchId, choice.spectrumIds);
  const live = useMemo(
    () =>
      liveResults(
        yardstick,
        samples.flatMap((sample) => liveSample(sample, read) ?? []),
      ),
    [yardstick, samples, read],
  );
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid gap-4.5">
      <FormAlert state={state} />
      <input type="hidden" name="batchId" value={batchId} />
      <input type="hidden" name="submissionKey" value={submissionKey} />
      <input type="hidden" name="samples" value={JSON.stringify(sentSamples(samples))} />
      <p className="text-ink-2">
        Every spectrum is read {readingRuleWords(method.readingRule)}, the rule of{' '}
        {yardstick.kind === 'curve' ? 'the curve' : 'the absorptivity'}.
      </p>
      <SpectrumPicker
        spectra={spectra}
        chosen={choice.spectrumIds}
        onChoose={(spectrumIds) => setChoice({ ...choice, spectrumIds })}
      />
      {error && (
        <p role="alert" className="text-red">
          {error.message}
        </p>
      )}
      <ChosenSamplesCard
        samples={samples}
        choice={choice}
        read={read}
        problemOf={(index, field) => failed?.fields[`samples.${index}.${field}`]?.[0]}
        onChange={setChoice}
      />
      <LiveTable results={live} method={method} origin="spectrum" />
      <div>
        <SubmitButton disabled={samples.length === 0}>
          {samples.length === 1 ? 'Save 1 sample' : `Save ${samples.length} samples`}
        </SubmitButton>
      </div>
    </form>
  );
}
