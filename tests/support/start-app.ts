import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { startGroup, stopGroup } from '../../db/scripts/processes.mjs';
import { parseEnv } from '../../lib/env';

const root = fileURLToPath(new URL('../..', import.meta.url));
const STARTS_WITHIN_MS = 120_000;

export interface RunningApp {
  readonly url: string;
  readonly dataDir: string;
  /** Everything it has printed so far: demo accounts, a token, a set-up code. */
  printed(): string;
  /** Stops it with all its children, and removes a data folder that was made for it. */
  stop(): Promise<void>;
}

async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo; // listening on TCP, so it is an AddressInfo
  await new Promise((resolve) => server.close(resolve));
  return port;
}

/**
 * Starts the built application as `npm start` does, on a free port, and waits until it answers. Its
 * configuration is the one given here and nothing else: neither the shell's nor that of an .env file.
 *
 * @param config environment variables by name; DATA_DIR is a new temporary folder unless given
 */
export async function startApp(config: Readonly<Record<string, string>> = {}): Promise<RunningApp> {
  const made = config.DATA_DIR ? null : await mkdtemp(path.join(tmpdir(), 'halflight-data-'));
  const dataDir = config.DATA_DIR ?? made ?? '';
  const url = `http://127.0.0.1:${config.PORT ?? (await freePort())}`;
  const blank = Object.fromEntries(Object.keys(parseEnv({})).map((name) => [name, '']));
  const child = startGroup(process.execPath, [path.join(root, 'db/scripts/start.mjs')], {
    cwd: root,
    env: { ...process.env, ...blank, ...config, DATA_DIR: dataDir, PORT: new URL(url).port },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  let printed = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream?.setEncoding('utf8').on('data', (text: string) => (printed += text));
  }
  const stop = async () => {
    await stopGroup(child);
    if (made) await rm(made, { recursive: true, force: true });
  };
  const deadline = Date.now() + STARTS_WITHIN_MS;
  while (!printed.includes('Halflight is at')) {
    if (child.exitCode !== null || child.signalCode !== null || Date.now() > deadline) {
      await stop();
      throw new Error(`The application did not start. It printed:\n${printed}`);
    }
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  return { url, dataDir, printed: () => printed, stop };
}
