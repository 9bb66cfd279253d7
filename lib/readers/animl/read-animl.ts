import { distinctNames } from '../distinct-names';
import { guessList } from '../guess-list';
import { previewSpectrum } from '../preview-table';
import { shapeKey, spectrumWords } from '../shape-key';
import { isWavelengthWord, xUnitFromText } from '../header-words';
import { finishSpectrum } from '../inspect/finish-spectrum';
import { answeredSignal, fittingUnits, judgeSignal } from '../inspect/guesses';
import type { SpectrumDraft } from '../inspect/spectrum-draft';
import {
  ReaderError,
  type Question,
  type ReadOptions,
  type ReadResult,
  type ReadSpectrum,
  type ReaderWarning,
} from '../types';
import { readAnimlDocument, type AnimlSeries, type AnimlSeriesSet } from './animl-document';
import { reachOf, seriesValues } from './series-values';

/** Whether a text is an AnIML document: its first element says so. */
export function looksLikeAniml(text: string): boolean {
  let start = text.slice(0, 10_000).trimStart();
  if (start.startsWith('<?xml')) start = start.slice(start.indexOf('>') + 1).trimStart();
  while (start.startsWith('<!--')) {
    const end = start.indexOf('-->');
    if (end < 0) return false;
    start = start.slice(end + 3).trimStart();
  }
  return /^<(?:\w{1,40}:)?AnIML[\s>]/.test(start);
}

/**
 * Read an AnIML document (core schema, drafts up to 0.90): individual, auto-incremented and encoded values, and series
 * with stretches missing. Declared lengths are compared with what is there.
 *
 * @throws ReaderError NO_TABLE, NOT_A_SPECTRUM, ENCODED_VALUES
 */
export function readAniml(text: string, fallbackName: string, options: ReadOptions): ReadResult {
  // Once for the elements, once for the lines they stand in.
  options.onSteps?.(2 * text.length);
  const document = readAnimlDocument(text);
  const spectra: ReadSpectrum[] = [];
  const questions: Question[] = [];
  const warnings: ReaderWarning[] = [];
  if (!document.complete)
    warnings.push({
      code: 'MISSING_END',
      message: 'The document ends before its last element is closed: check that it is complete',
    });
  const reading: Reading = {
    lineOf: lineCounter(text),
    bytes: text.length,
    left: POINTS_PER_BYTE * text.length,
    skipped: 0,
    records: Object.fromEntries(Object.entries(document.records).slice(0, MOST_SHOWN)),
    fallbackName,
    options,
  };
  document.sets.forEach((set, block) => {
    for (const draft of setDrafts(reading, set, block)) {
      const finished = finishSpectrum(draft, options);
      spectra.push(...finished.spectra);
      questions.push(...finished.questions);
    }
  });
  if (reading.skipped > 0)
    warnings.push({
      code: 'LENGTH',
      message: `${reading.skipped} series reach further than a document of this size can, and were left out: their lengths or start indices are damaged`,
      value: reading.skipped,
    });
  if (spectra.length === 0) {
    throw new ReaderError(
      'NOT_A_SPECTRUM',
      'No series set of this AnIML document has a wavelength, wavenumber or energy as its independent series.',
    );
  }
  return {
    reader: 'animl',
    readerVersion: '1',
    dialect: `AnIML, ${spectra.length} ${spectra.length === 1 ? 'spectrum' : 'spectra'}, x in ${spectra[0]?.xUnit}`,
    spectra: distinctNames(spectra),
    headerText: Object.entries(document.records)
      .map(([key, value]) => `${key}: ${value}`)
      .join('\n'),
    trailerText: '',
    warnings,
    questions,
    guesses: guessList([], questions, spectra),
    preview: previewSpectrum(spectra[0]),
    settings: {
      ...(options.xUnit ? { xUnit: options.xUnit } : {}),
      ...(options.signal ? { signal: options.signal } : {}),
    },
    shape: shapeKey('animl', spectrumWords(spectra)),
  };
}

/** Parameters shown with each spectrum; the header text holds all of them. */
const MOST_SHOWN = 200;
/** A value takes five characters at least; series with stretches left out may reach a little further. */
const POINTS_PER_BYTE = 4;

/** What all series of a document share. */
interface Reading {
  readonly lineOf: (at: number) => number;
  readonly bytes: number;
  /** Points that may still be laid out: lengths and start indices are words of the file, not promises. */
  left: number;
  skipped: number;
  readonly records: Readonly<Record<string, string>>;
  readonly fallbackName: string;
  readonly options: ReadOptions;
}

