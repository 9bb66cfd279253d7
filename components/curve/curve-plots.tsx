'use client';

import { useMemo } from 'react';
import { CurveChart } from '@/components/charts/curve-chart';
import { ResidualChart } from '@/components/charts/residual-chart';
import { Card } from '@/components/ui/card';
import { drawnLine } from '@/lib/curve/curve-line';
import { placedPoints } from '@/lib/curve/standard-rows';
import type { StoredStandard } from '@/lib/curve/stored-curve';
import type { CurveResult } from '@/lib/engine';

function pointsOf(standards: readonly StoredStandard[], curve: CurveResult) {
  return placedPoints(standards, curve.points).map(({ id, point }) => ({
    id,
    name: `${point.name}, reading ${point.replicate}`,
    concentration: point.concentration,
    absorbance: point.absorbance,
    residual: point.residual,
    excluded: point.excluded === true,
  }));
}

/** The line with its bands and the residuals below it. A point can be picked where `onPickPoint` is given. */
export function CurvePlots({
  standards,
  curve,
  chosenPointId,
  onPickPoint,
}: {
  standards: readonly StoredStandard[];
  curve: CurveResult;
  chosenPointId?: string;
  onPickPoint?: (pointId: string) => void;
}) {
  const line = useMemo(() => drawnLine(curve), [curve]);
  const points = useMemo(() => pointsOf(standards, curve), [standards, curve]);
  const drawn = useMemo(
    () =>
      points.flatMap((point) =>
        point.absorbance === null ? [] : [{ ...point, absorbance: point.absorbance }],
      ),
    [points],
  );
  const residuals = useMemo(
    () =>
      points.flatMap((point) => (point.residual === null ? [] : [{ ...point, residual: point.residual }])),
    [points],
  );
  const percent = `${Number((100 * curve.confidence).toPrecision(3))} %`;
  const bands = line.prediction
    ? `${percent} bands: the line, and single readings`
    : line.confidence
      ? `${percent} band of the line`
      : undefined;
  return (
    <>
      <Card flush title="Calibration line" aside={bands}>
        <CurveChart
          points={drawn}
          line={line}
          range={curve.range}
          unit={curve.unit}
          chosenPointId={chosenPointId}
          onPickPoint={onPickPoint}
        />
      </Card>
      <Card flush title="Residuals" aside="band: one residual SD">
        <ResidualChart
          points={residuals}
          unit={curve.unit}
          residualSd={curve.residualSd}
          chosenPointId={chosenPointId}
          onPickPoint={onPickPoint}
        />
      </Card>
    </>
  );
}
