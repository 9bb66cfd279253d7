import type { NextConfig } from 'next';
import { NextRequest } from 'next/server';
import { describe, expect, test } from 'vitest';

import { config, proxy } from '@/proxy';

// the file is plain JavaScript for node; only its type is told here
const file: string = new URL('../../next.config.mjs', import.meta.url).href;
const { default: nextConfig } = (await import(file)) as { default: NextConfig };

const answer = () =>
  proxy(new NextRequest('http://127.0.0.1:3000/notebooks')).headers.get('Content-Security-Policy') ?? '';

describe('the policy of a page', () => {
  test('lets only scripts with its nonce run, and no frame hold it', () => {
    expect(answer()).toMatch(/script-src 'self' 'nonce-[A-Za-z0-9+/=]{20,}' 'strict-dynamic'/);
    expect(answer()).toContain("frame-ancestors 'none'");
    expect(answer()).not.toContain('unsafe-eval');
    expect(/script-src[^;]*/.exec(answer())?.[0]).not.toContain('unsafe-inline');
  });
  test('has a new nonce every time', () => {
    const nonces = Array.from({ length: 20 }, () => /nonce-([^']+)/.exec(answer())?.[1]);
    expect(new Set(nonces).size).toBe(20);
  });
});

describe('the matcher', () => {
  const pattern = new RegExp(`^${config.matcher[0]?.source}$`);
  test.each(['/', '/notebooks/n1/curves', '/s/abc', '/apiary'])('covers the page %s', (path) => {
    expect(pattern.test(path)).toBe(true);
  });
  // a matched route has its body held in memory and cut at 10 MB
  test.each(['/api/v1/notebooks/n1/source-files', '/_next/static/chunks/a.js', '/icon.svg'])(
    'leaves out %s',
    (path) => {
      expect(pattern.test(path)).toBe(false);
    },
  );
});

describe('the headers of every answer', () => {
  const rules = async () => (await nextConfig.headers?.()) ?? [];
  const valuesFor = async (source: string) =>
    Object.fromEntries(
      (await rules())
        .find((rule) => rule.source === source && !rule.has)
        ?.headers.map((h) => [h.key, h.value]) ?? [],
    );

  test('name no type by guess, stay out of search engines, and send no address to other sites', async () => {
    expect(await valuesFor('/:path*')).toMatchObject({
      'X-Content-Type-Options': 'nosniff',
      'X-Robots-Tag': 'noindex, nofollow',
      'Referrer-Policy': 'same-origin',
    });
  });
  test('the API, uploads among it, has a policy of its own', async () => {
    expect((await valuesFor('/api/:path*'))['Content-Security-Policy']).toContain("default-src 'none'");
  });
  test('a shared page tells no referrer at all', async () => {
    expect(await valuesFor('/s/:path*')).toEqual({ 'Referrer-Policy': 'no-referrer' });
    // of two rules with the same header Next takes the later one
    const sources = (await rules()).map((rule) => rule.source);
    expect(sources.indexOf('/s/:path*')).toBeGreaterThan(sources.indexOf('/:path*'));
  });
  test('https alone is asked to stay https', async () => {
    const strict = (await rules()).filter((rule) =>
      rule.headers.some((h) => h.key === 'Strict-Transport-Security'),
    );
    expect(strict).toHaveLength(1);
    expect(strict[0]?.has).toEqual([{ type: 'header', key: 'x-forwarded-proto', value: 'https' }]);
  });
});
