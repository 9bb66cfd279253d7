import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import {
  listAbsorptivities,
  loadAbsorptivity,
  saveAbsorptivity,
  voidAbsorptivity,
} from '@/db/queries/absorptivities';
import { compareBatch } from '@/db/queries/batch-comparison';
import { createBatchVersion } from '@/db/queries/batch-versions';
import { createBatch, loadBatch, listBatches } from '@/db/queries/batches';
import { changeConditions, correctReading } from '@/db/queries/determination-changes';
import { addSpectrumSamples, addTypedSamples, loadDetermination } from '@/db/queries/determinations';
import { uploadSourceFile } from '@/db/queries/source-files';
import { listSpectra } from '@/db/queries/spectra';
import { resultsCsv } from '@/lib/batch/results-csv';
import { resultFromKnownAbsorptivity } from '@/lib/engine';
import type { Actor } from '@/lib/policies/actor';
import { saveAbsorptivityForm } from '@/lib/schemas/absorptivity';
import { newBatch } from '@/lib/schemas/batch';
import * as schemas from '@/lib/schemas/determination';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import {
  absorptivityTexts,
  makeAbsorptivity,
  type AbsorptivityTexts,
} from '../../../support/example-absorptivity';
import { makeCurve } from '../../../support/example-curve';
import { actorOf, makeMember, makeNotebook, makePerson } from '../../../support/factories';
import { jcampUpload } from '../../../support/spectrum-text';

let database: TestDatabase;
let owner: Actor;
let reader: Actor;
let stranger: Actor;
let notebookId: string;

beforeAll(async () => {
  database = await openTestDatabase();
  const [pi, viewer, other] = [await makePerson('pi'), await makePerson('viewer'), await makePerson('pi')];
  notebookId = await makeNotebook(pi.id);
  await makeMember(notebookId, viewer.id, 'reader');
  [owner, reader, stranger] = [await actorOf(pi.id), await actorOf(viewer.id), await actorOf(other.id)];
});
afterAll(() => database.close());

const made = (changes: AbsorptivityTexts = {}) => makeAbsorptivity(owner, notebookId, changes);
const save = (actor: Actor, changes: AbsorptivityTexts = {}) =>
  saveAbsorptivity(actor, saveAbsorptivityForm.parse(absorptivityTexts(notebookId, changes)));

async function batchOn(absorptivityId: string): Promise<string> {
  const form = { notebookId, submissionKey: randomUUID(), title: 'July weirs', note: '' };
  return (await createBatch(owner, newBatch.parse({ ...form, readOn: `absorptivity ${absorptivityId}` }))).id;
}

/** Typed samples as a form sends them; `more` stands for what a browser might add. */
function typed(batchId: string, readings: readonly string[], more: object = {}) {
  const samples = [{ sample: 'Weir 3', readings, dilution: '10 in 100', pathLengthMm: '10', ...more }];
  return schemas.addTypedSamples.parse({
    batchId,
    submissionKey: randomUUID(),
    samples: JSON.stringify(samples),
  });
}

async function determinationOn(absorptivityId: string, readings: readonly string[], more: object = {}) {
  const batchId = await batchOn(absorptivityId);
  await addTypedSamples(owner, typed(batchId, readings, more));
  const [one] = (await loadBatch(owner, batchId)).determinations;
  if (!one) throw new Error('the batch has a determination');
  return one;
}

