import { createHash, randomBytes } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { withShareVisits } from '@/db/actors';
import { createFor } from '@/db/access';
import {
  getSourceFile,
  listRefusedUploads,
  listSourceFiles,
  readSourceBytes,
  uploadSourceFile,
} from '@/db/queries/source-files';
import { getRawPoints } from '@/db/queries/spectra';
import { db, inTransaction } from '@/db/sequelize';
import { systemActor } from '@/db/actors';
import { readFile } from '@/lib/readers/read-file';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { actorOf, makeActor, makeMember, makeNotebook, makePerson } from '../../support/factories';
import { jcampUpload } from '../../support/spectrum-text';

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const code = (expected: string) => expect.objectContaining({ code: expected });
const page = { limit: 50 };

async function notebookOf(role: 'pi' | 'analyst' = 'pi') {
  const person = await makePerson(role);
  return { notebookId: await makeNotebook(person.id), owner: await actorOf(person.id), person };
}

async function counts() {
  const [[row]] = (await db().sequelize.query(`SELECT
    (SELECT count(*) FROM source_files) AS files, (SELECT count(*) FROM source_bytes) AS bytes,
    (SELECT count(*) FROM spectra) AS spectra, (SELECT count(*) FROM spectrum_points) AS points`)) as [
    [Record<string, number>],
    unknown,
  ];
  return row;
}

describe('uploadSourceFile', () => {
  test('keeps the bytes as they came and the points to the last bit', async () => {
    const { notebookId, owner } = await notebookOf();
    const upload = jcampUpload('S1', 400, [0.1, 1 / 3, 0.30000000000000004, -0.0021, 2.5]);
    const outcome = await uploadSourceFile(owner, notebookId, upload);
    if (outcome.verdict !== 'stored') throw new Error(`expected stored, got ${outcome.verdict}`);
    expect(outcome.sourceFile).toMatchObject({
      name: 'S1.jdx',
      sha256: createHash('sha256').update(upload.bytes).digest('hex'),
      sizeBytes: upload.bytes.length,
      spectrumCount: 1,
      pointCount: 5,
    });
    const bytes = await readSourceBytes(owner, outcome.sourceFile.id);
    expect(bytes.intact).toBe(true);
    expect(Buffer.compare(bytes.bytes, upload.bytes)).toBe(0);
    const read = readFile(upload.bytes, upload.name).spectra[0];
    const raw = await getRawPoints(owner, outcome.spectra[0]?.id ?? '');
    expect(raw.x).toEqual([...(read?.x ?? [])]);
    expect(raw.y).toEqual([...(read?.y ?? [])]);
  });

  test('writes one entry of the record for the file, with its hash, and none for its spectra', async () => {
    const { notebookId, owner } = await notebookOf();
    const outcome = await uploadSourceFile(owner, notebookId, jcampUpload('S1', 400, [0.1, 0.2, 0.3]));
    if (outcome.verdict !== 'stored') throw new Error(`expected stored, got ${outcome.verdict}`);
    const entries = await db().RecordEntry.findAll({ where: { notebookId, verb: 'created' } });
    const made = entries.filter((entry) => entry.kind !== 'notebook');
    expect(made).toHaveLength(1);
    expect(made[0]).toMatchObject({
      kind: 'source file',
      subjectId: outcome.sourceFile.id,
      to: { sha256: outcome.sourceFile.sha256, spectrumCount: 1 },
    });
  });

  test('does not store the same bytes twice in a notebook, whatever the name', async () => {
    const { notebookId, owner } = await notebookOf();
    const upload = jcampUpload('S1', 410, [0.1, 0.2, 0.3]);
    const first = await uploadSourceFile(owner, notebookId, upload);
    const again = await uploadSourceFile(owner, notebookId, { ...upload, name: 'copy.jdx' });
    if (first.verdict !== 'stored' || again.verdict !== 'alreadyHere')
      throw new Error(`expected stored and alreadyHere, got ${first.verdict} and ${again.verdict}`);
    expect(again.sourceFile.id).toBe(first.sourceFile.id);
    expect(again.spectra.map((view) => view.id)).toEqual(first.spectra.map((view) => view.id));
    expect((await listSourceFiles(owner, notebookId, page)).items).toHaveLength(1);
  });

  test('stores them once when both uploads run at the same time', async () => {
    const { notebookId, owner } = await notebookOf();
    const upload = jcampUpload('S1', 415, [0.1, 0.2, 0.3]);
    const both = await Promise.all([1, 2].map(() => uploadSourceFile(owner, notebookId, upload)));
    expect(both.map((outcome) => outcome.verdict).sort()).toEqual(['alreadyHere', 'stored']);
  });

  test('says where else the same bytes are, and only where the person may look', async () => {
    const { notebookId, owner, person } = await notebookOf();
    const other = await makeNotebook(person.id, 'The other notebook');
    const strange = await notebookOf();
    const upload = jcampUpload('S1', 420, [0.1, 0.2, 0.3]);
    await uploadSourceFile(strange.owner, strange.notebookId, upload);
    await uploadSourceFile(owner, other, upload);
    const outcome = await uploadSourceFile(owner, notebookId, upload);
    if (outcome.verdict !== 'stored') throw new Error(`expected stored, got ${outcome.verdict}`);
    expect(outcome.elsewhere.map((file) => file.notebookTitle)).toEqual(['The other notebook']);
  });

  test('a refused file leaves a line of the record and nothing else; the others go on', async () => {
    const { notebookId, owner } = await notebookOf();
    const before = await counts();
    const bad = { name: 'scan.pdf', bytes: new TextEncoder().encode('%PDF-1.7 and so on') };
    await expect(uploadSourceFile(owner, notebookId, bad)).rejects.toEqual(code('PDF'));
    expect(await counts()).toEqual(before);
    const [refused] = await listRefusedUploads(owner, notebookId, 10);
    expect(refused).toMatchObject({ name: 'scan.pdf', sentence: expect.stringContaining('This is a PDF') });
    const good = await uploadSourceFile(owner, notebookId, jcampUpload('S1', 430, [0.1, 0.2, 0.3]));
    expect(good.verdict).toBe('stored');
  });

  test('bytes that changed on the way are not stored', async () => {
    const { notebookId, owner } = await notebookOf();
    const before = await counts();
    const upload = { ...jcampUpload('S1', 440, [0.1, 0.2, 0.3]), sha256: randomBytes(32).toString('hex') };
    await expect(uploadSourceFile(owner, notebookId, upload)).rejects.toEqual(code('CONFLICT'));
    expect(await counts()).toEqual(before);
  });

  test('a folder in the name and control characters are dropped', async () => {
    const { notebookId, owner } = await notebookOf();
    const upload = { ...jcampUpload('S1', 450, [0.1, 0.2, 0.3]), name: 'C:\\scans\\..\\S\u00001.jdx' };
    const outcome = await uploadSourceFile(owner, notebookId, upload);
    expect(outcome).toMatchObject({ sourceFile: { name: 'S1.jdx' } });
  });
});

