import type { DilutionStep, Ware } from '@/lib/engine';
import { LIMITS } from '@/lib/limits';
import { parseDecimal } from '@/lib/schemas/decimal';
import { dilutionSentence, type SpokenStep } from './dilution-text';
import { pieceFor, wareOfPiece, type WareClass } from './ware-text';

export type ParsedDilution =
  | { readonly ok: true; readonly steps: readonly DilutionStep[]; readonly sentence: string }
  | { readonly ok: false; readonly message: string };

class DilutionText extends Error {}

const IN_ML: Readonly<Record<string, number>> = { '\u00b5l': 1e-3, ul: 1e-3, ml: 1, l: 1e3 };
const NUMBER = '[+-]?[\\d.,]+(?:e[+-]?\\d+)?';
const UNIT = '(\u00b5l|ul|ml|l)?';
const VOLUME = `(${NUMBER})\\s*${UNIT}`;
/** A volume with what is known of its vessel: "10 mL ±0.02 r0.003", tolerance and repeatability in the volume's unit. */
const MEASURED = (use: 'taken' | 'to') =>
  `(?<${use}>${NUMBER})\\s*(?<${use}Unit>\u00b5l|ul|ml|l)?` +
  `(?:\\s*(?:\u00b1|\\+-)\\s*(?<${use}Tolerance>${NUMBER})(?:\\s*r\\s*(?<${use}Repeats>${NUMBER}))?)?`;
const CLASS = '(?:\\s+(?:(?<family>iso|astm)\\s+)?(?:class\\s*)?(?<letter>[ab]))?';
const MADE_UP = new RegExp(
  `^${MEASURED('taken')}\\s*(?:in|to|made up to|/|->|\u2192)\\s*${MEASURED('to')}${CLASS}$`,
);
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

/** 100 × 1e-3 is 0.1, but 3 × 1e-3 is not 0.003 in binary; dividing by 1000 is exact to the last digit. */
function inMl(text: string, unit: string | undefined): number {
  const factor = IN_ML[unit ?? 'ml'] ?? 1;
  return factor < 1 ? numberIn(text) / 1000 : numberIn(text) * factor;
}

/** Two volumes in mL. A unit written once counts for both. */
function volumes(match: RegExpExecArray): [number, number, string] {
  const [, first = '', firstUnit, second = '', secondUnit] = match;
  const volume = inMl(first, firstUnit ?? secondUnit);
  return [volume, inMl(second, secondUnit ?? firstUnit), firstUnit ?? secondUnit ?? ''];
}

type Groups = Readonly<Record<string, string | undefined>>;

/** "10 ±0.02 in 100 ±0.1", "10 in 100 class A": volumes with what is known of the vessels. */
function madeUpStep(groups: Groups): SpokenStep {
  const { taken = '', takenUnit, to = '', toUnit, family, letter } = groups;
  const unitOf = { taken: takenUnit ?? toUnit, to: toUnit ?? takenUnit };
  const ware = (use: 'taken' | 'to'): Ware | undefined => {
    const [tolerance, repeats] = [groups[`${use}Tolerance`], groups[`${use}Repeats`]];
    if (tolerance === undefined) return undefined;
    const toleranceMl = inMl(tolerance, unitOf[use]);
    return repeats === undefined
      ? { toleranceMl }
      : { toleranceMl, repeatabilityMl: inMl(repeats, unitOf[use]) };
  };
  const [takenWare, toWare] = [ware('taken'), ware('to')];
  return {
    takenMl: inMl(taken, unitOf.taken),
    toMl: inMl(to, unitOf.to),
    inParts: false,
    ...(takenWare ? { takenWare } : {}),
    ...(toWare ? { toWare } : {}),
    ...(letter === undefined
      ? {}
      : { wareClass: { family: family === 'astm' ? 'ASTM' : 'ISO', letter: letter === 'b' ? 'B' : 'A' } }),
  };
}

/** The tolerances of a class for the vessels of a step that have none of their own. */
function withClass(step: SpokenStep, wareClass: WareClass): SpokenStep {
  const find = (volumeMl: number, use: 'taken' | 'to'): Ware => {
    const piece = pieceFor(volumeMl, use, wareClass);
    if (piece) return wareOfPiece(piece);
    const vessel = use === 'taken' ? 'pipette' : 'flask';
    throw new DilutionText(
      `${wareClass.family} has no ${vessel} of ${volumeMl} mL here. Write its tolerance instead, such as ${volumeMl} \u00b10.1`,
    );
  };
  if (step.inParts) throw new DilutionText('A class of glassware needs volumes, such as 10 in 100 class A');
  return {
    ...step,
    takenWare: step.takenWare ?? find(step.takenMl, 'taken'),
    toWare: step.toWare ?? find(step.toMl, 'to'),
  };
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
  const madeUp = MADE_UP.exec(part)?.groups;
  if (madeUp) return checked(madeUpStep(madeUp));
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
  // a class written behind the last step holds for every step without one of its own
  const last = steps.at(-1)?.wareClass;
  return steps.map((step) => {
    const wareClass = step.wareClass ?? last;
    return wareClass ? withClass(step, wareClass) : step;
  });
}

/**
 * The steps of a dilution from text as people write it: "10 in 100", "10/100", "25→50, 10→100", "1+9",
 * "100 µL in 10 mL", "×10"; the tolerance of a vessel as "10 ±0.02 in 100 ±0.1", or its class as "10 in 100 class A"
 * (ISO, or "ASTM class A"), found in the library of ware; steps are parted by a comma and a space, a semicolon or "then". Empty means not
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
  const steps = spoken.map(({ takenMl, takenWare, toMl, toWare }) => ({
    takenMl,
    toMl,
    ...(takenWare ? { takenWare } : {}),
    ...(toWare ? { toWare } : {}),
  }));
  return { ok: true, steps, sentence: dilutionSentence(spoken) };
}
