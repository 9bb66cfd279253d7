'use client';

import { useMemo } from 'react';

import { ChartView } from './chart-view';
import { PointsTable } from './points-table';
import { residualModel, type ResidualPoint } from './residual-model';

export interface ResidualChartProps {
  points: readonly ResidualPoint[];
  unit: string;
  residualSd?: number;
  chosenPointId?: string;
  onPickPoint?: (pointId: string) => void;
  interactive?: boolean;
  height?: number;
}

/** What is left over after the fit. A bend or a funnel in it is seen here first. */
export function ResidualChart({
  points,
  unit,
  residualSd,
  chosenPointId,
  onPickPoint,
  interactive,
  height = 240,
}: ResidualChartProps) {
  const model = useMemo(
    () => residualModel({ points, unit, residualSd, chosenPointId, height }),
    [points, unit, residualSd, chosenPointId, height],
  );
  return (
    <ChartView
      model={model}
      interactive={interactive}
      onPick={onPickPoint && (({ pointId }) => pointId !== undefined && onPickPoint(pointId))}
    >
      <PointsTable
        points={points.map((point) => ({ ...point, value: point.residual }))}
        valueLabel="residual"
        unit={unit}
        digits={4}
        onPickPoint={onPickPoint}
      />
    </ChartView>
  );
}
