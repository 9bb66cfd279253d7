import { type Blanks, prepareBlanks } from '../blanks';
import { NORMAL_PATH_MM } from '../prepare-points';
import { type MeanReading, meanReading } from './mean-reading';
import type { DirectRequest } from './types';

/** Blanks of a method without a curve are subtracted, when there are any. */
export function directBlanks(request: DirectRequest): Blanks {
  const { signal, pathLengthMm, blank } = request;
  return prepareBlanks({
    signal,
    pathLengthMm,
    ...(blank ? { blank: { ...blank, use: 'subtract' as const } } : {}),
  });
}

/** The mean blank of a path as read, with its uncertainty; null without blanks. */
export function blankMean(request: DirectRequest, blanks: Blanks, pathLengthMm: number): MeanReading | null {
  const values = blanks.readings
    .filter((item) => item.pathLengthMm === pathLengthMm)
    .map((item) => item.asRead);
  return values.length === 0 ? null : meanReading(values, request.readingSd);
}

/** Standard deviation known beforehand of a reading per 10 mm. */
export function knownSd({ readingSd }: DirectRequest, pathLengthMm: number): number | undefined {
  return readingSd === undefined ? undefined : (readingSd * NORMAL_PATH_MM) / pathLengthMm;
}
