'use client';

import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import type { GridColumn } from '@/lib/grid/grid-cell';

/** What a cell looks like beside its text. */
export interface CellLook {
  readonly text: string;
  readonly problem?: string;
  /** A reading without a number: allowed, and marked. */
  readonly gap: boolean;
  readonly leftOut?: string;
  readonly adornment?: ReactNode;
}

/* Refs that never change run once, when typing starts; later the caret is the person's own. */
function focusAndSelect(input: HTMLInputElement | null) {
  input?.select();
}
function focusAtEnd(input: HTMLInputElement | null) {
  input?.focus();
  input?.setSelectionRange(input.value.length, input.value.length);
}

function CellInput({
  column,
  label,
  draft,
  amending,
  onType,
  onLeave,
}: {
  column: GridColumn;
  label: string;
  draft: string;
  amending: boolean;
  onType: (text: string) => void;
  onLeave: () => void;
}) {
  return (
    <input
      ref={amending ? focusAndSelect : focusAtEnd}
      aria-label={label}
      value={draft}
      inputMode={column.kind === 'decimal' && !column.words ? 'decimal' : 'text'}
      autoComplete="off"
      spellCheck={false}
      onChange={(event) => onType(event.target.value)}
      onBlur={onLeave}
      className={classNames(
        'absolute inset-0 z-10 w-full bg-sheet px-2 outline-2 -outline-offset-2 outline-uv',
        column.kind === 'text' ? 'text-left' : 'num text-right',
      )}
    />
  );
}

function cellName(column: GridColumn, row: number, look: CellLook): string {
  const unit = column.unit ? ` in ${column.unit}` : '';
  const words = [`${column.label}${unit}, row ${row + 1}: ${look.text.trim() || 'empty'}`];
  if (look.leftOut) words.push(`left out, ${look.leftOut}`);
  return words.join('; ');
}

/** One cell. Only the active one can be reached with Tab; the grid above handles its keys. */
export function GridCell({
  column,
  row,
  index,
  look,
  active,
  selected,
  typing,
  describedBy,
  onType,
  onLeave,
}: {
  column: GridColumn;
  row: number;
  index: number;
  look: CellLook;
  active: boolean;
  selected: boolean;
  typing: { draft: string; amending: boolean } | null;
  describedBy?: string;
  onType: (text: string) => void;
  onLeave: () => void;
}) {
  return (
    <td
      role="gridcell"
      data-cell={`${row}:${index}`}
      tabIndex={active ? 0 : -1}
      aria-label={typing ? undefined : cellName(column, row, look)}
      aria-selected={selected}
      aria-readonly={column.readOnly || undefined}
      aria-invalid={look.problem ? true : undefined}
      aria-describedby={describedBy}
      className={classNames(
        'relative h-8.25 cursor-cell border-r border-b px-2 whitespace-nowrap select-none focus-visible:outline-2',
        'focus-visible:-outline-offset-2 first:sticky first:left-0 first:z-[5] first:bg-sheet',
        column.kind === 'text' ? 'max-w-48 overflow-hidden text-left text-ellipsis' : 'num text-right',
        selected && 'bg-uv-wash! focus:outline-2 focus:outline-uv',
        column.readOnly && 'text-ink-2',
        look.problem && 'bg-red-wash text-red',
        look.gap && 'text-amber italic',
        look.leftOut && 'text-ink-2 line-through',
      )}
    >
      <span className={classNames('flex items-center gap-1.5', column.kind !== 'text' && 'justify-end')}>
        {look.adornment}
        {look.problem && (
          <span aria-hidden="true" className="text-[0.6rem]">
            ▲
          </span>
        )}
        <span className="min-w-0 truncate">{look.text}</span>
      </span>
      {typing && (
        <CellInput
          column={column}
          label={`${column.label}, row ${row + 1}`}
          draft={typing.draft}
          amending={typing.amending}
          onType={onType}
          onLeave={onLeave}
        />
      )}
    </td>
  );
}
