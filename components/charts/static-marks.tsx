import { cssColour } from './chart-colour';
import type { ChartLabel, ChartModel, ChartPoint } from './chart-model';
import type { StaticScale } from './static-scale';

interface Part {
  model: ChartModel;
  scale: StaticScale;
}

const SHAPES = {
  circle: 'M-4 0a4 4 0 1 1 8 0a4 4 0 1 1 -8 0',
  diamond: 'M0 -5.2 5.2 0 0 5.2 -5.2 0Z',
  triangle: 'M0 -5 5 4 -5 4Z',
} as const;

function Mark({ point, scale }: { point: ChartPoint; scale: StaticScale }) {
  const colour = cssColour(point.colour);
  // a nested svg can stand at a per cent across; a transform cannot
  return (
    <svg x={scale.x(point.x)} y={scale.y(point.y)} overflow="visible">
      {point.chosen && <circle r="8" fill="none" className="stroke-uv" strokeWidth="2" />}
      <path
        transform={point.large ? 'scale(1.3)' : undefined}
        d={SHAPES[point.shape]}
        stroke={point.hollow ? colour : 'var(--color-sheet)'}
        strokeWidth={point.hollow ? 1.4 : 1}
        fill={point.hollow ? 'var(--color-sheet)' : colour}
      />
      {point.hollow && <path d="M-2.8 2.8 2.8 -2.8" stroke={colour} strokeWidth="1.2" />}
    </svg>
  );
}

export function StaticPoints({ model, scale }: Part) {
  return model.points.map((point) => <Mark key={point.id} point={point} scale={scale} />);
}

const SIDES: Record<ChartLabel['side'], { dx: number; dy: number; anchor: 'start' | 'middle' | 'end' }> = {
  right: { dx: 10, dy: 14, anchor: 'start' },
  left: { dx: -10, dy: -8, anchor: 'end' },
  'above-right': { dx: 10, dy: -4, anchor: 'start' },
};

/** Words at their things, with a rim of sheet so that a line behind them does not cut through. */
export function StaticLabels({ model, scale }: Part) {
  const halo = {
    paintOrder: 'stroke',
    stroke: 'var(--color-sheet)',
    strokeWidth: 3,
    strokeLinejoin: 'round' as const,
  };
  return (
    <>
      {model.labels.map((label) => {
        const side = SIDES[label.side];
        return (
          <text
            key={`${label.text} ${label.x}`}
            x={scale.x(label.x)}
            y={scale.y(label.y)}
            dx={side.dx}
            dy={side.dy}
            textAnchor={side.anchor}
            fill={cssColour(label.colour)}
            {...halo}
          >
            {label.text}
          </text>
        );
      })}
      {model.markers.map((marker) => {
        const late = marker.x > model.x.min + 0.7 * (model.x.max - model.x.min);
        return (
          <text
            key={marker.x}
            x={scale.x(marker.x)}
            dx={late ? -7 : 7}
            y="-6"
            textAnchor={late ? 'end' : 'start'}
            className="fill-uv"
          >
            {marker.label}
          </text>
        );
      })}
    </>
  );
}
