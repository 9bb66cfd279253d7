import type { DeterminationView } from '@/lib/views/determination';
import type { ResultRow } from './results-table';

/** A saved determination as a row of the results, opening to its own page under `base`. */
export function resultRowOf(determination: DeterminationView, base: string): ResultRow {
  const { id, sample, readings, pathLengthMm, dilution, result } = determination;
  return { key: id, sample, href: `${base}/determinations/${id}`, readings, pathLengthMm, dilution, result };
}
