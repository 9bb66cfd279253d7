import type { ChartModel } from './chart-model';
import { axisAround } from './ticks';

export interface ResidualPoint {
  id: string;
  name: string;
  concentration: number;
  /** measured minus fitted absorbance, per 10 mm */
  residual: number;
  excluded?: boolean;
}

export interface ResidualModelInput {
  points: readonly ResidualPoint[];
  unit: string;
  /** draws the band of one residual standard deviation on both sides of zero */
  residualSd?: number;
  chosenPointId?: string;
  height: number;
}

/** What is left over after the fit, over concentration; the axis is even on both sides of zero. */
export function residualModel({
  points,
  unit,
  residualSd,
  chosenPointId,
  height,
}: ResidualModelInput): ChartModel {
  const x = axisAround([0, ...points.map((point) => point.concentration)]);
  const far = 1.15 * Math.max(residualSd ?? 0, ...points.map((point) => Math.abs(point.residual))) || 0.001;
  const ends = [x.min, x.max];
  const fitted = points.filter((point) => !point.excluded);
  const largest = fitted.reduce<ResidualPoint | null>(
    (most, point) => (most && Math.abs(most.residual) >= Math.abs(point.residual) ? most : point),
    null,
  );
  return {
    title: 'Residuals',
    summary:
      `Measured minus fitted absorbance over concentration, ${fitted.length} readings.` +
      (largest
        ? ` The largest is ${largest.residual.toFixed(4)}, ${largest.name} at ${largest.concentration} ${unit}.`
        : ''),
    x: { label: `concentration, ${unit}`, ...x },
    y: { label: 'residual, A per 10 mm', min: -far, max: far },
    bands:
      residualSd === undefined
        ? []
        : [
            {
              name: 'residual SD',
              x: ends,
              low: [-residualSd, -residualSd],
              high: [residualSd, residualSd],
              colour: 'band-wide',
            },
          ],
    regions: [],
    lines: [{ id: 'zero', name: 'zero', x: ends, y: [0, 0], colour: 'uv', dash: 'solid', width: 1.2 }],
    points: points.map((point) => ({
      id: point.id,
      name: point.name,
      x: point.concentration,
      y: point.residual,
      colour: point.excluded ? 'ink-2' : 'ink',
      shape: 'circle',
      hollow: point.excluded,
      chosen: point.id === chosenPointId,
      hover: `${point.name}, ${point.concentration} ${unit}\nresidual ${point.residual.toFixed(4)}`,
    })),
    markers: [],
    guides: [],
    labels: [],
    ribbon: false,
    height,
  };
}
