import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { uploadSourceFile } from '@/db/queries/source-files';
import {
  countSpectra,
  getSpectrum,
  getSpectrumPoints,
  listSpectra,
  manySpectrumPoints,
  pageOfSpectra,
  readingsFromSpectra,
  renameSpectrum,
  setSpectrumAside,
} from '@/db/queries/spectra';
import { db } from '@/db/sequelize';
import type { Actor } from '@/lib/policies/actor';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { actorOf, makeActor, makeMember, makeNotebook, makePerson } from '../../support/factories';
import { jcampUpload } from '../../support/spectrum-text';

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const code = (expected: string) => expect.objectContaining({ code: expected });

async function notebookWith(...names: string[]) {
  const pi = await makePerson('pi');
  const owner = await actorOf(pi.id);
  const notebookId = await makeNotebook(pi.id);
  for (const name of names) await add(owner, notebookId, name, [0.1, 0.2, 0.4, 0.3]);
  return { notebookId, owner, spectra: await listSpectra(owner, notebookId) };
}

async function add(actor: Actor, notebookId: string, name: string, values: (number | string)[]) {
  const outcome = await uploadSourceFile(actor, notebookId, jcampUpload(name, 500, values));
  if (outcome.verdict !== 'stored') throw new Error(`expected stored, got ${outcome.verdict}`);
  const [view] = outcome.spectra;
  if (!view) throw new Error('the upload stored no spectrum');
  return view;
}

describe('listSpectra', () => {
  test('gives each with its file, range, points and highest absorbance, 2 before 10', async () => {
    const { spectra } = await notebookWith('S10', 'S2');
    expect(spectra.map((view) => view.name)).toEqual(['S2', 'S10']);
    expect(spectra[0]).toMatchObject({
      fileName: 'S2.jdx',
      fromNm: 500,
      toNm: 503,
      pointCount: 4,
      gapCount: 0,
      highestAbsorbance: 0.4,
      pathLengthMm: 10, // ##PATHLENGTH=1.0 is in centimetres
      voided: false,
    });
  });

  test('searches, and leaves out what was set aside unless asked', async () => {
    const { notebookId, owner, spectra } = await notebookWith('Weir 1', 'Weir 2', 'Blank');
    await setSpectrumAside(owner, spectra[1]?.id ?? '', true, 'wrong cell');
    const names = async (wanted: Parameters<typeof listSpectra>[2]) =>
      (await listSpectra(owner, notebookId, wanted)).map((view) => view.name);
    expect(await names({ search: 'weir' })).toEqual(['Weir 2']);
    expect(await names({ includeVoided: true })).toEqual(['Blank', 'Weir 1', 'Weir 2']);
    expect(await countSpectra(owner, notebookId)).toBe(2);
    const paged = await pageOfSpectra(owner, notebookId, { limit: 1, includeVoided: true });
    expect(paged.nextCursor).not.toBeNull();
  });
});

describe('points', () => {
  test('are ascending, with null and the file\u2019s own word at a gap', async () => {
    const { notebookId, owner } = await notebookWith();
    const view = await add(owner, notebookId, 'G', [0.1, '?', 0.4, 0.3]);
    const points = await getSpectrumPoints(owner, view.id);
    expect(points.wavelengthNm).toEqual([500, 501, 502, 503]);
    expect(points.absorbance).toEqual([0.1, null, 0.4, 0.3]);
    expect(points.gaps).toMatchObject([{ index: 1, wavelengthNm: 501 }]);
    expect(view.gapCount).toBe(1);
  });

  test('come for many spectra in the order asked for, or not at all when one is not the actor\u2019s', async () => {
    const { owner, spectra } = await notebookWith('A', 'B', 'C');
    const ids = spectra.map((view) => view.id).reverse();
    const many = await manySpectrumPoints(owner, ids);
    expect(many.map((view) => view.name)).toEqual(['C', 'B', 'A']);
    const strange = await notebookWith('D');
    const mixed = [...ids, strange.spectra[0]?.id ?? ''];
    await expect(manySpectrumPoints(owner, mixed)).rejects.toEqual(code('NOT_FOUND'));
  });
});

