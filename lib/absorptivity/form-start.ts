import { textsOfRule, type RuleTexts } from '@/lib/schemas/spectrum-rule';
import type { AbsorptivityView } from '@/lib/views/absorptivity';

/** The texts of the form of a known absorptivity, by the names of its fields. */
export interface AbsorptivityTexts extends RuleTexts {
  readonly title: string;
  readonly analyte: string;
  readonly basis: string;
  readonly unit: string;
  readonly formulaMass: string;
  readonly signal: string;
  readonly kind: string;
  readonly value: string;
  readonly u: string;
  readonly source: string;
  readonly conditions: string;
  readonly pathLengthMm: string;
  readonly pathLengthUMm: string;
  readonly readingSd: string;
  readonly confidence: string;
  readonly absorbanceLimit: string;
  readonly hazardNote: string;
  readonly reason: string;
}

export const EMPTY_ABSORPTIVITY: AbsorptivityTexts = {
  ...{ title: '', analyte: '', basis: '', unit: 'mg/L', formulaMass: '' },
  ...{ kind: 'molar', value: '', u: '', source: '', conditions: '' },
  ...{ rule: 'interpolated', at: '', half: '', from: '', to: '', minus: '' },
  ...{ signal: 'absorbance', pathLengthMm: '10', pathLengthUMm: '', readingSd: '' },
  ...{ confidence: '0.95', absorbanceLimit: '2', hazardNote: '', reason: '' },
};

const text = (value: number | null) => (value === null ? '' : String(value));

/** The form of a new version: everything as it stands in the version it is made from. */
export function textsOfAbsorptivity(of: AbsorptivityView): AbsorptivityTexts {
  return {
    ...textsOfRule(of.readingRule),
    title: of.title,
    analyte: of.analyte,
    basis: of.basis,
    unit: of.unit,
    formulaMass: text(of.formulaMass),
    signal: of.signal,
    kind: of.kind,
    value: text(of.value),
    u: text(of.u),
    source: of.source,
    conditions: of.conditions,
    pathLengthMm: text(of.pathLengthMm),
    pathLengthUMm: text(of.pathLengthUMm),
    readingSd: text(of.readingSd),
    confidence: text(of.confidence),
    absorbanceLimit: text(of.absorbanceLimit),
    hazardNote: of.hazardNote,
    reason: '',
  };
}
