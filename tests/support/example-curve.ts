import { saveCurve } from '@/db/queries/curve-saving';
import type { Actor } from '@/lib/policies/actor';
import { saveCurveForm, type CurveDraftInput } from '@/lib/schemas/curve';

/** Concentration and readings of each standard. */
export type StandardTexts = readonly (readonly [string, ...string[]])[];

const EXAMPLE: StandardTexts = [
  ['0', '0.0012', '0.0008'],
  ['0.5', '0.1011', '0.1002'],
  ['1', '0.2004', '0.2013'],
  ['2', '0.3989', '0.4006'],
  ['4', '0.8012', '0.7995'],
];

interface CurveOptions {
  readonly standards?: StandardTexts;
  readonly baseId?: string;
  readonly analyte?: string;
  readonly wavelengthNm?: string;
  readonly hazardNote?: string;
}

function draftOf({
  standards = EXAMPLE,
  analyte = 'iron',
  wavelengthNm = '510',
  hazardNote = '',
}: CurveOptions): CurveDraftInput {
  return {
    about: { title: '', analyte, basis: 'Fe', hazardNote, reason: '' },
    rule: { rule: 'point', at: wavelengthNm },
    calculation: {
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
    },
    standards: standards.map(([concentration, ...readings], index) => ({
      role: 'standard',
      name: `S${index}`,
      concentration,
      leftOut: null,
      readings: readings.map((text) => ({ text, leftOut: null })),
    })),
  };
}

let count = 0;

/** A saved curve, made as the form makes it; `baseId` makes a new version of that one. */
export async function makeCurve(
  actor: Actor,
  notebookId: string,
  options: CurveOptions = {},
): Promise<string> {
  count += 1;
  const { id } = await saveCurve(
    actor,
    saveCurveForm.parse({
      notebookId,
      saveKey: `example curve ${count}`,
      baseId: options.baseId ?? '',
      draft: JSON.stringify(draftOf(options)),
    }),
  );
  return id;
}
