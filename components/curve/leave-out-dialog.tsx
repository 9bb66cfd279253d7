'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { RadioGroup } from '@/components/ui/radio-group';
import type { StandardRowView } from '@/lib/curve/standard-rows';
import { absorbanceText } from '@/lib/format/optical';
import { LIMITS } from '@/lib/limits';

/** What is to be left out or taken back: a standard, or one of its readings by place. */
export interface LeaveOutAnswer {
  readonly index: number;
  readonly reading: number | null;
  /** Null takes it back into the fit. */
  readonly reason: string | null;
}

const WHOLE = 'whole';

function readingLabel(row: StandardRowView, at: number): string {
  const cell = row.readings[at];
  const value =
    cell === undefined || cell.absorbanceAsRead === null
      ? (cell?.gapText ?? '')
      : absorbanceText(cell.absorbanceAsRead);
  return `Reading ${at + 1}: ${value}${cell?.leftOutBecause ? `, left out: ${cell.leftOutBecause}` : ''}`;
}

/**
 * Asks why a standard or a reading is left out of the fit. It stays visible with the reason, and the range of
 * the curve shrinks to what is left.
 */
export function LeaveOutDialog({
  row,
  reading,
  effect,
  onAnswer,
  onClose,
}: {
  row: StandardRowView;
  /** The reading that was picked; null when the standard was. */
  reading: number | null;
  /** What leaving out the standard (null) or one of its readings would change, in words. */
  effect: (reading: number | null) => string | null;
  onAnswer: (answer: LeaveOutAnswer) => void;
  onClose: () => void;
}) {
  const [target, setTarget] = useState(reading === null ? WHOLE : String(reading));
  const [reason, setReason] = useState('');
  const [asked, setAsked] = useState(false);
  const at = target === WHOLE ? null : Number(target);
  const already = at === null ? row.leftOutBecause : (row.readings[at]?.leftOutBecause ?? null);
  const said = effect(at);
  const answer = (why: string | null) => onAnswer({ index: row.index, reading: at, reason: why });
  const choices = [
    { value: WHOLE, label: `The whole of ${row.name}, ${row.readings.length} readings` },
    ...row.readings.map((_, index) => ({ value: String(index), label: readingLabel(row, index) })),
  ];
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Leave out of the fit: ${row.name}`}
      description="What is left out stays on the page with its reason, and the curve covers only what is left."
    >
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          event.stopPropagation();
          setAsked(true);
          if (reason.trim() !== '') answer(reason.trim());
        }}
      >
        <RadioGroup
          name="leave-out-target"
          label="What"
          choices={choices}
          value={target}
          onChange={setTarget}
        />
        {!already && said !== null && (
          <p role="status" className="rounded-control bg-raised px-3 py-2 text-sm">
            {said}
          </p>
        )}
        <Field
          name="leave-out-reason"
          label="Why"
          hint="What you know about it, such as: flask overfilled, bubble in the cell. A large residual alone is no reason."
          maxLength={LIMITS.reason}
          value={reason}
          error={asked && reason.trim() === '' ? 'Say why it is left out' : undefined}
          onChange={(event) => setReason(event.currentTarget.value)}
        />
        <div className="flex flex-wrap gap-2">
          <Button variant="primary" type="submit">
            Leave it out
          </Button>
          {already && <Button onClick={() => answer(null)}>Take it back into the fit</Button>}
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
