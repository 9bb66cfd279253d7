import { otherAxisWord, xUnitFromText } from '../header-words';
import { answeredSignal, fittingUnits, judgeSignal } from '../inspect/guesses';
import type { SpectrumDraft } from '../inspect/spectrum-draft';
import type { TextLines } from '../text-lines';
import { ReaderError, type Gap, type ReadOptions, type ReaderWarning, type XUnit } from '../types';
import { headerChecks, headerNumber } from './header-checks';
import type { JcampBlock } from './jcamp-block';
import { decodeOrdinates } from './ordinates';
import { decodePairs } from './pairs';
import type { JcampRecord } from './records';
import { tableProfile } from './table-profile';
import { chooseGrid, gridX } from './x-axis';
import { placeOrdinates } from './x-checks';

/** What a table needs of its block, whichever way the block states it. */
interface TableHeader {
  readonly xText: string;
  readonly yText: string;
  readonly xFactor: number;
  readonly yFactor: number;
  readonly firstX: number;
  readonly lastX: number;
  readonly deltaX: number;
  readonly count: number;
}

export interface TableContext {
  readonly lines: TextLines;
  readonly block: JcampBlock;
  readonly record: JcampRecord;
  readonly options: ReadOptions;
  readonly name: string;
  readonly blockIndex: number;
  /** The text ends inside this table, so that its last number may be cut. */
  readonly cut: boolean;
}

/** How often each character of a table is looked at: for its comment (twice), its profile, its numbers. */
const PASSES = 4;
/** How often each data line is held against a grid. */
const LINE_PASSES = 8;

interface Points {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly gaps: ReadonlyMap<number, Omit<Gap, 'index'>>;
  readonly warnings: ReaderWarning[];
}

/**
 * Read one data table of a JCAMP-DX block.
 *
 * y is the decoded ordinate times YFACTOR, x as chooseGrid says; header values are checked, never applied.
 *
 * @throws ReaderError EMPTY_TABLE, YFACTOR_ZERO, X_UNKNOWN, NOT_A_SPECTRUM (x is no wavelength, wavenumber or energy)
 */
export function readTable(context: TableContext): SpectrumDraft {
  const { block, record, options } = context;
  const form = record.value || '(X++(Y..Y))';
  const header = tableHeader(block, form);
  refuseOtherAxis(header.xText, record.line, options);
  if (header.yFactor === 0 || Number.isNaN(header.yFactor)) {
    throw new ReaderError(
      'YFACTOR_ZERO',
      `YFACTOR in the block at line ${block.line + 1} is ${block.labels.get('YFACTOR') ?? 'not a number'}, which would make every reading 0. Correct it in the file (FIRSTY and MAXY show the scale) and upload it again.`,
      block.line + 1,
    );
  }
  const points = /\+\+/.test(form) ? packedPoints(context, header) : pairPoints(context, header);
  if (points.y.length === 0) {
    throw new ReaderError(
      'EMPTY_TABLE',
      `The data table at line ${record.line + 1} holds no points. Export the spectrum again.`,
      record.line + 1,
    );
  }
  if (!points.x.some(Number.isFinite)) {
    throw new ReaderError(
      'X_UNKNOWN',
      `Neither the header nor the data lines of the table at line ${record.line + 1} say where x lies. Correct FIRSTX and LASTX in the file and upload it again.`,
      record.line + 1,
    );
  }
  // Scaling, x and the checks against the header go over the points once more each.
  options.onSteps?.(4 * points.y.length);
  const warnings = [...points.warnings, ...headerChecks(block.labels, points.x, points.y, header.yFactor)];
  if (!block.labels.has('YFACTOR') && !block.labels.has('FACTOR') && /\+\+/.test(form)) {
    warnings.push({
      code: 'YFACTOR_MISSING',
      message: 'There is no YFACTOR: the ordinates are as written, which may be off by a power of ten',
    });
  }
  const unit = judgeXUnit(header.xText, points.x, options, warnings);
  const signal = options.signal
    ? answeredSignal(options.signal, header.yText)
    : judgeSignal(header.yText, points.y);
  if (signal.note) warnings.push(signal.note);
  return {
    name: context.name,
    x: points.x,
    xUnit: unit.unit,
    xUnitGuessed: unit.guessed,
    y: points.y,
    signal: signal.signal,
    signalGuessed: signal.guessed,
    signalText: header.yText,
    signalScale: signal.scale,
    gaps: [...points.gaps].map(([index, gap]) => ({ index, ...gap })),
    block: context.blockIndex,
    line: record.line + 2,
    header: block.header(),
    warnings,
  };
}

