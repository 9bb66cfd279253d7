import { afterAll, beforeAll, expect, test } from 'vitest';
import { loadCurve } from '@/db/queries/curves';
import { saveCurve } from '@/db/queries/curve-saving';
import { uploadSourceFile } from '@/db/queries/source-files';
import { calculateStandardCurve } from '@/lib/engine';
import type { Actor } from '@/lib/policies/actor';
import type { CurveDraftInput } from '@/lib/schemas/curve';
import { curveDraftInput, saveCurveInput } from '../../../support/curve-draft';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import { actorOf, makeNotebook, makePerson } from '../../../support/factories';
import { jcampUpload } from '../../../support/spectrum-text';

let database: TestDatabase;
let owner: Actor;
let notebookId: string;
let ids: string[];

async function upload(notebook: string, name: string, values: (number | string)[]): Promise<string> {
  const outcome = await uploadSourceFile(owner, notebook, jcampUpload(name, 500, values));
  if (outcome.verdict !== 'stored') throw new Error(`expected stored, got ${outcome.verdict}`);
  return outcome.spectra[0]?.id ?? '';
}

beforeAll(async () => {
  database = await openTestDatabase();
  const pi = await makePerson('pi');
  owner = await actorOf(pi.id);
  notebookId = await makeNotebook(pi.id);
  ids = [];
  for (const [index, top] of [0.2, 0.41, 0.79].entries())
    ids.push(await upload(notebookId, `S${index + 1}`, [0.01, top / 2, top, 0.02]));
});
afterAll(() => database.close());

function draftOf(spectrumIds: readonly string[], at: string, minus = ''): CurveDraftInput {
  return {
    ...curveDraftInput([]),
    rule: { rule: 'point', at, half: '', from: '', to: '', minus },
    standards: spectrumIds.map((spectrumId, index) => ({
      role: 'standard',
      name: `S${index + 1}`,
      concentration: String(2 ** index),
      leftOut: null,
      readings: [{ spectrumId, leftOut: null }],
    })),
  };
}
const save = (draft: CurveDraftInput) =>
  saveCurve(owner, saveCurveInput(notebookId, { draft, saveKey: crypto.randomUUID() }));

test('reads the stored spectra by the rule and keeps where each reading came from', async () => {
  const curve = await loadCurve(owner, (await save(draftOf(ids, '502', '500'))).id);
  const readings = curve.standards.flatMap((standard) => standard.readings);
  // as they came, by the points of the files; the curve is made of 0.2 − 0.01, 0.41 − 0.01, 0.79 − 0.01
  expect(readings.map(({ value, minusValue }) => [value, minusValue])).toEqual([
    [0.2, 0.01],
    [0.41, 0.01],
    [0.79, 0.01],
  ]);
  const { points } = curve.result.curve;
  points.forEach(({ absorbance }, index) =>
    expect(absorbance).toBeCloseTo([0.19, 0.4, 0.78][index] ?? NaN, 12),
  );
  expect(points.map(({ absorbanceAsRead }) => absorbanceAsRead)).toEqual([0.2, 0.41, 0.79]);
  expect(readings[1]).toMatchObject({
    origin: 'spectrum',
    spectrumId: ids[1],
    spectrumName: 'S2',
    rule: { kind: 'point', wavelengthNm: 502, minusNm: 500 },
  });
  expect(curve.result).toEqual(calculateStandardCurve(curve.request));
});

test('a standard above the absorbance limit is seen though its difference is harmless', async () => {
  const high = await upload(notebookId, 'High', [1.4, 1.5, 2.6, 0.5]);
  const draft = draftOf([...ids, high], '502', '500');
  const curve = await loadCurve(owner, (await save(draft)).id);
  expect(curve.result.curve.points[3]?.absorbance).toBeCloseTo(1.2, 12);
  const over = curve.result.curve.flags.filter(({ code }) => code === 'STANDARD_OVER_LIMIT');
  expect(over).toMatchObject([{ value: 2.6, limit: 2 }]);
});

test('a wavelength outside a spectrum is refused at its reading', async () => {
  await expect(save(draftOf(ids, '900'))).rejects.toMatchObject({
    code: 'INVALID_INPUT',
    message: expect.stringMatching(/^S1: .*outside/),
    details: expect.arrayContaining([expect.objectContaining({ pointer: '/draft.standards.2.readings.0' })]),
  });
});

test('a gap of the spectrum becomes a reading without a number', async () => {
  const gap = await upload(notebookId, 'S4', [0.01, 0.3, '?', 0.02]);
  const curve = await loadCurve(owner, (await save(draftOf([...ids, gap], '502'))).id);
  expect(curve.standards[3]?.readings[0]).toMatchObject({ value: null, gapText: expect.stringMatching(/./) });
  expect(curve.range.max).toBe(4);
});

test('a spectrum of another notebook does not exist here', async () => {
  const other = await makeNotebook(owner.personId ?? '');
  const strange = await upload(other, 'X', [0.1, 0.2, 0.3, 0.4]);
  await expect(save(draftOf([...ids, strange], '502'))).rejects.toMatchObject({ code: 'NOT_FOUND' });
});
