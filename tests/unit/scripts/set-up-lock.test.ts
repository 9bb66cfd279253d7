import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdtemp, rm, utimes, writeFile } from 'node:fs/promises';
import { hostname, tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { withLock } from '../../../db/scripts/set-up-lock.mjs';

let folder = '';
let file = '';
beforeEach(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'halflight-lock-'));
  file = path.join(folder, 'lock');
});
afterEach(() => rm(folder, { recursive: true, force: true }));

describe('withLock', () => {
  test('lets one work at a time, tells the others that they wait, and leaves nothing behind', async () => {
    let inside = 0;
    let most = 0;
    const onWait = vi.fn();
    const work = async () => {
      most = Math.max(most, ++inside);
      await new Promise((resolve) => setTimeout(resolve, 60));
      inside -= 1;
    };
    await Promise.all([1, 2, 3].map(() => withLock(file, work, { onWait, pollMs: 10 })));
    expect(most).toBe(1);
    expect(onWait).toHaveBeenCalledTimes(2);
    expect(existsSync(file)).toBe(false);
  });

  test('gives back what the work gave, and passes on what it threw', async () => {
    expect(await withLock(file, async () => 7)).toBe(7);
    await expect(withLock(file, () => Promise.reject(new Error('no compiler')))).rejects.toThrow(
      'no compiler',
    );
    expect(existsSync(file)).toBe(false);
  });

  test('passes over a lock whose process on this computer has ended', async () => {
    const ended = spawnSync(process.execPath, ['-e', '']).pid;
    await writeFile(file, `${hostname()} ${ended} x`);
    expect(await withLock(file, async () => 'done', { pollMs: 10 })).toBe('done');
  });

  test('waits for a process of another computer while its lock is touched, and no longer', async () => {
    await writeFile(file, `elsewhere 1 x`);
    const onWait = vi.fn(() => void utimes(file, new Date(0), new Date(0)));
    expect(await withLock(file, async () => 'done', { onWait, pollMs: 10 })).toBe('done');
    expect(onWait).toHaveBeenCalledTimes(1);
  });
});
