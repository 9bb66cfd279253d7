import type { ModelUnder, UnknownUnder } from '@/lib/engine';
import { modelWords } from './model-words';

/** A model under a weighting as a row of the comparison. */
export interface ComparedModel {
  readonly words: string;
  readonly inUse: boolean;
  readonly residualSd: number;
  readonly relativeStandardErrorPercent: number | null;
  /** In the order of the names; null where a result has no number. */
  readonly unknowns: readonly (UnknownUnder | null)[];
  /** The largest change it makes, in standard uncertainties of the result in use, and of which sample. */
  readonly largestChangeInU: number | null;
  readonly largestOf: string | null;
}

export interface ModelComparison {
  readonly rows: readonly ComparedModel[];
  readonly refused: readonly { readonly words: string; readonly reason: string }[];
  /** Samples of the columns. */
  readonly names: readonly string[];
}

/** Only results that leave with a number are compared: none is made of a reading above the limit. */
const quantified = ({ concentration }: UnknownUnder) => concentration !== null;

function largestChange(unknowns: readonly UnknownUnder[]) {
  const changes = unknowns
    .filter(quantified)
    .flatMap(({ name, changeInU }) => (changeInU === null ? [] : [{ name, changeInU }]));
  const [first, ...others] = changes;
  if (!first) return { largestChangeInU: null, largestOf: null };
  const worst = others.reduce((a, b) => (Math.abs(b.changeInU) > Math.abs(a.changeInU) ? b : a), first);
  return { largestChangeInU: worst.changeInU, largestOf: worst.changeInU === 0 ? null : worst.name };
}

/** What was compared and what could not be, as the table shows it: the one in use first. */
export function modelComparison(models: readonly ModelUnder[]): ModelComparison {
  const rows: ComparedModel[] = [];
  let names: readonly string[] = [];
  const refused: { words: string; reason: string }[] = [];
  for (const one of models) {
    const words = modelWords(one.model, one.weighting);
    if (one.reason !== undefined) refused.push({ words, reason: one.reason });
    else {
      const { inUse, residualSd, relativeStandardErrorPercent, unknowns } = one;
      const shown = unknowns.map((unknown) => (quantified(unknown) ? unknown : null));
      const row = { words, inUse, residualSd, relativeStandardErrorPercent, unknowns: shown };
      rows.push({ ...row, ...largestChange(unknowns) });
      names = unknowns.map(({ name }) => name);
    }
  }
  rows.sort((a, b) => Number(b.inUse) - Number(a.inUse));
  return { rows, refused, names };
}
