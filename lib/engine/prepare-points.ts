import { absorbanceOf, type Absorbance } from './absorbance';
import type { Blanks } from './blanks';
import type { CurveRequest, PointAnswer, Reading, StandardRequest } from './types';

/** One reading of a standard or of a blank level, on its way into the fit. */
export interface CurvePoint {
  /** Prefix of its lines in the working. */
  readonly id: string;
  readonly name: string;
  readonly role: PointAnswer['role'];
  readonly standardIndex: number | null;
  readonly replicate: number;
  readonly concentration: number;
  readonly pathLengthMm: number;
  readonly reading: Reading;
  readonly asRead: Absorbance;
  /** What was subtracted as blank, as read; null when the curve subtracts none. */
  readonly blank: number | null;
  /** Per 10 mm after the blank; null when censored. */
  readonly y: number | null;
  readonly givenWeight?: number;
  readonly excludedBecause?: PointAnswer['excludedBecause'];
}

/** The response of a point that is fitted: it has a number. */
export function responseOf(point: CurvePoint): number {
  return point.y as number;
}

/** Everything is normalised to this path. */
export const NORMAL_PATH_MM = 10;

/**
 * Absorbance per 10 mm after the blank: (A - A_blank) × 10 mm / l. The order is the measurement model's,
 * section 1: the blank is subtracted as read, in its own path, before the path is normalised.
 */
export function normalise(asRead: number, blank: number | null, pathLengthMm: number): number {
  const net = blank === null ? asRead : asRead - blank;
  return pathLengthMm === NORMAL_PATH_MM ? net : (net * NORMAL_PATH_MM) / pathLengthMm;
}

/** Every reading of the curve as a point: blank levels first, then the standards in the request's order. */
export function preparePoints(request: CurveRequest, blanks: Blanks): readonly CurvePoint[] {
  const levels = blanks.use === 'level' ? blanks.readings : [];
  const blankPoints = levels.map((blank, i): CurvePoint => ({
    id: `curve.blank.${i + 1}`,
    name: 'blank',
    role: 'blank',
    standardIndex: null,
    replicate: i + 1,
    concentration: 0,
    pathLengthMm: blank.pathLengthMm,
    reading: blank.reading,
    asRead: blank.absorbance,
    blank: null,
    y: normalise(blank.asRead, null, blank.pathLengthMm),
    ...(withoutWeightAtZero(request, 0) ? { excludedBecause: 'zeroWithReciprocalWeights' as const } : {}),
  }));
  return [
    ...blankPoints,
    ...request.standards.flatMap((standard, i) => standardPoints(request, standard, i, blanks)),
  ];
}

function withoutWeightAtZero(request: CurveRequest, concentration: number): boolean {
  return concentration === 0 && (request.weighting === '1/x' || request.weighting === '1/x2');
}

function standardPoints(
  request: CurveRequest,
  standard: StandardRequest,
  index: number,
  blanks: Blanks,
): readonly CurvePoint[] {
  const pathLengthMm = standard.pathLengthMm ?? request.pathLengthMm;
  return standard.readings.map((reading, i): CurvePoint => {
    const pointer = `/standards/${index}/readings/${i}`;
    const asRead = absorbanceOf(reading, request.signal, pointer);
    const blank = blanks.meanAt(pathLengthMm, pointer);
    const excludedBecause = whyExcluded(request, standard, i, asRead);
    return {
      id: `curve.standard.${index + 1}.${i + 1}`,
      name: standard.name ?? `standard ${index + 1}`,
      role: 'standard',
      standardIndex: index,
      replicate: i + 1,
      concentration: standard.concentration,
      pathLengthMm,
      reading,
      asRead,
      blank,
      y: asRead.value === null ? null : normalise(asRead.value, blank, pathLengthMm),
      ...(standard.weight === undefined ? {} : { givenWeight: standard.weight }),
      ...(excludedBecause === undefined ? {} : { excludedBecause }),
    };
  });
}

function whyExcluded(
  request: CurveRequest,
  standard: StandardRequest,
  reading: number,
  asRead: Absorbance,
): PointAnswer['excludedBecause'] {
  if (standard.excluded === true || standard.excludedReadings?.includes(reading)) return 'request';
  if (asRead.value === null) return 'censored';
  return withoutWeightAtZero(request, standard.concentration) ? 'zeroWithReciprocalWeights' : undefined;
}
