import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { demoFiles } from '../../../../fixtures/generate/write-demo';
import { spectrumFixtures } from '../../../../fixtures/generate/write-spectra';
import { readFile } from '@/lib/readers/read-file';
import { ReaderError, type ReadResult } from '@/lib/readers/types';

const fixtures = spectrumFixtures();
const fileOf = (folder: string, name: string): string =>
  fileURLToPath(new URL(`../../../../fixtures/${folder}/${name}`, import.meta.url));
const bytesOf = (content: string | Uint8Array): Uint8Array =>
  typeof content === 'string' ? new TextEncoder().encode(content) : content;

const codes = (result: ReadResult): string[] =>
  [...result.warnings, ...result.spectra.flatMap((spectrum) => spectrum.warnings)].map(
    (warning) => warning.code,
  );

describe('invented spectra in many dialects', () => {
  test.each(fixtures.map((fixture) => [fixture.name, fixture] as const))(
    '%s',
    (name, { content, expect: want }) => {
      const bytes = bytesOf(content);
      if (want.refused) {
        try {
          readFile(bytes, name);
        } catch (error) {
          expect(error).toBeInstanceOf(ReaderError);
          expect((error as ReaderError).code).toBe(want.refused);
          return;
        }
        throw new Error(`${name} was read, but must be refused as ${want.refused}`);
      }
      const result = readFile(bytes, name);
      if (want.spectra) {
        expect(result.spectra.length).toBe(want.spectra.length);
        want.spectra.forEach((spectrum, i) => {
          const got = result.spectra[i];
          expect(Array.from(got?.x ?? [])).toEqual(spectrum.x);
          expect(Array.from(got?.y ?? [], (y) => (Number.isNaN(y) ? null : y))).toEqual(spectrum.y);
          expect([got?.xUnit, got?.signal]).toEqual([spectrum.xUnit, spectrum.signal]);
          if (spectrum.name) expect(got?.name).toBe(spectrum.name);
        });
      }
      if (want.asks) expect(result.questions.map((question) => question.code)).toEqual(want.asks);
      for (const code of want.warnings ?? []) expect(codes(result)).toContain(code);
      expect(result.notASpectrum?.kind).toBe(want.notASpectrum);
    },
  );

  test('settings given back as options read the same', () => {
    for (const { name, content, expect: want } of fixtures) {
      if (!want.spectra || want.asks?.length !== 0) continue;
      const bytes = bytesOf(content);
      const first = readFile(bytes, name);
      const again = readFile(bytes, name, first.settings);
      expect([name, again.spectra.map((spectrum) => Array.from(spectrum.y))]).toEqual([
        name,
        first.spectra.map((spectrum) => Array.from(spectrum.y)),
      ]);
    }
  });
});

describe('the files in fixtures are those the generator writes', () => {
  test.each(fixtures.map((fixture) => [fixture.name, fixture.content] as const))(
    'spectra/%s',
    (name, content) => {
      expect(existsSync(fileOf('spectra', name))).toBe(true);
      expect(Array.from(readFileSync(fileOf('spectra', name)))).toEqual(Array.from(bytesOf(content)));
    },
  );

  test.each(Object.entries(demoFiles()))('demo/%s', (name, content) => {
    expect(readFileSync(fileOf('demo', name), 'utf8')).toBe(content);
  });
});
