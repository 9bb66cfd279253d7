import { significantText } from '../../format/round';
import { highestAsRead } from '../absorbance';
import { invert } from '../calibration/invert';
import type { FittedCurve } from '../fit-curve';
import { NORMAL_PATH_MM } from '../prepare-points';
import { valueAt } from '../regression/fit';
import type { DilutionAdvice } from '../types';
import type { ConvertedReadings } from './convert-readings';

/** Made with one pipette (1, 2, 5, 10, 20, 25 mL) and one flask, or two such steps from 1 in 200 on. */
const GLASSWARE_FACTORS = [2, 4, 5, 10, 20, 25, 50, 100, 200, 250, 500, 1000, 2000, 5000, 10000] as const;

/** Highest absorbance as read that a dilution aims at. */
const HIGHEST_AIM = 0.6;

/** From here on a reading says only that too little light came through: 0.1 % of stray light levels off at A = 3. */
export const PLATEAU_ABSORBANCE = 3;

const BLIND: DilutionAdvice = { factor: 10, atLeast: true, expectedAbsorbance: null };

/**
 * How to dilute a solution that was too strong. Aims at the middle of the curve's absorbance range, at most 0.6 as
 * read, by the nearest factor that glassware makes. A censored or plateau reading says nothing about how strong
 * the solution is: at least 1 in 10, then read again. So does a reading above the limit, but it is a lower bound.
 *
 * @param c in the measured solution; null when there is no number
 */
export function adviseDilution(
  curve: FittedCurve,
  readings: ConvertedReadings,
  c: number | null,
): DilutionAdvice {
  const { meanAsRead, asRead } = readings;
  if (c === null || meanAsRead === null || asRead.some((item) => highestAsRead(item) >= PLATEAU_ABSORBANCE))
    return BLIND;
  // What a second wavelength takes off (turbidity, say) is diluted with the sample; the blank is not.
  const asReadAfter = (factor: number) =>
    (valueAt(curve.fit, c / factor) * readings.pathLengthMm) / NORMAL_PATH_MM +
    (readings.blank ?? 0) +
    readings.meanTakenOff / factor;
  const needed = c / concentrationAimedAt(curve, readings);
  const fits = (factor: number) => c / factor <= curve.range.max && asReadAfter(factor) <= HIGHEST_AIM;
  const possible = GLASSWARE_FACTORS.filter(fits);
  const distance = (factor: number) => Math.abs(Math.log(factor / needed));
  const strongest = GLASSWARE_FACTORS[GLASSWARE_FACTORS.length - 1] ?? BLIND.factor;
  const factor = possible.reduce<number>(
    (best, candidate) => (distance(candidate) < distance(best) ? candidate : best),
    possible[0] ?? strongest,
  );
  const overLimit = asRead.some((item) => highestAsRead(item) > curve.request.absorbanceLimit);
  const atLeast = overLimit || possible.length === 0;
  return { factor, atLeast, expectedAbsorbance: atLeast ? null : asReadAfter(factor) };
}

function concentrationAimedAt(curve: FittedCurve, readings: ConvertedReadings): number {
  const { fit, data, range } = curve;
  const low = valueAt(fit, Math.min(...data.x));
  const top = valueAt(fit, range.max);
  const cap = ((HIGHEST_AIM - (readings.blank ?? 0)) * NORMAL_PATH_MM) / readings.pathLengthMm;
  const aimed = invert(fit, Math.min((low + top) / 2, cap));
  return aimed !== null && aimed > 0 ? aimed : range.max / 2;
}

/** "1 in 5 (1 part made up to 5)", "at least 1 in 10, then read again", with what was diluted before. */
export function adviceText(advice: DilutionAdvice, dilutedBefore: boolean): string {
  const factor = significantText(advice.factor, 5);
  const parts = ` (1 part made up to ${factor})`;
  const onTop = dilutedBefore ? ', on top of the dilution already made' : '';
  if (!advice.atLeast) return `1 in ${factor}${parts}${onTop}`;
  return `at least 1 in ${factor}${advice.factor === BLIND.factor ? '' : parts}${onTop}, then read again`;
}
