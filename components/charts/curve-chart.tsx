'use client';

import { useMemo } from 'react';

import { ChartView } from './chart-view';
import { curveModel, type CurveLine, type CurvePoint, type CurveUnknown } from './curve-model';
import { PointsTable } from './points-table';

export interface CurveChartProps {
  points: readonly CurvePoint[];
  /** null while too few points make a line */
  line: CurveLine | null;
  range?: { min: number; max: number };
  unit: string;
  yLabel?: string;
  unknowns?: readonly CurveUnknown[];
  chosenPointId?: string;
  /** called with the id of a standard's point, from the plot or from the table under it */
  onPickPoint?: (pointId: string) => void;
  interactive?: boolean;
  height?: number;
}

const NONE: readonly CurveUnknown[] = [];

/** The standard curve. Every point can be hovered, and picked from the plot or from the list under it. */
export function CurveChart({
  points,
  line,
  range,
  unit,
  yLabel = 'A per 10 mm',
  unknowns = NONE,
  chosenPointId,
  onPickPoint,
  interactive,
  height = 340,
}: CurveChartProps) {
  const model = useMemo(
    () => curveModel({ points, line, range, unit, yLabel, unknowns, chosenPointId, height }),
    [points, line, range, unit, yLabel, unknowns, chosenPointId, height],
  );
  function picked(pointId: string | undefined) {
    if (pointId !== undefined && points.some((point) => point.id === pointId)) onPickPoint?.(pointId);
  }
  return (
    <ChartView
      model={model}
      interactive={interactive}
      onPick={onPickPoint && (({ pointId }) => picked(pointId))}
    >
      <PointsTable
        points={points.map((point) => ({ ...point, value: point.absorbance }))}
        valueLabel={yLabel}
        unit={unit}
        digits={4}
        onPickPoint={onPickPoint}
      />
    </ChartView>
  );
}
