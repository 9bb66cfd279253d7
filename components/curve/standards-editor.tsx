'use client';

import type { ReactNode } from 'react';
import { ReadingsGrid } from '@/components/grid/readings-grid';
import { LightDisc } from '@/components/light-disc';
import { ReadingRuleForm } from '@/components/spectrum/reading-rule-form';
import { LinkButton } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { SegmentedControl } from '@/components/ui/radio-group';
import { cellIssues, SPECTRA_COLUMNS, TYPED_COLUMNS, type DraftIssues } from '@/lib/curve/draft-issues';
import { BLANK_WORD, cellKey, SPECTRUM_READING_COLUMN } from '@/lib/curve/grid-standards';
import type { Signal } from '@/lib/engine';
import { absorbanceOf } from '@/lib/engine/absorbance';
import { absorbanceText } from '@/lib/format/optical';
import { cellContent, type GridColumn } from '@/lib/grid/grid-cell';
import type { GridRow } from '@/lib/grid/grid-state';
import { spectrumRule } from '@/lib/schemas/spectrum-rule';
import type { SpectrumView } from '@/lib/views/spectrum';
import { SignalField } from './method-fields';
import { SpectraPicker } from './spectra-picker';
import { BlankAdvice, PathAdvice } from './standards-advice';
import type { CurveFormState } from './use-curve-form';

interface EditorProps {
  form: CurveFormState;
  issues: DraftIssues;
}

/** The disc of a typed reading, from the reading as it stands in its cell. */
function discOf(signal: Signal) {
  return function disc(_row: GridRow, column: GridColumn, text: string): ReactNode {
    if (column.kind !== 'reading') return null;
    const content = cellContent(column, text);
    if (content.state === 'gap') return <LightDisc absorbance={null} size={13} silent />;
    if (content.state !== 'number') return null;
    return <LightDisc absorbance={absorbanceOf(content.value, signal).value} size={13} silent />;
  };
}

function TypedStandards({ form, issues }: EditorProps) {
  const { typed, rule, setRule, calculation, setCalculation, leftOut, spelled } = form;
  const cells = cellIssues(issues, spelled, TYPED_COLUMNS);
  return (
    <div className="grid gap-3">
      <div className="grid grid-cols-1 items-start gap-3 sm:grid-cols-2">
        <Field
          name="rule.at"
          label="Wavelength"
          unit="nm"
          inputMode="decimal"
          value={rule.at}
          error={issues['rule.at']}
          onChange={(event) => setRule({ ...rule, at: event.currentTarget.value })}
        />
        <SignalField calculation={calculation} onCalculation={setCalculation} issues={issues} />
      </div>
      <BlankAdvice form={form} />
      {issues.standards && <p className="text-sm text-red">▲ {issues.standards}</p>}
      <ReadingsGrid
        label="Standards and their readings"
        spec={typed.spec}
        state={typed.state}
        dispatch={typed.dispatch}
        addColumnLabel="One more reading"
        adorn={discOf(calculation.signal)}
        problem={(row, _column, index) => cells[cellKey(row.id, index)]}
        leftOut={(row, _column, index) =>
          index < TYPED_COLUMNS.firstReading && index > 0
            ? undefined
            : (leftOut.rows[row.id] ?? leftOut.cells[cellKey(row.id, index)])
        }
      />
      <p className="text-sm text-ink-2">
        One row a standard. Write <b className="font-medium">{BLANK_WORD}</b> as the concentration of a blank,
        and what the instrument showed, such as OVER or &gt;3.5, where there is no number.
      </p>
    </div>
  );
}

/** A number of the row of a grid whose rows are given. */
const rowIndex = (row: GridRow) => Number(row.id.slice(1));

function RuleFields({ form, issues }: EditorProps) {
  const { rule, setRule } = form;
  const parsed = spectrumRule.safeParse(rule);
  const errors = Object.fromEntries(
    Object.entries(issues).flatMap(([path, message]) =>
      path.startsWith('rule.') ? [[path.slice(5), message]] : [],
    ),
  );
  return (
    <div className="-mx-4">
      <ReadingRuleForm
        state={{ texts: rule, rule: parsed.data ?? null, errors, untouched: false }}
        onChange={setRule}
      />
    </div>
  );
}

