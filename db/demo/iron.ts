import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { randomUUID } from 'node:crypto';
import type { Actor } from '@/lib/policies/actor';
import { newBatch } from '@/lib/schemas/batch';
import { saveCurveForm, type CurveDraftInput } from '@/lib/schemas/curve';
import { addSpectrumSamples, addTypedSamples } from '@/lib/schemas/determination';
import { newNotebook } from '@/lib/schemas/notebook';
import { actorForPerson } from '../actors';
import { createBatch } from '../queries/batches';
import { saveCurve } from '../queries/curve-saving';
import {
  addSpectrumSamples as readFromSpectra,
  addTypedSamples as readTyped,
} from '../queries/determinations';
import { createNotebook } from '../queries/notebooks';
import { uploadSourceFile } from '../queries/source-files';
import { listSpectra } from '../queries/spectra';

const FILES = path.join(process.cwd(), 'fixtures', 'demo');
const STANDARDS_FILE = 'LR-114-standards.csv';
/** 25 mL of digested sample are made up to 50 mL when the colour is developed. */
const COLOUR = '25 in 50';

/** Samples with a scan behind them, in the order of the run, with what was done to each before the colour. */
const SCANNED: readonly { readonly sample: string; readonly dilution?: string }[] = [
  { sample: 'S01' },
  { sample: 'S02' },
  { sample: 'S03' },
  { sample: 'S03-DUP' },
  { sample: 'S04' },
  { sample: 'S05' },
  { sample: 'S05-D10', dilution: `10 in 100, ${COLOUR}` },
  { sample: 'S06' },
  { sample: 'S07' },
  { sample: 'S08' },
];
const SAMPLE_BLANK = 'S07-SB';

/** Read again after the fresh reductant, and typed from the bench sheet. */
const TYPED = [
  { sample: 'S09-RR', readings: ['0.5052', '0.5025'] },
  { sample: 'S10-RR', readings: ['0.2332', '0.2350'] },
  { sample: 'S11-RR', readings: ['0.0701', '0.0699'] },
  { sample: 'S12-RR', readings: ['0.4206', '0.4200'] },
];

const HAZARD =
  'Boil the acid digest in a hood and never to dryness. Hydroxylamine is toxic and unstable when hot or concentrated; 1,10-phenanthroline is toxic. Gloves and goggles; collect the waste.';

async function upload(actor: Actor, notebookId: string, name: string): Promise<void> {
  const bytes = await readFile(path.join(FILES, name));
  await uploadSourceFile(actor, notebookId, { name, bytes, acceptProposal: true });
}

/** The standards by the concentration in their spectrum's name, two readings each. */
async function standardsOf(actor: Actor, notebookId: string): Promise<CurveDraftInput['standards']> {
  const spectra = (await listSpectra(actor, notebookId)).filter((one) => one.fileName === STANDARDS_FILE);
  const levels = new Map<string, string[]>();
  for (const { id, name } of [...spectra].sort((a, b) =>
    a.name.localeCompare(b.name, 'en', { numeric: true }),
  )) {
    const concentration = /Fe (\d+\.\d+) mg\/L/.exec(name)?.[1];
    if (concentration) levels.set(concentration, [...(levels.get(concentration) ?? []), id]);
  }
  return [...levels].map(([concentration, ids]) => ({
    role: 'standard' as const,
    name: Number(concentration) === 0 ? 'Reagent blank' : `Fe ${concentration}`,
    concentration,
    leftOut: null,
    readings: ids.map((spectrumId) => ({ spectrumId, leftOut: null })),
  }));
}

async function makeCurve(actor: Actor, notebookId: string): Promise<string> {
  const draft: CurveDraftInput = {
    about: {
      title: 'Total iron as ferroin, 510 nm',
      analyte: 'Total iron',
      basis: 'Fe',
      hazardNote: HAZARD,
      reason: '',
    },
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
    standards: await standardsOf(actor, notebookId),
  };
  const form = saveCurveForm.parse({
    notebookId,
    baseId: '',
    saveKey: randomUUID(),
    draft: JSON.stringify(draft),
  });
  return (await saveCurve(actor, form)).id;
}

async function makeBatch(actor: Actor, notebookId: string, curveId: string): Promise<void> {
  const { id: batchId } = await createBatch(
    actor,
    newBatch.parse({
      notebookId,
      submissionKey: randomUUID(),
      readOn: `curve ${curveId}`,
      title: 'LR-114, total iron, outfalls of the Tessel',
      note: '25.00 mL of digested sample developed in 50.00 mL. S07 is turbid; its sample blank is among the spectra.',
    }),
  );
  const spectra = await listSpectra(actor, notebookId);
  const scanned = SCANNED.map(({ sample, dilution = COLOUR }) => ({
    sample,
    pathLengthMm: '10',
    dilution,
    spectrumIds: spectra.filter((one) => one.fileName === `${sample}.dx`).map((one) => one.id),
  }));
  await readFromSpectra(
    actor,
    addSpectrumSamples.parse({ batchId, submissionKey: randomUUID(), samples: JSON.stringify(scanned) }),
  );
  const typed = TYPED.map((row) => ({ ...row, pathLengthMm: '10', dilution: COLOUR }));
  await readTyped(
    actor,
    addTypedSamples.parse({ batchId, submissionKey: randomUUID(), samples: JSON.stringify(typed) }),
  );
}

const UPLOADS = [
  STANDARDS_FILE,
  ...[...SCANNED.map(({ sample }) => sample), SAMPLE_BLANK].map((one) => `${one}.dx`),
];

/** Batch LR-114: files, curve and determinations, each through the schema and the query of its form. */
export async function seedIronNotebook(analystId: string, ownerId: string): Promise<void> {
  const { id } = await createNotebook(
    await actorForPerson(analystId),
    newNotebook.parse({
      title: 'Total iron, outfalls of the Tessel',
      purpose: 'Discharge consent of 5.00 mg/L total iron. Batch LR-114, method LR-Fe-510.',
      ownerId,
    }),
  );
  // making the notebook gave the analyst a membership, so who is asking is read again
  const analyst = await actorForPerson(analystId);
  for (const name of UPLOADS) await upload(analyst, id, name);
  await makeBatch(analyst, id, await makeCurve(analyst, id));
}