describe('a known absorptivity', () => {
  test('is kept with its source, and named by analyte and wavelength', async () => {
    const one = await loadAbsorptivity(owner, await made());
    expect(one).toMatchObject({
      title: 'Iron(II) as ferroin, 510 nm',
      ...{ kind: 'molar', value: 11100, u: 100, source: 'analytical textbooks', version: 1, status: 'saved' },
      ...{ unit: 'mg/L', formulaMass: 55.845, pathLengthMm: 10, pathLengthUMm: 0.02, wavelengthNm: 510 },
      mayEdit: true,
      flags: [],
    });
    expect(one.working.map(({ label }) => label)).toContain('molar absorptivity');
  });
  test('without uncertainty and conditions says so', async () => {
    const { flags, u } = await loadAbsorptivity(owner, await made({ u: '', conditions: '' }));
    expect(u).toBeNull();
    expect(flags.map(({ code }) => code)).toEqual([
      'ABSORPTIVITY_WITHOUT_U',
      'ABSORPTIVITY_WITHOUT_CONDITIONS',
    ]);
  });
  test('sent twice is saved once', async () => {
    const texts = { saveKey: 'the same form' };
    const [one, two] = [await save(owner, texts), await save(owner, texts)];
    expect(two.id).toBe(one.id);
    expect((await save(owner, { ...texts, value: '11050' })).id).not.toBe(one.id);
  });
  test('gets a new version; the old one says so, and a form opened on it is refused', async () => {
    const first = await made();
    const second = await made({ baseId: first, value: '11072', reason: 'measured here' });
    expect(await loadAbsorptivity(owner, first)).toMatchObject({
      status: 'superseded',
      newer: { id: second, version: 2 },
    });
    const { versions, reason } = await loadAbsorptivity(owner, second);
    expect(versions.map(({ version }) => version)).toEqual([2, 1]);
    expect(reason).toBe('measured here');
    await expect(save(owner, { baseId: first, value: '1' })).rejects.toMatchObject({
      code: 'CHANGED_MEANWHILE',
      details: [{ pointer: '/newerId', detail: second }, { pointer: '/newerVersion' }],
    });
  });
  test.each([
    ['source', { source: ' ' }],
    ['value', { value: '0' }],
    ['u', { u: '-1' }],
    ['formulaMass', { formulaMass: '' }],
    ['at', { at: '' }],
    ['analyte', { analyte: '' }],
    ['kind', { kind: 'other' }],
  ])('is refused at its field: %s', (path, changes) => {
    const parsed = saveAbsorptivityForm.safeParse(absorptivityTexts(notebookId, changes));
    expect(parsed.error?.issues.map((issue) => issue.path.join('.'))).toEqual([path]);
  });
  test('all that is wrong is said at once', () => {
    const texts = absorptivityTexts(notebookId, { source: '', value: 'x', at: '' });
    const paths = saveAbsorptivityForm.safeParse(texts).error?.issues.map((issue) => issue.path.join('.'));
    expect(paths?.sort()).toEqual(['at', 'source', 'value']);
  });
});

