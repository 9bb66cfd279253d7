import type { DilutionStep } from '../types';
import { volumeUncertainty } from '../uncertainty/volume';

/** One volume of a dilution: what it contributes to the factor, relatively. */
export interface VolumeTerm {
  readonly id: string;
  readonly label: string;
  readonly symbol: string;
  readonly volumeMl: number;
  readonly uMl: number;
}

export interface DilutionFactor {
  readonly value: number;
  readonly u: number;
  readonly volumes: readonly VolumeTerm[];
}

/**
 * F = Π (made up to / taken), (u_F/F)² = Σ (u_V/V)² over the volumes of all steps.
 *
 * @source EURACHEM/CITAC Guide CG 4, examples A1 and A2
 */
export function dilutionFactor(steps: readonly DilutionStep[]): DilutionFactor {
  const volumes = steps.flatMap((step, i): readonly VolumeTerm[] => [
    {
      id: `unknown.dilution.${i + 1}.taken`,
      label: `dilution ${i + 1}, volume taken`,
      symbol: `V_taken${i + 1}`,
      volumeMl: step.takenMl,
      uMl: step.takenUMl ?? volumeUncertainty(step.takenMl, step.takenWare ?? {}),
    },
    {
      id: `unknown.dilution.${i + 1}.to`,
      label: `dilution ${i + 1}, made up to`,
      symbol: `V_to${i + 1}`,
      volumeMl: step.toMl,
      uMl: step.toUMl ?? volumeUncertainty(step.toMl, step.toWare ?? {}),
    },
  ]);
  const value = steps.reduce((product, step) => product * (step.toMl / step.takenMl), 1);
  const u = value * Math.hypot(0, ...volumes.map((term) => term.uMl / term.volumeMl));
  return { value, u, volumes };
}
