'use client';

import { useState } from 'react';
import { ReasonDialog } from '@/components/batch/reason-dialog';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { dilutionText } from '@/lib/batch/dilution-text';
import { parseDilution } from '@/lib/batch/parse-dilution';
import type { FailedForm } from '@/lib/form-state';
import { LIMITS } from '@/lib/limits';
import type { DeterminationReadingView, DeterminationView } from '@/lib/views/determination';
import { change, correct, declareVoid } from './actions';

/** Put a new reading in the place of one. */
export function CorrectReading({
  determination: { id, version },
  reading,
  shown,
  symbol,
}: {
  determination: Pick<DeterminationView, 'id' | 'version'>;
  reading: Pick<DeterminationReadingView, 'id' | 'position'>;
  /** the reading as it stands, as text */
  shown: string;
  symbol: string;
}) {
  return (
    <ReasonDialog
      title={`Correct reading ${reading.position}`}
      description={`It stands at ${shown}. The new reading takes its place; the old one stays visible.`}
      trigger={
        <Button type="button" size="small" variant="quiet" aria-label={`Correct reading ${reading.position}`}>
          Correct
        </Button>
      }
      action={correct}
      hidden={{ determinationId: id, readingId: reading.id, version }}
      submitLabel="Save correction"
    >
      {(failed) => (
        <Field
          name="reading"
          label={`New reading, ${symbol}`}
          inputMode="decimal"
          failed={failed}
          autoFocus
        />
      )}
    </ReasonDialog>
  );
}

function DilutionField({ initial, failed }: { initial: string; failed?: FailedForm }) {
  const [text, setText] = useState(failed?.values.dilution ?? initial);
  const parsed = parseDilution(text);
  return (
    <Field
      name="dilution"
      label="Dilution"
      optional
      value={text}
      onChange={(event) => setText(event.target.value)}
      failed={failed}
      error={parsed.ok ? undefined : parsed.message}
      hint={parsed.ok ? parsed.sentence : undefined}
    />
  );
}

/** Change name, path length or dilution. */
export function ChangeConditions({
  determination,
}: {
  determination: Pick<
    DeterminationView,
    'id' | 'version' | 'sample' | 'pathLengthMm' | 'pathLengthUMm' | 'dilution'
  >;
}) {
  const { id, version, sample, pathLengthMm, pathLengthUMm, dilution } = determination;
  return (
    <ReasonDialog
      title="Change sample, path length or dilution"
      description="The result is calculated again from the readings as they stand."
      trigger={<Button type="button">Change path or dilution</Button>}
      action={change}
      hidden={{ determinationId: id, version }}
      submitLabel="Save change"
    >
      {(failed) => (
        <>
          <Field name="sample" label="Sample" initial={sample} maxLength={LIMITS.name} failed={failed} />
          <Field
            name="pathLengthMm"
            label="Path length"
            unit="mm"
            inputMode="decimal"
            initial={String(pathLengthMm)}
            failed={failed}
          />
          <Field
            name="pathLengthUMm"
            label="u of the path length"
            unit="mm"
            inputMode="decimal"
            optional
            hint="Standard uncertainty, when it is not the cell of the standards"
            initial={pathLengthUMm === null ? '' : String(pathLengthUMm)}
            failed={failed}
          />
          <DilutionField initial={dilutionText(dilution)} failed={failed} />
        </>
      )}
    </ReasonDialog>
  );
}

/** Declare the determination void. */
export function VoidDetermination({
  id,
  version,
  sample,
}: Pick<DeterminationView, 'id' | 'version' | 'sample'>) {
  return (
    <ReasonDialog
      title="Declare this determination void"
      description={`“${sample}” stays to be seen with its readings and leaves every count, copy and file.`}
      trigger={
        <Button type="button" variant="quiet">
          Declare void
        </Button>
      }
      action={declareVoid}
      hidden={{ determinationId: id, version }}
      submitLabel="Declare void"
      danger
    />
  );
}
