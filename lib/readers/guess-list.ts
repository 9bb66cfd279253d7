import type { Guess, Question, ReadSpectrum, ReaderWarning } from './types';

/** The option that answers each question. */
const QUESTION_ABOUT: Readonly<Record<string, Guess['about']>> = {
  DECIMAL_COMMA: 'decimalMark',
  X_UNIT: 'xUnit',
  NO_X: 'firstX',
  TABLES: 'table',
  EQUAL_X: 'equalX',
  TURN_ROUND: 'turnRound',
  RESTARTS: 'turnRound',
  SENTINEL: 'missingValues',
};

/** The option that would replace what each warning says was taken. */
const WARNING_ABOUT: Readonly<Record<string, Guess['about']>> = {
  X_UNIT_GUESSED: 'xUnit',
  X_UNIT_DOUBTFUL: 'xUnit',
  SIGNAL_GUESSED: 'signal',
  PERCENT_INFERRED: 'signal',
  PERCENT_DOUBTFUL: 'signal',
};

/**
 * What had to be guessed, each once, in the order in which a reading comes about: the layout, then what was asked, then
 * the units of the spectra. Where several spectra share a guess, the first one's sentence says how many do.
 */
export function guessList(
  layout: readonly Guess[],
  questions: readonly Question[],
  spectra: readonly ReadSpectrum[],
): Guess[] {
  const guesses = new Map<Guess['about'], Guess>();
  const add = (guess: Guess): void => {
    if (!guesses.has(guess.about)) guesses.set(guess.about, guess);
  };
  layout.forEach(add);
  for (const { code, message } of questions) {
    const about = QUESTION_ABOUT[code];
    if (about) add({ about, sentence: message });
  }
  for (const [about, warnings] of unitWarnings(spectra)) {
    const [first, ...others] = warnings;
    if (!first) continue;
    const more = others.length === 0 ? '' : ` (and so for ${others.length} more)`;
    add({ about, sentence: first.message + more });
  }
  return [...guesses.values()];
}

/** The warnings that tell of a guess, by what it is about; one sentence for all spectra counts once. */
function unitWarnings(spectra: readonly ReadSpectrum[]): Map<Guess['about'], ReaderWarning[]> {
  const told = new Map<Guess['about'], Map<string, ReaderWarning>>();
  for (const spectrum of spectra) {
    for (const warning of spectrum.warnings) {
      const about = WARNING_ABOUT[warning.code];
      if (!about) continue;
      const known = told.get(about) ?? new Map<string, ReaderWarning>();
      told.set(about, known.set(warning.message, warning));
    }
  }
  return new Map([...told].map(([about, warnings]) => [about, [...warnings.values()]]));
}
