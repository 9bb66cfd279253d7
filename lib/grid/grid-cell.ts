import { typedReading } from '@/lib/batch/typed-reading';
import { parseDecimal } from '@/lib/schemas/decimal';

/** text: anything. decimal: a number. reading: a number, or what the instrument showed instead of one. */
export type GridKind = 'text' | 'decimal' | 'reading';

export interface GridColumn {
  readonly key: string;
  readonly label: string;
  readonly unit?: string;
  readonly kind: GridKind;
  /** A CSS width; 6.5rem unless said. */
  readonly width?: string;
  /** Shown and copied, never changed. */
  readonly readOnly?: boolean;
  /** Words that a decimal column takes beside numbers, in lower case, such as "blank". */
  readonly words?: readonly string[];
}

export type CellContent =
  | { readonly state: 'blank' }
  | { readonly state: 'text'; readonly text: string }
  | { readonly state: 'number'; readonly value: number }
  /** A reading without a number: kept as it came, with what to say about it. */
  | { readonly state: 'gap'; readonly text: string; readonly message: string }
  | { readonly state: 'bad'; readonly message: string };

/** What the text of a cell means in its column. A blank cell is blank, never zero. */
export function cellContent(column: GridColumn, text: string): CellContent {
  const trimmed = text.trim();
  if (trimmed === '') return { state: 'blank' };
  if (column.kind === 'text') return { state: 'text', text: trimmed };
  const parsed = parseDecimal(trimmed);
  if (parsed.ok) return { state: 'number', value: parsed.value };
  if (column.kind === 'decimal') {
    const word = column.words?.find((known) => known === trimmed.toLowerCase());
    return word ? { state: 'text', text: word } : { state: 'bad', message: parsed.message };
  }
  const typed = typedReading(trimmed);
  if (!typed.ok) return { state: 'bad', message: typed.message };
  return { state: 'gap', text: trimmed, message: `Kept as “${trimmed}”: a reading without a number` };
}
