import { distinctNames } from '../distinct-names';
import { guessList } from '../guess-list';
import { previewSpectrum } from '../preview-table';
import { shapeKey, spectrumWords } from '../shape-key';
import { finishSpectrum } from '../inspect/finish-spectrum';
import { linesText, lineText, splitLines, type TextLines } from '../text-lines';
import {
  ReaderError,
  type NotASpectrum,
  type Question,
  type ReadOptions,
  type ReadResult,
  type ReadSpectrum,
  type ReaderWarning,
} from '../types';
import { JcampBlock } from './jcamp-block';
import { readTable } from './read-table';
import { dataEnd, jcampRecords, recordText, type JcampRecord } from './records';

const TABLES = new Set(['XYDATA', 'XYPOINTS', 'DATATABLE']);
const PEAKS = new Set(['PEAKTABLE', 'PEAKASSIGNMENTS', 'XYASSIGNMENTS']);

/**
 * Read a JCAMP-DX file (4.24, 5.0, 5.01): single blocks, LINK to any depth, NTUPLES with pages.
 *
 * A damaged block never spoils the others: what was wrong with it becomes a warning with its line. Only when
 * no block holds a spectrum is the file refused.
 */
export function readJcamp(text: string, fallbackName: string, options: ReadOptions): ReadResult {
  const lines = splitLines(text);
  // Once for the lines, once for the labels.
  options.onSteps?.(2 * text.length);
  const reading = new JcampReading(lines, fallbackName, options);
  const records = jcampRecords(lines);
  for (const record of records) reading.take(record);
  reading.close(records);
  return reading.result(records);
}

class JcampReading {
  private readonly stack: JcampBlock[] = [];
  private readonly spectra: ReadSpectrum[] = [];
  private readonly warnings: ReaderWarning[] = [];
  private readonly questions: Question[] = [];
  private readonly refusals: ReaderError[] = [];
  private peaks: NotASpectrum | undefined;
  private blocks = 0;
  private lastEnd = -1;

  constructor(
    private readonly lines: TextLines,
    private readonly fallbackName: string,
    private readonly options: ReadOptions,
  ) {}

  take(record: JcampRecord): void {
    const top = this.stack[this.stack.length - 1];
    if (record.label === 'END') {
      this.stack.pop();
      this.lastEnd = record.line;
      return;
    }
    if (record.label === 'TITLE') {
      this.open(record, top);
      return;
    }
    const block = top ?? this.openUntitled(record);
    if (TABLES.has(record.label)) this.readTableOf(block, record);
    else if (PEAKS.has(record.label)) this.notePeaks(record);
    else if (record.label === 'PAGE') {
      block.page = record.value;
      block.set('PAGE', record.value);
    } else block.set(record.label, recordText(this.lines, record));
  }

  private open(record: JcampRecord, top: JcampBlock | undefined): void {
    if (top && !top.isLink) {
      this.stack.pop();
      this.warnings.push({
        code: 'MISSING_END',
        message: `A new block begins at line ${record.line + 1} before the one at line ${top.line + 1} has ended`,
        line: record.line + 1,
      });
    }
    const block = new JcampBlock(record.line);
    block.set('TITLE', recordText(this.lines, record));
    this.stack.push(block);
  }

  private openUntitled(record: JcampRecord): JcampBlock {
    const block = new JcampBlock(record.line);
    this.stack.push(block);
    this.warnings.push({
      code: 'NO_TITLE',
      message: `The block at line ${record.line + 1} has no TITLE; its spectrum is named after the file`,
      line: record.line + 1,
    });
    return block;
  }

  private readTableOf(block: JcampBlock, record: JcampRecord): void {
    block.tables += 1;
    const index = this.blocks;
    this.blocks += 1;
    try {
      const draft = readTable({
        lines: this.lines,
        block,
        record,
        options: this.options,
        name: this.nameOf(block),
        blockIndex: index,
        cut: this.isCut(record),
      });
      const finished = finishSpectrum(draft, this.options);
      this.spectra.push(...finished.spectra);
      this.questions.push(...finished.questions);
    } catch (error) {
      if (!(error instanceof ReaderError)) throw error;
      this.refusals.push(error);
    }
  }

