'use client';

import Plotly, {
  type PlotHoverEvent,
  type PlotMouseEvent,
  type PlotSelectionEvent,
} from 'plotly.js-dist-min';
import { useMemo, useRef } from 'react';
import createPlotlyComponent from 'react-plotly.js/factory';

import type { ChartModel } from './chart-model';
import { PLOTLY_CONFIG, plotlyFigure } from './plotly-figure';
import { usePalette } from './use-palette';

const Plot = createPlotlyComponent(Plotly);

export interface PlotlyPlotProps {
  model: ChartModel;
  /** x where the pointer was, in axis units, and the id of the point under it */
  onPick?: (picked: { x: number; pointId?: string }) => void;
  /** a range of x drawn with the pointer */
  onSelectX?: (from: number, to: number) => void;
  onReady: () => void;
}

/** The interactive plot. Only ever loaded by chart-view.tsx, because everything behind this import is large. */
export function PlotlyPlot({ model, onPick, onSelectX, onReady }: PlotlyPlotProps) {
  const palette = usePalette();
  const pointerX = useRef<number | null>(null);
  const dragSelects = Boolean(onSelectX);
  const figure = useMemo(
    () => (palette ? plotlyFigure(model, palette, { dragSelects }) : null),
    [model, palette, dragSelects],
  );
  if (!figure) return null;

  function hovered(event: PlotHoverEvent) {
    const [x] = event.xvals ?? [];
    pointerX.current = typeof x === 'number' ? x : null;
  }

  function clicked(event: PlotMouseEvent) {
    const [nearest] = event.points;
    const x = pointerX.current ?? Number(nearest?.x);
    if (nearest && Number.isFinite(x)) onPick?.({ x, pointId: pointId(nearest) });
  }

  function selected(event: PlotSelectionEvent | undefined) {
    const [from, to] = (event?.range?.x ?? []).map(Number);
    if (from !== undefined && to !== undefined) onSelectX?.(Math.min(from, to), Math.max(from, to));
  }

  return (
    <Plot
      data={figure.data}
      layout={figure.layout}
      config={dragSelects ? PLOTLY_CONFIG.selecting : PLOTLY_CONFIG.zooming}
      useResizeHandler
      style={{ width: '100%', height: model.height }}
      onInitialized={onReady}
      onHover={hovered}
      onClick={onPick && clicked}
      onSelected={onSelectX && selected}
    />
  );
}

function pointId(point: object): string | undefined {
  return 'id' in point && typeof point.id === 'string' ? point.id : undefined;
}
