import { namesX, signalFromText } from '../header-words';
import { fittingUnits } from '../inspect/guesses';
import { shapeKey } from '../shape-key';
import type { Question } from '../types';
import type { AnalysedTable } from './analyse-table';
import type { Dialect } from './candidates';

/**
 * The key of a delimited file: dialect, layout, columns, the words of the header that stay from file to file, which
 * units x could be in, and what was asked. Names of samples, values of records and numbers are no part of it.
 */
export function tableShape(
  dialect: Dialect,
  table: AnalysedTable | undefined,
  questions: readonly Question[],
): string {
  const parts: string[] = [dialect.delimiter, dialect.decimalMark, ...questions.map(({ code }) => code)];
  if (table) {
    const { context, orientation, xColumn, series } = table;
    const x = series[0]?.x;
    parts.push(orientation, String(xColumn ?? ''));
    // The columns of spectra in rows are wavelengths: a longer scan is no other kind of file.
    if (orientation !== 'rows') parts.push(String(context.columns.length));
    parts.push(...Object.keys(context.header.records).sort(), ...labelKinds(context.heading.labels));
    if (x) parts.push(...fittingUnits(...extent(x)));
  }
  return shapeKey('delimited', parts);
}

/** Headings as words of the trade or as names, runs of one kind as one. */
function labelKinds(labels: readonly string[]): string[] {
  const kinds = labels.map((label) => {
    if (namesX(label)) return label.toLowerCase();
    const words = signalFromText(label);
    if (words) return `${words.signal} ${words.scale}`;
    return label === '' ? 'empty' : Number.isNaN(Number(label)) ? 'name' : 'number';
  });
  return kinds.filter((kind, i) => kind !== kinds[i - 1]);
}

function extent(x: Float64Array): [number, number] {
  let [low, high] = [Infinity, -Infinity];
  for (const value of x) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return [low, high];
}
