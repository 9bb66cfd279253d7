import type { SignalKind, XUnit } from '../types';
import { signalFromText, type SignalWords } from '../header-words';

/** Where the x of a UV, visible or near infrared spectrum can lie, in each unit. */
export const X_RANGES: Readonly<Record<XUnit, readonly [number, number]>> = {
  nm: [100, 4000],
  '1/cm': [1000, 100_000],
  um: [0.1, 4],
  angstrom: [1000, 40_000],
  eV: [0.3, 13],
};

/** The units whose range holds all of [low, high], the likeliest first. */
export function fittingUnits(low: number, high: number): XUnit[] {
  const units = (Object.keys(X_RANGES) as XUnit[]).filter(
    (unit) => low >= X_RANGES[unit][0] && high <= X_RANGES[unit][1],
  );
  return units.filter((unit) => likely(unit, low, high));
}

/** Ranges overlap at their ends; a scan that lies whole in the corner of one is the other. */
function likely(unit: XUnit, low: number, high: number): boolean {
  if (unit === 'nm') return low < 2600;
  if (unit === 'angstrom') return high <= 15_000 && low < 12_000 && high - low > 200;
  if (unit === '1/cm') return high > 3300;
  if (unit === 'eV') return high > 1.2 && high - low > 0.05;
  return true;
}

/** Median of the top decile: what the baseline of a transmittance spectrum stands at. */
export function topDecileMedian(y: Float64Array): number {
  const values = y.filter((value) => !Number.isNaN(value)).sort();
  const top = values.slice(Math.floor(values.length * 0.9));
  return top[Math.floor((top.length - 1) / 2)] ?? NaN;
}

export interface JudgedSignal {
  readonly signal: SignalKind;
  readonly scale: number;
  readonly guessed: boolean;
  readonly note?: { readonly code: string; readonly message: string };
}

/** Above this the baseline of a transmittance spectrum is a percentage. */
const PERCENT_FROM = 1.5;
/** Readings above this are no absorbance that a person would leave without a unit. */
const ABSORBANCE_MOST = 20;

/** The person's word for the ordinate; the scale of a unit that says the same (mAU for absorbance) still holds. */
export function answeredSignal(signal: SignalKind, text: string): JudgedSignal {
  const words = signalFromText(text);
  return { signal, scale: words?.signal === signal ? words.scale : 1, guessed: false };
}

/** What the ordinate is, by its words, else by its values; a guess says that it is one. */
export function judgeSignal(text: string, y: Float64Array): JudgedSignal {
  const words = signalFromText(text);
  if (!words) return guessSignal(text, y);
  if (words.openScale) return judgeTransmittance(text, y);
  return checkedPercent(words, text, y);
}

function judgeTransmittance(text: string, y: Float64Array): JudgedSignal {
  if (topDecileMedian(y) > PERCENT_FROM) {
    const message = `"${text}" is taken as per cent, because the readings reach well above 1`;
    return {
      signal: 'percentTransmittance',
      scale: 1,
      guessed: true,
      note: { code: 'PERCENT_INFERRED', message },
    };
  }
  return { signal: 'transmittance', scale: 1, guessed: false };
}

function checkedPercent(words: SignalWords, text: string, y: Float64Array): JudgedSignal {
  const judged = { signal: words.signal, scale: words.scale, guessed: false };
  if (words.signal !== 'percentTransmittance' || !(topDecileMedian(y) <= PERCENT_FROM)) return judged;
  const message = `"${text}" says per cent, but the readings stay below ${PERCENT_FROM}: they may be fractions`;
  return { ...judged, note: { code: 'PERCENT_DOUBTFUL', message } };
}

function guessSignal(text: string, y: Float64Array): JudgedSignal {
  let most = 0;
  for (const value of y) if (Math.abs(value) > most) most = Math.abs(value);
  const unit = text ? `"${text}" does not say what was measured` : 'The file does not say what was measured';
  if (most > ABSORBANCE_MOST || (most > 0 && most < 1e-6)) {
    const message = `${unit}, and the readings (up to ${most}) are no usual absorbance; they are kept as they stand`;
    return { signal: 'other', scale: 1, guessed: true, note: { code: 'SIGNAL_GUESSED', message } };
  }
  return {
    signal: 'absorbance',
    scale: 1,
    guessed: true,
    note: { code: 'SIGNAL_GUESSED', message: `${unit}; it is taken as absorbance` },
  };
}
