import type { AnyDilutionStep, DilutionStep, MassDilutionStep, ValueWithU, Ware } from '../types';
import { type Quantity, productOf, relativeU } from '../uncertainty/quantity';
import type { Spread } from '../uncertainty/spread';
import { volumeSpreads } from '../uncertainty/volume';

export interface DilutionFactor {
  readonly value: number;
  readonly u: number;
  /** Volumes, masses and densities, in the order of the steps. */
  readonly quantities: readonly Quantity[];
}

/**
 * F = Π (made up to / taken), (u_F/F)² = Σ (u_V/V)² over the volumes of all steps. A step by mass counts in volumes
 * too: (m_to/ρ_to)/(m_taken/ρ_taken), where the densities are taken as equal unless given. The tolerance of one
 * named piece used in several steps counts once, with its sign.
 *
 * @source EURACHEM/CITAC Guide CG 4, examples A1 and A2
 */
export function dilutionFactor(steps: readonly AnyDilutionStep[]): DilutionFactor {
  const quantities = steps.flatMap((step, i) =>
    isMassStep(step) ? byMass(step, i + 1) : byVolume(step, i + 1),
  );
  const value = productOf(quantities);
  return { value, u: value * relativeU(quantities), quantities };
}

export function isMassStep(step: AnyDilutionStep): step is MassDilutionStep {
  return 'takenG' in step;
}

const known = (u: number | undefined): readonly Spread[] =>
  u !== undefined && u > 0 ? [{ shape: 'normal', u }] : [];

interface VolumeFacts {
  readonly end: 'taken' | 'to';
  readonly step: number;
  readonly value: number;
  readonly u: number | undefined;
  readonly ware: Ware | undefined;
}

function byVolume(step: DilutionStep, number: number): readonly Quantity[] {
  return [
    volume({ end: 'taken', step: number, value: step.takenMl, u: step.takenUMl, ware: step.takenWare }),
    volume({ end: 'to', step: number, value: step.toMl, u: step.toUMl, ware: step.toWare }),
  ];
}

function volume({ end, step, value, u, ware = {} }: VolumeFacts): Quantity {
  const { piece, filling } = volumeSpreads(value, ware);
  const shared = ware.piece !== undefined && piece.length > 0 ? { piece: ware.piece, spreads: piece } : null;
  return {
    id: `unknown.dilution.${step}.${end}`,
    label: `dilution ${step}, ${end === 'taken' ? 'volume taken' : 'made up to'}`,
    symbol: `V_${end}${step}`,
    unit: 'mL',
    value,
    power: end === 'taken' ? -1 : 1,
    spreads: [...known(u), ...(shared ? [] : piece), ...filling],
    source: 'given',
    ...(shared ? { shared } : {}),
  };
}

function byMass(step: MassDilutionStep, number: number): readonly Quantity[] {
  const quantity = (
    part: 'mass taken' | 'made up to (mass)' | 'density of what was taken' | 'density after',
    symbol: string,
    value: number,
    u: number | undefined,
    power: 1 | -1,
  ): Quantity => ({
    id: `unknown.dilution.${number}.${symbol}`,
    label: `dilution ${number}, ${part}`,
    symbol: `${symbol}${number}`,
    unit: part.startsWith('density') ? 'g/mL' : 'g',
    value,
    power,
    spreads: known(u),
    source: 'given',
  });
  const { densities } = step;
  return [
    quantity('mass taken', 'm_taken', step.takenG, step.takenUG, -1),
    quantity('made up to (mass)', 'm_to', step.toG, step.toUG, 1),
    ...(densities
      ? [
          quantity(
            'density of what was taken',
            'rho_taken',
            densities.takenGPerMl,
            densities.takenUGPerMl,
            1,
          ),
          quantity('density after', 'rho_to', densities.toGPerMl, densities.toUGPerMl, -1),
        ]
      : []),
  ];
}

/** The recovery of the method, which a result is divided by. */
export function recoveryQuantity(recovery: ValueWithU | undefined): readonly Quantity[] {
  if (!recovery) return [];
  return [
    {
      id: 'unknown.recovery',
      label: 'recovery',
      symbol: 'R',
      unit: '',
      value: recovery.value,
      power: -1,
      spreads: known(recovery.u),
      source: 'given',
    },
  ];
}
