'use client';

import { useState } from 'react';
import { ReadingMark } from '@/components/batch/reading-mark';
import { Card } from '@/components/ui/card';
import { Field } from '@/components/ui/field';
import { parseDilution } from '@/lib/batch/parse-dilution';
import { sampleOfSpectrum, type ChosenSample, type SpectrumChoice } from '@/lib/batch/spectrum-choice';
import type { SpectrumPreview } from '@/lib/views/determination';
import type { SpectrumView } from '@/lib/views/spectrum';

type Change = (choice: SpectrumChoice) => void;

/** Takes effect when the field is left: while it is typed the spectrum would wander between samples. */
function SampleName({
  spectrum,
  name,
  onName,
}: {
  spectrum: SpectrumView;
  name: string;
  onName: (name: string) => void;
}) {
  const [draft, setDraft] = useState(name);
  return (
    <Field
      name={`sampleOf ${spectrum.id}`}
      label={`Sample of ${spectrum.name}`}
      hideLabel
      value={draft}
      onChange={(event) => setDraft(event.target.value)}
      onBlur={() => onName(draft.trim())}
      onKeyDown={(event) => {
        if (event.key !== 'Enter') return;
        event.preventDefault();
        onName(draft.trim());
      }}
      className="w-40"
    />
  );
}

function Member({
  spectrum,
  choice,
  preview,
  onChange,
}: {
  spectrum: SpectrumView;
  choice: SpectrumChoice;
  preview: SpectrumPreview | undefined;
  onChange: Change;
}) {
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-1">
      <SampleName
        key={sampleOfSpectrum(choice, spectrum)}
        spectrum={spectrum}
        name={sampleOfSpectrum(choice, spectrum)}
        onName={(name) => onChange({ ...choice, sampleOf: { ...choice.sampleOf, [spectrum.id]: name } })}
      />
      <span className="text-ink-2">{spectrum.name}</span>
      {preview?.error && <span className="text-red">{preview.error}</span>}
      {preview && preview.error === null && (
        <>
          <ReadingMark reading={{ ...preview, signal: 'absorbance' }} origin="spectrum" />
          {preview.atNm !== null && <span className="text-sm text-ink-2">at {preview.atNm} nm</span>}
        </>
      )}
    </li>
  );
}

/** The chosen spectra by sample: replicates stand together, and their names say to which sample they belong. */
export function ChosenSamplesCard({
  samples,
  choice,
  read,
  problemOf,
  onChange,
}: {
  samples: readonly ChosenSample[];
  choice: SpectrumChoice;
  read: ReadonlyMap<string, SpectrumPreview>;
  problemOf: (index: number, field: 'sample' | 'dilution' | 'pathLengthMm') => string | undefined;
  onChange: Change;
}) {
  if (samples.length === 0) return null;
  return (
    <Card flush title="Samples" aside="spectra of one sample name are its replicates">
      <ul className="divide-y">
        {samples.map((sample, index) => {
          const dilution = parseDilution(sample.dilution);
          return (
            <li
              key={sample.spectra[0]?.id}
              className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3 p-4"
            >
              <ul
                className="grid gap-1.5"
                aria-label={`Spectra of ${sample.sample || 'a sample without a name'}`}
              >
                {sample.spectra.map((spectrum) => (
                  <Member
                    key={spectrum.id}
                    spectrum={spectrum}
                    choice={choice}
                    preview={read.get(spectrum.id)}
                    onChange={onChange}
                  />
                ))}
                {problemOf(index, 'sample') && (
                  <li className="text-sm text-red">{problemOf(index, 'sample')}</li>
                )}
              </ul>
              <div className="flex flex-wrap gap-3">
                <Field
                  name={`dilution ${sample.sample}`}
                  label={`Dilution of ${sample.sample}`}
                  optional
                  value={sample.dilution}
                  onChange={(event) =>
                    onChange({
                      ...choice,
                      dilutionOf: { ...choice.dilutionOf, [sample.sample]: event.target.value },
                    })
                  }
                  error={dilution.ok ? undefined : dilution.message}
                  hint={dilution.ok ? dilution.sentence : undefined}
                  className="w-64"
                />
                <Field
                  name={`pathLengthMm ${sample.sample}`}
                  label="Path length"
                  unit="mm"
                  inputMode="decimal"
                  value={sample.pathLengthMm}
                  onChange={(event) =>
                    onChange({
                      ...choice,
                      pathLengthOf: { ...choice.pathLengthOf, [sample.sample]: event.target.value },
                    })
                  }
                  error={problemOf(index, 'pathLengthMm')}
                  className="w-32"
                />
              </div>
            </li>
          );
        })}
      </ul>
    </Card>
  );
}
