'use client';

import { useMemo } from 'react';

import { ChartView } from './chart-view';
import { spectraModel, type ChosenBand, type PlottedSpectrum } from './spectra-model';
import { WavelengthSlider } from './wavelength-slider';

export interface SpectraChartProps {
  spectra: readonly PlottedSpectrum[];
  /** readings above it are not to be trusted; 2 unless laboratory, instrument or method set another */
  absorbanceLimit?: number;
  chosen?: ChosenBand;
  rangeNm?: { from: number; to: number };
  /** called with a wavelength at which the spectra have a point */
  onPickWavelength?: (nm: number) => void;
  /** called with a band drawn over the plot */
  onPickBand?: (fromNm: number, toNm: number) => void;
  interactive?: boolean;
  height?: number;
}

/** Spectra over each other: hover to read, click or use the slider to choose a wavelength, drag to read a band. */
export function SpectraChart({
  spectra,
  absorbanceLimit = 2,
  chosen,
  rangeNm,
  onPickWavelength,
  onPickBand,
  interactive,
  height = 400,
}: SpectraChartProps) {
  const model = useMemo(
    () => spectraModel({ spectra, absorbanceLimit, chosen, rangeNm, height }),
    [spectra, absorbanceLimit, chosen, rangeNm, height],
  );
  const grid = spectra[0]?.wavelengthNm ?? [];
  return (
    <ChartView
      model={model}
      interactive={interactive}
      onPick={onPickWavelength && (({ x }) => onPickWavelength(nearest(grid, x)))}
      onSelectX={onPickBand && ((from, to) => onPickBand(nearest(grid, from), nearest(grid, to)))}
    >
      {onPickWavelength && grid.length > 1 && (
        <WavelengthSlider
          min={model.x.min}
          max={model.x.max}
          step={stepOf(grid)}
          value={chosen?.atNm}
          onPick={(nm) => onPickWavelength(nearest(grid, nm))}
        />
      )}
    </ChartView>
  );
}

/** The member of an ascending list that lies nearest to a value. */
export function nearest(ascending: readonly number[], value: number): number {
  let best = value;
  let distance = Infinity;
  for (const member of ascending) {
    const apart = Math.abs(member - value);
    if (apart >= distance) break;
    best = member;
    distance = apart;
  }
  return best;
}

function stepOf(ascending: readonly number[]): number {
  const span = (ascending.at(-1) ?? 1) - (ascending[0] ?? 0);
  return Number((span / (ascending.length - 1)).toPrecision(3)) || 1;
}
