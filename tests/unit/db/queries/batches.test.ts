import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { listFor } from '@/db/access';
import { createBatchVersion } from '@/db/queries/batch-versions';
import { createBatch, listBatches, loadBatch, recordExport, voidBatch } from '@/db/queries/batches';
import { voidCurve } from '@/db/queries/curves';
import { changeConditions, correctReading, voidDetermination } from '@/db/queries/determination-changes';
import { addTypedSamples, listDeterminations, loadDetermination } from '@/db/queries/determinations';
import { calculateStandardCurve } from '@/lib/engine';
import type { Actor } from '@/lib/policies/actor';
import * as schemas from '@/lib/schemas/determination';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import { EXAMPLE_CURVE } from '../../../support/example-batch';
import { makeCurve } from '../../../support/example-curve';
import { actorOf, makeMember, makeNotebook, makePerson } from '../../../support/factories';

let database: TestDatabase;
let owner: Actor;
let colleague: Actor;
let reader: Actor;
let stranger: Actor;
let notebookId: string;
let curveId: string;

beforeAll(async () => {
  database = await openTestDatabase();
  const [pi, analyst, viewer, other] = [
    await makePerson('pi', 'Odile Marchetti'),
    await makePerson('analyst', 'Tomasz Reed'),
    await makePerson('viewer', 'Ines Falk'),
    await makePerson('pi', 'Someone Else'),
  ];
  notebookId = await makeNotebook(pi.id);
  await makeMember(notebookId, analyst.id, 'contributor');
  await makeMember(notebookId, viewer.id, 'reader');
  [owner, colleague, reader, stranger] = [
    await actorOf(pi.id),
    await actorOf(analyst.id),
    await actorOf(viewer.id),
    await actorOf(other.id),
  ];
  curveId = await makeCurve(owner, notebookId, { hazardNote: 'Hydroxylamine is toxic: wear gloves.' });
});
afterAll(() => database.close());

const newBatch = async (title = 'July weirs', on = curveId) =>
  (await createBatch(owner, { notebookId, submissionKey: randomUUID(), curveId: on, title, note: '' })).id;

type Row = readonly [sample: string, readings: readonly string[], dilution?: string, pathLengthMm?: string];

function samplesOf(batchId: string, rows: readonly Row[], submissionKey: string = randomUUID()) {
  const samples = rows.map(([sample, readings, dilution = '', pathLengthMm = '10']) => ({
    ...{ sample, readings, dilution, pathLengthMm },
  }));
  return schemas.addTypedSamples.parse({ batchId, submissionKey, samples: JSON.stringify(samples) });
}

async function batchWith(rows: readonly Row[]) {
  const batchId = await newBatch();
  await addTypedSamples(owner, samplesOf(batchId, rows));
  return loadBatch(owner, batchId);
}

const onlyOne = async (rows: readonly Row[]) => {
  const [one] = (await batchWith(rows)).determinations;
  if (!one) throw new Error('the batch has a determination');
  return one;
};

const correction = (
  one: { id: string; version: number; readings: readonly { id: string }[] },
  text: string,
) =>
  schemas.correctReading.parse({
    determinationId: one.id,
    readingId: one.readings[0]?.id,
    version: one.version,
    reading: text,
    reason: 'copied the wrong digit',
  });

