import { absorbanceAsRead, absorbanceOf, type Absorbance } from '../absorbance';
import { isAboveRange } from '../censoring';
import { normalise } from '../prepare-points';
import type { UnknownRequest } from '../types';
import type { Measuring } from './measuring';

/** The readings of one unknown, each converted by itself. */
export interface ConvertedReadings {
  readonly asRead: readonly Absorbance[];
  /** Positions of those with a number. */
  readonly used: readonly number[];
  readonly pathLengthMm: number;
  readonly blank: number | null;
  /** Per 10 mm after the blank, one for each used reading. */
  readonly y: readonly number[];
  /** Null when a reading lies above the instrument's range, or none is left. Of the first wavelength, where a second was taken off. */
  readonly meanAsRead: number | null;
  /** Mean of what a second wavelength took off; 0 when there is none. */
  readonly meanTakenOff: number;
  readonly meanY: number | null;
  /** Lower bound of the mean as read when one is above range and its bound is known. */
  readonly atLeast: number | null;
  readonly state: 'numbers' | 'aboveRange' | 'nothing';
}

export function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/**
 * A reading above range makes the mean a bound, never a number. One that is empty or makes no sense has nothing to
 * say about the mean: the others make it, and a flag tells.
 */
export function convertReadings(
  { request, blanks }: Pick<Measuring, 'request' | 'blanks'>,
  unknown: Pick<UnknownRequest, 'readings' | 'pathLengthMm'>,
  pointer: string,
): ConvertedReadings {
  const asRead = unknown.readings.map((reading, i) =>
    absorbanceOf(reading, request.signal, `${pointer}/readings/${i}`),
  );
  const pathLengthMm = unknown.pathLengthMm ?? request.pathLengthMm;
  const blank = blanks.meanAt(pathLengthMm, pointer);
  const used = asRead.flatMap((item, i) => (item.value === null ? [] : [i]));
  const withNumber = used.map((i) => asRead[i] as Absorbance);
  const numbers = withNumber.map((item) => item.value as number);
  const above = asRead.some((item) => item.censored && isAboveRange(item.censored.reason));
  const state = above ? 'aboveRange' : used.length === 0 ? 'nothing' : 'numbers';
  const y = numbers.map((value) => normalise(value, blank, pathLengthMm));
  const shown = withNumber.map((item) => absorbanceAsRead(item) as number);
  const takenOff = withNumber.map((item) => item.two?.minus ?? 0);
  return {
    asRead,
    used,
    pathLengthMm,
    blank,
    y,
    meanAsRead: state === 'numbers' ? mean(shown) : null,
    meanTakenOff: state === 'numbers' ? mean(takenOff) : 0,
    meanY: state === 'numbers' ? mean(y) : null,
    atLeast: above ? boundOf(asRead) : null,
    state,
  };
}

function boundOf(asRead: readonly Absorbance[]): number | null {
  const bounds = asRead.map((item) => absorbanceAsRead(item) ?? item.censored?.atLeast);
  const known = bounds.filter((bound) => bound !== undefined);
  return known.length === bounds.length ? mean(known) : null;
}
