import { unknownOf, type UnknownSample } from '@/lib/batch/unknown-request';
import { calculateStandardCurve, type CurveRequest } from '@/lib/engine';
import type { BatchView } from '@/lib/views/batch';
import type { DeterminationView } from '@/lib/views/determination';

/** A small invented curve: A = 0.2 c, with a little scatter, 0.5 to 4 mg/L. */
export const EXAMPLE_CURVE: CurveRequest = {
  signal: 'absorbance',
  pathLengthMm: 10,
  unit: 'mg/L',
  model: 'linear',
  weighting: 'none',
  confidence: 0.95,
  absorbanceLimit: 2,
  standards: [
    { name: 'S0', concentration: 0, readings: [0.0012, 0.0008] },
    { name: 'S1', concentration: 0.5, readings: [0.1011, 0.1002] },
    { name: 'S2', concentration: 1, readings: [0.2004, 0.2013] },
    { name: 'S3', concentration: 2, readings: [0.3989, 0.4006] },
    { name: 'S4', concentration: 4, readings: [0.8012, 0.7995] },
  ],
  unknowns: [],
};

export function typedSample(sample: string, readings: readonly (number | string)[]): UnknownSample {
  return {
    sample,
    pathLengthMm: 10,
    dilution: [],
    readings: readings.map((reading) => ({
      value: typeof reading === 'number' ? reading : null,
      gapText: typeof reading === 'string' ? reading : null,
      signal: 'absorbance',
    })),
  };
}

function determination(sample: UnknownSample, index: number): DeterminationView {
  const unknowns = [unknownOf(sample, EXAMPLE_CURVE.signal)];
  const answer = calculateStandardCurve({ ...EXAMPLE_CURVE, unknowns });
  const [result] = answer.unknowns;
  if (!result) throw new Error('the engine answered without a result');
  const id = `determination-${index}`;
  return {
    id,
    notebookId: 'notebook',
    batchId: 'batch',
    position: index + 1,
    sample: sample.sample,
    note: '',
    pathLengthMm: sample.pathLengthMm,
    pathLengthUMm: null,
    dilution: sample.dilution,
    readings: [],
    result,
    engineVersion: answer.engine,
    version: 1,
    voidedAt: null,
    voidReason: null,
    createdAt: '2026-12-01T09:00:00.000Z',
  };
}

/** A batch as a page gets it, its results from the engine. */
export function exampleBatch(samples: readonly UnknownSample[], title = 'Weir samples'): BatchView {
  return {
    id: 'batch',
    notebookId: 'notebook',
    title,
    note: '',
    version: 1,
    status: 'open',
    voidReason: null,
    curve: { id: 'curve', title: 'Iron, 510 nm', version: 2, status: 'saved', voidReason: null, newer: null },
    absorptivity: null,
    sampleCount: samples.length,
    createdAt: '2026-12-01T09:00:00.000Z',
    method: {
      analyte: 'iron',
      basis: 'Fe',
      unit: 'mg/L',
      wavelengthNm: 510,
      readingRule: { kind: 'point', wavelengthNm: 510 },
      pathLengthMm: 10,
      confidence: 0.95,
      absorbanceLimit: 2,
      signal: 'absorbance',
      hazardNote: '',
      range: { min: 0.5, max: 4 },
      knownAbsorptivity: null,
    },
    determinations: samples.map(determination),
    mayEdit: true,
    supersedes: null,
    supersededBy: null,
  };
}
