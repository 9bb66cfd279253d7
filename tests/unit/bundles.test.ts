import { existsSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { projectRoot, sourceFiles, sourceText } from '../support/sources';

/*
 * What a page sends to the browser, by following the imports of its client components. A module that is imported
 * when it is needed (`await import`) is not sent with the page.
 */

const IMPORT = /^(?:import|export)\s+(?!type\b)(?:[^'"]*?\sfrom\s+)?['"]([^'"]+)['"]/gm;
const TYPES_ONLY = /^import\s*\{(\s*type\s+[^,}]+,?)+\s*\}\s*from\s*['"][^'"]+['"];?$/gm;

function importsOf(file: string): string[] {
  const text = sourceText(file).replace(TYPES_ONLY, '');
  return [...text.matchAll(IMPORT)].map(([, name = '']) => name);
}

function fileOf(name: string, from: string): string | null {
  const base = name.startsWith('@/') ? name.slice(2) : path.join(path.dirname(from), name);
  if (!name.startsWith('@/') && !name.startsWith('.')) return null;
  const candidates = [base, `${base}.ts`, `${base}.tsx`, `${base}/index.ts`];
  const found = candidates.find((file) => /\.tsx?$/.test(file) && existsSync(path.join(projectRoot, file)));
  return found?.split(path.sep).join('/') ?? null;
}

const isClient = (file: string) => /^(\/\*[\s\S]*?\*\/\s*)?'use client'/.test(sourceText(file));
const isAction = (file: string) => sourceText(file).startsWith("'use server'");

/** Packages that the client part of a page imports. */
function packagesSentWith(page: string): Set<string> {
  const packages = new Set<string>();
  const seen = new Set<string>();
  const visit = (file: string, inClient: boolean) => {
    const client = inClient || isClient(file);
    const key = `${file} ${client}`;
    if (seen.has(key) || isAction(file)) return;
    seen.add(key);
    for (const name of importsOf(file)) {
      const next = fileOf(name, file);
      if (next) visit(next, client);
      else if (client && !name.startsWith('.') && !name.startsWith('@/')) packages.add(name);
    }
  };
  visit(page, false);
  return packages;
}

const pages = sourceFiles(['app'], /\/(page|layout)\.tsx$/);
const sending = (what: RegExp) =>
  pages.filter((page) => [...packagesSentWith(page)].some((name) => what.test(name)));

describe('what pages send to the browser', () => {
  test('the walk follows imports to packages', () => {
    expect(pages.length).toBeGreaterThan(20);
    expect(sending(/^react$/).length).toBeGreaterThan(10);
  });

  test('no page sends Plotly with itself: it is fetched when a plot is drawn', () => {
    expect(sending(/plotly/)).toEqual([]);
  });

  // Curves and samples calculate while a person types, and "Is it right?" runs the calculation where the reader is.
  test('only pages that calculate in the browser send mathjs', () => {
    expect(sending(/^mathjs/)).toEqual([
      'app/(app)/notebooks/[notebookId]/absorptivities/[absorptivityId]/new-version/page.tsx',
      'app/(app)/notebooks/[notebookId]/absorptivities/new/page.tsx',
      'app/(app)/notebooks/[notebookId]/batches/[batchId]/add/page.tsx',
      'app/(app)/notebooks/[notebookId]/curves/[curveId]/new-version/page.tsx',
      'app/(app)/notebooks/[notebookId]/curves/[curveId]/page.tsx',
      'app/(app)/notebooks/[notebookId]/curves/new/page.tsx',
      'app/(public)/is-it-right/page.tsx',
    ]);
  });
});
