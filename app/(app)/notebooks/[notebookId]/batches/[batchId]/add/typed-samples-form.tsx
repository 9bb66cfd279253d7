'use client';

import { useActionState, useDeferredValue, useMemo, useState } from 'react';
import { LiveTable } from '@/components/batch/live-table';
import { ReadingsGrid } from '@/components/grid/readings-grid';
import { useGrid } from '@/components/grid/use-grid';
import { LightDisc } from '@/components/light-disc';
import { Card } from '@/components/ui/card';
import { FormAlert } from '@/components/ui/form-alert';
import { Select } from '@/components/ui/select';
import { SubmitButton } from '@/components/ui/submit-button';
import { liveResults } from '@/lib/batch/live-results';
import { discAbsorbance } from '@/lib/batch/reading-text';
import {
  checkRow,
  filledIn,
  readingsInUse,
  rowsAsTyped,
  sampleGrid,
  textsOf,
  withReadingCount,
} from '@/lib/batch/sample-grid';
import type { Yardstick } from '@/lib/batch/yardstick';
import type { Signal } from '@/lib/engine';
import { cellContent, type GridColumn } from '@/lib/grid/grid-cell';
import type { GridRow } from '@/lib/grid/grid-state';
import type { BatchMethodView } from '@/lib/views/batch';
import { addTyped } from './actions';

const READING_COUNTS = [1, 2, 3, 4, 5, 6, 8, 10];

interface TypedSamplesProps {
  batchId: string;
  submissionKey: string;
  method: BatchMethodView;
  yardstick: Yardstick;
}

function disc(signal: Signal) {
  return function DiscBefore(_row: GridRow, column: GridColumn, text: string) {
    const content = column.kind === 'reading' ? cellContent(column, text) : null;
    if (content?.state !== 'number') return null;
    return (
      <LightDisc absorbance={discAbsorbance({ value: content.value, gapText: null, signal })} size={14} />
    );
  };
}

/** The rows of the grid with what is wrong in them and what the engine makes of the rest. */
function useSamples(
  rows: readonly GridRow[],
  readingCount: number,
  { method, yardstick }: TypedSamplesProps,
) {
  const { signal, pathLengthMm } = method;
  const checked = useMemo(
    () => new Map(rows.map((row) => [row.id, checkRow(textsOf(row, readingCount), signal, pathLengthMm)])),
    [rows, readingCount, signal, pathLengthMm],
  );
  const settled = useDeferredValue(checked);
  const live = useMemo(
    () =>
      liveResults(
        yardstick,
        [...settled.values()].flatMap((row) => row.sample ?? []),
      ),
    [yardstick, settled],
  );
  return { checked, live };
}

/** Samples typed, or pasted from a spreadsheet, with their results while they are typed. */
export function TypedSamplesForm(props: TypedSamplesProps) {
  const { batchId, submissionKey, method } = props;
  const [state, submit] = useActionState(addTyped, { status: 'idle' });
  const [readingCount, setReadingCount] = useState(3);
  const spec = useMemo(
    () => sampleGrid(readingCount, method.signal, method.pathLengthMm),
    [readingCount, method.signal, method.pathLengthMm],
  );
  const [grid, dispatch] = useGrid(spec);
  const { rows: saved, draft, at } = grid;
  const rows = useMemo(() => rowsAsTyped({ rows: saved, draft, at }), [saved, draft, at]);
  const { checked, live } = useSamples(rows, readingCount, props);
  const refused = state.status === 'failed';
  const least = readingsInUse(rows, readingCount);

  function chooseReadingCount(count: number) {
    dispatch({ type: 'replace', rows: withReadingCount(rows, readingCount, count) });
    setReadingCount(count);
  }
  function problem(row: GridRow, column: GridColumn, index: number) {
    // what is merely missing is said once the person wanted to save
    const blank = (row.cells[index] ?? '').trim() === '';
    return blank && !refused ? undefined : checked.get(row.id)?.problems[column.key];
  }
  const sent = rows.map((row) => filledIn(textsOf(row, readingCount), method.pathLengthMm));
  return (
    <form action={submit} noValidate className="grid gap-4.5">
      <FormAlert state={state} />
      <input type="hidden" name="batchId" value={batchId} />
      <input type="hidden" name="submissionKey" value={submissionKey} />
      <input type="hidden" name="samples" value={JSON.stringify(sent)} />
      <Card
        title="Samples and readings"
        actions={
          <Select
            name="readingCount"
            label="Readings of each sample"
            value={String(readingCount)}
            onChange={(event) => chooseReadingCount(Number(event.target.value))}
            options={READING_COUNTS.map((count) => ({
              value: String(count),
              label: String(count),
              disabled: count < least,
            }))}
            className="grid-flow-col items-center"
          />
        }
      >
        <ReadingsGrid
          label="Samples and readings"
          spec={spec}
          state={grid}
          dispatch={dispatch}
          problem={problem}
          adorn={disc(method.signal)}
        />
        <p className="mt-3 text-sm text-ink-2">
          A dilution is written as volumes: <span className="num">10 in 100</span> (10 mL made up to 100 mL),{' '}
          <span className="num">10/100</span>, several steps as{' '}
          <span className="num">25 in 50, 10 in 100</span>, parts as <span className="num">1+9</span>. Empty
          means not diluted. Write OVER, or <span className="num">&gt;3.5</span>, where the instrument gave no
          number.
        </p>
      </Card>
      <LiveTable results={live} method={method} origin="typed" />
      <div>
        <SubmitButton>{saveLabel(rows.length)}</SubmitButton>
      </div>
    </form>
  );
}

const saveLabel = (count: number) =>
  count === 0 ? 'Save samples' : `Save ${count} ${count === 1 ? 'sample' : 'samples'}`;
