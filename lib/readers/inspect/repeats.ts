import type { Gap, ReadOptions, ReaderWarning } from '../types';
import { pickPoints, UNIT_WORDS, type SpectrumDraft } from './spectrum-draft';

export interface Repeats {
  readonly draft: SpectrumDraft;
  readonly warnings: ReaderWarning[];
  /** How many wavelengths stand more than once with different readings. */
  readonly conflicts: number;
}

/**
 * Deal with equal x. Equal readings are kept once, with a note; different ones are a person's to decide: the first,
 * their mean, or all of them as they stand.
 */
export function withoutRepeats(draft: SpectrumDraft, choice: ReadOptions['equalX']): Repeats {
  const groups = equalGroups(draft.x);
  if (groups.length === 0) return { draft, warnings: [], conflicts: 0 };
  const dropped = new Set<number>();
  const y = Float64Array.from(draft.y);
  const gaps = new Map(draft.gaps.map((gap) => [gap.index, gap]));
  let same = 0;
  let conflicts = 0;
  let example = NaN;
  for (const group of groups) {
    const [first = 0, ...others] = group;
    const differing = others.filter((place) => !sameReading(draft.y, first, place));
    same += others.length - differing.length;
    for (const place of others) if (sameReading(draft.y, first, place)) dropped.add(place);
    if (differing.length === 0) continue;
    conflicts += 1;
    if (Number.isNaN(example)) example = draft.x[first] ?? NaN;
    if (choice === 'keep') continue;
    if (choice === 'mean') takeMean(draft.y, group, y, gaps);
    for (const place of differing) dropped.add(place);
  }
  const kept = Array.from(draft.x.keys()).filter((place) => !dropped.has(place));
  const warnings = notes(draft, same, conflicts, example, choice);
  return { draft: pickPoints({ ...draft, y, gaps: [...gaps.values()] }, kept), warnings, conflicts };
}

function notes(
  draft: SpectrumDraft,
  same: number,
  conflicts: number,
  example: number,
  choice: ReadOptions['equalX'],
): ReaderWarning[] {
  const warnings: ReaderWarning[] = [];
  if (same > 0) {
    const message = `${same} ${same === 1 ? 'point stands' : 'points stand'} twice with the same reading and ${same === 1 ? 'is' : 'are'} kept once`;
    warnings.push({ code: 'REPEATED_POINTS', message, value: same });
  }
  if (conflicts > 0) {
    const done =
      choice === 'mean' ? 'their mean is used' : choice === 'keep' ? 'all are kept' : 'the first is used';
    const where = `${example} ${UNIT_WORDS[draft.xUnit]}`;
    warnings.push({
      code: 'EQUAL_X',
      message: `${conflicts} ${conflicts === 1 ? 'wavelength has' : 'wavelengths have'} different readings (first at ${where}); ${done}`,
      value: conflicts,
    });
  }
  return warnings;
}

/** Places with equal x, each group in file order. */
function equalGroups(x: Float64Array): number[][] {
  if (strictlyMonotonic(x)) return [];
  const places = new Map<number, number | number[]>();
  const groups: number[][] = [];
  for (let i = 0; i < x.length; i++) {
    const value = x[i] ?? NaN;
    const known = places.get(value);
    if (known === undefined) places.set(value, i);
    else if (typeof known === 'number') {
      const group = [known, i];
      places.set(value, group);
      groups.push(group);
    } else known.push(i);
  }
  return groups;
}

function strictlyMonotonic(x: Float64Array): boolean {
  const sign = Math.sign((x[1] ?? 0) - (x[0] ?? 0));
  for (let i = 1; i < x.length; i++) {
    if (!(((x[i] ?? NaN) - (x[i - 1] ?? NaN)) * sign > 0)) return false;
  }
  return true;
}

function sameReading(y: Float64Array, a: number, b: number): boolean {
  const [first = NaN, second = NaN] = [y[a], y[b]];
  return first === second || (Number.isNaN(first) && Number.isNaN(second));
}

/**
 * Put the mean of a group in place of its first reading. A reading off the scale has no number to average: the mean
 * without it would be too low or too high, so the point becomes a gap with that reason.
 */
function takeMean(
  readings: Float64Array,
  group: readonly number[],
  y: Float64Array,
  gaps: Map<number, Gap>,
): void {
  const [first = 0] = group;
  const offScale = group.map((place) => gaps.get(place)).find((gap) => gap && OFF_SCALE.has(gap.reason));
  y[first] = offScale ? NaN : meanOf(readings, group);
  gaps.delete(first);
  if (offScale) gaps.set(first, { ...offScale, index: first });
}

const OFF_SCALE: ReadonlySet<Gap['reason']> = new Set(['aboveRange', 'belowRange']);

function meanOf(y: Float64Array, places: readonly number[]): number {
  const readings = places.map((place) => y[place] ?? NaN).filter((value) => !Number.isNaN(value));
  if (readings.length === 0) return NaN;
  return readings.reduce((sum, value) => sum + value, 0) / readings.length;
}
