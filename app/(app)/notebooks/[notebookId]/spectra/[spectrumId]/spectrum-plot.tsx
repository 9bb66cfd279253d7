'use client';

import { SpectraChart } from '@/components/charts/spectra-chart';
import { Skeleton } from '@/components/ui/skeleton';
import { drawnSpectra } from '@/components/spectrum/drawn-spectra';
import { useSpectrumPoints } from '@/components/spectrum/use-spectrum-points';
import type { SpectrumView } from '@/lib/views/spectrum';

/** One spectrum by itself. */
export function SpectrumPlot({ spectrum }: { spectrum: SpectrumView }) {
  const { data, error } = useSpectrumPoints([spectrum.id]);
  if (error)
    return <p className="text-red">The points could not be fetched. Reload the page to try again.</p>;
  if (!data) return <Skeleton rows={6} label="Fetching the points" />;
  return <SpectraChart spectra={drawnSpectra([spectrum], data)} height={320} />;
}
