import { existsSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { ENGINE_ERRORS } from '@/lib/engine';
import { FLAGS } from '@/lib/engine/flags';
import { projectRoot, sourceText } from '../support/sources';

const readme = sourceText('README.md');
const guide = sourceText('DEVELOPERS.md');
const { scripts } = JSON.parse(sourceText('package.json')) as { scripts: Record<string, string> };

describe('README', () => {
  test('opens with the job and then the two commands', () => {
    const [title, job, ...rest] = readme.split(/\n{2,}/);
    expect(title).toBe('# Halflight');
    expect(job).toMatch(/absorbance/);
    expect(rest.join('\n').indexOf('npm start')).toBeLessThan(rest.join('\n').indexOf('npm test'));
  });

  test('names every flag with its level and meaning, and no other', () => {
    const rows = [...readme.matchAll(/^\| `([A-Z_]+)` *\| (\w+) *\| (.+?) *\|$/gm)].map(
      ([, ...cells]) => cells,
    );
    const flags = Object.entries(FLAGS).map(([code, { level, meaning }]) => [code, level, meaning]);
    expect(rows.sort()).toEqual(flags.sort());
  });

  test('names every script, and only scripts that are there', () => {
    const named = new Set([...readme.matchAll(/`npm (?:run )?([a-z0-9]+)`/g)].map(([, name = '']) => name));
    const lifecycle = /^pre/;
    expect([...named].sort()).toEqual(
      Object.keys(scripts)
        .filter((name) => !lifecycle.test(name))
        .sort(),
    );
  });

  test('shows a picture that is there', () => {
    const picture = /!\[[^\]]+\]\(([^)]+)\)/.exec(readme)?.[1] ?? '';
    expect(existsSync(path.join(projectRoot, picture))).toBe(true);
  });
});

describe('DEVELOPERS', () => {
  test('names folders and files that are there', () => {
    const named = [...guide.matchAll(/`((?:app|components|lib|db|tests|fixtures|public)\/[^`*…]*)`/g)];
    const missing = named
      .map(([, name = '']) => name)
      .filter((name) => !existsSync(path.join(projectRoot, name)));
    expect(missing).toEqual([]);
  });
});

test('every error of the engine has a sentence of its own', () => {
  const sentences = Object.values(ENGINE_ERRORS).map(String);
  expect(new Set(sentences).size).toBe(sentences.length);
});
