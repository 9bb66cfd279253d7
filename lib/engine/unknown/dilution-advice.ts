import { significantText } from '../../format/round';
import { highestAsRead } from '../absorbance';
import { invert } from '../calibration/invert';
import { makings } from '../dilution/glassware';
import type { FittedCurve } from '../fit-curve';
import { NORMAL_PATH_MM } from '../prepare-points';
import { valueAt } from '../regression/fit';
import type { DilutionAdvice } from '../types';
import type { ConvertedReadings } from './convert-readings';
import type { Measuring } from './measuring';

/** Highest absorbance as read that a dilution aims at. */
const HIGHEST_AIM = 0.6;

/** From here on a reading says only that too little light came through: 0.1 % of stray light levels off at A = 3. */
export const PLATEAU_ABSORBANCE = 3;

const BLIND: DilutionAdvice = { factor: 10, atLeast: true, expectedAbsorbance: null };

/** What a dilution can aim at. */
export interface Aim {
  readonly measuring: Measuring;
  /** Absorbance per 10 mm, after the blank, of a concentration. */
  absorbanceAt(concentration: number): number;
  /** Concentration to aim at, given the highest absorbance per 10 mm after the blank that may be aimed at. */
  concentrationAimedAt(cap: number): number;
}

/** The middle of the curve's absorbance range, or what is allowed of it. */
export function aimOfCurve(curve: FittedCurve): Aim {
  const { fit, data, range } = curve;
  return {
    measuring: curve,
    absorbanceAt: (concentration) => valueAt(fit, concentration),
    concentrationAimedAt: (cap) => {
      const low = valueAt(fit, Math.min(...data.x));
      const top = valueAt(fit, range.max);
      const aimed = invert(fit, Math.min((low + top) / 2, cap));
      return aimed !== null && aimed > 0 ? aimed : range.max / 2;
    },
  };
}

/**
 * How to dilute a solution that was too strong. Aims at the middle of the curve's absorbance range, at most 0.6 as
 * read, by the nearest factor that glassware makes. A censored or plateau reading says nothing about how strong
 * the solution is: at least 1 in 10, then read again. So does a reading above the limit, but it is a lower bound.
 * An estimate from the wing of the band says it in both cases.
 *
 * @param c in the measured solution; null when there is no number
 * @param wingEstimate the same as estimated from the wing of the band, when there is a spectrum
 */
export function adviseDilution(
  aim: Aim,
  readings: ConvertedReadings,
  c: number | null,
  wingEstimate?: number,
): DilutionAdvice {
  const { asRead, meanAsRead } = readings;
  const { request } = aim.measuring;
  const highest = Math.max(...asRead.map(highestAsRead));
  const censored = c === null || meanAsRead === null || highest >= PLATEAU_ABSORBANCE;
  const overLimit = highest > request.absorbanceLimit;
  if (wingEstimate !== undefined && (censored || overLimit))
    return { ...nearest(aim, readings, wingEstimate, false), fromWing: true };
  return censored ? BLIND : nearest(aim, readings, c, overLimit);
}

/** The dilution nearest to the aim of those that keep within the range and below the highest absorbance aimed at. */
function nearest(aim: Aim, readings: ConvertedReadings, c: number, isLowerBound: boolean): DilutionAdvice {
  const { request, range } = aim.measuring;
  const perPath = readings.pathLengthMm / NORMAL_PATH_MM;
  const blank = readings.blank ?? 0;
  // What a second wavelength takes off (turbidity, say) is diluted with the sample; the blank is not.
  const asReadAfter = (factor: number) =>
    aim.absorbanceAt(c / factor) * perPath + blank + readings.meanTakenOff / factor;
  const needed = c / aim.concentrationAimedAt((HIGHEST_AIM - blank) / perPath);
  const all = makings(request.glassware);
  const possible = all.filter(({ factor }) => c / factor <= range.max && asReadAfter(factor) <= HIGHEST_AIM);
  const strongest = all.at(-1) ?? BLIND;
  const distance = (factor: number) => Math.abs(Math.log(factor / needed));
  const chosen = possible.reduce(
    (best, candidate) => (distance(candidate.factor) < distance(best.factor) ? candidate : best),
    possible[0] ?? strongest,
  );
  const atLeast = isLowerBound || possible.length === 0;
  return {
    factor: chosen.factor,
    atLeast,
    expectedAbsorbance: atLeast ? null : asReadAfter(chosen.factor),
    ...('by' in chosen && chosen.by ? { by: chosen.by } : {}),
  };
}

/** "1 in 5 (1 part made up to 5)", "at least 1 in 10, then read again", with what was diluted before. */
export function adviceText(advice: DilutionAdvice, dilutedBefore: boolean): string {
  const factor = significantText(advice.factor, 5);
  const steps = advice.by?.map(({ takenMl, toMl }) => `${takenMl} mL made up to ${toMl} mL`).join(', then ');
  const parts = ` (${steps ?? `1 part made up to ${factor}`})`;
  const onTop = dilutedBefore ? ', on top of the dilution already made' : '';
  const wing = advice.fromWing ? ', as the wing of the band suggests' : '';
  if (!advice.atLeast) return `1 in ${factor}${parts}${onTop}${wing}`;
  const blind = advice.factor === BLIND.factor && steps === undefined;
  return `at least 1 in ${factor}${blind ? '' : parts}${onTop}${wing}, then read again`;
}
