import type { PlottedSpectrum } from '@/components/charts/spectra-model';
import type { SpectrumPointsView, SpectrumUse, SpectrumView } from '@/lib/views/spectrum';

/**
 * The chosen spectra as the plot takes them. What a curve or batch uses is drawn as what it is; the others run
 * light to dark by their highest absorbance, which is the order of concentration when they are one dye.
 */
export function drawnSpectra(
  chosen: readonly SpectrumView[],
  points: readonly SpectrumPointsView[],
  uses: Readonly<Record<string, SpectrumUse>> = {},
): PlottedSpectrum[] {
  const byId = new Map(points.map((view) => [view.id, view]));
  return chosen.flatMap(({ id, name, highestAbsorbance }) => {
    const view = byId.get(id);
    if (!view) return [];
    const use = uses[id] ?? { role: 'standard' as const, concentration: highestAbsorbance ?? 0 };
    return [{ id, name, wavelengthNm: view.wavelengthNm, absorbance: view.absorbance, ...use }];
  });
}