describe('who may', () => {
  test('a contributor uploads; a reader, a link and a read token may look; a stranger finds nothing', async () => {
    const { notebookId, owner } = await notebookOf();
    const [contributor, reader] = [await makePerson('analyst'), await makePerson('analyst')];
    await makeMember(notebookId, contributor.id, 'contributor');
    await makeMember(notebookId, reader.id, 'reader');
    const outcome = await uploadSourceFile(
      await actorOf(contributor.id),
      notebookId,
      jcampUpload('S1', 460, [0.1, 0.2, 0.3]),
    );
    if (outcome.verdict !== 'stored') throw new Error(`expected stored, got ${outcome.verdict}`);
    const { id } = outcome.sourceFile;
    const visitor = await linkActor(notebookId, owner.personId ?? '');
    const upload = jcampUpload('S2', 470, [0.1, 0.2, 0.3]);
    for (const looking of [await actorOf(reader.id), visitor, { ...owner, canWrite: false }]) {
      expect((await getSourceFile(looking, id)).uploadedBy).toBe(contributor.name);
      expect((await readSourceBytes(looking, id)).intact).toBe(true);
      await expect(uploadSourceFile(looking, notebookId, upload)).rejects.toEqual(code('NOT_ALLOWED'));
    }
    for (const stranger of [await makeActor('pi'), await makeActor('administrator')]) {
      await expect(getSourceFile(stranger, id)).rejects.toEqual(code('NOT_FOUND'));
      await expect(readSourceBytes(stranger, id)).rejects.toEqual(code('NOT_FOUND'));
      await expect(listSourceFiles(stranger, notebookId, page)).rejects.toEqual(code('NOT_FOUND'));
      await expect(uploadSourceFile(stranger, notebookId, upload)).rejects.toEqual(code('NOT_FOUND'));
    }
  });

  test('a person with a link to one notebook finds nothing of another', async () => {
    const { notebookId, owner } = await notebookOf();
    const other = await notebookOf();
    const outcome = await uploadSourceFile(owner, notebookId, jcampUpload('S1', 480, [0.1, 0.2, 0.3]));
    if (outcome.verdict !== 'stored') throw new Error(`expected stored, got ${outcome.verdict}`);
    const visitor = await linkActor(other.notebookId, other.person.id);
    await expect(readSourceBytes(visitor, outcome.sourceFile.id)).rejects.toEqual(code('NOT_FOUND'));
  });
});

async function linkActor(notebookId: string, createdById: string) {
  const system = systemActor();
  const expiresAt = new Date(Date.now() + 3_600_000);
  const visit = await inTransaction(async () => {
    const link = await createFor(system, 'shareLink', {
      notebookId,
      label: 'for a test',
      tokenHash: randomBytes(16).toString('hex'),
      expiresAt,
      createdById,
    });
    return createFor(system, 'shareSession', { shareLinkId: link.id, expiresAt });
  });
  const actor = await withShareVisits(null, [visit.id]);
  if (!actor) throw new Error('the share visit just made gave no actor');
  return actor;
}

test('pages of the list hold every file once, newest first', async () => {
  const { notebookId, owner } = await notebookOf();
  for (let i = 0; i < 5; i += 1)
    await uploadSourceFile(owner, notebookId, jcampUpload(`S${i}`, 500 + i, [0.1, 0.2, 0.3]));
  const first = await listSourceFiles(owner, notebookId, { limit: 2 });
  const second = await listSourceFiles(owner, notebookId, { limit: 2, cursor: first.nextCursor ?? '' });
  const third = await listSourceFiles(owner, notebookId, { limit: 2, cursor: second.nextCursor ?? '' });
  const names = [first, second, third].flatMap((part) => part.items.map((file) => file.name));
  expect(names).toEqual(['S4.jdx', 'S3.jdx', 'S2.jdx', 'S1.jdx', 'S0.jdx']);
  expect(third.nextCursor).toBeNull();
});
