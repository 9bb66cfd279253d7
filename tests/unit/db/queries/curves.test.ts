import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { curveRequestOf, listCurves, loadCurve, pageOfCurves, voidCurve } from '@/db/queries/curves';
import { saveCurve } from '@/db/queries/curve-saving';
import { listRecord } from '@/db/queries/record';
import { calculateStandardCurve } from '@/lib/engine';
import { saveCurveForm } from '@/lib/schemas/curve';
import type { Actor } from '@/lib/policies/actor';
import { curveDraftInput, saveCurveInput } from '../../../support/curve-draft';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import { actorOf, makeMember, makeNotebook, makePerson } from '../../../support/factories';

let database: TestDatabase;
let owner: Actor;
let analyst: Actor;
let reader: Actor;
let stranger: Actor;
let notebookId: string;
let keys = 0;
const key = () => `form number ${(keys += 1)}`;

beforeAll(async () => {
  database = await openTestDatabase();
  const pi = (await makePerson('pi', 'Mara Lind')).id;
  const worker = (await makePerson('analyst', 'Jonas Ek')).id;
  const viewer = (await makePerson('viewer')).id;
  const other = (await makePerson('analyst')).id;
  notebookId = await makeNotebook(pi);
  await makeMember(notebookId, worker, 'contributor');
  await makeMember(notebookId, viewer, 'reader');
  owner = await actorOf(pi);
  analyst = await actorOf(worker);
  reader = await actorOf(viewer);
  stranger = await actorOf(other);
});
afterAll(() => database.close());

const save = (actor: Actor, options: Parameters<typeof saveCurveInput>[1] = {}) =>
  saveCurve(actor, saveCurveInput(notebookId, { saveKey: key(), ...options }));

