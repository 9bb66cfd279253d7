// Starts Halflight: reads the configuration, brings the database up to date, serves, says where.
import { existsSync } from 'node:fs';
import http from 'node:http';
import net from 'node:net';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import { tsImport } from 'tsx/esm/api';
import { exitCodeOf, runGroup, startGroup, stopEverythingOnSignal, stopGroup } from './processes.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url));
const at = (...parts) => path.join(root, ...parts);
const dev = process.argv.includes('--dev');

/** A reason not to start that is said in one sentence, without a stack. */
class StartError extends Error {}

async function configuration() {
  if (existsSync(at('.env'))) process.loadEnvFile(at('.env')); // what the shell has set stays as it is
  const { parseEnv } = await tsImport('../../lib/env.ts', import.meta.url);
  try {
    return parseEnv(process.env);
  } catch (error) {
    if (error.name === 'EnvError') throw new StartError(error.message);
    throw error;
  }
}

/** What the children see: every name has a value, if a blank one, so that none takes another from a file of its own. */
function childEnv(config) {
  const values = Object.entries(config).map(([name, value]) => [name, String(value ?? '')]);
  const mode = { NODE_ENV: dev ? 'development' : 'production', NEXT_TELEMETRY_DISABLED: '1' };
  return { ...process.env, ...Object.fromEntries(values), ...mode };
}

/** Fails with a sentence unless the address can be listened on, before anything else is done. */
async function checkAddress(host, port) {
  const sentences = {
    EADDRINUSE: `Port ${port} is in use by another program: stop that one, or choose another port, for example PORT=${port + 1} npm start.`,
    EACCES: `Port ${port} may not be used by this account: choose one above 1023, for example PORT=3000 npm start.`,
    EADDRNOTAVAIL: `HOST=${host} is not an address of this computer: leave HOST out, or give one of its addresses.`,
    ENOTFOUND: `HOST=${host} is not a name that this computer knows: leave HOST out, or give one of its addresses.`,
  };
  const server = net.createServer();
  await new Promise((resolve, reject) => {
    server.once('error', reject).listen(port, host, resolve);
  }).catch((error) => {
    throw error.code in sentences ? new StartError(sentences[error.code]) : error;
  });
  await new Promise((resolve) => server.close(resolve));
}

/** The address that a browser on this computer reaches the server at. */
function localAddress(host, port) {
  const everywhere = { '0.0.0.0': '127.0.0.1', '::': '[::1]' };
  return `http://${everywhere[host] ?? (host.includes(':') ? `[${host}]` : host)}:${port}`;
}

/** The status of the first page, or null while nobody answers. */
function statusOf(url) {
  return new Promise((resolve) => {
    const request = http.get(url, { agent: false }, (response) => {
      response.resume();
      resolve(response.statusCode);
    });
    request.once('error', () => resolve(null));
  });
}

async function sayWhenItAnswers(url, shown, server) {
  let status = null;
  while (status === null && server.exitCode === null && server.signalCode === null) {
    await pause(100);
    status = await statusOf(url);
  }
  if (status === null) return;
  console.log(`\nHalflight is at ${shown}`);
  if (status >= 500) console.log(`Its first page failed with status ${status}; the reason stands above.`);
  console.log('Ctrl-C stops it.');
}

async function start() {
  if (!dev && !existsSync(at('.next', 'BUILD_ID'))) {
    throw new StartError('There is no build to serve yet: `npm start` makes one first.');
  }
  const config = await configuration();
  const { HOST, PORT, APP_URL } = config;
  await checkAddress(HOST, PORT);
  const env = childEnv(config);
  const node = (...args) => [process.execPath, args, { cwd: root, env }];
  const prepared = await runGroup(...node('--import', 'tsx', at('db', 'scripts', 'prepare.ts')));
  if (prepared !== 0) return prepared;

  const next = at('node_modules', 'next', 'dist', 'bin', 'next');
  const server = startGroup(...node(next, dev ? 'dev' : 'start', '-H', HOST, '-p', String(PORT)));
  const url = localAddress(HOST, PORT);
  await sayWhenItAnswers(url, APP_URL ? `${APP_URL} (here: ${url})` : url, server);
  const code = await exitCodeOf(server);
  await stopGroup(server, 2_000);
  return code;
}

stopEverythingOnSignal();
// A test run holds a channel to the server it starts; should the run be cut off, the server ends with it.
process.once('disconnect', () => process.kill(process.pid, 'SIGTERM'));
try {
  process.exitCode = await start();
} catch (error) {
  if (!(error instanceof StartError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
