import type { DilutionStep } from '@/lib/engine';
import { LIMITS } from '@/lib/limits';
import { parseDecimal } from '@/lib/schemas/decimal';
import { dilutionSentence, type SpokenStep } from './dilution-text';

export type ParsedDilution =
  | { readonly ok: true; readonly steps: readonly DilutionStep[]; readonly sentence: string }
  | { readonly ok: false; readonly message: string };

class DilutionText extends Error {}

const IN_ML: Readonly<Record<string, number>> = { '\u00b5l': 1e-3, ul: 1e-3, ml: 1, l: 1e3 };
const NUMBER = '[+-]?[\\d.,]+(?:e[+-]?\\d+)?';
const VOLUME = `(${NUMBER})\\s*(\u00b5l|ul|ml|l)?`;
const MADE_UP = new RegExp(`^${VOLUME}\\s*(?:in|to|made up to|/|->|\u2192)\\s*${VOLUME}$`);
const PARTS = new RegExp(`^${VOLUME}\\s*\\+\\s*${VOLUME}$`);
const TIMES = new RegExp(`^(?:[x\u00d7]\\s*(${NUMBER})|(${NUMBER})\\s*(?:[x\u00d7]|-?\\s*fold))$`);
const RATIO = new RegExp(`^${VOLUME}\\s*:\\s*${VOLUME}$`);
const NOTHING = /^(|1|none|no|undiluted|not diluted|-)$/;

function numberIn(text: string): number {
  const parsed = parseDecimal(text);
  if (!parsed.ok) throw new DilutionText(`${text}: ${parsed.message}`);
  if (!(parsed.value > 0)) throw new DilutionText(`A volume must be above zero, not ${text}`);
  return parsed.value;
}

/** Two volumes in mL. A unit written once counts for both. */
function volumes(match: RegExpExecArray): [number, number, string] {
  const [, first = '', firstUnit, second = '', secondUnit] = match;
  const left = IN_ML[firstUnit ?? secondUnit ?? 'ml'] ?? 1;
  const right = IN_ML[secondUnit ?? firstUnit ?? 'ml'] ?? 1;
  // 100 × 1e-3 is 0.1, but 3 × 1e-3 is not 0.003 in binary; dividing by 1000 is exact to the last digit
  const inMl = (value: number, factor: number) => (factor < 1 ? value / 1000 : value * factor);
  const unit = firstUnit ?? secondUnit ?? '';
  return [inMl(numberIn(first), left), inMl(numberIn(second), right), unit];
}

function checked(step: SpokenStep): SpokenStep {
  const { takenMl, toMl, inParts } = step;
  const unit = inParts ? '' : ' mL';
  if (toMl < takenMl)
    throw new DilutionText(
      `${takenMl}${unit} cannot be made up to ${toMl}${unit}: the end volume is smaller than what was taken`,
    );
  return step;
}

function stepOf(part: string): SpokenStep {
  const madeUp = MADE_UP.exec(part);
  if (madeUp) {
    const [takenMl, toMl] = volumes(madeUp);
    return checked({ takenMl, toMl, inParts: false });
  }
  const parts = PARTS.exec(part);
  if (parts) {
    const [takenMl, addedMl, unit] = volumes(parts);
    return checked({ takenMl, toMl: sum(takenMl, addedMl), inParts: unit === '', addedMl });
  }
  const times = TIMES.exec(part);
  if (times) return checked({ takenMl: 1, toMl: numberIn(times[1] ?? times[2] ?? ''), inParts: true });
  const ratio = RATIO.exec(part);
  if (ratio) {
    const [, one = '', , other = ''] = ratio;
    throw new DilutionText(
      `${one}:${other} is read in two ways. Write ${one} in ${other} (made up to ${other}) or ${one}+${other} (${other} added)`,
    );
  }
  if (/^[\d.,]+$/.test(part))
    throw new DilutionText(`Is ${part} a factor? Write ×${part}, or the volumes, such as 10 in 100`);
  throw new DilutionText(`"${part}" is not understood. Write volumes such as 10 in 100, or 10/100, or 1+9`);
}

/** a + b without the tail of binary fractions: 0.1 + 0.2 is 0.3 mL. */
function sum(a: number, b: number): number {
  return Number((a + b).toPrecision(12));
}

const splitLoosely = (text: string) => text.split(/\s*(?:;|\n|\bthen\b|,\s+|,(?=\s*$))\s*/);
const splitAtEveryComma = (text: string) => text.split(/\s*(?:;|\n|\bthen\b|,)\s*/);

function stepsOf(parts: readonly string[]): SpokenStep[] {
  const steps = parts.filter((part) => part !== '').map(stepOf);
  if (steps.length > LIMITS.dilutionSteps)
    throw new DilutionText(`These are ${steps.length} steps; ${LIMITS.dilutionSteps} are the most`);
  return steps;
}

/**
 * The steps of a dilution from text as people write it: "10 in 100", "10/100", "25→50, 10→100", "1+9",
 * "100 µL in 10 mL", "×10"; steps are parted by a comma and a space, a semicolon or "then". Empty means not
 * diluted. `sentence` says what was understood, so that a person can see a slip. "1:10" is not guessed.
 */
export function parseDilution(text: string): ParsedDilution {
  const plain = text.trim().toLowerCase().replaceAll('\u03bc', '\u00b5').replaceAll('\u2212', '-');
  if (NOTHING.test(plain)) return { ok: true, steps: [], sentence: dilutionSentence([]) };
  try {
    return understood(readSteps(plain));
  } catch (error) {
    if (error instanceof DilutionText) return { ok: false, message: error.message };
    throw error;
  }
}

function readSteps(plain: string): SpokenStep[] {
  try {
    return stepsOf(splitLoosely(plain));
  } catch (error) {
    // "25→50,10→100": the comma cannot be a decimal mark, so it parts two steps
    const parts = splitAtEveryComma(plain);
    const plausible = parts.length > 1 && parts.every((part) => MADE_UP.test(part) || PARTS.test(part));
    if (error instanceof DilutionText && plausible) return stepsOf(parts);
    throw error;
  }
}

function understood(spoken: readonly SpokenStep[]): ParsedDilution {
  const steps = spoken.map(({ takenMl, toMl }) => ({ takenMl, toMl }));
  return { ok: true, steps, sentence: dilutionSentence(spoken) };
}
