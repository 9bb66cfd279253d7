import { type Absorbance, absorbanceOf, readingText } from './absorbance';
import { EngineError } from './errors';
import type { CurveRequest, Reading } from './types';

export interface BlankReading {
  readonly reading: Reading;
  /** What is calculated with. */
  readonly asRead: number;
  readonly absorbance: Absorbance;
  readonly pathLengthMm: number;
}

/** The curve's one decision about blanks, with the readings behind it. */
export interface Blanks {
  readonly use: 'none' | 'subtract' | 'level';
  readonly readings: readonly BlankReading[];
  /** Mean blank of a path as read; null unless blanks are subtracted. */
  meanAt(pathLengthMm: number, pointer: string): number | null;
  /** Blank readings of a path. */
  countAt(pathLengthMm: number): number;
}

/**
 * Blank readings as absorbances, by path. A blank without a number is refused: it would silently change what
 * every reading of the curve has subtracted from it.
 *
 * @throws EngineError BLANK_CENSORED; and BLANK_PATH_MISSING when a reading's path has no blank
 */
export function prepareBlanks(request: Pick<CurveRequest, 'blank' | 'signal' | 'pathLengthMm'>): Blanks {
  const { blank } = request;
  const convert = (readings: readonly Reading[], pathLengthMm: number, pointer: string) =>
    readings.map((reading, i): BlankReading => {
      const absorbance = absorbanceOf(reading, request.signal, `${pointer}/${i}`);
      const asRead = absorbance.value;
      if (asRead === null) {
        throw new EngineError(
          'BLANK_CENSORED',
          `a blank reading must have a number, got "${readingText(reading)}"; leave it out or read the blank again`,
          `${pointer}/${i}`,
        );
      }
      return { reading, asRead, absorbance, pathLengthMm };
    });
  const readings = blank
    ? [
        ...convert(blank.readings, request.pathLengthMm, '/blank/readings'),
        ...(blank.otherPaths ?? []).flatMap((other, i) =>
          convert(other.readings, other.pathLengthMm, `/blank/otherPaths/${i}/readings`),
        ),
      ]
    : [];
  const at = (pathLengthMm: number) => readings.filter((item) => item.pathLengthMm === pathLengthMm);
  return {
    use: blank?.use ?? 'none',
    readings,
    countAt: (pathLengthMm) => at(pathLengthMm).length,
    meanAt(pathLengthMm, pointer) {
      if (blank?.use !== 'subtract') return null;
      const same = at(pathLengthMm);
      if (same.length === 0) {
        throw new EngineError(
          'BLANK_PATH_MISSING',
          `a reading at ${pathLengthMm} mm needs a blank reading at ${pathLengthMm} mm to be subtracted from it`,
          pointer,
        );
      }
      return same.reduce((sum, item) => sum + item.asRead, 0) / same.length;
    },
  };
}