  private nameOf(block: JcampBlock): string {
    const title = (block.labels.get('TITLE') ?? '').replace(/\s+/g, ' ').trim() || this.fallbackName;
    return block.page === '' ? title : `${title} (${block.page})`;
  }

  /** The file ends on this table's last line, without ##END and without a line end. */
  private isCut(record: JcampRecord): boolean {
    const { lines } = this;
    return (
      record.to === lines.count &&
      (lines.end[lines.count - 1] ?? 0) === lines.text.length &&
      dataEnd(lines, lines.count - 1) > 0
    );
  }

  private notePeaks(record: JcampRecord): void {
    const rows: string[][] = [];
    for (let line = record.from; line < record.to && rows.length < 1000; line++) {
      const row = this.lines.text.slice(this.lines.start[line] ?? 0, dataEnd(this.lines, line)).trim();
      if (row !== '') rows.push(row.split(/[\s,;()]+/).filter((cell) => cell !== ''));
    }
    const message = `The table at line ${record.line + 1} lists peaks, which are no curve; it is kept as a table`;
    this.peaks ??= { kind: 'peaks', message, columns: ['position', 'height'], rows };
    this.warnings.push({ code: 'PEAK_TABLE', message, line: record.line + 1 });
  }

  close(records: readonly JcampRecord[]): void {
    const open = this.stack.length;
    if (open === 0) return;
    const last = records[records.length - 1];
    this.warnings.push({
      code: 'MISSING_END',
      message: `The file ends without ##END=${open > 1 ? ` for ${open} blocks` : ''}: check that it is complete`,
      line: last ? last.to : 1,
    });
  }

  result(records: readonly JcampRecord[]): ReadResult {
    const { spectra } = this;
    const [refusal] = this.refusals;
    if (spectra.length === 0 && !this.peaks) {
      if (refusal) throw refusal;
      throw new ReaderError(
        'NO_TABLE',
        'This JCAMP-DX file holds no data table (##XYDATA= or ##XYPOINTS=). Export the spectrum again, with its points.',
      );
    }
    for (const { code, message, line } of this.refusals)
      this.warnings.push({ code, message, ...(line === undefined ? {} : { line }) });
    const forms = [
      ...new Set(
        records.filter((record) => TABLES.has(record.label)).map((record) => record.value || 'unnamed form'),
      ),
    ];
    const end = this.lastEnd < 0 ? this.lines.count : this.lastEnd + 1;
    return {
      reader: 'jcamp-dx',
      readerVersion: '1',
      dialect: `JCAMP-DX, ${spectra.length} ${spectra.length === 1 ? 'spectrum' : 'spectra'}, ${forms.slice(0, 3).join(' and ') || 'peak table'}`,
      spectra: distinctNames(spectra),
      headerText: headerText(this.lines, records),
      trailerText: linesText(this.lines, end, this.lines.count).trim(),
      warnings: this.warnings,
      questions: this.questions,
      guesses: guessList([], this.questions, spectra),
      preview: previewSpectrum(spectra[0]),
      ...(this.peaks ? { notASpectrum: this.peaks } : {}),
      settings: {
        ...(this.options.xUnit ? { xUnit: this.options.xUnit } : {}),
        ...(this.options.signal ? { signal: this.options.signal } : {}),
      },
      shape: shapeKey('jcamp-dx', [...forms, ...spectrumWords(spectra)]),
    };
  }
}

/** Everything but the data tables, as it stands in the file. */
function headerText(lines: TextLines, records: readonly JcampRecord[]): string {
  const parts: string[] = [];
  for (const record of records) {
    if (record.label === 'END') continue;
    const table = TABLES.has(record.label) || PEAKS.has(record.label);
    parts.push(table ? lineText(lines, record.line) : linesText(lines, record.line, record.to));
  }
  return parts.join('\n');
}