function setDrafts(reading: Reading, set: AnimlSeriesSet, block: number): SpectrumDraft[] {
  const { options } = reading;
  const x = set.series.find((series) => series.dependency === 'independent') ?? set.series[0];
  if (!x) return [];
  const words = `${x.unit} ${x.quantity} ${x.name}`;
  const stated = options.xUnit ?? xUnitFromText(x.unit) ?? xUnitFromText(words);
  if (!stated && !isWavelengthWord(words)) return [];
  const ordinates = set.series.filter((series) => series !== x && series.sets.length > 0);
  const xReach = reachOf(x);
  return ordinates.flatMap((y) => {
    const draft = seriesDraft(reading, set, x, xReach, y);
    if (!draft) return [];
    const unit = stated ?? fittingUnits(Math.min(...ends(draft.x)), Math.max(...ends(draft.x)))[0] ?? 'nm';
    const guessed = stated
      ? []
      : [{ code: 'X_UNIT_GUESSED', message: `The series "${x.name}" gives no unit; it is taken as ${unit}` }];
    const sample = set.samples.length === 1 ? set.samples[0] : undefined;
    const base = sample || set.step || set.name || reading.fallbackName;
    return [
      {
        ...draft,
        name: ordinates.length > 1 ? `${base} ${y.name}` : base,
        xUnit: unit,
        xUnitGuessed: !stated,
        block,
        header: { ...reading.records, step: set.step, technique: set.technique },
        warnings: [...draft.warnings, ...guessed],
      },
    ];
  });
}

const ends = (x: Float64Array): number[] => [x[0] ?? NaN, x[x.length - 1] ?? NaN];

function seriesDraft(
  reading: Reading,
  set: AnimlSeriesSet,
  x: AnimlSeries,
  xReach: number,
  y: AnimlSeries,
): SpectrumDraft | undefined {
  const { options, bytes } = reading;
  const reach = Math.max(xReach, reachOf(y));
  const declared = Number.isInteger(set.length) && set.length > 0 ? set.length : reach;
  // A length beyond anything the text can hold is damage, not data.
  const n = Math.max(reach, Math.min(declared, bytes));
  if (reach === 0) return undefined;
  if (n > bytes || n > reading.left) {
    reading.skipped += 1;
    return undefined;
  }
  reading.left -= n;
  options.onSteps?.(2 * n + y.sets.length);
  const points = seriesValues(y, n);
  const axis = seriesValues(x, n);
  const warnings: ReaderWarning[] = [];
  const line = reading.lineOf(y.at);
  const sparse = y.sets.some((one) => one.startIndex > 0 || Number.isFinite(one.endIndex));
  if (reach > declared || (!sparse && points.given !== declared) || wrongStretch(y)) {
    warnings.push({
      code: 'LENGTH',
      message: `The series set declares ${declared} values, but the series "${y.name}" holds ${points.given}; the places without a value are gaps`,
      line,
      value: points.given,
    });
  }
  const yText = [y.unit, y.quantity || y.name].filter((word) => word !== '').join(' ');
  const judged = options.signal ? answeredSignal(options.signal, yText) : judgeSignal(yText, points.values);
  if (judged.note) warnings.push(judged.note);
  return {
    name: '',
    x: axis.values,
    xUnit: 'nm',
    xUnitGuessed: false,
    y: points.values,
    signal: judged.signal,
    signalGuessed: judged.guessed,
    signalText: y.unit || y.name,
    signalScale: judged.scale,
    gaps: points.gaps,
    block: 0,
    line,
    header: {},
    warnings,
  };
}

/** A stretch that says where it ends must be as long as that. */
function wrongStretch(series: AnimlSeries): boolean {
  return series.sets.some(
    (set) =>
      set.kind !== 'increment' &&
      Number.isFinite(set.endIndex) &&
      set.values.length !== set.endIndex - set.startIndex + 1,
  );
}

/** The line of a place in the text, for places asked in rising order: the text is gone through once. */
function lineCounter(text: string): (at: number) => number {
  let line = 1;
  let next = text.indexOf('\n');
  return (at) => {
    while (next >= 0 && next < at) {
      line += 1;
      next = text.indexOf('\n', next + 1);
    }
    return line;
  };
}
