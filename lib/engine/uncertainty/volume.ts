import type { Ware } from '../types';
import { type Spread, spreadU } from './spread';

/** Cubic expansion of water near 20 °C, per kelvin. */
const WATER_EXPANSION_PER_K = 2.1e-4;

/** The errors of one volume by their cause: of the piece itself, and of each filling. */
export interface VolumeSpreads {
  /** The same at every use of one piece. */
  readonly piece: readonly Spread[];
  readonly filling: readonly Spread[];
}

/** Tolerance triangular (values near the nominal one are likelier), repeatability normal, temperature rectangular. */
export function volumeSpreads(volumeMl: number, ware: Ware): VolumeSpreads {
  const temperature = volumeMl * WATER_EXPANSION_PER_K * (ware.temperatureRangeK ?? 0);
  const spreads = {
    piece: [{ shape: 'triangular', halfWidth: ware.toleranceMl ?? 0 }],
    filling: [
      { shape: 'normal', u: ware.repeatabilityMl ?? 0 },
      { shape: 'rectangular', halfWidth: temperature },
    ],
  } as const;
  const there = (spread: Spread) => spreadU(spread) > 0;
  return { piece: spreads.piece.filter(there), filling: spreads.filling.filter(there) };
}

/**
 * Standard uncertainty of a volume from what is known about the vessel, mL:
 *
 *     u² = (tolerance/√6)² + repeatability² + (V · 2.1e-4 K⁻¹ · ΔT / √3)²
 *
 * @source EURACHEM/CITAC Guide CG 4, example A1
 */
export function volumeUncertainty(volumeMl: number, ware: Ware): number {
  const { piece, filling } = volumeSpreads(volumeMl, ware);
  return Math.hypot(0, ...[...piece, ...filling].map(spreadU));
}
