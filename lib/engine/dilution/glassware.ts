import type { DilutionAdvice, OwnedGlassware } from '../types';

/** A factor and the steps that make it. */
export interface Making {
  readonly factor: number;
  readonly by?: NonNullable<DilutionAdvice['by']>;
}

/** Made with one pipette (1, 2, 5, 10, 20, 25 mL) and one flask, or two such steps from 1 in 200 on. */
const USUAL = [2, 4, 5, 10, 20, 25, 50, 100, 200, 250, 500, 1000, 2000, 5000, 10000] as const;

/** Closer than this two factors are the same one. */
const SAME = 1e-9;

/**
 * Every dilution that some glassware makes, in ascending order: in one step where one pipette and one flask do,
 * else in two; the larger volume of two that make the same factor, since it is measured better.
 *
 * @param owned pipettes and flasks of the laboratory; without them the factors a usual set makes
 */
export function makings(owned: OwnedGlassware | undefined): readonly Making[] {
  if (!owned) return USUAL.map((factor) => ({ factor }));
  const single = distinct(
    owned.pipettesMl.flatMap((takenMl) =>
      owned.flasksMl.filter((toMl) => toMl > takenMl).map((toMl) => stepsMake([{ takenMl, toMl }])),
    ),
  );
  const double = single.flatMap((first) => single.map((second) => stepsMake([...first.by, ...second.by])));
  return distinct([...single, ...double]);
}

type Steps = NonNullable<Making['by']>;
type Made = Required<Making>;

function stepsMake(by: Steps): Made {
  return { factor: by.reduce((product, { takenMl, toMl }) => (product * toMl) / takenMl, 1), by };
}

/** One way to each factor: fewer steps, then the larger volume taken. */
function distinct(ways: readonly Made[]): readonly Made[] {
  const smallest = ({ by }: Made) => Math.min(...by.map(({ takenMl }) => takenMl));
  const sorted = [...ways].sort(
    (a, b) => compare(a.factor, b.factor) || a.by.length - b.by.length || smallest(b) - smallest(a),
  );
  return sorted.filter((way, i) => i === 0 || compare(way.factor, (sorted[i - 1] as Made).factor) !== 0);
}

function compare(a: number, b: number): number {
  return Math.abs(a - b) <= SAME * Math.max(a, b) ? 0 : a - b;
}
