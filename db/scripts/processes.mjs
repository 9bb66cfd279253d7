import { spawn } from 'node:child_process';
import { constants } from 'node:os';
import { setTimeout as pause } from 'node:timers/promises';

// Every child leads a process group of its own, so that whatever it starts in turn can be stopped with it.
const running = new Set();
let stopping = false;

function signalGroup(child, signal) {
  try {
    process.kill(-child.pid, signal);
    return true;
  } catch (error) {
    if (error.code === 'ESRCH' || error.code === 'EPERM') return false; // nobody, or only the dead, are left in it
    throw error;
  }
}

/** Starts a program in a process group of its own, without standard input. */
export function startGroup(command, args, options = {}) {
  const child = spawn(command, args, { stdio: ['ignore', 'inherit', 'inherit'], ...options, detached: true });
  if (child.pid !== undefined) running.add(child);
  return child;
}

/**
 * The exit code of a child, awaited; 128 + n when signal n ended it, as a shell counts. It stays pending while
 * everything is being stopped on a signal, so that nobody reports as a failure what was asked for.
 */
export function exitCodeOf(child) {
  const code = (exit, signal) => exit ?? 128 + constants.signals[signal];
  if (child.exitCode !== null || child.signalCode !== null) {
    return Promise.resolve(code(child.exitCode, child.signalCode));
  }
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (exit, signal) => stopping || resolve(code(exit, signal)));
  });
}

/** Asks a whole group to stop, and after `graceMs` ends it by force. Resolves when nobody is left in it. */
export async function stopGroup(child, graceMs = 10_000) {
  if (child.pid === undefined) return;
  const deadline = Date.now() + graceMs;
  let left = signalGroup(child, 'SIGTERM');
  // The last two seconds are for the ended to disappear; in a container nobody may ever collect them.
  while (left && Date.now() < deadline + 2_000) {
    await pause(50);
    left = signalGroup(child, Date.now() < deadline ? 0 : 'SIGKILL');
  }
  running.delete(child);
}

/** Runs a program to its end, ends whatever it left behind, and gives its exit code. */
export async function runGroup(command, args, options = {}) {
  const child = startGroup(command, args, options);
  try {
    return await exitCodeOf(child);
  } finally {
    await stopGroup(child, 2_000);
  }
}

/**
 * From now on Ctrl-C, SIGTERM and a closed terminal stop every group before this process ends, and a second
 * such signal ends them by force. When this process ends in any other way, they end with it.
 */
export function stopEverythingOnSignal() {
  let askedAt = 0;
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, async () => {
      const again = stopping;
      if (again && Date.now() - askedAt < 1_000) return; // Ctrl-C under npm arrives twice: from the terminal and from npm
      if (!again) askedAt = Date.now();
      stopping = true;
      const graceMs = again ? 0 : 10_000;
      await Promise.all([...running].map((child) => stopGroup(child, graceMs)));
      process.exit(128 + constants.signals[signal]);
    });
  }
  process.on('exit', () => {
    for (const child of running) signalGroup(child, 'SIGKILL');
  });
}
