/** How far a number agrees with a printed one. */
export interface Agreement {
  /** Whole digits that agree; the log relative error, and never more than are printed. */
  readonly digits: number;
  /** Significant digits as printed. */
  readonly printed: number;
  /** Rounded to the printed digits, the two are the same. */
  readonly all: boolean;
}

/** Printed text in parts: its digits without the point, how many stand behind the point, the power of ten. */
function partsOf(text: string) {
  const match = /^[+-]?(\d*)\.?(\d*)(?:[eE]([+-]?\d+))?$/.exec(text);
  if (!match || !/\d/.test(text))
    throw new RangeError(`a printed number must be plain decimal text, got "${text}"`);
  const [, whole = '', decimals = '', exponent = '0'] = match;
  return { digits: whole + decimals, decimals: decimals.length, exponent: Number(exponent) };
}

/** Significant digits of a number as printed: 0.0050 has two, 1.20 three. Of a zero, its decimals. */
export function printedDigits(text: string): number {
  const { digits, decimals } = partsOf(text);
  return digits.replace(/^0+/, '').length || Math.max(1, decimals);
}

/** Half a unit of the last printed digit, with room for the binary image of the printed decimal itself. */
function halfUnit(text: string): number {
  const { decimals, exponent } = partsOf(text);
  return 0.5 * 10 ** (exponent - decimals) * (1 + 1e-9);
}

/**
 * Compare a number with a printed one. All digits agree when it lies within half a unit of the last printed digit;
 * else as many whole digits as the log relative error has, -log10(|ours - printed| / |printed|), at most all but
 * one. Of a printed zero the error is taken as it is.
 *
 * @throws RangeError when `published` is no plain decimal text
 * @source log relative error: as in NIST's Statistical Reference Datasets
 */
export function agreement(ours: number, published: string): Agreement {
  const printed = printedDigits(published);
  const certified = Number(published);
  const error = Math.abs(ours - certified);
  if (error <= halfUnit(published)) return { digits: printed, printed, all: true };
  const logRelativeError = -Math.log10(certified === 0 ? error : error / Math.abs(certified));
  const digits = Number.isNaN(logRelativeError) ? 0 : Math.floor(logRelativeError);
  return { digits: Math.min(Math.max(0, digits), printed - 1), printed, all: false };
}

/**
 * Where more digits are printed, this many are enough: numbers of 53 bits carry 15 to 16, and a fit loses some of
 * them on data that were made to be hard.
 */
export const ENOUGH_DIGITS = 12;

/** The verdict: the same as printed, or the same as far as the arithmetic of computers carries. */
export function agrees({ digits, all }: Agreement): boolean {
  return all || digits >= ENOUGH_DIGITS;
}
