import type { DilutionStep } from '@/lib/engine';
import { wareSentence, wareText, type WareClass } from './ware-text';

/** A step as it is said back: in millilitres, or in parts when no volume was written. */
export interface SpokenStep extends DilutionStep {
  readonly inParts?: boolean;
  /** What was added to the part taken, when it was written as "1+9". */
  readonly addedMl?: number;
  /** The class of glassware written behind it. */
  readonly wareClass?: WareClass;
}

const figure = (value: number) => String(Number(value.toPrecision(6)));
const parts = (count: number) => `${figure(count)} ${count === 1 ? 'part' : 'parts'}`;

function stepSentence(step: SpokenStep): string {
  const { takenMl, toMl, inParts, addedMl } = step;
  if (addedMl !== undefined)
    return inParts
      ? `${parts(takenMl)} plus ${parts(addedMl)}, ${parts(toMl)} in all`
      : `${figure(takenMl)} mL plus ${figure(addedMl)} mL, ${figure(toMl)} mL in all`;
  if (inParts) return `${parts(takenMl)} made up to ${parts(toMl)}`;
  return `${figure(takenMl)} mL${wareSentence(step.takenWare, ' mL')} made up to ${figure(toMl)} mL${wareSentence(step.toWare, ' mL')}`;
}

/** How many times the sample is diluted: the product of made up to ÷ taken. */
export function dilutionFactor(steps: readonly DilutionStep[]): number {
  return steps.reduce((product, { takenMl, toMl }) => (product * toMl) / takenMl, 1);
}

/** What was understood of a dilution: "10 mL made up to 100 mL: diluted 10 times". */
export function dilutionSentence(steps: readonly SpokenStep[]): string {
  if (steps.length === 0) return 'Not diluted';
  const factor = figure(dilutionFactor(steps));
  return `${steps.map(stepSentence).join(', then ')}: diluted ${factor} times`;
}

/** Steps in the form that `parseDilution` reads back: "10 in 100, 25 ±0.03 in 50 ±0.06"; empty when not diluted. */
export function dilutionText(steps: readonly DilutionStep[]): string {
  return steps
    .map(
      ({ takenMl, takenWare, toMl, toWare }) =>
        `${takenMl}${wareText(takenWare)} in ${toMl}${wareText(toWare)}`,
    )
    .join(', ');
}
