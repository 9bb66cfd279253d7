import type { CurveResult, PointAnswer, Signal } from '@/lib/engine';
import { absorbanceOf } from '@/lib/engine/absorbance';
import type { StoredReading, StoredStandard } from './stored-curve';

/** One reading of the table of standards: what came, what became of it in the fit. */
export interface ReadingCell {
  readonly pointId: string;
  readonly position: number;
  readonly absorbanceAsRead: number | null;
  /** The absorbance that a second wavelength takes off; null without one. */
  readonly takenOff: number | null;
  /** What stood there instead of a number. */
  readonly gapText: string | null;
  readonly leftOutBecause: string | null;
  readonly origin: StoredReading['origin'];
  readonly spectrumId: string | null;
}

export interface StandardRowView {
  readonly index: number;
  readonly role: StoredStandard['role'];
  readonly name: string;
  readonly concentration: number;
  readonly leftOutBecause: string | null;
  readonly readings: readonly ReadingCell[];
  /** Mean of its fitted readings read back through the line; null when none is in the fit. */
  readonly backCalculated: number | null;
  readonly errorPercent: number | null;
}

const ENGINE_REASON: Readonly<Record<string, string>> = {
  censored: 'it has no number',
  zeroWithReciprocalWeights: 'a standard of zero has no weight under 1/x and 1/x²',
};

/** The name of a reading that the plots and the table share: standard and reading, both from 0. */
export const pointId = (standard: number, reading: number) => `${standard}.${reading}`;

export interface PlacedPoint {
  readonly id: string;
  readonly point: PointAnswer;
}

/**
 * The engine's points beside the standards they came from. Standards are found by their place among the
 * standards of the request; blank readings that are left out never reached the engine.
 */
export function placedPoints(
  standards: readonly StoredStandard[],
  points: readonly PointAnswer[],
): readonly PlacedPoint[] {
  const placeOfStandard = standards.flatMap(({ role }, index) => (role === 'standard' ? [index] : []));
  const blanks = standards.flatMap((standard, index) =>
    standard.role === 'blank' && standard.excludedReason === null
      ? standard.readings.flatMap(({ excludedReason }, at) =>
          excludedReason === null ? [pointId(index, at)] : [],
        )
      : [],
  );
  let blank = 0;
  return points.flatMap((point) => {
    if (point.standardIndex === null) {
      const id = blanks[blank];
      blank += 1;
      return id === undefined ? [] : [{ id, point }];
    }
    const index = placeOfStandard[point.standardIndex];
    return index === undefined ? [] : [{ id: pointId(index, point.replicate - 1), point }];
  });
}

const absorbanceOrNull = (value: number | null, signal: Signal) =>
  value === null ? null : absorbanceOf(value, signal).value;

const mean = (values: readonly number[]) =>
  values.length === 0 ? null : values.reduce((sum, value) => sum + value, 0) / values.length;

function rowOf(standard: StoredStandard, index: number, points: ReadonlyMap<string, PointAnswer>) {
  const own = standard.readings.map((_, at) => points.get(pointId(index, at)));
  const fitted = own.flatMap((point) =>
    point && point.excluded === undefined && point.backCalculated !== null ? [point.backCalculated] : [],
  );
  const backCalculated = mean(fitted);
  const { concentration } = standard;
  return {
    index,
    role: standard.role,
    name: standard.name,
    concentration,
    leftOutBecause: standard.excludedReason,
    backCalculated,
    errorPercent:
      backCalculated === null || concentration === 0
        ? null
        : (100 * (backCalculated - concentration)) / concentration,
    readings: standard.readings.map((reading, at): ReadingCell => {
      const why = own[at]?.excludedBecause;
      return {
        pointId: pointId(index, at),
        position: at + 1,
        absorbanceAsRead: absorbanceOrNull(reading.value, reading.signal),
        takenOff: absorbanceOrNull(reading.minusValue ?? null, reading.signal),
        gapText: reading.gapText,
        leftOutBecause:
          reading.excludedReason ?? standard.excludedReason ?? (why && ENGINE_REASON[why]) ?? null,
        origin: reading.origin,
        spectrumId: reading.spectrumId,
      };
    }),
  };
}

/** The table of standards. Without a curve, as long as the readings make none, it has no read-back. */
export function standardRows(
  standards: readonly StoredStandard[],
  curve: CurveResult | null,
): readonly StandardRowView[] {
  const points = new Map(placedPoints(standards, curve?.points ?? []).map(({ id, point }) => [id, point]));
  return standards.map((standard, index) => rowOf(standard, index, points));
}
