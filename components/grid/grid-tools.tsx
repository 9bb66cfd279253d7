'use client';

import { ClipboardPaste, Plus, Redo2, Undo2 } from 'lucide-react';
import { useState, type Dispatch } from 'react';
import { Button } from '@/components/ui/button';
import { pasteWords } from '@/lib/grid/grid-paste';
import type { GridAction, GridState } from '@/lib/grid/grid-state';

/** The line under a grid: what the cell at the cursor or the last paste has to say. */
export function GridStatus({
  id,
  state,
  sentence,
  dispatch,
}: {
  id: string;
  state: GridState;
  sentence?: string;
  dispatch: Dispatch<GridAction>;
}) {
  const { pasted } = state;
  return (
    <div className="flex min-h-6 flex-wrap items-center gap-x-3 gap-y-1 text-sm">
      <p id={id} role="status" className="text-ink-2">
        {sentence ?? (pasted ? `Pasted ${pasteWords(pasted)}.` : '')}
      </p>
      {pasted && pasted.asked > 0 && (
        <Button size="small" onClick={() => dispatch({ type: 'commasArePoints' })}>
          Read those commas as decimal marks
        </Button>
      )}
    </div>
  );
}

/** The same by hand or finger: paste, undo, redo and, where the grid can widen, one more column. */
export function GridTools({
  state,
  dispatch,
  addColumnLabel,
}: {
  state: GridState;
  dispatch: Dispatch<GridAction>;
  addColumnLabel?: string;
}) {
  const [refused, setRefused] = useState(false);
  async function paste() {
    try {
      // Browsers hand out the clipboard only over https or on this machine, and only when allowed to.
      dispatch({ type: 'paste', text: await navigator.clipboard.readText() });
      setRefused(false);
    } catch {
      setRefused(true);
    }
  }
  return (
    <div className="flex flex-wrap items-center gap-1.5">
      <Button size="small" onClick={paste}>
        <ClipboardPaste aria-hidden="true" className="size-3.5" /> Paste
      </Button>
      <Button
        size="small"
        variant="quiet"
        disabled={state.past.length === 0}
        onClick={() => dispatch({ type: 'undo' })}
      >
        <Undo2 aria-hidden="true" className="size-3.5" /> Undo
      </Button>
      <Button
        size="small"
        variant="quiet"
        disabled={state.future.length === 0}
        onClick={() => dispatch({ type: 'redo' })}
      >
        <Redo2 aria-hidden="true" className="size-3.5" /> Redo
      </Button>
      {addColumnLabel && (
        <Button size="small" variant="quiet" onClick={() => dispatch({ type: 'addColumn' })}>
          <Plus aria-hidden="true" className="size-3.5" /> {addColumnLabel}
        </Button>
      )}
      {refused && (
        <p role="alert" className="text-sm text-red">
          The browser keeps its clipboard closed to pages. Choose a cell and press Ctrl+V.
        </p>
      )}
    </div>
  );
}
