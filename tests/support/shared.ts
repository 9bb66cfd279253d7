import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import path from 'node:path';

const root = fileURLToPath(new URL('../..', import.meta.url));

/**
 * Reference material that lives beside the project and is not part of it (real spectra under licences
 * that do not let us ship them, golden numbers computed elsewhere). Null where it is absent.
 */
export function sharedDir(): string | null {
  const candidate = process.env.HALFLIGHT_SHARED ?? path.join(root, '..', 'shared');
  return existsSync(candidate) ? candidate : null;
}

/** A file of the reference material, or null with one printed line that says why its check did not run. */
export function sharedFile(relative: string): string | null {
  const dir = sharedDir();
  const file = dir ? path.join(dir, relative) : null;
  if (file && existsSync(file)) return file;
  console.info(
    `not checked: ${relative} is not here (the reference material is not shipped with the project)`,
  );
  return null;
}
