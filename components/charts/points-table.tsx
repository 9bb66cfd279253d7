import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import { Table, Td, Th } from '@/components/ui/table';

import { tickText } from './ticks';

export interface ListedPoint {
  id: string;
  name: string;
  concentration: number;
  value: number;
  excluded?: boolean;
}

/** The points of a plot as a table, for those who cannot see or point; what a click does there, a button does here. */
export function PointsTable({
  points,
  valueLabel,
  unit,
  digits,
  onPickPoint,
}: {
  points: readonly ListedPoint[];
  valueLabel: string;
  unit: string;
  digits: number;
  onPickPoint?: (pointId: string) => void;
}) {
  return (
    <div className="no-print px-4 pb-3">
      <Disclosure summary="The points of this plot as a table">
        <Table label="Points of the plot">
          <thead>
            <tr>
              <Th>Standard</Th>
              <Th numeric>c, {unit}</Th>
              <Th numeric>{valueLabel}</Th>
              <Th>In the fit</Th>
              {onPickPoint && <Th>Choose</Th>}
            </tr>
          </thead>
          <tbody>
            {points.map((point) => (
              <tr key={point.id}>
                <Td>{point.name}</Td>
                <Td numeric>{point.concentration}</Td>
                <Td numeric>{tickText(point.value, digits)}</Td>
                <Td>{point.excluded ? 'left out' : 'yes'}</Td>
                {onPickPoint && (
                  <Td>
                    <Button
                      size="small"
                      variant="quiet"
                      aria-label={`Choose ${point.name}, ${tickText(point.value, digits)}`}
                      onClick={() => onPickPoint(point.id)}
                    >
                      Choose
                    </Button>
                  </Td>
                )}
              </tr>
            ))}
          </tbody>
        </Table>
      </Disclosure>
    </div>
  );
}
