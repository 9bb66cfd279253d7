import { randomUUID } from 'node:crypto';
import { readFileSync, unlinkSync, utimesSync, writeFileSync } from 'node:fs';
import { readFile, rename, stat, unlink } from 'node:fs/promises';
import { hostname } from 'node:os';
import { setTimeout as pause } from 'node:timers/promises';

function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

/** The contents of a lock whose holder is gone: it no longer beats, or its process on this host has ended. */
async function abandoned(file, staleMs) {
  const contents = await readFile(file, 'utf8');
  const { mtimeMs } = await stat(file);
  if (Date.now() - mtimeMs > staleMs) return contents;
  const [host, pid] = contents.split(' ');
  return host === hostname() && !isAlive(Number(pid)) ? contents : null;
}

/** Takes an abandoned lock out of the way; should another process have done so just now, puts its lock back. */
async function remove(file, contents) {
  const aside = `${file}.${randomUUID()}`;
  await rename(file, aside);
  if ((await readFile(aside, 'utf8')) === contents) await unlink(aside);
  else await rename(aside, file);
}

/** Runs a file operation that has nothing to do when the lock has meanwhile gone. */
function unlessGone(operation) {
  try {
    operation();
  } catch (error) {
    if (error.code !== 'ENOENT') throw error;
  }
}

async function tryTake(file, mine, staleMs) {
  try {
    writeFileSync(file, mine, { flag: 'wx' });
    return true;
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
  }
  try {
    const contents = await abandoned(file, staleMs);
    if (contents !== null) await remove(file, contents);
  } catch (error) {
    if (error.code !== 'ENOENT') throw error; // its holder took it away meanwhile
  }
  return false;
}

/**
 * Does the work while no other process of this clone does it; others wait their turn. The lock is a file that
 * is touched every two seconds and goes away with this process; one that is no longer touched is passed over.
 *
 * @param onWait called once when there is somebody to wait for
 */
export async function withLock(file, work, { onWait = () => {}, staleMs = 15_000, pollMs = 250 } = {}) {
  const mine = `${hostname()} ${process.pid} ${randomUUID()}`;
  let waited = false;
  while (!(await tryTake(file, mine, staleMs))) {
    if (!waited) onWait();
    waited = true;
    await pause(pollMs);
  }
  const beat = setInterval(() => unlessGone(() => utimesSync(file, new Date(), new Date())), 2_000);
  const release = () => {
    clearInterval(beat);
    unlessGone(() => readFileSync(file, 'utf8') === mine && unlinkSync(file));
  };
  process.once('exit', release);
  try {
    return await work();
  } finally {
    process.off('exit', release);
    release();
  }
}
