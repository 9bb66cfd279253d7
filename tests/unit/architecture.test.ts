import { readdirSync } from 'node:fs';
import path from 'node:path';
import { ESLint } from 'eslint';
import { describe, expect, test } from 'vitest';
import { CADMIUM, FLUORESCEIN, THERMOMETER, WEIGHTED } from '@/lib/checks/datasets/lines';
import { NOINT1, NORRIS, PONTIUS } from '@/lib/checks/datasets/nist-strd';
import { printedDigits } from '@/lib/checks/digits';
import { publishedChecks } from '@/lib/checks/published-checks';
import { projectRoot, sourceFiles, sourceText as source } from '../support/sources';

/** Lines that export a value; types and interfaces may be exported anywhere. */
const valueExports = (file: string) =>
  source(file)
    .split('\n')
    .filter((line) => /^export (?!type\b|interface\b)/.test(line));

/** Doors that strangers may knock at, each with the reason. */
const OPEN_ACTIONS: Record<string, RegExp> = {
  'app/(public)/sign-in/actions.ts': /= openAction\(/,
  'app/(public)/set-up/actions.ts': /= openAction\(/,
  'app/(public)/set-password/[token]/actions.ts': /= openAction\(/,
};
const OPEN_ROUTES: Record<string, RegExp> = {
  // exchanges the secret of a link for a cookie limited to that share
  'app/(public)/s/[token]/route.ts': /export async function GET/,
};

const actions = sourceFiles(['app'], /\/actions\.ts$/);
const routes = sourceFiles(['app'], /\/route\.ts$/).filter((file) => !file.includes('_server'));
const queries = sourceFiles(['db/queries'], /\.ts$/);

describe('doors', () => {
  test('there are doors and queries to check', () => {
    expect(actions.length).toBeGreaterThan(3);
    expect(routes.length).toBeGreaterThan(3);
    expect(queries.length).toBeGreaterThan(3);
  });

  test.each(actions)('%s exports only action(...)', (file) => {
    expect(source(file)).toMatch(/^'use server';/);
    const door = OPEN_ACTIONS[file] ?? /= action\(/;
    expect(valueExports(file).filter((line) => !door.test(line))).toEqual([]);
  });

  test.each(routes)('%s exports only route(...)', (file) => {
    const door = OPEN_ROUTES[file] ?? /^export const (GET|POST|PUT|PATCH|DELETE) = route\(/;
    const settings = /^export const (dynamic|runtime|maxDuration) = /;
    expect(valueExports(file).filter((line) => !door.test(line) && !settings.test(line))).toEqual([]);
  });

  test('every door for strangers on the list is there', () => {
    for (const file of Object.keys(OPEN_ACTIONS)) expect(actions).toContain(file);
    for (const file of Object.keys(OPEN_ROUTES)) expect(routes).toContain(file);
  });

  test('no file outside actions.ts is a server action', () => {
    const others = sourceFiles(['app', 'components', 'lib', 'db'], /\.tsx?$/).filter(
      (file) => !actions.includes(file),
    );
    expect(others.filter((file) => /^\s*'use server'/m.test(source(file)))).toEqual([]);
  });

  test.each(queries)('%s asks who is asking, in every function', (file) => {
    const asks = /^export (async )?function \w+(<[^>]*>)?\((actor: Actor\b|$)/;
    expect(valueExports(file).filter((line) => !asks.test(line))).toEqual([]);
    const firstArguments = [
      ...source(file).matchAll(/^export (?:async )?function \w+(?:<[^>]*>)?\(\s*(\w+): (\w+)/gm),
    ];
    for (const [, name, type] of firstArguments) expect([name, type]).toEqual(['actor', 'Actor']);
  });
});

describe('import arrows', () => {
  const eslint = new ESLint({ cwd: projectRoot });
  const lint = async (filePath: string, code: string) => {
    const [result] = await eslint.lintText(code, { filePath });
    return (result?.messages ?? []).map((message) => message.ruleId);
  };

  test.each([
    ['lib/planted.ts', "import '@/db/sequelize';"],
    ['lib/planted.ts', "import 'node:fs';"],
    ['lib/engine/planted.ts', "import { z } from 'zod'; export const x = z;"],
    ['lib/engine/planted.ts', "import '@/lib/errors';"],
    ['lib/checks/planted.ts', "import '@/lib/schemas/decimal';"],
    ['lib/checks/planted.ts', "import '@/lib/format/round';"],
    ['lib/checks/sources/planted.ts', "import '../../format/round';"],
    ['components/planted.tsx', "import '@/db/queries/notebooks';"],
    ['components/planted.tsx', "import '@/app/_server/route';"],
    ['components/ui/planted.tsx', "import '@/lib/engine';"],
    ['db/planted.ts', "import '@/components/ui/button';"],
    ['app/planted.ts', "import '@/db/access';"],
    ['app/planted.ts', "import '@/db/sequelize';"],
  ])('%s may not say %s', async (file, code) => {
    expect(await lint(file, code)).toContain('no-restricted-imports');
  });

  test.each([
    ['db/queries/planted.ts', 'export const f = (m: { findByPk(id: string): void }) => m.findByPk("1");'],
    ['app/planted.ts', 'export const f = (a: unknown) => a as Actor;'],
    ['lib/engine/planted.ts', 'export const f = () => Math.random();'],
    ['lib/engine/planted.ts', 'export const f = () => new Date();'],
  ])('%s may not say %s', async (file, code) => {
    expect(await lint(file, code)).toContain('no-restricted-syntax');
  });
});

describe('the engine knows no expected answer', () => {
  const engine = sourceFiles(['lib/engine'], /\.ts$/);

  test.each(engine)('%s imports only the engine, packages and the round-off', (file) => {
    const imports = [...source(file).matchAll(/(?:from|import|import\()\s*'(\.[^']*)'/g)];
    const outside = imports
      .map(([, to = '']) => path.posix.join(path.posix.dirname(file), to))
      .filter((to) => !to.startsWith('lib/engine/') && to !== 'lib/format/round');
    expect(outside).toEqual([]);
    expect(source(file)).not.toMatch(/'@\/|fixtures\/reference.*'|\.json'/);
  });

  test('holds neither the published values nor their data', () => {
    const printed = publishedChecks()
      .flatMap(({ checks }) => checks)
      .map(({ published }) => published.replace(/^-|E.*$/g, ''))
      .filter((text) => printedDigits(text) >= 5);
    const data = [CADMIUM, FLUORESCEIN, THERMOMETER, WEIGHTED, NORRIS, PONTIUS, NOINT1].map(({ y }) =>
      y.slice(2, 6).join(', '),
    );
    expect(printed.length).toBeGreaterThan(25);
    const held = engine.filter((file) => [...printed, ...data].some((text) => source(file).includes(text)));
    expect(held).toEqual([]);
  });
});

describe('the tree', () => {
  const ALLOWED = new Set([
    'app',
    'components',
    'lib',
    'db',
    'public',
    'tests',
    'fixtures',
    'README.md',
    'DEVELOPERS.md',
    'LICENSE',
    'package.json',
    'package-lock.json',
    'tsconfig.json',
    'postcss.config.mjs',
    'next.config.mjs',
    'eslint.config.mjs',
    'proxy.ts',
    'instrumentation.ts',
    'next-env.d.ts',
    'node_modules',
    'data',
    'tsconfig.tsbuildinfo',
    'test-results',
    'coverage',
    'playwright-report',
  ]);

  test('holds nothing at its top that no tool insists on', () => {
    const found = readdirSync(projectRoot).filter((name) => !name.startsWith('.'));
    expect(found.filter((name) => !ALLOWED.has(name))).toEqual([]);
  });

  test('has no file named after nothing', () => {
    const vague = /\/(utils?|helpers?|common|manager|misc|data2)\.(ts|tsx|mjs)$/;
    expect(sourceFiles(['app', 'components', 'lib', 'db', 'tests'], vague)).toEqual([]);
  });

  test('has one barrel file, the engine', () => {
    expect(sourceFiles(['components', 'lib', 'db'], /\/index\.ts$/)).toEqual([
      'db/models/index.ts',
      'lib/engine/index.ts',
    ]);
  });
});
