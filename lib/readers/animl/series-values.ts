import { gapReason } from '../number-cell';
import { ReaderError, type Gap } from '../types';
import type { AnimlSeries, ValueSet } from './animl-document';

export interface SeriesValues {
  readonly values: Float64Array;
  readonly gaps: Gap[];
  /** How many values stand in the document. */
  readonly given: number;
}

/** How many places the stretches of a series reach; an increment reaches as far as it is asked to. */
export function reachOf(series: AnimlSeries): number {
  let reach = 0;
  for (const set of series.sets) {
    if (set.kind === 'increment') continue;
    reach = Math.max(
      reach,
      set.startIndex + (set.kind === 'encoded' ? decodedSet(series, set).length : set.values.length),
    );
  }
  return reach;
}

/** The values of a series at the places 0 to n − 1; places that no stretch covers are gaps. */
export function seriesValues(series: AnimlSeries, n: number): SeriesValues {
  const values = new Float64Array(n).fill(NaN);
  const words = new Map<number, string>();
  let given = 0;
  for (const set of series.sets) {
    if (set.kind === 'increment') {
      fillIncrement(values, set);
      continue;
    }
    const stretch = set.kind === 'encoded' ? decodedSet(series, set) : set.values;
    given += stretch.length;
    for (let i = 0; i < stretch.length && set.startIndex + i < n; i++)
      values[set.startIndex + i] = stretch[i] ?? NaN;
    for (const [place, word] of set.unreadable) words.set(set.startIndex + place, word);
  }
  const gaps: Gap[] = [];
  values.forEach((value, index) => {
    if (Number.isFinite(value)) return;
    values[index] = NaN;
    const text = words.get(index) ?? '';
    gaps.push({ index, reason: gapReason(text), text });
  });
  return { values, gaps, given };
}

/** StartValue and Increment: x = start + (i − startIndex) · increment. */
function fillIncrement(values: Float64Array, set: ValueSet): void {
  const [start = NaN, increment = NaN] = set.values;
  const last = Number.isFinite(set.endIndex) ? Math.min(set.endIndex, values.length - 1) : values.length - 1;
  for (let i = set.startIndex; i <= last; i++) values[i] = start + (i - set.startIndex) * increment;
}

/** Base64 of little-endian numbers of the series' type. */
function decodedSet(series: AnimlSeries, set: ValueSet): number[] {
  if (set.values.length > 0) return set.values;
  let binary: string;
  try {
    binary = atob(set.base64.replace(/\s+/g, ''));
  } catch {
    throw new ReaderError(
      'ENCODED_VALUES',
      `The encoded values of the series "${series.name}" are damaged (not valid base64). Export the document again.`,
    );
  }
  set.base64 = '';
  const bytes = Uint8Array.from(binary, (letter) => letter.charCodeAt(0));
  const view = new DataView(bytes.buffer);
  const size = series.type === 'Float32' || series.type === 'Int32' ? 4 : 8;
  for (let at = 0; at + size <= bytes.length; at += size) set.values.push(numberAt(view, at, series.type));
  return set.values;
}

function numberAt(view: DataView, at: number, type: string): number {
  if (type === 'Float32') return view.getFloat32(at, true);
  if (type === 'Int32') return view.getInt32(at, true);
  if (type === 'Int64') return Number(view.getBigInt64(at, true));
  return view.getFloat64(at, true);
}
