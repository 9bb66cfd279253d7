'use client';

import { useState } from 'react';
import { Card } from '@/components/ui/card';
import { ToneShape } from '@/components/ui/pill';
import { cellKey } from '@/lib/curve/grid-standards';
import { effectsOn, leftOutWords } from '@/lib/curve/left-out-words';
import { pointId, standardRows } from '@/lib/curve/standard-rows';
import { CurveFacts } from './curve-facts';
import { CurveJudgements } from './curve-judgements';
import { CurvePlots } from './curve-plots';
import { LeaveOutDialog, type LeaveOutAnswer } from './leave-out-dialog';
import { StandardsTable } from './standards-table';
import type { CurveFormState } from './use-curve-form';

interface Picked {
  readonly index: number;
  readonly reading: number | null;
}

const pickedOf = (id: string): Picked => {
  const [index = 0, reading = 0] = id.split('.').map(Number);
  return { index, reading };
};

/** Leave something out of the draft, or take it back, by where it stands in the grid. */
function withAnswer(form: CurveFormState, { index, reading, reason }: LeaveOutAnswer) {
  const source = form.spelled.sources[form.live.places[index] ?? -1];
  if (!source) return;
  const { rows, cells } = form.leftOut;
  const set = (all: Readonly<Record<string, string>>, key: string) => {
    const { [key]: _gone, ...others } = all;
    return reason === null ? others : { ...others, [key]: reason };
  };
  if (reading === null) return form.setLeftOut({ rows: set(rows, source.rowId), cells });
  const place = source.readings[reading];
  if (place) form.setLeftOut({ rows, cells: set(cells, cellKey(place.rowId, place.column)) });
}

/** What comes of the entries so far: figures, plots, table, judgement; and the way to leave a reading out. */
export function LivePanel({ form }: { form: CurveFormState }) {
  const [picked, setPicked] = useState<Picked | null>(null);
  const { live } = form;
  const curve = live.answer?.curve ?? null;
  const rows = standardRows(live.standards, curve);
  const row = picked ? rows[picked.index] : undefined;
  const effects = picked && live.request ? effectsOn(live.request, live.standards, picked.index) : [];
  const effectWords = (reading: number | null) => {
    const found = effects.find(({ replicate }) => replicate === (reading === null ? null : reading + 1));
    return found && curve ? leftOutWords(found, curve) : null;
  };
  return (
    <div className="grid gap-4.5">
      {!curve && (
        <Card title="The line">
          <p role="status" className="flex gap-2">
            <ToneShape tone={live.refused ? 'stop' : 'plain'} className="mt-1.5" />
            {live.sentence}
          </p>
        </Card>
      )}
      {curve && (
        <>
          <CurveFacts curve={curve} />
          <CurvePlots
            standards={live.standards}
            curve={curve}
            chosenPointId={picked ? pointId(picked.index, picked.reading ?? 0) : undefined}
            onPickPoint={(id) => setPicked(pickedOf(id))}
          />
        </>
      )}
      {rows.length > 0 && (
        <Card flush title="Standards, read back" aside="pick a point or a row to leave it out">
          <StandardsTable
            rows={rows}
            unit={form.calculation.unit}
            onLeaveOut={({ index }) => setPicked({ index, reading: null })}
          />
        </Card>
      )}
      {curve && <CurveJudgements curve={curve} />}
      {row && picked && (
        <LeaveOutDialog
          row={row}
          reading={picked.reading}
          effect={effectWords}
          onClose={() => setPicked(null)}
          onAnswer={(answer) => {
            withAnswer(form, answer);
            setPicked(null);
          }}
        />
      )}
    </div>
  );
}
