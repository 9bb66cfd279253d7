import type { CurveDraftInput } from '@/lib/schemas/curve';
import { textsOfRule, type RuleTexts } from '@/lib/schemas/spectrum-rule';
import type { CurveView, StandardView } from '@/lib/views/curve';
import {
  BLANK_WORD,
  cellKey,
  NOTHING_LEFT_OUT,
  SPECTRUM_READING_COLUMN,
  type LeftOut,
} from './grid-standards';
import type { CalculationTexts } from './live-curve';

export type AboutTexts = CurveDraftInput['about'];

/** What the form of a curve starts from. */
export interface FormStart {
  readonly source: 'typed' | 'spectra';
  readonly about: AboutTexts;
  readonly rule: RuleTexts;
  readonly calculation: CalculationTexts;
  /** Rows of the grid: of typed standards, or (without its first and last column) of chosen spectra. */
  readonly rows: readonly (readonly string[])[];
  readonly spectrumIds: readonly string[];
  readonly leftOut: LeftOut;
}

const RULE: RuleTexts = { rule: 'interpolated', at: '', half: '', from: '', to: '', minus: '' };

const CALCULATION: CalculationTexts = {
  signal: 'absorbance',
  unit: 'mg/L',
  formulaMass: '',
  pathLengthMm: '10',
  pathLengthKnown: true,
  pathLengthUMm: '',
  blankRule: 'none',
  model: 'linear',
  weighting: 'none',
  varianceS0: '',
  varianceK: '',
  confidence: '0.95',
  absorbanceLimit: '2',
  standardsRelativeUPercent: '',
};

export const EMPTY_FORM: FormStart = {
  source: 'typed',
  about: { title: '', analyte: '', basis: '', hazardNote: '', reason: '' },
  rule: RULE,
  calculation: CALCULATION,
  rows: [],
  spectrumIds: [],
  leftOut: NOTHING_LEFT_OUT,
};

const text = (value: number | null) => (value === null ? '' : String(value));

function calculationTexts({ method }: CurveView): CalculationTexts {
  const percent =
    method.standardsRelativeU === null
      ? ''
      : String(Number((100 * method.standardsRelativeU).toPrecision(12)));
  return {
    signal: method.signal,
    unit: method.unit,
    formulaMass: text(method.formulaMass),
    pathLengthMm: text(method.pathLengthMm),
    pathLengthKnown: method.pathLengthKnown,
    pathLengthUMm: text(method.pathLengthUMm),
    blankRule: method.blankRule,
    model: method.model,
    weighting: method.weighting === 'given' ? 'none' : method.weighting,
    varianceS0: text(method.varianceFunction?.s0 ?? null),
    varianceK: text(method.varianceFunction?.k ?? null),
    confidence: method.confidence === 0.9 ? '0.9' : method.confidence === 0.99 ? '0.99' : '0.95',
    absorbanceLimit: text(method.absorbanceLimit),
    standardsRelativeUPercent: percent,
  };
}

const concentrationText = (standard: StandardView) =>
  standard.role === 'blank' ? BLANK_WORD : String(standard.concentration);

/** Typed standards as rows of the grid; row i has the id r{i}, as gridOf gives them. */
function typedRows(standards: readonly StandardView[]): Pick<FormStart, 'rows' | 'leftOut' | 'spectrumIds'> {
  const rows: Record<string, string> = {};
  const cells: Record<string, string> = {};
  standards.forEach((standard, index) => {
    if (standard.excludedReason !== null) rows[`r${index}`] = standard.excludedReason;
    standard.readings.forEach((reading, at) => {
      if (reading.excludedReason !== null) cells[cellKey(`r${index}`, at + 2)] = reading.excludedReason;
    });
  });
  return {
    rows: standards.map((standard) => [
      standard.name,
      concentrationText(standard),
      ...standard.readings.map((reading) => reading.gapText ?? text(reading.value)),
    ]),
    spectrumIds: [],
    leftOut: { rows, cells },
  };
}

/** Readings of spectra, one row each: name and concentration of their standard. */
function spectraRows(
  standards: readonly StandardView[],
): Pick<FormStart, 'rows' | 'leftOut' | 'spectrumIds'> {
  const rows: Record<string, string> = {};
  const cells: Record<string, string> = {};
  const all = standards.flatMap((standard) =>
    standard.readings.map((reading, at) => ({ standard, reading, at })),
  );
  all.forEach(({ standard, reading, at }) => {
    const id = reading.spectrumId ?? '';
    if (at === 0 && standard.excludedReason !== null) rows[id] = standard.excludedReason;
    if (reading.excludedReason !== null) cells[cellKey(id, SPECTRUM_READING_COLUMN)] = reading.excludedReason;
  });
  return {
    rows: all.map(({ standard }) => [standard.name, concentrationText(standard)]),
    spectrumIds: all.map(({ reading }) => reading.spectrumId ?? ''),
    leftOut: { rows, cells },
  };
}

/** The form of a new version: everything as it stands in the version it is made from. */
export function formOf(curve: CurveView): FormStart {
  const { method, standards, title } = curve;
  const source = standards.some(({ readings }) => readings.some(({ origin }) => origin === 'spectrum'))
    ? 'spectra'
    : 'typed';
  return {
    source,
    about: {
      title,
      analyte: method.analyte,
      basis: method.basis,
      hazardNote: method.hazardNote,
      reason: '',
    },
    rule: textsOfRule(method.readingRule),
    calculation: calculationTexts(curve),
    ...(source === 'spectra' ? spectraRows(standards) : typedRows(standards)),
  };
}
