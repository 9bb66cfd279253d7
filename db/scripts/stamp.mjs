// A stamp is a hash of contents: in a fresh clone the times of files say nothing.
import { createHash } from 'node:crypto';
import { readFile, readdir, stat } from 'node:fs/promises';
import path from 'node:path';

/** What the build is made from. A change anywhere here makes the next `npm start` build again. */
export const BUILD_SOURCES = [
  'app',
  'components',
  'lib',
  'db',
  'public',
  'proxy.ts',
  'instrumentation.ts',
  'next.config.mjs',
  'postcss.config.mjs',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];

async function filesUnder(root, relative) {
  const found = await stat(path.join(root, relative)).catch((error) => {
    if (error.code === 'ENOENT') return null;
    throw error;
  });
  if (!found) return [];
  if (!found.isDirectory()) return found.isFile() ? [relative] : [];
  const names = (await readdir(path.join(root, relative))).filter((name) => !name.startsWith('.'));
  return (await Promise.all(names.map((name) => filesUnder(root, `${relative}/${name}`)))).flat();
}

/** A hash of the names and contents of files and folders; dot files inside folders do not count. */
export async function stampOf(root, sources) {
  const files = (await Promise.all(sources.map((source) => filesUnder(root, source)))).flat().sort();
  const total = createHash('sha256');
  for (const file of files) {
    const contents = createHash('sha256').update(await readFile(path.join(root, file)));
    total.update(`${file}\0${contents.digest('hex')}\n`);
  }
  return total.digest('hex');
}

/** The stamp of the sources of the build. */
export function buildStamp(root) {
  return stampOf(root, BUILD_SOURCES);
}

/** The stamp of installed packages: the lock file, and the Node that native modules are compiled for. */
export async function installStamp(root, node = process) {
  const lock = await stampOf(root, ['package-lock.json']);
  return `${lock} node-${node.versions.modules} ${node.platform} ${node.arch}`;
}

/**
 * Whether the packages that npm says it installed (node_modules/.package-lock.json) are those of the lock
 * file, both parsed. Optional packages may be absent: they are for other platforms.
 */
export function installedIsLocked(lock, installed) {
  const wanted = Object.entries(lock.packages).filter(([name]) => name !== '');
  const same = (a, b) => a?.version === b?.version && a?.integrity === b?.integrity;
  const missing = wanted.some(([name, entry]) => !entry.optional && !same(entry, installed.packages[name]));
  const foreign = Object.entries(installed.packages).some(
    ([name, entry]) => !same(entry, lock.packages[name]),
  );
  return !missing && !foreign;
}
