import { significantText } from '../format/round';

export type FlagLevel = 'note' | 'warn' | 'stop';

/** The numbers a flag's text is made from; each flag uses the members it needs. */
export interface FlagNumbers {
  readonly value?: number;
  readonly limit?: number;
  readonly unit?: string;
  readonly name?: string;
  readonly detail?: string;
}

interface FlagKind {
  readonly level: FlagLevel;
  /** What it means, for the table in the README. */
  readonly meaning: string;
  readonly text: (numbers: FlagNumbers) => string;
}

const n = (x: number | undefined) => (x === undefined ? 'an unknown amount' : significantText(x, 3));
const named = (name: string | undefined) => name ?? 'A standard';

/** Everything the engine may say about a curve or a result. One entry per code; nothing else may be flagged. */
export const FLAGS = {
  READING_OVER_LIMIT: {
    level: 'stop',
    meaning: 'a reading above the absorbance limit',
    text: (f) =>
      `A reading of ${n(f.value)} is above the absorbance limit of ${n(f.limit)}. Up there stray light makes absorbances come out low, so no concentration is given. Dilute: ${f.detail ?? ''}`,
  },
  READING_CENSORED: {
    level: 'stop',
    meaning: 'a reading that the instrument could not give, above its range',
    text: (f) =>
      `The instrument showed "${f.name ?? ''}" instead of a number: the absorbance is above its range, so no concentration is given. Dilute: ${f.detail ?? ''}`,
  },
  READING_WITHOUT_NUMBER: {
    level: 'stop',
    meaning: 'no reading with a number',
    text: (f) =>
      `"${f.name ?? ''}" is not a reading that can be used, and no other is left. Read the solution again.`,
  },
  READING_LEFT_OUT: {
    level: 'warn',
    meaning: 'one of several readings has no number and was left out of the mean',
    text: (f) =>
      `${n(f.value)} of ${n(f.limit)} readings had no number ("${f.name ?? ''}") and took no part in the mean. Read again if the missing one matters.`,
  },
  READING_NEGATIVE: {
    level: 'warn',
    meaning: 'an absorbance below zero by more than the noise explains',
    text: (f) =>
      `The absorbance ${n(f.value)} lies below ${n(f.limit)}, three standard deviations under zero: the reference was darker than the sample. Swap the cells; if the sign turns, it is the cells, if not, the baseline.`,
  },
  REPLICATES_APART: {
    level: 'warn',
    meaning: 'replicate readings that disagree',
    text: (f) =>
      `The replicate readings differ by ${n(f.value)}, more than the ${n(f.limit)} allowed. ${f.detail ?? ''} Look for a bubble, a fingerprint or carry-over, and read again; every reading stays on record.`,
  },
  OVER_TOP_STANDARD: {
    level: 'stop',
    meaning: 'a concentration above the top standard',
    text: (f) =>
      `The measured solution comes out at ${n(f.value)} ${f.unit ?? ''}, above the top standard of ${n(f.limit)}: the curve says nothing there. Dilute: ${f.detail ?? ''}`,
  },
  UNDER_LOWEST_STANDARD: {
    level: 'warn',
    meaning: 'detected, but below the lowest standard',
    text: (f) =>
      `The measured solution comes out at ${n(f.value)} ${f.unit ?? ''}: detected, but below the lowest standard of ${n(f.limit)}. Take more sample, a longer cell, or add a lower standard.`,
  },
  NOT_DETECTED: {
    level: 'warn',
    meaning: 'a concentration below the critical value',
    text: (f) =>
      `The measured solution comes out below the critical value of ${n(f.limit)} ${f.unit ?? ''}: it cannot be told from a blank. It is reported as less than the lowest standard.`,
  },
  VALUE_UNDER_CRITICAL: {
    level: 'warn',
    meaning: 'within the standards, yet below the critical value',
    text: (f) =>
      `${n(f.value)} ${f.unit ?? ''} lies within the standards but below the critical value of ${n(f.limit)}: the scatter of this curve is too large for its lowest standard. Read more replicates or repeat the curve.`,
  },
  CURVE_GIVES_NO_ROOT: {
    level: 'stop',
    meaning: 'an absorbance that the quadratic never reaches',
    text: (f) =>
      `The quadratic never reaches the absorbance ${n(f.value)} of this solution, so no concentration can be read. Dilute: ${f.detail ?? ''}`,
  },
  CELL_WITHOUT_U: {
    level: 'note',
    meaning: 'an unknown read in a cell of another path length whose uncertainty was not given',
    text: (f) =>
      `The unknown was read at ${n(f.value)} mm, the curve at ${n(f.limit)} mm: another cell. Its path length enters the result without an uncertainty until one is given.`,
  },
  READING_WITHOUT_U: {
    level: 'note',
    meaning: 'one reading, and nothing known of its scatter',
    text: (f) =>
      `${named(f.name)} was read once and nothing is known of the scatter: its reading enters without an uncertainty. Read it again, or state the standard deviation of a reading.`,
  },
  PATH_WITHOUT_U: {
    level: 'note',
    meaning: 'a path length without an uncertainty where it does not cancel',
    text: (f) =>
      `The path length of ${n(f.value)} mm divides the result and has no uncertainty. State the tolerance of the cell.`,
  },
  ABSORPTIVITY_WITHOUT_U: {
    level: 'note',
    meaning: 'a known absorptivity without an uncertainty',
    text: (f) =>
      `The absorptivity ${n(f.value)} has no uncertainty, so that of the result is too small. Take it from where the value comes from.`,
  },
  ABSORPTIVITY_WITHOUT_CONDITIONS: {
    level: 'note',
    meaning: 'a known absorptivity whose conditions were not stated',
    text: () =>
      'An absorptivity holds for one wavelength, solvent, acidity, temperature and bandwidth, and none was stated. Check that the readings were taken under the same.',
  },
  FAR_FROM_STANDARD: {
    level: 'warn',
    meaning: 'an unknown far from the one standard it is compared with',
    text: (f) =>
      `The unknown reads ${n(f.value)} times the standard, outside 1/${n(f.limit)} to ${n(f.limit)}: one standard rests on a line through zero all that way. Use a standard nearer to it, or a curve.`,
  },
  STANDARD_DRIFTED: {
    level: 'warn',
    meaning: 'a standard that read differently before and after the unknowns',
    text: (f) =>
      `The standard changed by ${n(f.value)} % between before and after the unknowns, more than ${n(f.limit)} %. Find the drift and read the unknowns again.`,
  },
  MDL_DESIGN: {
    level: 'warn',
    meaning: 'a method detection limit whose study does not have the prescribed design',
    text: (f) =>
      `The study of the method detection limit falls short: ${f.detail ?? ''}. The limit is computed, but it is not one by 40 CFR 136.`,
  },
  MDL_SPIKE_LEVEL: {
    level: 'warn',
    meaning: 'spikes of a method detection limit too near to it or too far above it',
    text: (f) =>
      `The spikes of ${n(f.value)} ${f.unit ?? ''} are not 2 to 10 times the limit found, ${n(f.limit)}. Repeat the study with spikes ${f.detail ?? ''}.`,
  },
  FEW_DEGREES_OF_FREEDOM: {
    level: 'note',
    meaning: 'fewer than three degrees of freedom',
    text: (f) =>
      `The scatter rests on ${n(f.value)} degrees of freedom, fewer than ${n(f.limit)}: coverage factors are large. Add standards or replicates.`,
  },
  NO_SCATTER: {
    level: 'note',
    meaning: 'readings that lie on the curve exactly',
    text: () =>
      'Every reading lies on the curve exactly, so the readings carry no uncertainty at all. Check that they are measured values, with all their digits.',
  },
  SLOPE_NEGATIVE: {
    level: 'warn',
    meaning: 'absorbance that falls with concentration',
    text: (f) =>
      `The slope is negative (${n(f.value)}): absorbance falls as concentration rises. Check the order of the standards and the signal.`,
  },
  SLOPE_LOOSE: {
    level: 'warn',
    meaning: 'a slope so uncertain that the usual uncertainty formula is an approximation',
    text: (f) =>
      `g is ${n(f.value)}, above ${n(f.limit)}: the slope is uncertain enough to make the interval lopsided. Use the Fieller interval, and more or wider-spaced standards.`,
  },
  SLOPE_NOT_PROVEN: {
    level: 'warn',
    meaning: 'a slope that cannot be told from zero; the Fieller interval is unbounded',
    text: (f) =>
      `g is ${n(f.value)}, not below ${n(f.limit)}: the slope cannot be told from zero, and no interval is bounded. Repeat the standards before using this curve.`,
  },
  INTERCEPT_NOT_ZERO: {
    level: 'warn',
    meaning: 'a line through zero whose points do not pass through zero',
    text: (f) =>
      `A free line through these standards has an intercept of ${n(f.value)}, ${n(f.limit)} times its uncertainty. Forced through zero, low results are off by ${f.detail ?? 'as much'}. Use a free intercept or find the blank.`,
  },
  ZERO_STANDARD_WITH_SUBTRACT: {
    level: 'note',
    meaning: 'a standard of concentration zero beside a subtracted blank',
    text: (f) =>
      `${named(f.name)} has concentration zero while the blank is subtracted from every reading. Both are kept; make sure that it is not the same solution counted twice.`,
  },
  ZERO_STANDARD_LEFT_OUT: {
    level: 'note',
    meaning: 'a zero standard left out under weights 1/x or 1/x²',
    text: (f) =>
      `${named(f.name)} has concentration zero, where 1/x has no value: ${n(f.value)} readings took no part in the fit. They are still shown.`,
  },
  STANDARD_LEFT_OUT: {
    level: 'note',
    meaning: 'readings of standards left out on request',
    text: (f) =>
      `${n(f.value)} readings of standards are left out. They are still shown; the curve now holds for ${f.detail ?? 'the rest'}.`,
  },
  STANDARD_CENSORED: {
    level: 'warn',
    meaning: 'a reading of a standard without a number, left out of the fit',
    text: (f) =>
      `${named(f.name)} has a reading without a number ("${f.detail ?? ''}"). It took no part in the fit. Read it again, diluted if it was too strong.`,
  },
  STANDARD_OVER_LIMIT: {
    level: 'warn',
    meaning: 'a reading of a standard above the absorbance limit',
    text: (f) =>
      `${named(f.name)} reads ${n(f.value)}, above the absorbance limit of ${n(f.limit)}. Stray light bends the curve there: leave it out or use a shorter cell.`,
  },
  STANDARD_BACK_CALCULATES_OFF: {
    level: 'warn',
    meaning: 'a level whose mean back-calculates further off than 20 % (lowest) or 10 % (others)',
    text: (f) =>
      `The level ${f.detail ?? ''} ${f.unit ?? ''} back-calculates at ${n(f.value)} %, outside ±${n(f.limit)} %. Check how it was made, weight the fit, or shorten the range.`,
  },
  CRITICAL_OVER_LOWEST: {
    level: 'warn',
    meaning: 'a critical value above the lowest standard',
    text: (f) =>
      `The critical value ${n(f.value)} ${f.unit ?? ''} is above the lowest standard of ${n(f.limit)}: near it nothing can be told from a blank. Read more replicates, or start the curve higher.`,
  },
  LACK_OF_FIT: {
    level: 'warn',
    meaning: 'levels further from the curve than the replicates explain',
    text: (f) =>
      `The levels scatter about the curve more than their replicates do (F ${n(f.value)}, 95 % limit ${n(f.limit)}). Look at the residuals: a bend asks for a shorter range, one level for a new standard.`,
  },
  CURVATURE: {
    level: 'warn',
    meaning: 'a bend that a straight line does not follow (Mandel)',
    text: (f) =>
      `The readings bend: Mandel's F is ${n(f.value)}, above ${n(f.limit)} (99 %). Shorten the range, or use a quadratic.`,
  },
  VARIANCE_UNEVEN: {
    level: 'warn',
    meaning: 'replicates that scatter differently at the two ends of the curve',
    text: (f) =>
      `The replicates at one end of the curve have ${n(f.value)} times the variance of the other end (99 % limit ${n(f.limit)}). Weights such as 1/x or a variance function describe this better.`,
  },
  INFLUENTIAL_POINT: {
    level: 'note',
    meaning: "a reading that alone moves the curve (Cook's distance above 1)",
    text: (f) =>
      `One reading of ${named(f.name)} alone moves the curve: Cook's distance ${n(f.value)}, above ${n(f.limit)}. Look whether it is right before relying on the curve.`,
  },
} as const satisfies Record<string, FlagKind>;

export type FlagCode = keyof typeof FLAGS;

export interface Flag {
  readonly code: FlagCode;
  readonly level: FlagLevel;
  readonly message: string;
  readonly value?: number;
  readonly limit?: number;
}

/** A flag with its text made from its numbers: what, how large, why, what to do. */
export function flag(code: FlagCode, numbers: FlagNumbers = {}): Flag {
  const kind: FlagKind = FLAGS[code];
  return {
    code,
    level: kind.level,
    message: kind.text(numbers).trim(),
    ...(numbers.value === undefined ? {} : { value: numbers.value }),
    ...(numbers.limit === undefined ? {} : { limit: numbers.limit }),
  };
}
