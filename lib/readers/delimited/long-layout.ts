import { signalFromText } from '../header-words';
import type { LayoutContext } from './layout-context';
import { seriesPoints, type Series } from './series';

/** Fewer points than this under one name are readings, not spectra. */
const SHORTEST = 3;

/** More numbers than this never name one spectrum together: dose, day and repeat, say. */
const MOST_NUMBER_KEYS = 3;

/** Columns that say which spectrum a row belongs to. */
export interface LongKeys {
  readonly keys: readonly number[];
  readonly ordinates: readonly number[];
}

/**
 * A long table has one reading a row: x repeats, and one or more other columns say whose it is. Those are the columns
 * of text, and if x still repeats under them, columns of numbers that keep still while x runs.
 */
export function findLongKeys(context: LayoutContext, xColumn: number): LongKeys | undefined {
  const { table, columns } = context;
  const x = table.columns[xColumn]?.values;
  if (!x || x.length < 2 * SHORTEST || columns[xColumn]?.direction !== 0) return undefined;
  if (new Set(x).size === x.length) return undefined;
  const texts = columns.flatMap((_, i) =>
    i !== xColumn && (table.columns[i]?.texts ?? 0) > (table.columns[i]?.numbers ?? 0) ? [i] : [],
  );
  const isText = new Set(texts);
  const still = columns.flatMap((fact, i) =>
    i !== xColumn && !isText.has(i) && fact.numbers === fact.rows && namesSpectra(context, i) ? [i] : [],
  );
  for (let used = 0; used <= Math.min(still.length, MOST_NUMBER_KEYS); used++) {
    const keys = [...texts, ...still.slice(0, used)];
    if (keys.length === 0) continue;
    const groups = groupRows(context, keys);
    if (groups.size < 2 || !distinctWithin(groups, x)) continue;
    const named = new Set([...keys, ...still]);
    const ordinates = columns.flatMap((fact, i) =>
      i !== xColumn && !named.has(i) && fact.numbers > 0 && !fact.isIndex ? [i] : [],
    );
    return ordinates.length > 0 ? { keys, ordinates } : undefined;
  }
  return undefined;
}

/** A number that names a spectrum keeps still for rows on end, or is one of a few whole numbers. */
function namesSpectra(context: LayoutContext, column: number): boolean {
  const values = context.table.columns[column]?.values ?? new Float64Array();
  if (signalFromText(context.heading.labels[column] ?? '')) return false;
  let changes = 0;
  for (let i = 1; i < values.length; i++) if (values[i] !== values[i - 1]) changes += 1;
  if (changes > 0 && changes * SHORTEST <= values.length) return true;
  return changes > 0 && values.every(Number.isInteger) && new Set(values).size * SHORTEST <= values.length;
}

function groupRows(context: LayoutContext, keys: readonly number[]): Map<string, number[]> {
  const groups = new Map<string, number[]>();
  context.options.onSteps?.(context.table.rows.length * keys.length);
  for (let row = 0; row < context.table.rows.length; row++) {
    const key = keys.map((column) => cellOf(context, column, row)).join(' ');
    const rows = groups.get(key);
    if (rows) rows.push(row);
    else groups.set(key, [row]);
  }
  return groups;
}

function cellOf(context: LayoutContext, column: number, row: number): string {
  const cells = context.table.columns[column];
  return (cells?.odd.get(row)?.text ?? String(cells?.values[row] ?? '')).replace(/^"|"$/g, '');
}

function distinctWithin(groups: ReadonlyMap<string, readonly number[]>, x: Float64Array): boolean {
  for (const rows of groups.values()) {
    if (rows.length < SHORTEST || new Set(rows.map((row) => x[row])).size !== rows.length) return false;
  }
  return true;
}

/** The spectra of a long table, in the order in which they first appear. */
export function longSeries(context: LayoutContext, xColumn: number, long: LongKeys): Series[] {
  const { table, heading } = context;
  const x = table.columns[xColumn];
  if (!x) return [];
  const series: Series[] = [];
  for (const [key, rows] of groupRows(context, long.keys)) {
    for (const column of long.ordinates) {
      const y = table.columns[column];
      if (!y) continue;
      const label = heading.labels[column] ?? '';
      series.push({
        name: long.ordinates.length > 1 && label !== '' ? `${key} ${label}` : key,
        xLabel: heading.labels[xColumn] ?? '',
        yLabel: label,
        ...seriesPoints(x, y, rows, table.rows),
        line: table.rows[rows[0] ?? 0] ?? 0,
        header: Object.fromEntries(
          long.keys.map((k) => [heading.labels[k] || `column ${k + 1}`, cellOf(context, k, rows[0] ?? 0)]),
        ),
      });
    }
  }
  return series;
}