describe('who may', () => {
  test('a stranger learns nothing: there is no such batch', async () => {
    const batch = await batchWith([['Weir 3', ['0.4021']]]);
    const [one] = batch.determinations;
    await expect(loadBatch(stranger, batch.id)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(loadDetermination(stranger, one?.id ?? '')).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(listBatches(stranger, notebookId, { limit: 5 })).rejects.toMatchObject({
      code: 'NOT_FOUND',
    });
    await expect(addTypedSamples(stranger, samplesOf(batch.id, [['x', ['0.4']]]))).rejects.toMatchObject({
      code: 'NOT_FOUND',
    });
  });
  test('a reader sees everything and changes nothing', async () => {
    const one = await onlyOne([['Weir 3', ['0.4021']]]);
    expect((await loadBatch(reader, one.batchId)).mayEdit).toBe(false);
    const tries = [
      createBatch(reader, { notebookId, submissionKey: randomUUID(), curveId, title: 'x', note: '' }),
      addTypedSamples(reader, samplesOf(one.batchId, [['x', ['0.4']]])),
      correctReading(reader, correction(one, '0.5')),
      voidDetermination(reader, { determinationId: one.id, version: 1, reason: 'x' }),
      voidBatch(reader, { batchId: one.batchId, reason: 'x' }),
      createBatchVersion(reader, { batchId: one.batchId, submissionKey: randomUUID(), curveId, reason: 'x' }),
    ];
    for (const outcome of await Promise.allSettled(tries))
      expect(outcome).toMatchObject({ status: 'rejected', reason: { code: 'NOT_ALLOWED' } });
  });
});

describe('the curve of a batch', () => {
  test('a void curve is refused at its field, with why it is void', async () => {
    const voided = await makeCurve(owner, notebookId);
    await voidCurve(owner, { curveId: voided, reason: 'wrong stock' });
    await expect(newBatch('x', voided)).rejects.toMatchObject({
      code: 'INVALID_INPUT',
      details: [{ pointer: '/curveId', detail: expect.stringContaining('wrong stock') as string }],
    });
  });
  test('a curve of another notebook is refused', async () => {
    const elsewhere = await makeNotebook(owner.personId ?? '');
    const other = await makeCurve(owner, elsewhere);
    await expect(newBatch('x', other)).rejects.toMatchObject({ code: 'INVALID_INPUT' });
  });
  test('a superseded version may be used, and the batch says so', async () => {
    const first = await makeCurve(owner, notebookId);
    const second = await makeCurve(owner, notebookId, { baseId: first });
    const batch = await loadBatch(owner, await newBatch('on the old one', first));
    expect(batch.curve).toMatchObject({
      version: 1,
      status: 'superseded',
      newer: { id: second, version: 2 },
    });
  });
  test('the hazard note of the method comes with the batch', async () => {
    const batch = await loadBatch(owner, await newBatch());
    expect(batch.method.hazardNote).toContain('wear gloves');
  });
});

describe('saving samples', () => {
  test('the result is the engine on the stored readings; a number from a browser is nowhere', async () => {
    const batchId = await newBatch();
    const samples = [
      {
        sample: 'Weir 3',
        readings: ['0.4021', '0.4013'],
        dilution: '10 in 100',
        pathLengthMm: '10',
        result: { concentration: { value: 987654.321, u: 0, U: 0 }, report: '987654.321 mg/L' },
        concentration: 987654.321,
      },
    ];
    const form = { batchId, submissionKey: randomUUID(), samples: JSON.stringify(samples) };
    await addTypedSamples(owner, schemas.addTypedSamples.parse(form));
    const batch = await loadBatch(owner, batchId);
    const unknowns = [{ name: 'Weir 3', readings: [0.4021, 0.4013], dilution: [{ takenMl: 10, toMl: 100 }] }];
    const [expected] = calculateStandardCurve({ ...EXAMPLE_CURVE, unknowns }).unknowns;
    expect(batch.determinations[0]?.result.concentration).toEqual(expected?.concentration);
    expect(JSON.stringify(batch)).not.toContain('987654');
  });
  test('a double click saves once', async () => {
    const batchId = await newBatch();
    const input = samplesOf(batchId, [
      ['a', ['0.4']],
      ['b', ['0.5']],
    ]);
    const counts = await Promise.all([addTypedSamples(owner, input), addTypedSamples(owner, input)]);
    expect(counts.map(({ count }) => count).sort()).toEqual([0, 2]);
    expect((await loadBatch(owner, batchId)).determinations).toHaveLength(2);
  });
  test('the same form with other samples in it is another saving', async () => {
    const batchId = await newBatch();
    const key = randomUUID();
    await addTypedSamples(owner, samplesOf(batchId, [['a', ['0.4']]], key));
    await addTypedSamples(owner, samplesOf(batchId, [['b', ['0.5']]], key));
    const { determinations } = await loadBatch(owner, batchId);
    expect(determinations.map(({ sample, position }) => [sample, position])).toEqual([
      ['a', 1],
      ['b', 2],
    ]);
  });
  test('a batch made twice by a double click is one', async () => {
    const input = { notebookId, submissionKey: randomUUID(), curveId, title: 'twice', note: '' };
    const [one, two] = await Promise.all([createBatch(owner, input), createBatch(owner, input)]);
    expect(one.id).toBe(two.id);
  });
  test('replicates are kept one by one, text as it came', async () => {
    const one = await onlyOne([['Drain', ['1.9', 'OVER', '>3.5']]]);
    expect(one.readings.map(({ value, gapReason, gapText }) => value ?? [gapReason, gapText])).toEqual([
      1.9,
      ['aboveRange', 'OVER'],
      ['aboveRange', '>3.5'],
    ]);
    expect(one.result).toMatchObject({ reportCase: 'notQuantified', concentration: null });
  });
  test('a batch that was declared void takes no more samples', async () => {
    const batchId = await newBatch();
    await voidBatch(owner, { batchId, reason: 'lamp failed' });
    await expect(addTypedSamples(owner, samplesOf(batchId, [['a', ['0.4']]]))).rejects.toMatchObject({
      code: 'CHANGED_MEANWHILE',
    });
    await expect(voidBatch(owner, { batchId, reason: 'again' })).rejects.toMatchObject({
      message: expect.stringContaining('lamp failed') as string,
    });
  });
});

describe('correcting', () => {
  test('a new reading with its reason; the old one stays and is superseded', async () => {
    const one = await onlyOne([['Weir 3', ['0.4201', '0.4013']]]);
    await correctReading(owner, correction(one, '0.4021'));
    const after = await loadDetermination(owner, one.id);
    expect(after.readings.map(({ value }) => value)).toEqual([0.4021, 0.4013]);
    expect(after.readings[0]).toMatchObject({
      supersedesId: one.readings[0]?.id,
      reason: 'copied the wrong digit',
    });
    expect(after.superseded.map(({ value }) => value)).toEqual([0.4201]);
    expect(after.superseded[0]?.supersededAt).not.toBeNull();
    expect(after.version).toBe(2);
    const unknowns = [{ readings: [0.4021, 0.4013] }];
    const [expected] = calculateStandardCurve({ ...EXAMPLE_CURVE, unknowns }).unknowns;
    expect(after.result.concentration).toEqual(expected?.concentration);
    expect(after.history.map(({ what, why, who }) => [what, why, who])).toEqual([
      ['saved', null, 'Odile Marchetti'],
      ['reading 1 is now 0.4021 (was 0.4201)', 'copied the wrong digit', 'Odile Marchetti'],
    ]);
  });
  test('the second of two writers is told what the first one did, and nothing is written', async () => {
    const seen = await onlyOne([['Weir 3', ['0.4201', '0.4013']]]);
    await correctReading(colleague, correction(seen, '0.4021'));
    await expect(correctReading(owner, correction(seen, '0.4022'))).rejects.toMatchObject({
      code: 'CHANGED_MEANWHILE',
      message: expect.stringMatching(
        /^Tomasz Reed changed this meanwhile: reading 1 is now 0\.4021 \(was 0\.4201\)/,
      ) as string,
    });
    const after = await loadDetermination(owner, seen.id);
    expect([after.version, after.readings[0]?.value]).toEqual([2, 0.4021]);
  });
  test('two corrections at once: one is saved, the other is told', async () => {
    const seen = await onlyOne([['Weir 3', ['0.42']]]);
    const both = await Promise.allSettled([
      correctReading(owner, correction(seen, '0.43')),
      correctReading(colleague, correction(seen, '0.44')),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    expect((await loadDetermination(owner, seen.id)).superseded).toHaveLength(1);
  });
  test('the same reading again is not a correction', async () => {
    const one = await onlyOne([['Weir 3', ['0.42']]]);
    await expect(correctReading(owner, correction(one, '0,42'))).rejects.toMatchObject({
      code: 'INVALID_INPUT',
    });
  });
  test('path length and dilution change with a reason and are calculated again', async () => {
    const one = await onlyOne([['Weir 3', ['0.4021'], '10 in 100']]);
    const change = {
      determinationId: one.id,
      version: 1,
      sample: 'Weir 3',
      pathLengthMm: '10',
      dilution: '1+19',
      reason: 'flask of 20',
    };
    await changeConditions(owner, schemas.changeConditions.parse(change));
    const after = await loadDetermination(owner, one.id);
    expect(after.result.dilutionFactor.value).toBe(20);
    expect((after.result.concentration?.value ?? 0) / (one.result.concentration?.value ?? 1)).toBeCloseTo(
      2,
      12,
    );
    expect(after.history.at(-1)).toMatchObject({
      what: 'the dilution is now 1 in 20 (was 10 in 100)',
      why: 'flask of 20',
    });
  });
  test('another cell with its uncertainty, and vessels with theirs, become lines of the budget', async () => {
    const one = await onlyOne([['Weir 3', ['0.4021'], '10 in 100']]);
    const change = {
      determinationId: one.id,
      version: 1,
      sample: 'Weir 3',
      pathLengthMm: '20',
      pathLengthUMm: '0,02',
      dilution: '10 in 100 class A',
      reason: 'the long cell',
    };
    await changeConditions(owner, schemas.changeConditions.parse(change));
    const after = await loadDetermination(owner, one.id);
    expect(after.pathLengthUMm).toBe(0.02);
    expect(after.result.budget.map(({ source }) => source)).toEqual(
      expect.arrayContaining([
        'path length of the unknown',
        'dilution 1, volume taken',
        'dilution 1, made up to',
      ]),
    );
    expect(after.history.at(-1)?.what).toContain(
      'the standard uncertainty of the path length is now 0.02 mm (was not given)',
    );
    // the same again is no change, the ware included
    await expect(
      changeConditions(owner, schemas.changeConditions.parse({ ...change, version: 2 })),
    ).rejects.toMatchObject({ code: 'INVALID_INPUT' });
  });
  test('a void determination keeps its numbers to be seen, leaves the count, and changes no more', async () => {
    const one = await onlyOne([['Weir 3', ['0.4021']]]);
    await voidDetermination(owner, { determinationId: one.id, version: 1, reason: 'wrong bottle' });
    const batch = await loadBatch(owner, one.batchId);
    expect([batch.sampleCount, batch.determinations[0]?.voidReason]).toEqual([0, 'wrong bottle']);
    const late = { ...correction(one, '0.5'), version: 2 };
    await expect(correctReading(owner, late)).rejects.toMatchObject({
      code: 'CHANGED_MEANWHILE',
      message: expect.stringContaining('wrong bottle') as string,
    });
  });
});

describe('a new version on another curve', () => {
  const steeper = [
    ['0', '0.0012', '0.0008'],
    ['0.5', '0.1111', '0.1102'],
    ['1', '0.2204', '0.2213'],
    ['2', '0.4389', '0.4406'],
    ['4', '0.8812', '0.8795'],
  ] as const;

  test('the same readings, calculated on the new curve; the old version stays as it was', async () => {
    const old = await batchWith([
      ['Weir 3', ['0.4021', '0.4013'], '10 in 100'],
      ['void one', ['0.3']],
    ]);
    const [kept, gone] = old.determinations;
    await voidDetermination(owner, { determinationId: gone?.id ?? '', version: 1, reason: 'wrong bottle' });
    const target = await makeCurve(owner, notebookId, { standards: steeper });
    const input = {
      batchId: old.id,
      submissionKey: randomUUID(),
      curveId: target,
      reason: 'standards made afresh',
    };
    const [made, again] = await Promise.all([
      createBatchVersion(owner, input),
      createBatchVersion(owner, input),
    ]);
    expect(made.id).toBe(again.id);
    const now = await loadBatch(owner, made.id);
    expect(now).toMatchObject({ version: 2, status: 'open', supersedes: { id: old.id, version: 1 } });
    expect(now.determinations.map(({ sample }) => sample)).toEqual(['Weir 3']);
    expect(now.determinations[0]?.readings.map(({ value }) => value)).toEqual([0.4021, 0.4013]);
    expect(now.determinations[0]?.result.concentration?.value).toBeLessThan(
      kept?.result.concentration?.value ?? 0,
    );
    const before = await loadBatch(owner, old.id);
    expect(before).toMatchObject({ status: 'superseded', supersededBy: { id: made.id, version: 2 } });
    expect(before.determinations[0]?.result).toEqual(kept?.result);
    await expect(
      correctReading(owner, correction(kept ?? { id: '', version: 1, readings: [] }, '0.5')),
    ).rejects.toMatchObject({
      code: 'CHANGED_MEANWHILE',
    });
  });
  test.each([
    ['another analyte', { analyte: 'phosphate' }, 'is for phosphate'],
    ['another wavelength, with typed readings', { wavelengthNm: '562' }, 'typed for 510 nm'],
  ])('%s is refused', async (_what, options, words) => {
    const old = await batchWith([['Weir 3', ['0.4021']]]);
    const target = await makeCurve(owner, notebookId, options);
    const input = { batchId: old.id, submissionKey: randomUUID(), curveId: target, reason: 'x' };
    await expect(createBatchVersion(owner, input)).rejects.toMatchObject({
      code: 'INVALID_INPUT',
      message: expect.stringContaining(words) as string,
    });
    expect((await loadBatch(owner, old.id)).status).toBe('open');
  });
});

test('lists come by pages and miss nothing', async () => {
  const elsewhere = await makeNotebook(owner.personId ?? '');
  const curve = await makeCurve(owner, elsewhere);
  const made: string[] = [];
  for (const title of ['one', 'two', 'three'])
    made.push(
      (
        await createBatch(owner, {
          notebookId: elsewhere,
          submissionKey: randomUUID(),
          curveId: curve,
          title,
          note: '',
        })
      ).id,
    );
  const first = await listBatches(owner, elsewhere, { limit: 2 });
  const second = await listBatches(owner, elsewhere, { limit: 2, cursor: first.nextCursor ?? '' });
  expect([...first.items, ...second.items].map(({ id }) => id).sort()).toEqual([...made].sort());
  expect(second.nextCursor).toBeNull();
  await addTypedSamples(
    owner,
    samplesOf(made[0] ?? '', [
      ['a', ['0.4']],
      ['b', ['0.5']],
    ]),
  );
  const page = await listDeterminations(owner, made[0] ?? '', { limit: 1 });
  expect([page.items.length, page.items[0]?.readings.length, page.nextCursor === null]).toEqual([
    1,
    1,
    false,
  ]);
});

test('that results left as a file stands in the record', async () => {
  const batchId = await newBatch('exported');
  await recordExport(reader, batchId, 'CSV');
  const entries = await listFor(owner, 'recordEntry', notebookId, {
    where: { subjectId: batchId, verb: 'exported' },
  });
  expect(entries.map((entry) => [entry.actorName, entry.to])).toEqual([['Ines Falk', { format: 'CSV' }]]);
});