function tableHeader(block: JcampBlock, form: string): TableHeader {
  const { labels } = block;
  const symbols = /\(\s*(\w+?)\s*(?:\+\+\s*\(\s*(\w+?)\s*\.\.|(\w)\s*\.\.)/.exec(form);
  if (!labels.has('SYMBOL') || !symbols) {
    return {
      xText: labels.get('XUNITS') ?? '',
      yText: labels.get('YUNITS') ?? '',
      xFactor: factor(labels.get('XFACTOR')),
      yFactor: factor(labels.get('YFACTOR')),
      firstX: headerNumber(labels.get('FIRSTX')),
      lastX: headerNumber(labels.get('LASTX')),
      deltaX: headerNumber(labels.get('DELTAX')),
      count: headerNumber(labels.get('NPOINTS')),
    };
  }
  const [, xSymbol = 'X', packed, paired] = symbols;
  const x = xSymbol;
  const y = packed ?? paired ?? 'Y';
  const text = (symbol: string, unitLabel: string): string =>
    `${block.variable(symbol, 'VARNAME')} ${block.variable(symbol, unitLabel)}`.trim();
  const either = (label: string, variable: string): number =>
    headerNumber(labels.get(label) ?? block.variable(x, variable));
  return {
    xText: block.variable(x, 'UNITS') || text(x, 'UNITS'),
    yText: block.variable(y, 'UNITS') || text(y, 'UNITS'),
    xFactor: factor(block.variable(x, 'FACTOR') || undefined),
    yFactor: factor(block.variable(y, 'FACTOR') || undefined),
    firstX: either('FIRSTX', 'FIRST'),
    lastX: either('LASTX', 'LAST'),
    deltaX: headerNumber(labels.get('DELTAX')),
    count: either('NPOINTS', 'VARDIM'),
  };
}

function factor(text: string | undefined): number {
  return text === undefined ? 1 : headerNumber(text);
}

function packedPoints(context: TableContext, header: TableHeader): Points {
  const { lines, record, cut } = context;
  const profile = tableProfile(lines, record.from, record.to);
  const ordinates = decodeOrdinates(lines, record.from, record.to, profile);
  if (cut && ordinates.raw.length !== header.count) markCut(ordinates.raw, ordinates.gaps);
  const xFactor = Number.isFinite(header.xFactor) && header.xFactor !== 0 ? header.xFactor : 1;
  const grid = chooseGrid({ ...header, xFactor }, ordinates);
  const placed = placeOrdinates(ordinates, grid, xFactor);
  context.options.onSteps?.(
    PASSES * profile.bytes + ordinates.raw.length + LINE_PASSES * ordinates.lines.length,
  );
  const y = placed.raw.map((raw) => raw * header.yFactor);
  const warnings = [...ordinates.warnings, ...grid.warnings, ...placed.warnings];
  if (profile.decimalComma)
    warnings.push({
      code: 'DECIMAL_COMMA',
      message:
        'The numbers are written with decimal commas, which the format does not allow; they were read as such',
      line: record.line + 2,
    });
  return { x: gridX(grid, y.length), y, gaps: placed.gaps, warnings };
}

function pairPoints(context: TableContext, header: TableHeader): Points {
  const { lines, record, cut } = context;
  const pairs = decodePairs(lines, record.from, record.to, tableProfile(lines, record.from, record.to));
  const bytes = (lines.end[record.to - 1] ?? 0) - (lines.start[record.from] ?? 0);
  context.options.onSteps?.(PASSES * Math.max(0, bytes));
  if (cut && pairs.y.length !== header.count) markCut(pairs.y, pairs.gaps);
  const xFactor = Number.isFinite(header.xFactor) && header.xFactor !== 0 ? header.xFactor : 1;
  const x = pairs.x.toArray().map((value) => value * xFactor);
  const y = pairs.y.toArray().map((value) => value * header.yFactor);
  const warnings = [...pairs.warnings];
  if (Number.isFinite(header.count) && header.count !== y.length) {
    warnings.push({
      code: 'NPOINTS',
      message: `NPOINTS says ${header.count}, but ${y.length} points were read`,
      value: y.length,
    });
  }
  return { x, y, gaps: pairs.gaps, warnings };
}

/** The last number of a file that ends in the middle of its table may lack its end: it is no number to trust. */
function markCut(
  list: { length: number; set(index: number, value: number): void },
  gaps: Map<number, Omit<Gap, 'index'>>,
): void {
  if (list.length === 0) return;
  list.set(list.length - 1, NaN);
  gaps.set(list.length - 1, { reason: 'unreadable', text: 'end of the file' });
}

function refuseOtherAxis(text: string, line: number, options: ReadOptions): void {
  if (options.xUnit || text === '' || xUnitFromText(text)) return;
  const other =
    otherAxisWord(text) !== undefined ||
    /second|minute|hertz|^hz$|ppm|m\/z|volt|degree|kelvin|celsius|index|points?$/i.test(text);
  if (!other) return;
  throw new ReaderError(
    'NOT_A_SPECTRUM',
    `The x axis of the table at line ${line + 1} is in ${text.toLowerCase()}, so this is no UV-Vis spectrum. Name the unit of x if that is wrong.`,
    line + 1,
  );
}

function judgeXUnit(
  text: string,
  x: Float64Array,
  options: ReadOptions,
  warnings: ReaderWarning[],
): { unit: XUnit; guessed: boolean } {
  if (options.xUnit) return { unit: options.xUnit, guessed: false };
  const [low, high] = [
    Math.min(x[0] ?? NaN, x[x.length - 1] ?? NaN),
    Math.max(x[0] ?? NaN, x[x.length - 1] ?? NaN),
  ];
  const fits = fittingUnits(low, high);
  const stated = xUnitFromText(text);
  if (!stated) {
    const unit = fits[0] ?? 'nm';
    warnings.push({
      code: 'X_UNIT_GUESSED',
      message: `XUNITS ${text ? `"${text}" is no unit known here` : 'is missing'}; x from ${low} to ${high} is taken as ${unit}`,
    });
    return { unit, guessed: true };
  }
  if (!fits.includes(stated) && fits.includes('nm') && high < 1200) {
    warnings.push({
      code: 'X_UNIT_DOUBTFUL',
      message: `XUNITS says ${text}, but x from ${low} to ${high} looks like nm; choose the unit if so`,
    });
  }
  return { unit: stated, guessed: false };
}
