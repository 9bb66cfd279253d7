'use client';

import { useEffect, useId, useRef, useState, type ComponentType, type ReactNode } from 'react';

import type { PlotlyPlotProps } from './plotly-plot';
import { StaticChart } from './static-chart';

export interface ChartViewProps extends Omit<PlotlyPlotProps, 'onReady'> {
  /** false keeps the still picture, and loads nothing */
  interactive?: boolean;
  /** controls and tables that say the same without the plot */
  children?: ReactNode;
}

type Loading = 'waiting' | 'shown' | 'refused';

/** Loads the interactive plot when its place comes into view. */
function usePlotly(place: React.RefObject<HTMLElement | null>, wanted: boolean) {
  const [Plot, setPlot] = useState<ComponentType<PlotlyPlotProps> | null>(null);
  const [loading, setLoading] = useState<Loading>('waiting');
  useEffect(() => {
    const element = place.current;
    if (!wanted || !element) return;
    let left = false;
    const observer = new IntersectionObserver(
      async (entries) => {
        if (!entries.some((entry) => entry.isIntersecting)) return;
        observer.disconnect();
        try {
          const { PlotlyPlot } = await import('./plotly-plot');
          if (!left) setPlot(() => PlotlyPlot);
        } catch {
          if (!left) setLoading('refused');
        }
      },
      { rootMargin: '200px' },
    );
    observer.observe(element);
    return () => {
      left = true;
      observer.disconnect();
    };
  }, [place, wanted]);
  return { Plot, loading, ready: () => setLoading('shown') };
}

/**
 * A plot in its page. The still picture is there at once and gives its place to the interactive one; in print, in a
 * share and where scripts are off it stays.
 */
export function ChartView({ model, interactive = true, children, ...picking }: ChartViewProps) {
  const id = useId();
  const place = useRef<HTMLDivElement>(null);
  const { Plot, loading, ready } = usePlotly(place, interactive);
  const shown = loading === 'shown';
  return (
    <figure aria-label={model.title} aria-describedby={id} className="min-w-0">
      <p id={id} className="sr-only">
        {model.summary}
      </p>
      <div ref={place} className="relative" style={{ minHeight: model.height }}>
        <div className={shown ? 'hidden print:block' : undefined}>
          <StaticChart model={model} />
        </div>
        {Plot && (
          <div
            className={shown ? 'print:hidden' : 'invisible absolute inset-0'}
            data-plot={shown ? 'ready' : 'loading'}
          >
            <Plot model={model} {...picking} onReady={ready} />
          </div>
        )}
      </div>
      {loading === 'refused' && (
        <p className="px-4 text-sm text-ink-2">
          The interactive plot could not be loaded; this picture shows the same. Reload the page to try again.
        </p>
      )}
      {children}
    </figure>
  );
}
