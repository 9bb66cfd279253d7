import { previewTable } from '../preview-table';
import type { TextLines } from '../text-lines';
import type { Guess, Question, ReadOptions, ReadSpectrum, TablePreview } from '../types';
import type { AnalysedTable } from './analyse-table';
import type { Decision } from './decide-dialect';
import { DELIMITER_WORDS } from './describe';
import { cellTexts } from './split-cells';

/** Another delimiter that would do as well makes the one taken a guess. */
export function dialectGuesses(decision: Decision, options: ReadOptions): Guess[] {
  const { dialect, rival } = decision;
  if (!rival || options.delimiter !== undefined) return [];
  const sentence = `${DELIMITER_WORDS[dialect.delimiter]} is taken; ${DELIMITER_WORDS[rival.delimiter].toLowerCase()} would read about as many numbers`;
  return [{ about: 'delimiter', sentence }];
}

/** The ends of the table read, cell by cell. */
export function tablePreview(
  lines: TextLines,
  decision: Decision,
  table: AnalysedTable | undefined,
): TablePreview {
  const rows = table?.context.table.rows ?? [];
  return previewTable(table?.context.heading.labels ?? [], rows.length, (row) => {
    const line = rows[row] ?? 0;
    return cellTexts(lines.text, lines.start[line] ?? 0, lines.end[line] ?? 0, decision.dialect.delimiter);
  });
}

/** The settings behind a reading: handed back as options, they give it again. */
export function settingsOf(
  decision: Decision,
  table: AnalysedTable | undefined,
  spectra: readonly ReadSpectrum[],
  options: ReadOptions,
): ReadOptions {
  const { onSteps: _unused, ...given } = options;
  const [spectrum] = spectra;
  return {
    ...given,
    delimiter: decision.dialect.delimiter,
    decimalMark: decision.dialect.decimalMark,
    ...(table ? { orientation: table.orientation } : {}),
    ...(table?.xColumn === undefined ? {} : { xColumn: table.xColumn }),
    ...(spectrum ? { xUnit: spectrum.xUnit } : {}),
  };
}

/** Twenty columns with the same question ask once; the first message stands for all. */
export function oneOfEach(questions: readonly Question[]): Question[] {
  const seen = new Set<string>();
  return questions.filter((question) => {
    const key = `${question.code}|${question.choices.map((choice) => choice.label).join('|')}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}
