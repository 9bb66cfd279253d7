import { mkdir, mkdtemp, rename, rm, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { existsSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import {
  BUILD_SOURCES,
  buildStamp,
  installStamp,
  installedIsLocked,
  stampOf,
} from '../../../db/scripts/stamp.mjs';

let root = '';
const put = (file: string, text: string) => writeFile(path.join(root, file), text);

beforeEach(async () => {
  root = await mkdtemp(path.join(tmpdir(), 'halflight-stamp-'));
  await mkdir(path.join(root, 'app/deep'), { recursive: true });
  await put('app/page.tsx', 'one');
  await put('app/deep/form.tsx', 'two');
  await put('proxy.ts', 'three');
});
afterEach(() => rm(root, { recursive: true, force: true }));

describe('the stamp of the build', () => {
  test('does not depend on the times of files', async () => {
    const before = await buildStamp(root);
    await utimes(path.join(root, 'app/page.tsx'), 1, 1);
    expect(await buildStamp(root)).toBe(before);
  });

  test.each([
    ['a change of a byte', () => put('app/deep/form.tsx', 'twO')],
    ['a new file', () => put('app/deep/new.tsx', '')],
    ['a new name', () => rename(path.join(root, 'app/page.tsx'), path.join(root, 'app/other.tsx'))],
    ['a file less', () => rm(path.join(root, 'proxy.ts'))],
    [
      'contents that moved from one file to the next',
      () => Promise.all([put('app/page.tsx', ''), put('proxy.ts', 'onethree')]),
    ],
  ])('changes with %s', async (_what, change) => {
    const before = await buildStamp(root);
    await change();
    expect(await buildStamp(root)).not.toBe(before);
  });

  test('passes over what is not built, and dot files', async () => {
    const before = await buildStamp(root);
    await put('README.md', 'words');
    await put('app/.DS_Store', 'noise');
    expect(await buildStamp(root)).toBe(before);
  });

  test('covers only names that stand at the top of the project', () => {
    const project = fileURLToPath(new URL('../../..', import.meta.url));
    const mayBeAbsent = ['proxy.ts', 'instrumentation.ts'];
    const absent = BUILD_SOURCES.filter((source) => !existsSync(path.join(project, source)));
    expect(absent.filter((source) => !mayBeAbsent.includes(source))).toEqual([]);
  });

  test('is the same for the same contents elsewhere', async () => {
    const other = await mkdtemp(path.join(tmpdir(), 'halflight-stamp-'));
    await writeFile(path.join(other, 'proxy.ts'), 'three');
    expect(await stampOf(other, ['proxy.ts'])).toBe(await stampOf(root, ['proxy.ts']));
    await rm(other, { recursive: true });
  });
});

describe('the stamp of the installed packages', () => {
  const node = { versions: { modules: '115' }, platform: 'linux', arch: 'x64' };

  test('changes with the lock file, and with what native modules are compiled for', async () => {
    await put('package-lock.json', '{"a":1}');
    const before = await installStamp(root, node);
    expect(await installStamp(root, { ...node })).toBe(before);
    expect(await installStamp(root, { ...node, versions: { modules: '127' } })).not.toBe(before);
    expect(await installStamp(root, { ...node, arch: 'arm64' })).not.toBe(before);
    await put('package-lock.json', '{"a":2}');
    expect(await installStamp(root, node)).not.toBe(before);
  });
});

describe('packages that were installed by hand', () => {
  const next = { version: '1.0.0', integrity: 'sha512-n' };
  const other = { version: '2.0.0', integrity: 'sha512-o' };
  const forMac = { version: '3.0.0', integrity: 'sha512-m', optional: true };
  const lock = {
    packages: {
      '': {},
      'node_modules/next': next,
      'node_modules/other': other,
      'node_modules/for-mac': forMac,
    },
  };

  test('are those of the lock file, also without packages of other platforms', () => {
    expect(
      installedIsLocked(lock, { packages: { 'node_modules/next': next, 'node_modules/other': other } }),
    ).toBe(true);
  });

  test.each([
    ['one is missing', { 'node_modules/next': next }],
    [
      'one has another version',
      { 'node_modules/next': next, 'node_modules/other': { ...other, version: '2.0.1' } },
    ],
    [
      'one has other contents',
      { 'node_modules/next': next, 'node_modules/other': { ...other, integrity: 'sha512-x' } },
    ],
    [
      'one is foreign',
      { 'node_modules/next': next, 'node_modules/other': other, 'node_modules/extra': other },
    ],
  ])('are not when %s', (_what, packages) => {
    expect(installedIsLocked(lock, { packages })).toBe(false);
  });
});
