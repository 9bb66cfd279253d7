import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const projectRoot = fileURLToPath(new URL('../..', import.meta.url));

/** Every file below some folders of the project whose path (with forward slashes) matches. */
export function sourceFiles(folders: readonly string[], matching: RegExp): string[] {
  return folders
    .flatMap((folder) =>
      readdirSync(path.join(projectRoot, folder), { recursive: true, withFileTypes: true })
        .filter((entry) => entry.isFile())
        .map((entry) =>
          path.relative(projectRoot, path.join(entry.parentPath, entry.name)).split(path.sep).join('/'),
        ),
    )
    .filter((file) => matching.test(file))
    .sort();
}

export function sourceText(file: string): string {
  return readFileSync(path.join(projectRoot, file), 'utf8');
}
