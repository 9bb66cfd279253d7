import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { uploadSourceFile } from '@/db/queries/source-files';
import { getRawPoints, getSpectrumPoints } from '@/db/queries/spectra';
import type { Actor } from '@/lib/policies/actor';
import { readFile } from '@/lib/readers/read-file';
import { ReaderError } from '@/lib/readers/types';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { actorOf, makeNotebook, makePerson } from '../../support/factories';

const folder = fileURLToPath(new URL('../../../fixtures/spectra', import.meta.url));
const files = readdirSync(folder, { recursive: true, withFileTypes: true })
  .filter((entry) => entry.isFile() && entry.name !== 'expected.json')
  .map((entry) => path.join(entry.parentPath, entry.name))
  .sort();

let database: TestDatabase;
let owner: Actor;
let notebookId: string;
beforeAll(async () => {
  database = await openTestDatabase();
  const pi = await makePerson('pi');
  owner = await actorOf(pi.id);
  notebookId = await makeNotebook(pi.id);
});
afterAll(() => database.close());

const withNull = (values: Float64Array) =>
  Array.from(values, (value) => (Number.isNaN(value) ? null : value));

test('there are files to check', () => {
  expect(files.length).toBeGreaterThan(20);
});

test.each(files.map((file) => [path.relative(folder, file), file]))(
  '%s is stored as it was read, or refused in a sentence',
  async (_name, file) => {
    const upload = {
      name: path.basename(file),
      bytes: new Uint8Array(readFileSync(file)),
      acceptProposal: true,
    };
    const outcome = await uploadSourceFile(owner, notebookId, upload).catch((error: unknown) => {
      if (error instanceof ReaderError) return error;
      throw error;
    });
    if (outcome instanceof ReaderError) return expect(outcome.message).toMatch(/\w+ \w+/);
    if (outcome.verdict === 'asks') throw new Error('the proposal was to be taken');
    const read = readFile(upload.bytes, upload.name).spectra;
    expect(outcome.spectra).toHaveLength(read.length);
    for (const [i, view] of outcome.spectra.entries()) {
      const raw = await getRawPoints(owner, view.id);
      expect(raw.x).toEqual([...(read[i]?.x ?? [])]);
      expect(raw.y).toEqual(withNull(read[i]?.y ?? new Float64Array()));
      const form = await getSpectrumPoints(owner, view.id);
      expect(form.wavelengthNm).toEqual([...new Set(form.wavelengthNm)].sort((a, b) => a - b));
      expect(form.gaps.map((gap) => gap.index)).toEqual(
        form.absorbance.flatMap((value, index) => (value === null ? [index] : [])),
      );
    }
  },
);
