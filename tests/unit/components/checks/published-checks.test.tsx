import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { CheckSummary } from '@/components/checks/check-summary';
import { apartText, digitsText, verdictWords } from '@/components/checks/check-words';
import { PublishedChecks } from '@/components/checks/published-checks';
import { SourceCard } from '@/components/checks/source-card';
import { publishedChecks } from '@/lib/checks/published-checks';
import { type CheckResults, runSource } from '@/lib/checks/run-checks';

const sources = publishedChecks();
const right: CheckResults = Object.assign({}, ...sources.map(runSource));
const total = Object.keys(right).length;
const [cadmium] = sources.filter(({ id }) => id === 'cadmium');
const [slope] = cadmium?.checks ?? [];
if (!cadmium || !slope) throw new Error('the cadmium line is gone');
const wrong = { ...right, [slope.id]: 0.25 };
const engine = { server: '1.1.0', browser: '1.1.0' };

const summary = (both: { browser: CheckResults; server: CheckResults }, engines = engine) =>
  renderToStaticMarkup(<CheckSummary sources={sources} both={both} engine={engines} />);

describe('the sentence on top', () => {
  test('counts both places and names the engine', () => {
    const html = summary({ browser: right, server: right });
    expect(html).toContain(`${total} of ${total} published values agree in this browser and on the server`);
    expect(html).toContain('Engine version 1.1.0.');
    expect(html).toContain('the same numbers to the last bit');
  });

  test('shows how far this browser is', () => {
    const html = summary({ browser: runSource(cadmium), server: right });
    expect(html).toContain(`${total} of ${total} published values agree on the server`);
    expect(html).toContain(`${cadmium.checks.length} of ${total} done here`);
    expect(html).toContain('role="progressbar"');
  });

  test.each([
    ['server', { browser: right, server: wrong }],
    ['browser', { browser: wrong, server: right }],
    ['server while the browser waits', { browser: {}, server: wrong }],
  ])('a wrong value on the %s stops, with what to do and where it is', (_, both) => {
    const html = summary(both);
    expect(html).toContain(`1 of ${total} published values does not agree`);
    expect(html).toContain('Do not report numbers calculated here');
    expect(html).toContain('administrator');
    expect(html).toContain(`href="#${slope.id}"`);
  });

  test('says when page and server have different engines', () => {
    expect(summary({ browser: right, server: right }, { server: '1.2.0', browser: '1.1.0' })).toContain(
      'Engine version 1.1.0 in this browser, 1.2.0 on the server',
    );
  });
});

describe('a line', () => {
  test.each([
    [right, right, 'order', 'agrees', 'all 4 printed digits'],
    [{}, right, 'plain', 'agrees on the server', 'all 4 printed digits'],
    [right, wrong, 'stop', 'does not agree on the server', '1 of 4 printed digits'],
    [wrong, right, 'stop', 'does not agree in this browser', '1 of 4 printed digits'],
    [wrong, wrong, 'stop', 'does not agree', '1 of 4 printed digits'],
  ])('gives its verdict over both places (%#)', (browser, server, tone, words, digits) => {
    expect(verdictWords(slope, { browser, server })).toEqual({ tone, words });
    expect(digitsText(slope, { browser, server })).toBe(digits);
  });

  test('shows the published value and both of ours, and marks a wrong one', () => {
    const html = renderToStaticMarkup(
      <SourceCard source={cadmium} both={{ browser: right, server: wrong }} />,
    );
    expect(html).toContain('>0.2410<');
    expect(html).toContain('>0.24100<');
    expect(html).toContain('>0.25000<');
    expect(html.match(/bg-red-wash/g)?.length).toBeGreaterThan(0);
  });

  test('shows a refusal of the engine as no number', () => {
    const both = { browser: { ...right, [slope.id]: null }, server: right };
    expect(renderToStaticMarkup(<SourceCard source={cadmium} both={both} />)).toContain('no number');
    expect(verdictWords(slope, both).words).toBe('does not agree in this browser');
  });
});

test('a difference between the places is told as a part of a value', () => {
  expect(apartText({ browser: { a: 1 + 2 ** -50 }, server: { a: 1 } })).toContain('at most 9e-16 of a value');
});

test('the page comes with the server’s column and waits for the browser’s', () => {
  const html = renderToStaticMarkup(<PublishedChecks server={right} serverEngine="1.1.0" />);
  expect(html.match(/not yet/g)).toHaveLength(total);
  expect(html.match(/<table/g)).toHaveLength(sources.length);
});