describe('readingsFromSpectra', () => {
  test('reads each by the rule; what cannot be read says why and the others are read', async () => {
    const { notebookId, owner, spectra } = await notebookWith('A', 'B');
    const short = await add(owner, notebookId, 'Short', [0.1, 0.2]);
    const ids = [short.id, ...spectra.map((view) => view.id)];
    const readings = await readingsFromSpectra(owner, notebookId, ids, { kind: 'point', wavelengthNm: 502 });
    expect(readings.map((reading) => reading.name)).toEqual(['Short', 'A', 'B']);
    expect(readings[0]).toMatchObject({
      value: null,
      gapReason: null,
      error: expect.stringContaining('outside'),
    });
    expect(readings[1]).toMatchObject({ value: 0.4, atNm: 502, pathLengthMm: 10, minusValue: null });
  });

  test('takes off the second wavelength and keeps the reading as it came', async () => {
    const { notebookId, owner } = await notebookWith();
    const view = await add(owner, notebookId, 'High', [0.1, 0.2, 2.5, 0.5]);
    const rule = { kind: 'windowMaximum', fromNm: 500, toNm: 503, minusNm: 503 } as const;
    const [reading] = await readingsFromSpectra(owner, notebookId, [view.id], rule);
    expect(reading).toMatchObject({
      value: 2,
      mainValue: 2.5,
      minusValue: 0.5,
      atNm: 502,
      absorbanceLimitExceeded: true,
    });
  });

  test('a gap is a reading without a number and with its reason', async () => {
    const { notebookId, owner } = await notebookWith();
    const view = await add(owner, notebookId, 'Gap', [0.1, '?', 0.4, 0.3]);
    const [reading] = await readingsFromSpectra(owner, notebookId, [view.id], {
      kind: 'point',
      wavelengthNm: 501,
    });
    expect(reading).toMatchObject({ value: null, gapReason: 'missing', gapText: '?' });
    expect(reading?.error).toBeUndefined();
  });

  test('a spectrum of another notebook is not there', async () => {
    const { notebookId, owner } = await notebookWith('A');
    const pi = owner.personId ?? '';
    const other = await makeNotebook(pi);
    const view = await add(owner, other, 'Elsewhere', [0.1, 0.2, 0.3, 0.4]);
    const rule = { kind: 'point', wavelengthNm: 501 } as const;
    await expect(readingsFromSpectra(owner, notebookId, [view.id], rule)).rejects.toEqual(code('NOT_FOUND'));
  });
});

describe('changes', () => {
  test('a new name and setting aside are in the record with their reason; bringing back too', async () => {
    const { notebookId, owner, spectra } = await notebookWith('A');
    const id = spectra[0]?.id ?? '';
    await renameSpectrum(owner, id, 'Standard 1');
    expect(await setSpectrumAside(owner, id, true, 'cell was dirty')).toMatchObject({
      name: 'Standard 1',
      voided: true,
      voidReason: 'cell was dirty',
    });
    expect((await setSpectrumAside(owner, id, false, 'it was the other cell')).voided).toBe(false);
    const entries = await db().RecordEntry.findAll({
      where: { notebookId, subjectId: id },
      order: [['id', 'ASC']],
    });
    expect(entries.map((entry) => entry.why)).toEqual([null, 'cell was dirty', 'it was the other cell']);
    expect(entries[0]).toMatchObject({ from: { name: 'A' }, to: { name: 'Standard 1' } });
  });

  test('are not for readers, and do not exist for strangers', async () => {
    const { notebookId, spectra } = await notebookWith('A');
    const id = spectra[0]?.id ?? '';
    const reader = await makePerson('analyst');
    await makeMember(notebookId, reader.id, 'reader');
    const looking = await actorOf(reader.id);
    expect((await getSpectrum(looking, id)).name).toBe('A');
    await expect(renameSpectrum(looking, id, 'B')).rejects.toEqual(code('NOT_ALLOWED'));
    await expect(setSpectrumAside(looking, id, true, 'x')).rejects.toEqual(code('NOT_ALLOWED'));
    const stranger = await makeActor('administrator');
    await expect(getSpectrum(stranger, id)).rejects.toEqual(code('NOT_FOUND'));
    await expect(getSpectrumPoints(stranger, id)).rejects.toEqual(code('NOT_FOUND'));
    await expect(renameSpectrum(stranger, id, 'B')).rejects.toEqual(code('NOT_FOUND'));
    await expect(listSpectra(stranger, notebookId)).rejects.toEqual(code('NOT_FOUND'));
  });
});
