import { useId } from 'react';

import { bottomMargin, MARGIN, plotHeight, type ChartModel } from './chart-model';
import { StaticLabels, StaticPoints } from './static-marks';
import { StaticLines, StaticRegions, StaticSentences } from './static-shapes';
import { scaleOf } from './static-scale';
import { tickText, ticksBetween } from './ticks';
import { ribbonBetween } from './visible-light';

/**
 * The model as SVG: rendered on the server, before the interactive plot is there, in print and in shares. Across it
 * stretches with its place; letters and points keep their size, so that it can be read at any width.
 */
export function StaticChart({ model }: { model: ChartModel }) {
  const scale = scaleOf(model);
  const height = plotHeight(model);
  return (
    <div
      style={{
        padding: `${MARGIN.top}px ${MARGIN.right}px ${bottomMargin(model)}px ${MARGIN.left}px`,
        height: model.height,
      }}
    >
      <svg
        role="img"
        aria-label={model.title}
        width="100%"
        height={height}
        overflow="visible"
        className="block font-mono text-[11px]"
      >
        <StaticRegions model={model} scale={scale} />
        <Grid model={model} />
        {model.ribbon && <Ribbon model={model} />}
        <StaticLines model={model} scale={scale} />
        <StaticSentences model={model} scale={scale} />
        <StaticPoints model={model} scale={scale} />
        <StaticLabels model={model} scale={scale} />
      </svg>
    </div>
  );
}

function Grid({ model }: { model: ChartModel }) {
  const scale = scaleOf(model);
  const y = ticksBetween(model.y.min, model.y.max, 5);
  const x = ticksBetween(model.x.min, model.x.max, 6);
  const below = scale.height + (model.ribbon ? 27 : 18);
  return (
    <g className="fill-ink-2">
      {y.at.map((tick) => (
        <g key={tick}>
          <line x1="0" x2="100%" y1={scale.y(tick)} y2={scale.y(tick)} className="stroke-grid" />
          <text x="-8" y={scale.y(tick)} dy="0.35em" textAnchor="end">
            {tickText(tick, y.decimals)}
          </text>
        </g>
      ))}
      {x.at.map((tick) => (
        <text key={tick} x={scale.x(tick)} y={below} textAnchor="middle">
          {tickText(tick, x.decimals)}
        </text>
      ))}
      <text x="50%" y={below + 17} textAnchor="middle" className="font-sans">
        {model.x.label}
      </text>
      <text x={-MARGIN.left + 8} y={-11} className="font-sans">
        {model.y.label}
      </text>
    </g>
  );
}

function Ribbon({ model }: { model: ChartModel }) {
  const id = useId();
  const ribbon = ribbonBetween(model.x.min, model.x.max);
  if (!ribbon) return null;
  const scale = scaleOf(model);
  return (
    <g>
      <defs>
        <linearGradient id={id}>
          {ribbon.stops.map((stop) => (
            <stop key={stop.offset} offset={stop.offset} stopColor={stop.colour} />
          ))}
        </linearGradient>
      </defs>
      <rect
        x={scale.x(ribbon.from)}
        width={scale.width(ribbon.from, ribbon.to)}
        y={scale.height + 4}
        height="6"
        fill={`url(#${id})`}
      />
    </g>
  );
}
