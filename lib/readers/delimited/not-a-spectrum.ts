import { otherAxisWord, signalFromText } from '../header-words';
import type { NotASpectrum } from '../types';
import type { LayoutContext } from './layout-context';
import { cellTexts } from './split-cells';

const MOST_ROWS = 2000;

const KINDS: Record<NotASpectrum['kind'], string> = {
  readings:
    'These are readings at one or two wavelengths rather than a spectrum. Use them as readings, or import them as they stand.',
  kinetics:
    'The first axis is time: these are readings over time, not a spectrum. Copy the readings into a table where they are needed.',
  plate:
    'This is a plate of end-point readings (rows A, B, C …, columns 1, 2, 3 …), not a spectrum. Copy the readings into a standard curve or batch.',
  calibration:
    'This is a table of concentrations and readings, not a spectrum. Paste it into a standard curve.',
  table:
    'This is a table of numbers without a wavelength, wavenumber or energy column. Name the column that is x if it is a spectrum after all.',
  peaks: 'This lists peaks, which are no curve.',
};

const OF_SAMPLES =
  'These are readings of samples, not a spectrum. Paste them into a standard curve or batch.';

/** Offer a table that is no spectrum as what it is, with its cells as they stand. */
export function notASpectrum(context: LayoutContext): NotASpectrum {
  const { lines, dialect, table, heading } = context;
  const rows = table.rows.slice(0, MOST_ROWS).map((line) => {
    const [start, end] = [lines.start[line] ?? 0, lines.end[line] ?? 0];
    context.options.onSteps?.(end - start);
    return cellTexts(lines.text, start, end, dialect.delimiter);
  });
  const kind = kindOf(context, rows);
  return { kind, message: kind === 'readings' ? OF_SAMPLES : KINDS[kind], columns: heading.labels, rows };
}

export function readingsTable(context: LayoutContext): NotASpectrum {
  return { ...notASpectrum(context), kind: 'readings', message: KINDS.readings };
}

function kindOf(context: LayoutContext, rows: readonly (readonly string[])[]): NotASpectrum['kind'] {
  const { labels } = context.heading;
  const axes = labels.map(otherAxisWord);
  if (isPlate(labels, rows)) return 'plate';
  if (axes.includes('concentration') || labels.some((label) => /standard|std\b|calib/i.test(label)))
    return 'calibration';
  if (axes.includes('time')) return 'kinetics';
  if (isListOfSamples(labels, rows)) return 'readings';
  return 'table';
}

/** Names in the first column, and absorbances beside them. */
function isListOfSamples(labels: readonly string[], rows: readonly (readonly string[])[]): boolean {
  const read = labels
    .slice(1)
    .some(
      (label) => signalFromText(label)?.signal === 'absorbance' || /^A(?:\d{3}|[\s_])|reading/.test(label),
    );
  return read && rows.every(([name = '']) => name !== '' && Number.isNaN(Number(name)));
}

/** Rows that begin with A, B, C …; over them 1, 2, 3 …. */
function isPlate(labels: readonly string[], rows: readonly (readonly string[])[]): boolean {
  const lettered =
    rows.length >= 2 && rows.every((row, i) => (row[0] ?? '').toUpperCase() === String.fromCharCode(65 + i));
  const numbered =
    labels.length > 2 && labels.slice(1).every((label, i) => label === '' || label === String(i + 1));
  return lettered && (numbered || labels.every((label) => label === ''));
}
