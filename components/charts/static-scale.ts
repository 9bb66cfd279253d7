import { plotHeight, type ChartModel } from './chart-model';

export interface StaticScale {
  height: number;
  /** across, as a per cent of the plot's own width, which only the browser knows */
  x(value: number): string;
  width(from: number, to: number): string;
  /** down, in px */
  y(value: number): number;
  /** both in thousandths, for paths in the stretched inner drawing */
  path(x: readonly number[], y: readonly (number | null)[]): string;
}

export function scaleOf(model: ChartModel): StaticScale {
  const height = plotHeight(model);
  const across = (value: number) => (value - model.x.min) / (model.x.max - model.x.min);
  const down = (value: number) => 1 - (value - model.y.min) / (model.y.max - model.y.min);
  return {
    height,
    x: (value) => `${(100 * across(value)).toFixed(3)}%`,
    width: (from, to) => `${(100 * (across(to) - across(from))).toFixed(3)}%`,
    y: (value) => Math.round(10 * height * down(value)) / 10,
    path(x, y) {
      let pen = 'M';
      let path = '';
      x.forEach((value, i) => {
        const level = y[i] ?? null;
        if (level === null) {
          pen = 'M';
          return;
        }
        path += `${pen}${(1000 * across(value)).toFixed(1)} ${(1000 * down(level)).toFixed(1)}`;
        pen = 'L';
      });
      return path;
    },
  };
}
