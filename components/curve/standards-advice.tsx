'use client';

import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { TYPED_COLUMNS } from '@/lib/curve/draft-issues';
import { BLANK_WORD, looksLikeBlank } from '@/lib/curve/grid-standards';
import type { CurveFormState } from './use-curve-form';

/* What a person is told about their standards before the calculation has to refuse or to flag them. */

/** Says what a row that is a blank needs, before the calculation has to refuse it. */
export function BlankAdvice({ form }: { form: CurveFormState }) {
  const { calculation, spelled, typed, source } = form;
  const ruleIsNone = calculation.blankRule === 'none';
  const hasBlank = spelled.standards.some(({ role }) => role === 'blank');
  if (ruleIsNone && hasBlank)
    return (
      <Notice tone="decide">
        The blank takes no part while the blank rule is “none”. Choose below what is done with it.
      </Notice>
    );
  const column = typed.spec.columns[TYPED_COLUMNS.concentration];
  const at = typed.state.rows.findIndex(
    ({ cells }) => column && looksLikeBlank(cells[0] ?? '', cells[1] ?? '', column),
  );
  if (source !== 'typed' || ruleIsNone || hasBlank || at < 0) return null;
  const setCell = {
    type: 'setCell',
    row: at,
    column: TYPED_COLUMNS.concentration,
    text: BLANK_WORD,
  } as const;
  return (
    <Notice
      action={
        <Button size="small" onClick={() => typed.dispatch(setCell)}>
          Use it as the blank
        </Button>
      }
    >
      Row {at + 1} is named like a blank and stands among the standards as zero.
    </Notice>
  );
}

/** What a file says of its path against what the method says; the method decides, and the person is told. */
export function PathAdvice({ form }: { form: CurveFormState }) {
  const { readings, spectrumIds, calculation } = form;
  const own = Number(calculation.pathLengthMm.replace(',', '.'));
  const other = spectrumIds.flatMap((id) => {
    const read = readings.spectra.get(id);
    if (!read || read.pathLengthMm === null || read.pathLengthMm === own) return [];
    return [read];
  });
  const [first] = other;
  if (!first) return null;
  return (
    <Notice tone="decide">
      The file of {first.name} states a path of {first.pathLengthMm} mm
      {other.length > 1 && `, and ${other.length - 1} more state another than the method`}; the method says{' '}
      {calculation.pathLengthMm} mm. The method counts: correct the one that is wrong.
    </Notice>
  );
}