function SpectraGrid({ form, issues }: EditorProps) {
  const { fromSpectra, spectrumIds, readings, leftOut, spelled } = form;
  const cells = cellIssues(issues, spelled, SPECTRA_COLUMNS);
  const idOf = (row: GridRow) => spectrumIds[rowIndex(row)] ?? '';
  const readOf = (row: GridRow) => readings.spectra.get(idOf(row));
  const firstOf = new Map(
    spelled.sources.flatMap(({ rowId, readings: all }) => all.map((r) => [r.rowId, rowId])),
  );
  return (
    <ReadingsGrid
      label="Spectra of the standards"
      spec={fromSpectra.spec}
      state={fromSpectra.state}
      dispatch={fromSpectra.dispatch}
      shown={(row, column) => {
        if (column.key !== 'reading') return undefined;
        const read = readOf(row);
        if (!read) return '…';
        if (read.value === null) return read.gapText ?? 'not read';
        return read.minusValue === null
          ? absorbanceText(read.value)
          : `${absorbanceText(read.mainValue ?? read.value)} − ${absorbanceText(read.minusValue)}`;
      }}
      adorn={(row, column) =>
        column.key === 'reading' && readOf(row) ? (
          <LightDisc absorbance={readOf(row)?.mainValue ?? readOf(row)?.value ?? null} size={13} silent />
        ) : null
      }
      problem={(row, column, index) =>
        (column.key === 'reading' ? readOf(row)?.error : undefined) ?? cells[cellKey(idOf(row), index)]
      }
      leftOut={(row, column) =>
        column.key === 'reading'
          ? (leftOut.rows[firstOf.get(idOf(row)) ?? ''] ??
            leftOut.cells[cellKey(idOf(row), SPECTRUM_READING_COLUMN)])
          : undefined
      }
    />
  );
}

function SpectraStandards({
  form,
  issues,
  spectra,
  uploadHref,
}: EditorProps & { spectra: readonly SpectrumView[]; uploadHref: string }) {
  if (spectra.length === 0)
    return (
      <Notice action={<LinkButton href={uploadHref}>Upload spectra</LinkButton>}>
        This notebook has no spectra yet. Upload them first, or type the readings.
      </Notice>
    );
  return (
    <div className="grid gap-3">
      <RuleFields form={form} issues={issues} />
      {form.readings.failure && (
        <Notice tone="stop" title="The spectra could not be read">
          {form.readings.failure}
        </Notice>
      )}
      <PathAdvice form={form} />
      <BlankAdvice form={form} />
      {issues.standards && <p className="text-sm text-red">▲ {issues.standards}</p>}
      <div>
        <SpectraPicker spectra={spectra} chosen={form.spectrumIds} onChange={form.chooseSpectra} />
      </div>
      {form.spectrumIds.length > 0 && <SpectraGrid form={form} issues={issues} />}
      <p className="text-sm text-ink-2">
        Spectra with the same standard and concentration are its readings. Write{' '}
        <b className="font-medium">{BLANK_WORD}</b> as the concentration of a blank.
      </p>
    </div>
  );
}

/** Standards and their readings: typed or pasted, or read off spectra of the notebook. */
export function StandardsEditor(
  props: EditorProps & { spectra: readonly SpectrumView[]; uploadHref: string },
) {
  const { form } = props;
  return (
    <div className="grid gap-3.5">
      <SegmentedControl
        name="source"
        label="Readings"
        hideLabel
        choices={[
          { value: 'typed', label: 'Typed or pasted' },
          { value: 'spectra', label: 'From spectra' },
        ]}
        value={form.source}
        onChange={(value) => form.setSource(value === 'spectra' ? 'spectra' : 'typed')}
      />
      {form.source === 'typed' ? <TypedStandards {...props} /> : <SpectraStandards {...props} />}
    </div>
  );
}
