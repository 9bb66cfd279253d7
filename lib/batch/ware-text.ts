import { WARE, type WareItem } from '@/lib/engine/dilution/ware';
import type { Ware } from '@/lib/engine';
import { significantText } from '@/lib/format/round';

/** Glassware by the family of standards and its class, as written behind a dilution: "class A", "ASTM class B". */
export interface WareClass {
  readonly family: 'ISO' | 'ASTM';
  readonly letter: 'A' | 'B';
}

const STANDARDS = {
  ISO: { taken: 'ISO 648', to: 'ISO 1042' },
  ASTM: { taken: 'ASTM E969', to: 'ASTM E288' },
} as const;

/** The smallest piston pipette that holds the volume; none beyond the largest. */
function pistonFor(volumeMl: number): WareItem | undefined {
  return WARE.filter(({ kind, nominalMl }) => kind === 'piston pipette' && nominalMl >= volumeMl).sort(
    (a, b) => a.nominalMl - b.nominalMl,
  )[0];
}

/** The piece of the library that holds this volume, or undefined when the standard has none of its size. */
export function pieceFor(
  volumeMl: number,
  use: 'taken' | 'to',
  { family, letter }: WareClass,
): WareItem | undefined {
  const glass = WARE.find(
    (item) =>
      item.standard === STANDARDS[family][use] &&
      item.className === `class ${letter}` &&
      Math.abs(item.nominalMl - volumeMl) <= 1e-9 * volumeMl,
  );
  return glass ?? (use === 'taken' ? pistonFor(volumeMl) : undefined);
}

export const wareOfPiece = ({ toleranceMl, repeatabilityMl }: WareItem): Ware => ({
  toleranceMl,
  ...(repeatabilityMl === undefined ? {} : { repeatabilityMl }),
});

const figure = (value: number) => significantText(value, 6);

/** "±0.02" or "±0.008 r0.003", as it is typed behind a volume; empty when nothing is known of the vessel. */
export function wareText(ware: Ware | undefined): string {
  if (ware?.toleranceMl === undefined) return '';
  const repeatability = ware.repeatabilityMl === undefined ? '' : ` r${figure(ware.repeatabilityMl)}`;
  return ` ±${figure(ware.toleranceMl)}${repeatability}`;
}

/** " (±0.02 mL)" for the sentence that says a dilution back. */
export function wareSentence(ware: Ware | undefined, unit: string): string {
  if (ware?.toleranceMl === undefined) return '';
  const repeatability =
    ware.repeatabilityMl === undefined ? '' : `, repeatable to ${figure(ware.repeatabilityMl)}${unit}`;
  return ` (±${figure(ware.toleranceMl)}${unit}${repeatability})`;
}
