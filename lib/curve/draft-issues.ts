import { curveDraft, type CurveDraftInput } from '@/lib/schemas/curve';
import { cellKey, type SpelledStandards } from './grid-standards';

/** Sentences by the path of what they are about, with dots: "about.analyte", "standards.2.concentration". */
export type DraftIssues = Readonly<Record<string, string>>;

/** Everything in a draft that keeps it from being saved; the first sentence for each place. */
export function draftIssues(draft: CurveDraftInput): DraftIssues {
  const parsed = curveDraft.safeParse(draft);
  if (parsed.success) return {};
  const issues: Record<string, string> = {};
  for (const { path, message } of parsed.error.issues) issues[path.join('.')] ??= message;
  return issues;
}

/** The fields of a refused save under the paths of the draft. */
export function issuesOfAnswer(fields: Readonly<Record<string, readonly string[]>>): DraftIssues {
  return Object.fromEntries(
    Object.entries(fields).flatMap(([name, [sentence]]) =>
      name.startsWith('draft.') && sentence !== undefined ? [[name.slice('draft.'.length), sentence]] : [],
    ),
  );
}

export interface GridColumns {
  readonly name: number;
  readonly concentration: number;
  readonly firstReading: number;
}
export const TYPED_COLUMNS: GridColumns = { name: 0, concentration: 1, firstReading: 2 };
export const SPECTRA_COLUMNS: GridColumns = { name: 1, concentration: 2, firstReading: 3 };

const STANDARD = /^standards\.(\d+)(?:\.(name|concentration|readings)(?:\.(\d+))?)?/;

/** The sentences that belong to cells of the grid, by row and column. */
export function cellIssues(
  issues: DraftIssues,
  { sources }: SpelledStandards,
  columns: GridColumns,
): DraftIssues {
  const found: Record<string, string> = {};
  for (const [path, message] of Object.entries(issues)) {
    const [, standard, part, reading] = STANDARD.exec(path) ?? [];
    const source = sources[Number(standard)];
    if (standard === undefined || !source) continue;
    const place = reading === undefined ? undefined : source.readings[Number(reading)];
    const column =
      part === 'name' ? columns.name : part === 'readings' ? columns.firstReading : columns.concentration;
    found[cellKey(place?.rowId ?? source.rowId, place?.column ?? column)] ??= message;
  }
  return found;
}
