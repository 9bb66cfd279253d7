import { curveDraft, saveCurveForm, type CurveDraftInput, type SaveCurve } from '@/lib/schemas/curve';

type Typed = readonly [name: string, concentration: string, ...readings: string[]];

const STANDARDS: readonly Typed[] = [
  ['S1', '0.5', '0.1012', '0.0993', '0.0997'],
  ['S2', '1', '0.2007', '0.1996', '0.2027'],
  ['S3', '2', '0.3972', '0.3998', '0.3941'],
  ['S4', '3', '0.5978', '0.5960', '0.5991'],
  ['S5', '4', '0.7951', '0.7962', '0.7955'],
];

/** What the form of a curve holds: total iron at 510 nm, 10 mm, five standards of three readings. */
export function curveDraftInput(standards: readonly Typed[] = STANDARDS): CurveDraftInput {
  return {
    about: { title: '', analyte: 'Iron(II) as ferroin', basis: 'Fe', hazardNote: 'Wear gloves', reason: '' },
    rule: { rule: 'point', at: '510', half: '', from: '', to: '', minus: '' },
    calculation: {
      signal: 'absorbance',
      unit: 'mg/L',
      formulaMass: '55.845',
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
    standards: standards.map(([name, concentration, ...readings]) => ({
      role: concentration === 'blank' ? ('blank' as const) : ('standard' as const),
      name,
      concentration: concentration === 'blank' ? '' : concentration,
      leftOut: null,
      readings: readings.map((text) => ({ text, leftOut: null })),
    })),
  };
}

/** A form as the action hands it on, after the schema. */
export function saveCurveInput(
  notebookId: string,
  { draft = curveDraftInput(), baseId = '', saveKey = 'key of a form' } = {},
): SaveCurve {
  return saveCurveForm.parse({ notebookId, baseId, saveKey, draft: JSON.stringify(draft) });
}

export const parsedDraft = (draft: CurveDraftInput = curveDraftInput()) => curveDraft.parse(draft);