describe('saveCurve', () => {
  test('keeps what was typed, and what the engine makes of the stored readings', async () => {
    const { id } = await save(analyst);
    const curve = await loadCurve(reader, id);
    expect(curve).toMatchObject({
      title: 'Iron(II) as ferroin, 510 nm',
      version: 1,
      status: 'saved',
      createdBy: 'Jonas Ek',
      mayEdit: false,
      newer: null,
    });
    expect(curve.standards.map(({ name, concentration }) => [name, concentration])).toEqual([
      ['S1', 0.5],
      ['S2', 1],
      ['S3', 2],
      ['S4', 3],
      ['S5', 4],
    ]);
    expect(curve.standards[2]?.readings.map(({ value, origin }) => [value, origin])).toEqual([
      [0.3972, 'typed'],
      [0.3998, 'typed'],
      [0.3941, 'typed'],
    ]);
    expect(curve.result).toEqual(calculateStandardCurve(curve.request));
    expect(await curveRequestOf(reader, id)).toEqual(curve.request);
  });

  test('takes no result from outside: a false slope in the form changes nothing', async () => {
    const honest = await loadCurve(analyst, (await save(analyst)).id);
    const draft = {
      ...curveDraftInput(),
      result: { curve: { slope: { value: 99, u: 0 } } },
      answer: 99,
      slope: 99,
    };
    const form = {
      notebookId,
      baseId: '',
      saveKey: key(),
      draft: JSON.stringify(draft),
      result: '99',
      slope: '99',
    };
    const forged = await loadCurve(analyst, (await saveCurve(analyst, saveCurveForm.parse(form))).id);
    expect(forged.result.curve.slope).toEqual(honest.result.curve.slope);
    expect(JSON.stringify(forged)).not.toContain('99}');
    const inReading = curveDraftInput();
    Object.assign(inReading.standards[0]?.readings[0] ?? {}, { absorbance: 99 });
    expect(saveCurveForm.safeParse({ ...form, draft: JSON.stringify(inReading) }).success).toBe(false);
  });

  test('a double click saves once, also when both clicks arrive together', async () => {
    const input = saveCurveInput(notebookId, { saveKey: key() });
    const before = (await listCurves(analyst, notebookId)).length;
    const [one, two] = await Promise.all([saveCurve(analyst, input), saveCurve(analyst, input)]);
    expect(one).toEqual(two);
    expect(await listCurves(analyst, notebookId)).toHaveLength(before + 1);
  });

  test('another content under the same key is not swallowed', async () => {
    const saveKey = key();
    const first = await save(analyst, { saveKey });
    const draft = curveDraftInput();
    draft.about.title = 'Another';
    expect((await save(analyst, { saveKey, draft })).id).not.toBe(first.id);
  });

  test('a standard and a reading left out stay visible with their reasons, and the range shrinks', async () => {
    const draft = curveDraftInput();
    Object.assign(draft.standards[4] ?? {}, { leftOut: 'flask overfilled' });
    Object.assign(draft.standards[1]?.readings[2] ?? {}, { leftOut: 'bubble' });
    const curve = await loadCurve(analyst, (await save(analyst, { draft })).id);
    expect(curve.range).toEqual({ min: 0.5, max: 3 });
    expect(curve.n).toBe(11);
    expect(curve.standards[4]?.excludedReason).toBe('flask overfilled');
    expect(curve.standards[1]?.readings[2]).toMatchObject({ value: 0.2027, excludedReason: 'bubble' });
    expect(curve.result.curve.points.filter((point) => point.excluded)).toHaveLength(4);
  });

  test('a reading without a number keeps what the instrument showed', async () => {
    const draft = curveDraftInput([
      ...curveDraftInput().standards.map((s) => [s.name, s.concentration, '0.1', '0.2'] as const),
      ['S6', '20', 'OVER', '>3.5'],
    ]);
    draft.standards.forEach((standard, index) => {
      if (index < 5) standard.readings = curveDraftInput().standards[index]?.readings ?? [];
    });
    const curve = await loadCurve(analyst, (await save(analyst, { draft })).id);
    expect(
      curve.standards[5]?.readings.map(({ value, gapReason, gapText }) => [value, gapReason, gapText]),
    ).toEqual([
      [null, 'aboveRange', 'OVER'],
      [null, 'aboveRange', '>3.5'],
    ]);
    expect(curve.range.max).toBe(4);
  });

  test.each([
    [
      'two coinciding standards',
      [
        ['S1', '1', '0.2'],
        ['S2', '1', '0.21'],
        ['S3', '1', '0.19'],
      ],
      /STANDARDS_COINCIDE|TOO_FEW_STANDARDS/,
    ],
    [
      'too few standards',
      [
        ['S1', '1', '0.2'],
        ['S2', '2', '0.4'],
      ],
      /TOO_FEW_STANDARDS/,
    ],
  ] as const)('refuses %s and writes nothing', async (_what, standards, code) => {
    const before = (await listCurves(analyst, notebookId)).length;
    await expect(save(analyst, { draft: curveDraftInput(standards as never) })).rejects.toMatchObject({
      code: expect.stringMatching(code),
    });
    expect(await listCurves(analyst, notebookId)).toHaveLength(before);
  });

  test('a reader may not save, and for a stranger nothing is there', async () => {
    await expect(save(reader)).rejects.toMatchObject({ code: 'NOT_ALLOWED' });
    await expect(save(stranger)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    const { id } = await save(analyst);
    await expect(loadCurve(stranger, id)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(curveRequestOf(stranger, id)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(listCurves(stranger, notebookId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});

describe('versions', () => {
  const changed = (reason: string) => {
    const draft = curveDraftInput();
    draft.about.reason = reason;
    return draft;
  };

  test('a new version supersedes the old one, which keeps its numbers', async () => {
    const { id: firstId } = await save(analyst);
    const before = await loadCurve(analyst, firstId);
    const draft = changed('S5 prepared again');
    draft.standards[4]?.readings.splice(0, 1);
    const { id } = await save(owner, { baseId: firstId, draft });
    const [first, second] = [await loadCurve(analyst, firstId), await loadCurve(analyst, id)];
    expect(first).toMatchObject({ status: 'superseded', newer: { id, version: 2 } });
    expect(first.result).toEqual(before.result);
    expect(second).toMatchObject({
      version: 2,
      reason: 'S5 prepared again',
      createdBy: 'Mara Lind',
      lineageId: first.lineageId,
    });
    expect(second.method.version).toBe(2);
    expect(second.versions.map(({ version, status }) => [version, status])).toEqual([
      [2, 'saved'],
      [1, 'superseded'],
    ]);
  });

  test('two people saving the same curve: the second is told who and when, and nothing is overwritten', async () => {
    const { id: base } = await save(analyst);
    const results = await Promise.allSettled([
      save(owner, { baseId: base, draft: changed('mine') }),
      save(analyst, { baseId: base, draft: changed('no, mine') }),
    ]);
    expect(results.map(({ status }) => status)).toEqual(['fulfilled', 'rejected']);
    const winner = (results[0] as PromiseFulfilledResult<{ id: string }>).value.id;
    expect((results[1] as PromiseRejectedResult).reason).toMatchObject({
      code: 'CHANGED_MEANWHILE',
      message: expect.stringMatching(/^Mara Lind saved version 2 on \d{4}-\d\d-\d\d \d\d:\d\d UTC/),
      details: expect.arrayContaining([{ pointer: '/newerId', detail: winner }]),
    });
    expect((await loadCurve(analyst, winner)).versions).toHaveLength(2);
    // knowing of it, the second person may put theirs on top
    const { id } = await save(analyst, { baseId: winner, draft: changed('no, mine') });
    expect(await loadCurve(analyst, id)).toMatchObject({ version: 3 });
  });

  test('sending a saved version twice gives the same version, not a conflict', async () => {
    const { id: baseId } = await save(analyst);
    const input = saveCurveInput(notebookId, { saveKey: key(), baseId, draft: changed('again') });
    expect(await saveCurve(analyst, input)).toEqual(await saveCurve(analyst, input));
  });

  test('a void curve stays, with its reason, and is not voided twice', async () => {
    const { id } = await save(analyst);
    await expect(voidCurve(reader, { curveId: id, reason: 'no' })).rejects.toMatchObject({
      code: 'NOT_ALLOWED',
    });
    await voidCurve(analyst, { curveId: id, reason: 'wrong cell' });
    expect(await loadCurve(reader, id)).toMatchObject({ status: 'void', voidReason: 'wrong cell' });
    await expect(voidCurve(analyst, { curveId: id, reason: 'again' })).rejects.toMatchObject({
      code: 'CHANGED_MEANWHILE',
    });
  });
});

describe('the record and the lists', () => {
  test('one save makes an entry of the curve and one of all its standards', async () => {
    const { id } = await save(analyst);
    const { items } = await listRecord(analyst, notebookId, { limit: 20 });
    const own = items
      .filter((entry) => JSON.stringify(entry).includes(id) || entry.kind === 'standard curve')
      .slice(0, 2);
    expect(own.map(({ verb }) => verb).sort()).toEqual(['created', 'standards saved']);
    expect(JSON.stringify(own)).toContain('0.3972');
    expect(items.filter(({ kind }) => kind === 'reading' || kind === 'standard')).toEqual([]);
  });

  test('pages of the list end where the next one begins', async () => {
    const all = await listCurves(reader, notebookId);
    const first = await pageOfCurves(reader, notebookId, { limit: 2 });
    const next = await pageOfCurves(reader, notebookId, { limit: 2, cursor: first.nextCursor ?? '' });
    expect([...first.items, ...next.items].map(({ id }) => id)).toEqual(all.slice(0, 4).map(({ id }) => id));
  });
});
