import type { Ware } from '../types';

/** Cubic expansion of water near 20 °C, per kelvin. */
const WATER_EXPANSION_PER_K = 2.1e-4;

/**
 * Standard uncertainty of a volume from what is known about the vessel, mL:
 *
 *     u² = (tolerance/√6)² + repeatability² + (V · 2.1e-4 K⁻¹ · ΔT / √3)²
 *
 * Tolerance triangular (values near the nominal one are likelier), temperature rectangular.
 *
 * @source EURACHEM/CITAC Guide CG 4, example A1
 */
export function volumeUncertainty(volumeMl: number, ware: Ware): number {
  const tolerance = (ware.toleranceMl ?? 0) / Math.sqrt(6);
  const temperature = (volumeMl * WATER_EXPANSION_PER_K * (ware.temperatureRangeK ?? 0)) / Math.sqrt(3);
  return Math.hypot(tolerance, ware.repeatabilityMl ?? 0, temperature);
}
