// Makes a clone ready to run: installs the packages and builds the application, each only when it has to.
// It runs before any package is there, so it imports nothing but what comes with Node.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { readFile, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { exitCodeOf, startGroup, stopEverythingOnSignal, stopGroup } from './processes.mjs';
import { withLock } from './set-up-lock.mjs';
import { buildStamp, installStamp, installedIsLocked } from './stamp.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url));
const at = (...parts) => path.join(root, ...parts);
const INSTALLED = at('node_modules', '.set-up-stamp');
const BUILT = at('.next', 'set-up-stamp');
const say = (sentence) => console.log(sentence);

/** A reason to stop that is said in one sentence, without a stack. */
class SetUpError extends Error {}

async function textOf(file) {
  return existsSync(file) ? await readFile(file, 'utf8') : null;
}

function isThere(command) {
  return spawnSync('sh', ['-c', `command -v ${command}`], { stdio: 'ignore' }).status === 0;
}

async function checkNode() {
  const { engines } = JSON.parse(await readFile(at('package.json'), 'utf8'));
  const oldest = engines.node.replace(/^>=/, '').split('.').map(Number);
  const have = process.versions.node.split('.').map(Number);
  const different = have.findIndex((part, i) => part !== (oldest[i] ?? 0));
  if (different >= 0 && have[different] < (oldest[different] ?? 0)) {
    throw new SetUpError(
      `Halflight needs Node ${oldest.join('.')} or newer and this is ${process.versions.node}: install a newer Node, then run the command again.`,
    );
  }
}

/** Runs a long step, says every half minute that it still runs, and shows its output only when it fails. */
async function quietly(doing, command, args, env) {
  const started = Date.now();
  const seconds = () => Math.round((Date.now() - started) / 1000);
  const child = startGroup(command, args, { cwd: root, env, stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream.setEncoding('utf8').on('data', (text) => (output += text));
  }
  const still = setInterval(() => say(`  still ${doing}, ${seconds()} s so far`), 30_000);
  try {
    const code = await exitCodeOf(child);
    await stopGroup(child, 2_000);
    if (code !== 0) console.error(output.trimEnd().split('\n').slice(-80).join('\n'));
    return { ok: code === 0, seconds: seconds() };
  } finally {
    clearInterval(still);
  }
}

function nativeModuleLoads() {
  return (
    spawnSync(process.execPath, ['-e', "require('sqlite3')"], { cwd: root, stdio: 'ignore' }).status === 0
  );
}

async function isInstalled() {
  return (await textOf(INSTALLED)) === (await installStamp(root));
}

/** Packages that somebody installed by hand, with npm and from the same lock file, are as good as ours. */
async function adoptInstalled() {
  const [stamp, installed] = await Promise.all([
    textOf(INSTALLED),
    textOf(at('node_modules', '.package-lock.json')),
  ]);
  const now = await installStamp(root);
  const sameNode = stamp === null || stamp.split(' ').slice(1).join() === now.split(' ').slice(1).join();
  if (!installed || !sameNode) return false;
  const lock = JSON.parse(await readFile(at('package-lock.json'), 'utf8'));
  if (!installedIsLocked(lock, JSON.parse(installed)) || !nativeModuleLoads()) return false;
  await writeFile(INSTALLED, now);
  return true;
}

function compilerEnv() {
  const chosen = process.env.CC || process.env.CXX;
  if (chosen || !['ccache', 'gcc', 'g++'].every(isThere)) return process.env;
  return { ...process.env, CC: 'ccache gcc', CXX: 'ccache g++' };
}

async function install() {
  if (await adoptInstalled()) return;
  say('Installing packages with npm ci; SQLite may be compiled on the way, so this takes a few minutes.');
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const npm = process.env.npm_execpath?.endsWith('npm-cli.js') ? process.env.npm_execpath : null;
  const [command, ...before] = npm ? [process.execPath, npm] : ['npm'];
  const { ok, seconds } = await quietly('installing', command, [...before, ...args], compilerEnv());
  if (!ok || !nativeModuleLoads()) {
    const missing = ['python3', 'g++', 'make'].filter((tool) => !isThere(tool));
    throw new SetUpError(
      missing.length > 0
        ? `The packages could not be installed: SQLite is compiled on this machine and ${missing.join(' and ')} cannot be found; install them (on Debian: apt-get install -y python3 g++ make), then run the command again.`
        : 'The packages could not be installed; what npm said stands above (when it could not reach its registry, check the network), and the command can be run again.',
    );
  }
  await writeFile(INSTALLED, await installStamp(root));
  say(`Installed the packages in ${seconds} s.`);
}

async function isBuilt() {
  return existsSync(at('.next', 'BUILD_ID')) && (await textOf(BUILT)) === (await buildStamp(root));
}

async function build() {
  say(
    existsSync(BUILT)
      ? 'Building the application again, because its sources have changed.'
      : 'Building the application, which takes about a minute.',
  );
  const stamp = await buildStamp(root); // before the build: what changes meanwhile is built next time
  await rm(BUILT, { force: true });
  const env = { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' };
  const next = at('node_modules', 'next', 'dist', 'bin', 'next');
  const { ok, seconds } = await quietly('building', process.execPath, [next, 'build'], env);
  if (!ok) {
    throw new SetUpError('The application could not be built; what Next.js said about it stands above.');
  }
  await writeFile(BUILT, stamp);
  say(`Built the application in ${seconds} s.`);
}

async function setUp(withBuild) {
  const ready = async () => (await isInstalled()) && (!withBuild || (await isBuilt()));
  if (await ready()) return;
  const onWait = () => say('Another set-up of this clone is running; waiting until it is done.');
  await withLock(
    at('.set-up.lock'),
    async () => {
      if (!(await isInstalled())) await install();
      if (withBuild && !(await isBuilt())) await build();
    },
    { onWait },
  );
}

stopEverythingOnSignal();
try {
  await checkNode();
  await setUp(!process.argv.includes('--no-build'));
} catch (error) {
  if (!(error instanceof SetUpError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
