import type { Gap, ReaderWarning, SignalKind, XUnit } from '../types';

/** A spectrum as a reader decoded it, before it is looked at for what a person should know. */
export interface SpectrumDraft {
  readonly name: string;
  readonly x: Float64Array;
  readonly xUnit: XUnit;
  readonly xUnitGuessed: boolean;
  readonly y: Float64Array;
  readonly signal: SignalKind;
  readonly signalGuessed: boolean;
  readonly signalText: string;
  readonly signalScale: number;
  readonly gaps: readonly Gap[];
  readonly block: number;
  readonly line: number;
  readonly header: Readonly<Record<string, string>>;
  readonly warnings: readonly ReaderWarning[];
}

export const UNIT_WORDS: Record<XUnit, string> = {
  nm: 'nm',
  '1/cm': '1/cm',
  um: 'µm',
  angstrom: 'Å',
  eV: 'eV',
};

/** The points of a draft at the places given, in that order; gaps move with them. */
export function pickPoints(draft: SpectrumDraft, places: ArrayLike<number>): SpectrumDraft {
  const n = places.length;
  const x = new Float64Array(n);
  const y = new Float64Array(n);
  const byPlace = new Map(draft.gaps.map((gap) => [gap.index, gap]));
  const gaps: Gap[] = [];
  for (let i = 0; i < n; i++) {
    const from = places[i] ?? 0;
    x[i] = draft.x[from] ?? NaN;
    y[i] = draft.y[from] ?? NaN;
    const gap = byPlace.get(from);
    if (gap) gaps.push({ ...gap, index: i });
  }
  return { ...draft, x, y, gaps };
}
