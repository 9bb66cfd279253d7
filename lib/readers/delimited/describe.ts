import { UNIT_WORDS } from '../inspect/spectrum-draft';
import type { Delimiter, NotASpectrum, Orientation, ReadSpectrum } from '../types';
import type { AnalysedTable } from './analyse-table';
import type { Dialect } from './candidates';

export const DELIMITER_WORDS: Record<Delimiter, string> = {
  ',': 'Comma between columns',
  ';': 'Semicolon between columns',
  tab: 'Tab between columns',
  '|': 'Bar between columns',
  blank: 'Blanks between columns',
  fixed: 'Columns of fixed width',
};

const LAYOUT_WORDS: Record<Orientation, string> = {
  columns: 'spectra in columns',
  pairs: 'pairs of x and y columns',
  rows: 'spectra in rows',
  long: 'one reading a row',
  stacked: 'tables one below the other',
};

const KIND_WORDS: Record<NotASpectrum['kind'], string> = {
  readings: 'readings of samples',
  kinetics: 'readings over time',
  plate: 'a plate of readings',
  calibration: 'concentrations and readings',
  table: 'a table without a column for x',
  peaks: 'a list of peaks',
};

/** What was understood of a table, in one sentence. */
export function describeReading(
  dialect: Dialect,
  encoding: string,
  table: AnalysedTable | undefined,
  spectra: readonly ReadSpectrum[],
): string {
  const parts = [
    DELIMITER_WORDS[dialect.delimiter],
    dialect.decimalMark === ',' ? 'decimal comma' : 'decimal point',
  ];
  const [first] = spectra;
  if (table && first) parts.push(LAYOUT_WORDS[table.orientation]);
  else if (table?.notASpectrum) parts.push(KIND_WORDS[table.notASpectrum.kind]);
  if (first) {
    const points = spectra.every((spectrum) => spectrum.x.length === first.x.length)
      ? ` of ${first.x.length} ${first.x.length === 1 ? 'point' : 'points'}`
      : '';
    parts.push(`${spectra.length} ${spectra.length === 1 ? 'spectrum' : 'spectra'}${points}`);
    parts.push(
      `x in ${UNIT_WORDS[first.xUnit]}${first.xUnitGuessed ? ' (guessed)' : ''} from ${first.x[0]} to ${first.x[first.x.length - 1]}`,
    );
  }
  parts.push(encoding);
  return parts.join(', ');
}
