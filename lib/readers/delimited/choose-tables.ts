import { xUnitFromText } from '../header-words';
import type { Question, ReadOptions, ReaderWarning } from '../types';
import type { AnalysedTable } from './analyse-table';

export interface ChosenTables {
  readonly tables: readonly AnalysedTable[];
  readonly questions: Question[];
  readonly warnings: ReaderWarning[];
}

/** A further table smaller than this beside a large one is told of, not asked about. */
const SMALL_SHARE = 0.1;

/**
 * Which tables of a file are read. Tables of one build, over one range, are spectra one below the other and all of them
 * are taken; unlike ones are never joined: the first of some size is proposed and the person is asked.
 */
export function chooseTables(tables: readonly AnalysedTable[], options: ReadOptions): ChosenTables {
  const spectral = tables.filter((table) => table.series.length > 0);
  if (spectral.length === 0) return { tables: largestFirst(tables).slice(0, 1), questions: [], warnings: [] };
  if (options.table !== undefined) {
    const one = spectral[options.table];
    return { tables: one ? [one] : [], questions: [], warnings: [] };
  }
  const largest = firstSizable(spectral);
  if (!largest) return { tables: [], questions: [], warnings: [] };
  const alike = spectral.filter((table) => table === largest || sameBuild(table, largest));
  const taken = new Set(alike);
  const unlike = spectral.filter((table) => !taken.has(table));
  if (unlike.length === 0) return { tables: alike, questions: [], warnings: [] };
  if (options.orientation === 'stacked') return { tables: spectral, questions: [], warnings: [] };
  const size = sizeOf(largest);
  if (unlike.every((table) => sizeOf(table) < SMALL_SHARE * size)) {
    const warnings = unlike.map((table) => ({
      code: 'OTHER_TABLE',
      message: `A smaller table at line ${lineOf(table)} was left out; it can be chosen`,
      line: lineOf(table),
    }));
    return { tables: alike, questions: [], warnings };
  }
  return { tables: alike, questions: [question(spectral)], warnings: [] };
}

function question(tables: readonly AnalysedTable[]): Question {
  const choices = tables.slice(0, 12).map((table, k) => ({
    label: `Table ${k + 1} (line ${lineOf(table)}, ${table.context.table.rows.length} rows)`,
    options: { table: k },
  }));
  return {
    code: 'TABLES',
    message: `${tables.length} tables were found that are not of one kind. Which is to be read?`,
    choices: [...choices, { label: 'All of them, each for itself', options: { orientation: 'stacked' } }],
  };
}

const lineOf = (table: AnalysedTable): number => (table.context.table.rows[0] ?? 0) + 1;

/** The first table that is no mere fraction of the longest: what a file is about stands at its head. */
function firstSizable(tables: readonly AnalysedTable[]): AnalysedTable | undefined {
  const most = tables.reduce((rows, table) => Math.max(rows, sizeOf(table)), 0);
  return tables.find((table) => sizeOf(table) >= most / 3);
}

const sizeOf = (table: AnalysedTable): number =>
  table.series.reduce((points, series) => Math.max(points, series.x.length), 0);

function largestFirst(tables: readonly AnalysedTable[]): AnalysedTable[] {
  return [...tables].sort((a, b) => b.context.block.numbers - a.context.block.numbers);
}

function sameBuild(a: AnalysedTable, b: AnalysedTable): boolean {
  if (a.orientation !== b.orientation || a.context.block.fields !== b.context.block.fields) return false;
  const [x1, x2] = [a.series[0]?.x, b.series[0]?.x];
  if (!x1 || !x2) return false;
  const unit = (table: AnalysedTable): string => xUnitFromText(table.series[0]?.xLabel ?? '') ?? '';
  if (unit(a) !== unit(b)) return false;
  const ends = (x: Float64Array): [number, number] => [
    Math.min(x[0] ?? 0, x[x.length - 1] ?? 0),
    Math.max(x[0] ?? 0, x[x.length - 1] ?? 0),
  ];
  const [low1, high1] = ends(x1);
  const [low2, high2] = ends(x2);
  const shorter = Math.min(high1 - low1, high2 - low2);
  return Math.min(high1, high2) - Math.max(low1, low2) >= 0.5 * shorter;
}
