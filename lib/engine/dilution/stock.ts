import { requireNotNegative, requirePositive } from '../checks/require';
import type { ValueWithU, Ware } from '../types';
import { productOf, type Quantity, relativeU } from '../uncertainty/quantity';
import { type Spread, spreadU } from '../uncertainty/spread';
import { volumeSpreads } from '../uncertainty/volume';

export interface StockRequest {
  readonly massG: number;
  readonly massUG?: number;
  /** Mass fraction of the substance, with the half-width of its rectangular limits. */
  readonly purity: number;
  readonly purityHalfWidth?: number;
  readonly volumeMl: number;
  readonly ware?: Ware;
}

export interface Stock extends ValueWithU {
  /** Relative standard uncertainty, common to everything made from it. */
  readonly relativeU: number;
  /** Contributions to u, in g/L. */
  readonly parts: readonly { readonly source: string; readonly u: number }[];
}

/**
 * A stock solution made up from a weighed substance, g/L:
 *
 *     c = 1000 m P / V        (u_c/c)² = (u_m/m)² + (u_P/P)² + (u_V/V)²        m in g, V in mL
 *
 * @throws EngineError MASS_NOT_POSITIVE, VOLUME_NOT_POSITIVE, UNCERTAINTY_NEGATIVE
 * @source EURACHEM/CITAC Guide CG 4, example A1
 */
export function stockSolution(request: StockRequest): Stock {
  const { massG, massUG = 0, purity, purityHalfWidth = 0, volumeMl, ware = {} } = request;
  requirePositive(massG, 'MASS_NOT_POSITIVE', 'the mass (g)', '/massG');
  requirePositive(purity, 'MASS_NOT_POSITIVE', 'the purity', '/purity');
  requirePositive(volumeMl, 'VOLUME_NOT_POSITIVE', 'the volume (mL)', '/volumeMl');
  requireNotNegative(massUG, 'the uncertainty of the mass (g)', '/massUG');
  requireNotNegative(purityHalfWidth, 'the limits of the purity', '/purityHalfWidth');
  const { piece, filling } = volumeSpreads(volumeMl, ware);
  const quantities = [
    quantity('mass', 'g', massG, 1, [{ shape: 'normal', u: massUG }]),
    quantity('purity', '', purity, 1, [{ shape: 'rectangular', halfWidth: purityHalfWidth }]),
    quantity('volume', 'mL', volumeMl, -1, [...piece, ...filling]),
  ];
  const value = 1000 * productOf(quantities);
  const relative = relativeU(quantities);
  const parts = quantities.map((item) => ({
    source: item.label,
    u: (value * Math.hypot(0, ...item.spreads.map(spreadU))) / item.value,
  }));
  return { value, u: value * relative, relativeU: relative, parts };
}

function quantity(
  label: string,
  unit: string,
  value: number,
  power: 1 | -1,
  spreads: readonly Spread[],
): Quantity {
  return { id: `stock.${label}`, label, symbol: label, unit, value, power, spreads, source: 'given' };
}
