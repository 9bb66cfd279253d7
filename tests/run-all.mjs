// `npm test`: every suite, one after another, and at the end one line that counts every test of all of them.
import { existsSync, readdirSync, rmSync } from 'node:fs';
import { mkdir, mkdtemp, readFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { runGroup, stopEverythingOnSignal } from '../db/scripts/processes.mjs';
import {
  countExitCode,
  countPlaywright,
  countSuite,
  countVitest,
  countsLine,
  sumCounts,
} from './support/count-results.mjs';
import { ensureChromium } from './support/find-chromium.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const work = await mkdtemp(path.join(tmpdir(), 'halflight-test-'));
const scratch = path.join(work, 'scratch'); // the temporary folder of every suite, so that nothing of it stays
const artifacts = path.join(work, 'browser');

/** The environment without Halflight's own configuration: a test never meets a real laboratory's data. */
async function neutralEnv() {
  const example = await readFile(path.join(root, '.env.example'), 'utf8');
  const names = [...example.matchAll(/^([A-Z_]+)=/gm)].map((match) => match[1]);
  const dropped = new Set([...names, 'NODE_ENV']);
  return Object.fromEntries(Object.entries(process.env).filter(([name]) => !dropped.has(name)));
}

const env = { ...(await neutralEnv()), NEXT_TELEMETRY_DISABLED: '1', TMPDIR: scratch };

function run(tool, args, extra = {}) {
  const script = path.join(root, 'node_modules', tool);
  return runGroup(process.execPath, [script, ...args], { cwd: root, env: { ...env, ...extra } });
}

async function reportIn(file) {
  return existsSync(file) ? JSON.parse(await readFile(file, 'utf8')) : null;
}

async function types() {
  const code = await run('next/dist/bin/next', ['typegen']);
  return countExitCode(code === 0 ? await run('typescript/bin/tsc', ['--noEmit']) : code);
}

async function unit() {
  const report = path.join(work, 'unit.json');
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  const code = await run('vitest/vitest.mjs', ['run', '--config', 'tests/vitest.config.ts', ...reporters]);
  return countSuite(countVitest, await reportIn(report), code);
}

async function browser() {
  const report = path.join(work, 'browser.json');
  const code = await run('@playwright/test/cli.js', ['test', '--config', 'tests/playwright.config.ts'], {
    CHROMIUM_PATH: ensureChromium(),
    HALFLIGHT_E2E_REPORT: report,
    HALFLIGHT_E2E_OUTPUT: artifacts,
  });
  return countSuite(countPlaywright, await reportIn(report), code);
}

const suites = [
  ['Format', async () => countExitCode(await run('prettier/bin/prettier.cjs', ['--check', '.']))],
  ['Lint', async () => countExitCode(await run('eslint/bin/eslint.js', ['--max-warnings=0', '.']))],
  ['Types', types],
  ['Unit tests and tests against SQLite', unit],
  ['Tests in a browser', browser],
];

async function runSuite([name, suite], index) {
  const started = Date.now();
  console.log(`\n[${index + 1} of ${suites.length}] ${name}`);
  const counts = await suite().catch((error) => {
    console.error(error.message);
    return countExitCode(1);
  });
  console.log(`${name}: ${countsLine(counts)} (${Math.round((Date.now() - started) / 1000)} s)`);
  return counts;
}

/** Whether browser tests failed and left traces and pictures. */
function hasArtifacts() {
  return existsSync(artifacts) && readdirSync(artifacts).some((name) => !name.startsWith('.'));
}

stopEverythingOnSignal();
process.once('exit', () => {
  rmSync(hasArtifacts() ? scratch : work, { recursive: true, force: true, maxRetries: 5 });
});
await mkdir(scratch);
const counts = [];
for (const [index, suite] of suites.entries()) counts.push(await runSuite(suite, index));
if (hasArtifacts()) console.log(`\nTraces and pictures of what failed are in ${artifacts}`);
const total = sumCounts(counts);
console.log(`\n${countsLine(total)}`);
process.exitCode = total.failed === 0 ? 0 : 1;
