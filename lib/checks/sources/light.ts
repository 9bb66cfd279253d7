import {
  absorbanceOf,
  type KnownAbsorptivityRequest,
  peakSeenThroughSlit,
  photometricErrorPercent,
  resultFromKnownAbsorptivity,
  slopeLoss,
  strayAbsorbance,
} from '@/lib/engine';
import { type CheckRow, type CheckSource, sourceOf } from '../types';

const TRANSMITTANCES: readonly (readonly [number, string])[] = [
  [100, '0.00000'],
  [50, '0.30103'],
  [36.8, '0.43415'],
  [10, '1.00000'],
  [0.1, '3.00000'],
];

function transmittance(): CheckSource {
  return sourceOf({
    id: 'transmittance',
    title: 'Absorbance of a transmittance',
    source: 'A = −log₁₀ T',
    kind: 'identity',
    rows: TRANSMITTANCES.map(([percent, published]): CheckRow => [
      `A at ${percent} %T`,
      published,
      () => absorbanceOf(percent, 'percentTransmittance').value ?? NaN,
    ]),
  });
}

/** Stray light as a fraction, and A shown at a true A of 1, 2, 3, 4. */
const STRAY: readonly (readonly [number, readonly string[]])[] = [
  [0.0001, ['0.9996', '1.9957', '2.9587', '3.6990']],
  [0.001, ['0.9961', '1.9590', '2.6994', '2.9590']],
  [0.01, ['0.9629', '1.7033', '1.9629', '2.0000']],
];

function strayLight(): CheckSource {
  return sourceOf({
    id: 'stray',
    title: 'Absorbance shown under stray light',
    source: 'A = −log₁₀((T + s)/(1 + s)), evaluated apart from the engine',
    kind: 'identity',
    rows: STRAY.flatMap(([stray, shown]) =>
      shown.map((published, i): CheckRow => [
        `true A ${i + 1}, ${stray * 100} % stray light`,
        published,
        () => strayAbsorbance(i + 1, stray),
      ]),
    ),
  });
}

function photometry(): CheckSource {
  return sourceOf({
    id: 'photometry',
    title: 'Photometric error and the width of the slit',
    source: 'Twyman and Lothian, Proc. Phys. Soc. 45 (1933) 643; the rest follows from its formula',
    kind: 'identity',
    rows: [
      [
        'least relative error per 1 %T, at A 0.4343, %',
        '2.718',
        () => photometricErrorPercent(0.4343, 0.01),
        'typed from memory',
      ],
      ['relative error per 1 %T at A 0.1, %', '5.47', () => photometricErrorPercent(0.1, 0.01)],
      ['relative error per 1 %T at A 2, %', '21.7', () => photometricErrorPercent(2, 0.01)],
      ['absorbance lost where A changes by 0.2 across the slit', '0.00383', () => slopeLoss(0.2)],
      ['absorbance lost where A changes by 0.5 across the slit', '0.02373', () => slopeLoss(0.5)],
      ['peak seen through a slit of a tenth of the band', '0.9954', () => peakSeenThroughSlit(0.1)],
      ['peak seen through a slit of half the band', '0.8987', () => peakSeenThroughSlit(0.5)],
    ],
  });
}

/** One reading in 10 mm, without anything that changes the concentration. */
function byAbsorptivity(
  reading: number,
  unit: KnownAbsorptivityRequest['unit'],
  absorptivity: { readonly kind: 'molar' | 'specific'; readonly value: number },
  formulaMass?: number,
): number {
  const [result] = resultFromKnownAbsorptivity({
    signal: 'absorbance',
    pathLengthMm: 10,
    unit,
    confidence: 0.95,
    absorbanceLimit: 2,
    formulaMass,
    absorptivity: { ...absorptivity, u: 0, source: 'published' },
    unknowns: [{ readings: [reading] }],
  }).unknowns;
  return result?.measured?.value ?? NaN;
}

function absorptivities(): CheckSource {
  return sourceOf({
    id: 'absorptivity',
    title: 'Concentrations by a known absorptivity',
    source:
      'Beer-Lambert law with published absorptivities; NADH: Horecker and Kornberg, J. Biol. Chem. 175 (1948) 385',
    kind: 'seen in print',
    rows: [
      [
        'NADH at 340 nm, ε 6220, A 0.0622, µmol/L',
        '10.0',
        () => byAbsorptivity(0.0622, 'µmol/L', { kind: 'molar', value: 6220 }),
      ],
      [
        'double-stranded DNA at 260 nm, A 1, µg/mL',
        '50',
        () => byAbsorptivity(1, 'µg/mL', { kind: 'specific', value: 20 }),
      ],
      [
        'serum albumin, ε 43824, 66463 g/mol, A 0.6594, g/L',
        '1.000',
        () => byAbsorptivity(0.6594, 'g/L', { kind: 'molar', value: 43824 }, 66463),
        'identity',
      ],
    ],
  });
}

/** From light to absorbance, and from absorbance to concentration. */
export function light(): readonly CheckSource[] {
  return [transmittance(), strayLight(), photometry(), absorptivities()];
}
