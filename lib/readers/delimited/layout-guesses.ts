import { namesX } from '../header-words';
import type { Guess } from '../types';
import type { AnalysedTable } from './analyse-table';
import { xIsGuess } from './find-x';
import type { LayoutContext } from './layout-context';

/** A table that has a column for x, too, is read by rows because of its form alone. */
export const ROWS_BY_FORM: Guess = {
  about: 'orientation',
  sentence:
    'There are few rows, many columns and a heading of wavelengths, so each row is taken as a spectrum',
};

/** What no word of the file says of a table's layout: where x is, and whether rows, columns or pairs are spectra. */
export function layoutGuesses(context: LayoutContext, analysed: AnalysedTable): Guess[] {
  const { orientation, xColumn, series } = analysed;
  if (series.length === 0) return [];
  const guesses: Guess[] = [...analysed.guesses];
  const { labels } = context.heading;
  if (orientation === 'pairs' && context.options.orientation === undefined) {
    const axes = context.columns.flatMap((fact, i) => (i % 2 === 0 && fact.numbers > 0 ? [i] : []));
    if (!axes.every((column) => namesX(labels[column] ?? '')))
      guesses.push({
        about: 'orientation',
        sentence: `Every second column can be an axis, so the ${context.columns.length} columns are taken as pairs of x and y`,
      });
  }
  if (orientation !== 'columns' && orientation !== 'long') return guesses;
  if (xColumn !== undefined && xIsGuess(context.table, context.columns, labels, context.options, xColumn)) {
    const label = labels[xColumn];
    const which = label ? `Column ${xColumn + 1} ("${label}")` : `Column ${xColumn + 1}`;
    guesses.push({ about: 'xColumn', sentence: `${which} is taken as x; another column could be x as well` });
  }
  return guesses;
}
