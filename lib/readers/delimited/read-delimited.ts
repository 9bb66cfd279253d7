import { finishSpectrum } from '../inspect/finish-spectrum';
import { refused } from '../check-answers';
import { distinctNames } from '../distinct-names';
import { guessList } from '../guess-list';
import { shapeKey } from '../shape-key';
import { linesText, splitLines, type TextLines } from '../text-lines';
import {
  ReaderError,
  type Question,
  type ReadOptions,
  type ReadResult,
  type ReadSpectrum,
  type ReaderWarning,
} from '../types';
import { analyseTable, type AnalysedTable } from './analyse-table';
import { blockScore } from './blocks';
import { commaDoubt } from './decimal-commas';
import { decideDialect, type Decision } from './decide-dialect';
import { describeReading } from './describe';
import { headerFacts, type HeaderFacts } from './header-facts';
import { mergeBlocks, type MergedBlock } from './merge-blocks';
import { readingsTable } from './not-a-spectrum';
import { judgeXUnit, seriesToDraft } from './series-to-draft';
import { chooseTables } from './choose-tables';
import { dialectGuesses, oneOfEach, settingsOf, tablePreview } from './reading-facts';
import { tableShape } from './table-shape';

const NO_TABLE =
  'This text holds no table of numbers: at least one row with a wavelength and a reading is needed. Export the spectrum again, with its points.';

/**
 * Read a table of numbers in plain text: any delimiter, either decimal mark, spectra in columns, pairs, rows, blocks
 * or a long list. What stands before and after the table is kept as text and never read as numbers.
 *
 * @throws ReaderError NO_TABLE when there is no row of numbers
 */
export function readDelimited(
  text: string,
  fileName: string,
  encoding: string,
  options: ReadOptions,
): ReadResult {
  const lines = splitLines(text);
  options.onSteps?.(text.length);
  const asked = options.delimiter === ',' && options.decimalMark === ',';
  const decision = decideDialect(lines, asked ? { ...options, decimalMark: '.' } : options);
  if (!decision) throw nothingLeft(options);
  const doubt = commaDoubt(lines, decision, options);
  if (doubt) {
    options.onSteps?.(3 * text.length);
    const reading = readDelimited(doubt.text, fileName, encoding, {
      ...options,
      delimiter: ';',
      decimalMark: ',',
    });
    const settings = { ...reading.settings, delimiter: ',', decimalMark: ',' } as const;
    return {
      ...reading,
      settings,
      guesses: asked
        ? reading.guesses
        : [{ about: 'decimalMark', sentence: doubt.question.message }, ...reading.guesses],
      shape: shapeKey('delimited', ['comma in doubt', reading.shape]),
      dialect: reading.dialect.replace('Semicolon', 'Comma'),
      questions: asked ? reading.questions : [doubt.question, ...reading.questions],
    };
  }
  if (asked && decision.best.fields > 0) {
    const quoted = decideDialect(lines, options);
    if (quoted) return readTables(lines, quoted, fileName, encoding, options);
  }
  return readTables(lines, decision, fileName, encoding, options);
}

/** Answers can leave no table where there is one. */
function nothingLeft({ headerRows, delimiter, decimalMark }: ReadOptions): ReaderError {
  if (headerRows)
    return refused(
      `Below the first ${headerRows} lines there is no row of numbers. Give fewer header lines.`,
    );
  if (delimiter || decimalMark)
    return refused(
      'With this delimiter and decimal mark no row of numbers is left. Choose others, or leave them to be found.',
    );
  return new ReaderError('NO_TABLE', NO_TABLE);
}

function readTables(
  lines: TextLines,
  decision: Decision,
  fileName: string,
  encoding: string,
  options: ReadOptions,
): ReadResult {
  const blocks = worthReading(mergeBlocks(lines, decision, options.onSteps));
  const global = headerFacts(linesText(lines, 0, blocks[0]?.rows[0] ?? 0));
  const tables = blocks.map((block, k) => {
    const above = k === 0 ? -1 : lastRow(blocks[k - 1]);
    const local =
      k === 0 ? global : joinFacts(global, headerFacts(linesText(lines, above + 1, block.rows[0] ?? 0)));
    return analyseTable(lines, decision, block, above, local, options, fileName);
  });
  const chosen = chooseTables(tables, options);
  refuseProse(lines, tables, chosen.tables);
  return buildResult(
    lines,
    decision,
    chosen.tables,
    tables,
    chosen.questions,
    chosen.warnings,
    encoding,
    options,
  );
}

