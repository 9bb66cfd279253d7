import { saveAbsorptivity } from '@/db/queries/absorptivities';
import type { Actor } from '@/lib/policies/actor';
import { saveAbsorptivityForm } from '@/lib/schemas/absorptivity';

/** Ferroin at 510 nm as textbooks give it, from memory; its uncertainty is invented for the tests. */
const FERROIN = {
  title: '',
  analyte: 'Iron(II) as ferroin',
  basis: 'Fe',
  unit: 'mg/L',
  formulaMass: '55.845',
  signal: 'absorbance',
  kind: 'molar',
  value: '11100',
  u: '100',
  source: 'analytical textbooks',
  conditions: 'water, pH 3 to 9',
  rule: 'point',
  at: '510',
  pathLengthMm: '10',
  pathLengthUMm: '0.02',
  readingSd: '',
  confidence: '0.95',
  absorbanceLimit: '2',
  hazardNote: 'Hydroxylamine is toxic: wear gloves.',
};

let count = 0;

export type AbsorptivityTexts = Partial<
  Record<keyof typeof FERROIN | 'baseId' | 'saveKey' | 'reason', string>
>;

/** The texts of the form, before its schema. */
export function absorptivityTexts(notebookId: string, changes: AbsorptivityTexts = {}) {
  count += 1;
  return { ...FERROIN, notebookId, baseId: '', saveKey: `example absorptivity ${count}`, ...changes };
}

/** A saved absorptivity, made as the form makes it. */
export async function makeAbsorptivity(
  actor: Actor,
  notebookId: string,
  changes: AbsorptivityTexts = {},
): Promise<string> {
  const input = saveAbsorptivityForm.parse(absorptivityTexts(notebookId, changes));
  return (await saveAbsorptivity(actor, input)).id;
}
