import type { AnyDilutionStep, ValueWithU } from '../types';
import { type Quantity, productOf } from '../uncertainty/quantity';
import type { From } from '../working/ledger';
import { type DilutionFactor, dilutionFactor, recoveryQuantity } from './dilution-factor';

/** From the measured solution to the sample: C = c · F, or C = c · F / R with a recovery. */
export interface Scaling {
  readonly value: number;
  readonly factor: DilutionFactor;
  readonly recovery: ValueWithU | undefined;
  /** Everything in it, to be a line of the budget. */
  readonly quantities: readonly Quantity[];
  /** Ids of the lines behind its symbols. */
  readonly from: From;
}

export const RESULT_OF: From = { C: 'unknown.result' };

export function scalingOf(
  steps: readonly AnyDilutionStep[] | undefined,
  recovery: ValueWithU | undefined,
): Scaling {
  const factor = dilutionFactor(steps ?? []);
  const divided = recoveryQuantity(recovery);
  return {
    value: factor.value * productOf(divided),
    factor,
    recovery,
    quantities: [...factor.quantities, ...divided],
    from: { F: 'unknown.factor', ...(recovery ? { R: 'unknown.recovery' } : {}) },
  };
}

/** "c * F", or "c * F / R". */
export function scaleText(of: string, { recovery }: Scaling): string {
  return recovery ? `${of} * F / R` : `${of} * F`;
}
