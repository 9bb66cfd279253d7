import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test, vi } from 'vitest';

import { isCurrent, NavigationList } from '@/components/frame/navigation-list';
import { currentTab } from '@/components/frame/notebook-tabs';
import { PageHeader } from '@/components/frame/page-header';
import { SharedFrame } from '@/components/frame/shared-frame';
import { themeAttribute, themeFrom } from '@/components/frame/theme';

vi.mock('next/navigation', () => ({ usePathname: () => '/notebooks/n1/curves' }));

describe('theme', () => {
  test('a cookie that says nothing known follows the system', () => {
    expect(themeFrom('dark')).toBe('dark');
    expect(themeFrom(undefined)).toBe('system');
    expect(themeFrom('"><script>')).toBe('system');
  });
  test('the system setting leaves <html> unmarked', () => {
    expect(themeAttribute('system')).toBeUndefined();
    expect(themeAttribute('light')).toBe('light');
  });
});

test('an entry is current on its page and below it, not beside it', () => {
  expect(isCurrent('/notebooks/n1', '/notebooks')).toBe(true);
  expect(isCurrent('/notebooks-old', '/notebooks')).toBe(false);
  expect(isCurrent('/notebooks', '/')).toBe(false);
});

test('of two tabs that fit the longer one is current', () => {
  const tabs = ['/notebooks/n1', '/notebooks/n1/curves', '/notebooks/n1/record'].map((href) => ({
    href,
    label: href,
  }));
  expect(currentTab('/notebooks/n1/curves/c7', tabs)).toBe('/notebooks/n1/curves');
  expect(currentTab('/notebooks/n1', tabs)).toBe('/notebooks/n1');
  expect(currentTab('/people', tabs)).toBeUndefined();
  const also = [...tabs, { href: '/notebooks/n1/spectra', label: 'Spectra', also: '/notebooks/n1/files' }];
  expect(currentTab('/notebooks/n1/files/f1', also)).toBe('/notebooks/n1/spectra');
});

test('the navigation shows the entries it was given and no other, and marks the open one', () => {
  const html = renderToStaticMarkup(
    <NavigationList entries={[{ href: '/notebooks', label: 'Notebooks', count: 4 }]} recent={[]} />,
  );
  expect(html.match(/<a /g)).toHaveLength(1);
  expect(html).toContain('aria-current="page"');
  expect(html).not.toContain('Recent');
});

test('the last crumb is the page itself and no link', () => {
  const html = renderToStaticMarkup(
    <PageHeader
      title="Record"
      crumbs={[
        { label: 'Notebooks', href: '/notebooks' },
        { label: 'Record', href: '/notebooks/n1/record' },
      ]}
    />,
  );
  expect(html.match(/<a /g)).toHaveLength(1);
  expect(html).toContain('<span aria-current="page">Record</span>');
});

test('a shared page has no navigation and says that nothing can be changed', () => {
  const html = renderToStaticMarkup(
    <SharedFrame sharedBy="Ines Farrow" until="14 January 2027">
      <p>content</p>
    </SharedFrame>,
  );
  expect(html).not.toContain('<nav');
  expect(html).not.toContain('<a ');
  expect(html).toContain('until 14 January 2027. Nothing can be changed here.');
});
