import type { Ware } from '../types';

export type WareKind = 'transfer pipette' | 'volumetric flask' | 'piston pipette';

/** A piece of volumetric ware by the standard it is made to. A default to start from: the certificate comes first. */
export interface WareItem {
  readonly id: string;
  readonly kind: WareKind;
  readonly standard: string;
  readonly className: string;
  readonly nominalMl: number;
  /** Half-width of the tolerance; of a piston pipette its greatest systematic error. */
  readonly toleranceMl: number;
  /** Greatest random error of a piston pipette, as a standard deviation. */
  readonly repeatabilityMl?: number;
  /** "published": seen in a public source; "memory": typed from memory, to be checked against the standard. */
  readonly basis: 'published' | 'memory';
}

/** Nominal volume and tolerance in mL. */
type Row = readonly [nominalMl: number, toleranceMl: number];

/* Class A; class B has twice the tolerance. Kealey and Haines, Analytical Chemistry, table 2.6, where published. */
const PIPETTES_ASTM: Rows = {
  published: [
    [1, 0.006],
    [5, 0.01],
    [10, 0.02],
    [25, 0.03],
    [50, 0.05],
    [100, 0.08],
  ],
  memory: [
    [2, 0.006],
    [3, 0.01],
    [4, 0.01],
    [15, 0.03],
    [20, 0.03],
  ],
};
const PIPETTES_ISO: Rows = {
  published: [],
  memory: [
    [1, 0.008],
    [2, 0.01],
    [5, 0.015],
    [10, 0.02],
    [20, 0.03],
    [25, 0.03],
    [50, 0.05],
  ],
};
/* 500 mL: the book has 0.15, memory 0.20; the published one is kept. */
const FLASKS_ASTM: Rows = {
  published: [
    [25, 0.03],
    [50, 0.05],
    [100, 0.08],
    [250, 0.12],
    [500, 0.15],
    [1000, 0.3],
    [2000, 0.5],
  ],
  memory: [
    [5, 0.02],
    [10, 0.02],
    [200, 0.1],
  ],
};
/* 100 mL: EURACHEM/CITAC CG 4, example A1. */
const FLASKS_ISO: Rows = {
  published: [[100, 0.1]],
  memory: [
    [5, 0.025],
    [10, 0.025],
    [25, 0.04],
    [50, 0.06],
    [250, 0.15],
    [500, 0.25],
    [1000, 0.4],
  ],
};

interface Rows {
  readonly published: readonly Row[];
  readonly memory: readonly Row[];
}

/** ISO 8655-2, air displacement, type A: nominal µL, greatest systematic and random error in per cent of it. */
const PISTON: readonly (readonly [nominalUl: number, systematic: number, random: number])[] = [
  [1, 5, 5],
  [2, 4, 2],
  [5, 2.5, 1.5],
  [10, 1.2, 0.8],
  [20, 1, 0.5],
  [50, 1, 0.4],
  [100, 0.8, 0.3],
  [200, 0.8, 0.3],
  [500, 0.8, 0.3],
  [1000, 0.8, 0.3],
  [2000, 0.8, 0.3],
  [5000, 0.8, 0.3],
  [10000, 0.6, 0.3],
];
const PISTON_PUBLISHED = 1000;

/** Tolerance of class B over that of class A. */
const CLASS_B = 2;

function glass(kind: WareKind, standard: string, rows: Rows): readonly WareItem[] {
  return (['published', 'memory'] as const).flatMap((basis) =>
    rows[basis].flatMap(([nominalMl, toleranceMl]) =>
      (['A', 'B'] as const).map((letter): WareItem => ({
        id: `${standard} class ${letter} ${nominalMl} mL`,
        kind,
        standard,
        className: `class ${letter}`,
        nominalMl,
        toleranceMl: letter === 'A' ? toleranceMl : CLASS_B * toleranceMl,
        basis,
      })),
    ),
  );
}

/** Errors are limits in µL over the whole range of a pipette, not in per cent of what it is set to. */
function piston(): readonly WareItem[] {
  return PISTON.map(([nominalUl, systematic, random]) => ({
    id: `ISO 8655-2 type A ${nominalUl} \u00b5L`,
    kind: 'piston pipette',
    standard: 'ISO 8655-2',
    className: 'type A',
    nominalMl: nominalUl / 1000,
    toleranceMl: (nominalUl * systematic) / 1e5,
    repeatabilityMl: (nominalUl * random) / 1e5,
    basis: nominalUl === PISTON_PUBLISHED ? 'published' : 'memory',
  }));
}

/** The library, each entry with its standard and class and whether its figures were seen or remembered. */
export const WARE: readonly WareItem[] = [
  ...glass('transfer pipette', 'ISO 648', PIPETTES_ISO),
  ...glass('transfer pipette', 'ASTM E969', PIPETTES_ASTM),
  ...glass('volumetric flask', 'ISO 1042', FLASKS_ISO),
  ...glass('volumetric flask', 'ASTM E288', FLASKS_ASTM),
  ...piston(),
];

/** The library as a laboratory has edited it: its own entries replace those of the same id and join the others. */
export function wareLibrary(own: readonly WareItem[] = []): readonly WareItem[] {
  const replaced = new Set(own.map((item) => item.id));
  return [...WARE.filter((item) => !replaced.has(item.id)), ...own];
}

/**
 * What the budget needs to know of a piece.
 *
 * @param piece names the very piece, so that its tolerance counts once however often it is used
 * @param temperatureRangeK half-width of the room's temperature about 20 °C
 */
export function wareOf(
  item: WareItem,
  { piece, temperatureRangeK }: Pick<Ware, 'piece' | 'temperatureRangeK'> = {},
): Ware {
  const { toleranceMl, repeatabilityMl } = item;
  return {
    toleranceMl,
    ...(repeatabilityMl === undefined ? {} : { repeatabilityMl }),
    ...(temperatureRangeK === undefined ? {} : { temperatureRangeK }),
    ...(piece === undefined ? {} : { piece }),
  };
}
