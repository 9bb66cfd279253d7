import { type Constituent, CONSTITUENTS, type Recipe, type RecipeStep } from './recipe-types';

/** What a method does with its own blank reading. */
export type BlankRule = 'none' | 'level' | 'subtract';

export interface LedgerRequest {
  readonly recipe: Recipe;
  readonly blankRule: BlankRule;
  /** What the method's own blank holds. */
  readonly methodBlankContains: readonly Constituent[];
  /** What stood in the beam when the instrument was set to zero: it is in no spectrum any more. */
  readonly zeroedOn: readonly Constituent[];
  /** True when the method's blank went through the same recipe, so that it holds only what is left. */
  readonly blankThroughRecipe: boolean;
  readonly spectrumNames: Readonly<Record<string, string>>;
}

/** One thing that would be taken off twice. */
export interface TakenTwice {
  readonly constituent: Constituent | 'spectrum';
  readonly first: string;
  readonly second: string;
  /** A sentence: what, by whom, and what to do. */
  readonly text: string;
  /** Of the step that comes second; /blankRule for the method's own blank. */
  readonly pointer: string;
}

export interface BlankLedger {
  /** In order: the zero setting, each step that takes something off, the method's blank. */
  readonly sentences: readonly string[];
  /** Empty when all is well; else the recipe must not be used with this method. */
  readonly twice: readonly TakenTwice[];
}

const WORDS: Record<Constituent, string> = {
  instrument: 'the drift of the instrument’s baseline',
  cell: 'the cell',
  solvent: 'the solvent',
  reagents: 'the reagents',
  sampleColour: 'the sample’s own colour',
  turbidity: 'the sample’s turbidity',
};

interface Entry {
  readonly who: string;
  readonly pointer: string;
  readonly spectrumId?: string;
  readonly removes: readonly Constituent[];
  readonly sentence: string;
}

/**
 * What each blank takes off, in words, and what would be taken off twice. A blank takes off what it contains
 * without what the instrument was zeroed on. Offsets and line baselines are measured on the sample itself after the
 * steps before, so they take off what is left and cannot do it twice; a scatter correction counts as turbidity.
 * A blank used as a level puts its content into the intercept, which the calculation takes off.
 */
export function blankLedger(request: LedgerRequest): BlankLedger {
  const entries = [
    ...request.recipe.steps.flatMap((step, i) => entryOf(step, i, request)),
    ...methodEntry(request),
  ];
  const zero = `The instrument was zeroed on ${list(request.zeroedOn, 'nothing that was stated')}.`;
  return { sentences: [zero, ...entries.map(({ sentence }) => sentence)], twice: doubles(entries) };
}

function entryOf(step: RecipeStep, i: number, request: LedgerRequest): readonly Entry[] {
  const who = `step ${i + 1}, “${step.name}”,`;
  const pointer = `/steps/${i}`;
  if (step.kind === 'subtractSpectrum' || step.kind === 'sampleBlank') {
    const removes = left(step.contains, request.zeroedOn);
    const spectrum = request.spectrumNames[step.spectrumId] ?? step.spectrumId;
    const sentence = `Step ${i + 1}, “${step.name}”: “${spectrum}” contains ${list(step.contains, 'nothing that was stated')} and takes off ${list(removes, 'nothing')}.`;
    return [{ who, pointer, removes, sentence, spectrumId: step.spectrumId }];
  }
  if (step.kind === 'scatter') {
    const sentence = `Step ${i + 1}, “${step.name}”: the scatter fitted on the sample itself takes off ${WORDS.turbidity}.`;
    return [{ who, pointer, removes: ['turbidity'], sentence }];
  }
  return [];
}

function methodEntry(request: LedgerRequest): readonly Entry[] {
  const { blankRule, methodBlankContains, zeroedOn, blankThroughRecipe } = request;
  const pointer = '/blankRule';
  if (blankRule === 'none') {
    return [{ who: '', pointer, removes: [], sentence: 'The method takes no blank reading off.' }];
  }
  const how =
    blankRule === 'level' ? 'is a level of the curve, so its intercept' : 'reading is subtracted and';
  const removes = blankThroughRecipe ? [] : left(methodBlankContains, zeroedOn);
  const through = blankThroughRecipe
    ? 'takes off only what the recipe leaves of it, for it went through the same recipe'
    : `takes off ${list(removes, 'nothing')}`;
  const sentence = `The method’s blank contains ${list(methodBlankContains, 'nothing that was stated')}; it${blankRule === 'level' ? ' ' : 's '}${how} ${through}.`;
  return [{ who: 'the method’s blank', pointer, removes, sentence }];
}

function doubles(entries: readonly Entry[]): readonly TakenTwice[] {
  return entries.flatMap((second, i) =>
    entries.slice(0, i).flatMap((first): readonly TakenTwice[] => {
      const shared: readonly TakenTwice['constituent'][] =
        second.spectrumId !== undefined && second.spectrumId === first.spectrumId
          ? ['spectrum']
          : second.removes.filter((one) => first.removes.includes(one));
      return shared.map((constituent) => twice(constituent, first, second));
    }),
  );
}

function twice(constituent: TakenTwice['constituent'], first: Entry, second: Entry): TakenTwice {
  const what = constituent === 'spectrum' ? 'the same spectrum' : WORDS[constituent];
  return {
    constituent,
    first: first.pointer,
    second: second.pointer,
    pointer: second.pointer,
    text: `${capital(what)} would be taken off twice: by ${first.who} and by ${second.who.replace(/,$/, '')}. Leave one of them out, or say what it really contains.`,
  };
}

const left = (contains: readonly Constituent[], zeroedOn: readonly Constituent[]) =>
  CONSTITUENTS.filter((one) => contains.includes(one) && !zeroedOn.includes(one));

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function list(what: readonly Constituent[], none: string): string {
  const words = what.map((one) => WORDS[one]);
  if (words.length === 0) return none;
  return words.length === 1 ? (words[0] as string) : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
