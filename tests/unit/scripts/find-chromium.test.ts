import { chmod, mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { findChromium } from '../../support/find-chromium.mjs';

let folder = '';
async function program(name: string, mode = 0o755): Promise<string> {
  const file = path.join(folder, name);
  await mkdir(path.dirname(file), { recursive: true });
  await writeFile(file, '#!/bin/sh\n');
  await chmod(file, mode);
  return file;
}
beforeEach(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'halflight-chromium-'));
});
afterEach(() => rm(folder, { recursive: true, force: true }));

describe('findChromium', () => {
  test('takes the one that CHROMIUM_PATH names before any other', async () => {
    const mine = await program('mine/browser');
    await program('bin/chromium');
    expect(findChromium({ CHROMIUM_PATH: mine, PATH: path.join(folder, 'bin') }, [])).toBe(mine);
  });

  test('says so when CHROMIUM_PATH names nothing that runs', () => {
    expect(() => findChromium({ CHROMIUM_PATH: path.join(folder, 'none') }, [])).toThrow(
      /^CHROMIUM_PATH names/,
    );
  });

  test('looks in PATH and then in the usual places, for each name', async () => {
    const places = [path.join(folder, 'opt')];
    expect(findChromium({ PATH: path.join(folder, 'bin') }, places)).toBeNull();
    const usual = await program('opt/chromium');
    expect(findChromium({ PATH: path.join(folder, 'bin') }, places)).toBe(usual);
    const inPath = await program('bin/google-chrome-stable');
    expect(findChromium({ PATH: path.join(folder, 'bin') }, places)).toBe(inPath);
  });

  test('passes over a file that cannot be run', async () => {
    await program('bin/chromium', 0o644);
    expect(findChromium({ PATH: path.join(folder, 'bin') }, [])).toBeNull();
  });
});
