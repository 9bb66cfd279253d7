import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { exitCodeOf, runGroup, startGroup, stopGroup } from '../../../db/scripts/processes.mjs';

const processes = fileURLToPath(new URL('../../../db/scripts/processes.mjs', import.meta.url));
let folder = '';
beforeEach(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'halflight-processes-'));
});
afterEach(() => rm(folder, { recursive: true, force: true }));

/** A shell that leaves the pid of a sleeping grandchild in a file and waits for it. */
const family = (file: string, rest = 'wait') => ['-c', `sleep 300 & echo $! > ${file}; ${rest}`];

async function pidIn(file: string): Promise<number> {
  for (;;) {
    const text = await readFile(file, 'utf8').catch(() => '');
    if (text.endsWith('\n')) return Number(text);
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

/** Gone, or dead and not yet collected, which a container without an init may leave so. */
async function isGone(pid: number): Promise<boolean> {
  try {
    process.kill(pid, 0);
  } catch {
    return true;
  }
  const status = await readFile(`/proc/${pid}/stat`, 'utf8').catch(() => null);
  return status !== null && / [ZX] /.test(status);
}

describe('process groups', () => {
  test('the exit code is the one of the program, or 128 and the signal that ended it', async () => {
    expect(await runGroup('sh', ['-c', 'exit 3'])).toBe(3);
    expect(await runGroup('sh', ['-c', 'kill -TERM $$'])).toBe(143);
    await expect(runGroup('no-such-program-here', [])).rejects.toThrow('ENOENT');
  });

  test('stopping a program stops what it started', async () => {
    const file = path.join(folder, 'pid');
    const child = startGroup('sh', family(file));
    const grandchild = await pidIn(file);
    await stopGroup(child);
    expect(await exitCodeOf(child)).toBe(143);
    expect(await isGone(grandchild)).toBe(true);
  });

  test('one that does not listen is ended by force', async () => {
    const file = path.join(folder, 'pid');
    const child = startGroup('sh', ['-c', `trap '' TERM; echo $$ > ${file}; while :; do sleep 1; done`]);
    await pidIn(file);
    await stopGroup(child, 100);
    expect(await exitCodeOf(child)).toBe(137);
  });

  test('what a program leaves behind at its end is ended', async () => {
    const file = path.join(folder, 'pid');
    expect(await runGroup('sh', family(file, 'exit 0'))).toBe(0);
    expect(await isGone(await pidIn(file))).toBe(true);
  });

  test.each([
    ['SIGINT', 130],
    ['SIGTERM', 143],
  ] as const)('%s to a script stops all its groups first', async (signal, code) => {
    const file = path.join(folder, 'pid');
    const script = `import { runGroup, stopEverythingOnSignal } from ${JSON.stringify(processes)};
      stopEverythingOnSignal();
      await runGroup('sh', ${JSON.stringify(family(file))});
      console.log('reported as ended');`;
    const parent = spawn(process.execPath, ['--input-type=module', '-e', script], { stdio: 'pipe' });
    let printed = '';
    parent.stdout.setEncoding('utf8').on('data', (text: string) => (printed += text));
    const grandchild = await pidIn(file);
    parent.kill(signal);
    expect(await once(parent, 'exit')).toEqual([code, null]);
    expect(await isGone(grandchild)).toBe(true);
    expect(printed).toBe('');
  });
});
