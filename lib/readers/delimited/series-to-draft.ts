import { isWavelengthWord, signalFromText, xUnitFromText } from '../header-words';
import { answeredSignal, fittingUnits, judgeSignal } from '../inspect/guesses';
import { sentinelValue } from '../inspect/sentinels';
import { UNIT_WORDS, type SpectrumDraft } from '../inspect/spectrum-draft';
import type { Question, ReadOptions, ReaderWarning, XUnit } from '../types';
import type { HeaderFacts } from './header-facts';
import type { Series } from './series';

export interface JudgedUnit {
  readonly unit: XUnit;
  readonly guessed: boolean;
  readonly warning?: ReaderWarning;
  readonly question?: Question;
}

/** Unit of x: the person's word, the column's heading, the header text, else the range, and then it is said. */
export function judgeXUnit(series: readonly Series[], header: HeaderFacts, options: ReadOptions): JudgedUnit {
  if (options.xUnit) return { unit: options.xUnit, guessed: false };
  const stated = series.map((one) => xUnitFromText(one.xLabel)).find((unit) => unit !== undefined);
  if (stated) return { unit: stated, guessed: false };
  let [low, high] = [Infinity, -Infinity];
  for (const one of series) {
    for (const x of one.x) {
      if (x < low) low = x;
      if (x > high) high = x;
    }
  }
  const fits = fittingUnits(low, high);
  if (header.xUnit && fits.includes(header.xUnit)) return { unit: header.xUnit, guessed: false };
  const [likeliest = 'nm', other] = fits;
  const label = series.find((one) => isWavelengthWord(one.xLabel))?.xLabel;
  const named = label ? `"${label}" gives no unit` : 'The file gives no unit of x';
  const warning = {
    code: 'X_UNIT_GUESSED',
    message: `${named}; x from ${low} to ${high} is taken as ${UNIT_WORDS[likeliest]}`,
  };
  if (other === undefined) return { unit: likeliest, guessed: true, warning };
  const choices = fits.map((unit) => ({ label: UNIT_WORDS[unit], options: { xUnit: unit } }));
  const question = {
    code: 'X_UNIT',
    message: `${named}, and x from ${low} to ${high} can be ${fits.map((unit) => UNIT_WORDS[unit]).join(' or ')}. Which is it?`,
    choices,
  };
  return { unit: likeliest, guessed: true, warning, question };
}

/** A series with its units judged. */
export function seriesToDraft(
  series: Series,
  unit: JudgedUnit,
  header: HeaderFacts,
  options: ReadOptions,
  block: number,
): SpectrumDraft {
  const yText = signalFromText(series.yLabel) ? series.yLabel : header.signalText;
  const judged = options.signal
    ? answeredSignal(options.signal, yText)
    : judgeSignal(yText, withoutStandIns(series.y, header));
  const warnings = [...series.warnings];
  if (unit.warning) warnings.push(unit.warning);
  if (judged.note) warnings.push(judged.note);
  return {
    name: series.name,
    x: series.x,
    xUnit: unit.unit,
    xUnitGuessed: unit.guessed,
    y: series.y,
    signal: judged.signal,
    signalGuessed: judged.guessed,
    signalText: yText,
    signalScale: judged.scale,
    gaps: series.gaps,
    block,
    line: series.line + 1,
    header: { ...header.records, ...series.header },
    warnings,
  };
}

/** The readings without the values that stand for none, which would pass for huge ones. */
function withoutStandIns(y: Float64Array, header: HeaderFacts): Float64Array {
  const sentinel = sentinelValue(y);
  if (sentinel === undefined && header.missing.length === 0) return y;
  const standIns = new Set(header.missing);
  return y.filter((value) => value !== sentinel && !standIns.has(value));
}