describe('who may', () => {
  test('a stranger learns nothing', async () => {
    const id = await made();
    await expect(loadAbsorptivity(stranger, id)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(listAbsorptivities(stranger, notebookId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(save(stranger)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
  test('a reader sees it and changes nothing', async () => {
    const id = await made();
    expect((await loadAbsorptivity(reader, id)).mayEdit).toBe(false);
    const input = { notebookId, submissionKey: randomUUID(), absorptivityId: id, title: 'x', note: '' };
    const tries = [
      save(reader),
      save(reader, { baseId: id }),
      voidAbsorptivity(reader, { absorptivityId: id, reason: 'x' }),
      createBatch(reader, input),
    ];
    for (const outcome of await Promise.allSettled(tries))
      expect(outcome).toMatchObject({ status: 'rejected', reason: { code: 'NOT_ALLOWED' } });
  });
});

describe('a batch on it', () => {
  test('gives what Beer-Lambert gives, and what the engine gives', async () => {
    const id = await made();
    const one = await determinationOn(id, ['0.1980', '0.1996']);
    // A / (ε l) · M · 10: 0.1988 reads 1.0002 mg/L by ε 11 100 and M 55.845, diluted ten times
    const expected = ((0.1988 / 11100) * 55.845 * 1000 * 100) / 10;
    expect(one.result.concentration?.value).toBeCloseTo(expected, 10);
    expect(one.result.budget.map(({ source }) => source)).toEqual([
      'readings',
      'absorptivity',
      'path length',
    ]);
    const [own] = resultFromKnownAbsorptivity({
      ...(await loadAbsorptivity(owner, id)).request,
      unknowns: [
        {
          name: 'Weir 3',
          readings: [0.198, 0.1996],
          pathLengthMm: 10,
          dilution: [{ takenMl: 10, toMl: 100 }],
        },
      ],
    }).unknowns;
    expect(one.result).toEqual(JSON.parse(JSON.stringify(own)));
    expect(one.result.fieller).toBeNull();
  });
  test('says what it is read on, without a curve and without a range', async () => {
    const id = await made();
    const batch = await loadBatch(owner, await batchOn(id));
    expect(batch).toMatchObject({
      curve: null,
      absorptivity: { id, version: 1, status: 'saved', newer: null },
      method: { range: null, unit: 'mg/L', knownAbsorptivity: { value: 11100, u: 100, flags: [] } },
    });
    const { items } = await listBatches(owner, notebookId, { limit: 100 });
    expect(items.find((item) => item.id === batch.id)?.absorptivity?.id).toBe(id);
  });
  test('a number that a browser sends as a result is not stored', async () => {
    const forged = { result: { concentration: { value: 99 } }, value: 99, engineVersion: '0', u: 0 };
    const one = await determinationOn(await made(), ['0.1988'], forged);
    expect(one.result.concentration?.value).toBeCloseTo(10.002, 3);
    expect(JSON.stringify(await loadDetermination(owner, one.id))).not.toContain('99}');
  });
  test('is calculated again when a reading is corrected or a condition changes', async () => {
    const one = await determinationOn(await made(), ['0.1988']);
    const correction = schemas.correctReading.parse({
      ...{ determinationId: one.id, readingId: one.readings[0]?.id, version: one.version },
      ...{ reading: '0.3976', reason: 'copied the wrong digit' },
    });
    await correctReading(owner, correction);
    const twice = await loadDetermination(owner, one.id);
    expect(twice.result.computed).toBeCloseTo(2 * (one.result.computed ?? NaN), 10);
    await changeConditions(
      owner,
      schemas.changeConditions.parse({
        ...{ determinationId: one.id, version: twice.version, sample: 'Weir 3' },
        ...{ pathLengthMm: '20', dilution: '', reason: 'it was the long cell' },
      }),
    );
    const long = await loadDetermination(owner, one.id);
    expect(long.result.computed).toBeCloseTo((twice.result.computed ?? NaN) / 20, 10);
    // the uncertainty of the usual cell does not hold for another one
    expect(long.result.flags.map(({ code }) => code)).toContain('PATH_WITHOUT_U');
  });
  test('reads spectra by the rule of the absorptivity', async () => {
    await uploadSourceFile(owner, notebookId, jcampUpload('S01', 509, [0.1, 0.1988, 0.3]));
    const [spectrum] = await listSpectra(owner, notebookId);
    const batchId = await batchOn(await made());
    const samples = [{ sample: 'S01', spectrumIds: [spectrum?.id], dilution: '', pathLengthMm: '10' }];
    const sent = { batchId, submissionKey: randomUUID(), samples: JSON.stringify(samples) };
    await addSpectrumSamples(owner, schemas.addSpectrumSamples.parse(sent));
    const [one] = (await loadBatch(owner, batchId)).determinations;
    expect(one?.readings[0]).toMatchObject({ value: 0.1988, origin: 'spectrum' });
    expect(one?.result.concentration?.value).toBeCloseTo(1.0002, 4);
  });
  test('leaves in a file under its own columns', async () => {
    const { batchId } = await determinationOn(await made(), ['0.1988']);
    const [head = '', row = ''] = resultsCsv(await loadBatch(owner, batchId)).split('\r\n');
    expect(head).toContain('curve,curve version,known absorptivity,absorptivity version,engine');
    expect(row).toContain(',,,"Iron(II) as ferroin, 510 nm",1,');
  });
});

describe('refusals about batches', () => {
  test('a void absorptivity takes no batch and no more samples', async () => {
    const id = await made();
    const batchId = await batchOn(id);
    await voidAbsorptivity(owner, { absorptivityId: id, reason: 'wrong table' });
    const refusal = {
      code: 'INVALID_INPUT',
      details: [{ pointer: '/absorptivityId', detail: expect.stringContaining('wrong table') as string }],
    };
    await expect(batchOn(id)).rejects.toMatchObject(refusal);
    await expect(addTypedSamples(owner, typed(batchId, ['0.2']))).rejects.toMatchObject(refusal);
    await expect(voidAbsorptivity(owner, { absorptivityId: id, reason: 'x' })).rejects.toMatchObject({
      code: 'CHANGED_MEANWHILE',
    });
  });
  test('one of another notebook is refused', async () => {
    const other = await makeNotebook(owner.personId ?? '');
    const theirs = await makeAbsorptivity(owner, other);
    await expect(batchOn(theirs)).rejects.toMatchObject({ code: 'INVALID_INPUT' });
  });
  test('the form of a batch takes one of the two', () => {
    const id = randomUUID();
    const parsed = (readOn: string) =>
      newBatch.safeParse({ notebookId, submissionKey: randomUUID(), title: 'x', readOn });
    expect(parsed(`curve ${id}`).data).toMatchObject({ curveId: id });
    expect(parsed(`absorptivity ${id}`).data).toMatchObject({ absorptivityId: id });
    for (const wrong of ['', id, 'curve', 'curve x', `other ${id}`])
      expect(parsed(wrong).error?.issues[0]?.path).toEqual(['readOn']);
  });
  test('no other curve and no comparison of models', async () => {
    const { batchId } = await determinationOn(await made(), ['0.1988']);
    const curveId = await makeCurve(owner, notebookId, { analyte: 'Iron(II) as ferroin' });
    const version = { batchId, submissionKey: randomUUID(), curveId, reason: 'x' };
    await expect(createBatchVersion(owner, version)).rejects.toMatchObject({ code: 'INVALID_INPUT' });
    await expect(compareBatch(owner, batchId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});
