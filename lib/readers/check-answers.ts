import { ReaderError, type ReadOptions } from './types';

/** Refuse answers that cannot be meant, whatever the file. @throws ReaderError ANSWERS */
export function checkAnswers(answers: ReadOptions): void {
  const { firstX, stepX, xColumn, yColumns } = answers;
  if ((firstX === undefined) !== (stepX === undefined))
    throw refused('Give the first wavelength and the step together.');
  if (stepX !== undefined && (!Number.isFinite(stepX) || stepX === 0))
    throw refused('Give a step other than 0; for falling wavelengths, one below 0.');
  if (firstX !== undefined && !Number.isFinite(firstX))
    throw refused('Give the first wavelength as a number.');
  if (yColumns?.length === 0) throw refused('Choose at least one column of readings.');
  if (xColumn !== undefined && yColumns?.includes(xColumn))
    throw refused(`Column ${xColumn + 1} cannot be both x and a column of readings.`);
}

/** Refuse columns that the table does not have. @throws ReaderError ANSWERS */
export function checkColumns(answers: ReadOptions, columns: number): void {
  const named = [answers.xColumn ?? 0, ...(answers.yColumns ?? [])];
  const missing = named.find((column) => column >= columns);
  if (missing === undefined) return;
  throw refused(
    `The table has ${columns} ${columns === 1 ? 'column' : 'columns'}; there is no column ${missing + 1}.`,
  );
}

export function refused(sentence: string): ReaderError {
  return new ReaderError('ANSWERS', sentence);
}
