import { spawnSync } from 'node:child_process';
import { accessSync, constants, existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

const COMMANDS = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable'];
const PLACES = [
  '/usr/bin',
  '/usr/local/bin',
  '/snap/bin',
  '/opt/google/chrome',
  '/Applications/Chromium.app/Contents/MacOS',
  '/Applications/Google Chrome.app/Contents/MacOS',
];

function isProgram(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false; // absent, or not to be run: the next place is tried
  }
}

/**
 * The path of an installed Chromium or Chrome: the one CHROMIUM_PATH names, else the first in the folders of
 * PATH and the usual places. Null when there is none.
 *
 * @throws Error when CHROMIUM_PATH names something that cannot be run
 */
export function findChromium(env = process.env, places = PLACES) {
  if (env.CHROMIUM_PATH) {
    if (isProgram(env.CHROMIUM_PATH)) return env.CHROMIUM_PATH;
    throw new Error(
      `CHROMIUM_PATH names ${env.CHROMIUM_PATH}, which cannot be run: set it to a Chromium or Chrome, or leave it out.`,
    );
  }
  const folders = [...(env.PATH ?? '').split(path.delimiter).filter(Boolean), ...places];
  const names = [...COMMANDS, 'Chromium', 'Google Chrome'];
  return folders.flatMap((folder) => names.map((name) => path.join(folder, name))).find(isProgram) ?? null;
}

function mayInstall() {
  const release = existsSync('/etc/os-release') ? readFileSync('/etc/os-release', 'utf8') : '';
  return process.getuid?.() === 0 && /^ID=debian$/m.test(release);
}

/** As findChromium; where it may (as root on Debian) it installs the distribution's own first. */
export function ensureChromium() {
  const found = findChromium();
  if (found) return found;
  if (mayInstall()) {
    console.log('Installing Chromium for the tests in a browser.');
    const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
    const apt = (...args) =>
      spawnSync('apt-get', args, { env, stdio: ['ignore', 'ignore', 'inherit'] }).status === 0;
    if (apt('update') && apt('install', '-y', '--no-install-recommends', 'chromium')) {
      const installed = findChromium();
      if (installed) return installed;
    }
  }
  throw new Error(
    'The tests in a browser need Chromium or Chrome: install one (on Debian: apt-get install -y chromium), or set CHROMIUM_PATH to where it is.',
  );
}