/** The largest block and every other that could be a table beside it; stray lines of numbers are none. */
function worthReading(blocks: readonly MergedBlock[]): MergedBlock[] {
  let most = 0;
  for (const block of blocks) most = Math.max(most, blockScore(block));
  return blocks.filter(
    (block) => blockScore(block) === most || (block.rows.length >= 3 && blockScore(block) >= 0.02 * most),
  );
}

function lastRow(block: MergedBlock | undefined): number {
  return block?.rows[block.rows.length - 1] ?? -1;
}

function joinFacts(global: HeaderFacts, local: HeaderFacts): HeaderFacts {
  const xUnit = local.xUnit ?? global.xUnit;
  return {
    records: { ...global.records, ...local.records },
    declared: local.declared.length > 0 ? local.declared : global.declared,
    missing: [...global.missing, ...local.missing],
    ...(xUnit ? { xUnit } : {}),
    signalText: local.signalText || global.signalText,
    sample: local.sample || global.sample,
  };
}

/** Running text with a few numbers in it is no table, though some line may look like a row. */
function refuseProse(
  lines: TextLines,
  tables: readonly AnalysedTable[],
  chosen: readonly AnalysedTable[],
): void {
  const [first] = chosen.length > 0 ? chosen : tables;
  const rows = first?.context.table.rows.length ?? 0;
  if (rows >= 3 || lines.count <= 10) {
    if (rows > 1 || (first?.context.columns.length ?? 0) > 1) return;
  }
  const headed = first?.context.heading.labels.some((label) => label !== '');
  if (rows === 0 || !headed || first?.xColumn === undefined) throw new ReaderError('NO_TABLE', NO_TABLE);
}

function buildResult(
  lines: TextLines,
  decision: Decision,
  chosen: readonly AnalysedTable[],
  all: readonly AnalysedTable[],
  tableQuestions: readonly Question[],
  tableWarnings: readonly ReaderWarning[],
  encoding: string,
  options: ReadOptions,
): ReadResult {
  const spectra: ReadSpectrum[] = [];
  const questions: Question[] = [...tableQuestions];
  const warnings: ReaderWarning[] = [...tableWarnings];
  const places = new Map(all.map((table, k) => [table, k]));
  for (const table of chosen) {
    const unit = judgeXUnit(table.series, table.context.header, options);
    if (unit.question) questions.push(unit.question);
    questions.push(...table.questions);
    warnings.push(...table.warnings);
    const missing = table.context.header.missing;
    const withMissing =
      missing.length > 0 && options.missingValues === undefined
        ? { ...options, missingValues: missing }
        : options;
    for (const series of table.series) {
      const finished = finishSpectrum(
        seriesToDraft(series, unit, table.context.header, options, places.get(table) ?? 0),
        withMissing,
      );
      spectra.push(...finished.spectra);
      questions.push(...finished.questions);
    }
  }
  const [first] = chosen;
  const [top] = all;
  const other =
    spectra.length === 0
      ? (first ?? top)?.notASpectrum
      : first && spectra.every((one) => one.x.length <= 2)
        ? readingsTable(first.context)
        : undefined;
  const start = top?.context.heading.firstLine ?? 0;
  const last = all[all.length - 1]?.context.table.rows.at(-1) ?? lines.count - 1;
  if (spectra.length === 0 && !other && questions.length === 0) throw new ReaderError('NO_TABLE', NO_TABLE);
  const settings = settingsOf(decision, first, spectra, options);
  const asked = oneOfEach(questions);
  return {
    reader: 'delimited',
    readerVersion: '1',
    dialect: describeReading(decision.dialect, encoding, first, spectra),
    spectra: distinctNames(spectra),
    headerText: linesText(lines, 0, top?.context.table.rows[0] ?? start),
    trailerText: linesText(lines, last + 1, lines.count).trim(),
    warnings,
    questions: asked,
    guesses: guessList(
      [...dialectGuesses(decision, options), ...chosen.flatMap((table) => table.guesses)],
      asked,
      spectra,
    ),
    preview: tablePreview(lines, decision, first ?? top),
    ...(other ? { notASpectrum: other } : {}),
    settings,
    shape: tableShape(decision.dialect, first, asked),
  };
}
