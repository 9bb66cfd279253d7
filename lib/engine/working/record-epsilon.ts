import { epsilonFactor } from '../calibration/molar-absorptivity';
import type { FittedCurve } from '../fit-curve';
import type { MolarAbsorptivity } from '../types';
import type { Ledger } from './ledger';

/** Lines of the molar absorptivity, when one is claimed. */
export function recordEpsilon(
  ledger: Ledger,
  curve: FittedCurve,
  epsilon: MolarAbsorptivity | undefined,
): void {
  if (!epsilon) return;
  const { request, fit } = curve;
  ledger.solved(
    {
      id: 'curve.epsilonFactor',
      label: 'From the slope to per mole and litre',
      symbol: 'f',
      unit: 'L/(mol cm) for a slope of 1',
      source: `unit ${request.unit}, formula mass ${request.formulaMass} g/mol`,
    },
    'formula mass / (unit in g/L), or 1 / (unit in mol/L)',
    [],
    epsilonFactor(request),
  );
  ledger.line(
    {
      id: 'curve.epsilon',
      label: 'Molar absorptivity',
      symbol: 'epsilon',
      unit: epsilon.unit,
      source: 'Beer-Lambert law',
    },
    'b * f',
    { b: 'curve.slope', f: 'curve.epsilonFactor' },
    epsilon.value,
  );
  const slopeU = fit.model === 'quadratic' ? ['curve.v.slope'] : ['curve.u.slope'];
  ledger.solved(
    {
      id: 'curve.u.epsilon',
      label: 'Standard uncertainty of the molar absorptivity',
      symbol: 'u(epsilon)',
      unit: epsilon.unit,
      source: 'JCGM 100 (GUM), 5.1',
    },
    'epsilon * sqrt((u(b)/b)^2 + u_rel(standards)^2 + (u(l)/l)^2)',
    ['curve.epsilon', 'curve.slope', ...slopeU],
    epsilon.u,
  );
}
