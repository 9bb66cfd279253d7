import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import path from 'node:path';
import { describe, expect, test } from 'vitest';

const root = fileURLToPath(new URL('../../../..', import.meta.url));
const css = readFileSync(path.join(root, 'app/globals.css'), 'utf8');

interface Token {
  light: string;
  dark: string;
  comment: string;
}

const TOKEN =
  /--color-([a-z0-9-]+):\s*light-dark\((#[0-9a-f]{6}),\s*(#[0-9a-f]{6})\);(?:\s*\/\*([^*]*)\*\/)?/g;
const tokens = new Map<string, Token>(
  [...css.matchAll(TOKEN)].map(([, name = '', light = '', dark = '', comment = '']) => [
    name,
    { light, dark, comment },
  ]),
);

/** The pairs that the stylesheet itself documents: "text on a b c" and "graphic on a b". */
const pairs = [...tokens].flatMap(([name, { comment }]) => {
  const [, kind, grounds] = /(text|graphic) on ([a-z0-9 -]+)/.exec(comment) ?? [];
  if (!kind || !grounds) return [];
  return grounds
    .trim()
    .split(/\s+/)
    .map((ground) => ({ name, ground, kind, least: kind === 'text' ? 4.5 : 3 }));
});

// Reference: WCAG 2.2, definitions of relative luminance and contrast ratio (W3C Recommendation, 2023)
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5]
    .map((start) => parseInt(hex.slice(start, start + 2), 16) / 255)
    .map((v) => (v <= 0.04045 ? v / 12.92 : ((v + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [dark = 0, bright = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (bright + 0.05) / (dark + 0.05);
}

test('the formula gives 21 for black on white and 4.54 for #767676 on white', () => {
  // Reference: WCAG 2.2 states 21:1 as the largest ratio; #767676 is the known lightest grey that passes AA on white
  expect(contrast('#000000', '#ffffff')).toBe(21);
  expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
});

test('the stylesheet documents its colours and their pairs', () => {
  expect(tokens.size).toBeGreaterThan(30);
  expect(pairs.length).toBeGreaterThan(50);
  expect(pairs.filter(({ ground }) => !tokens.has(ground))).toEqual([]);
});

describe.each(['light', 'dark'] as const)('in the %s theme', (theme) => {
  test.each(pairs)('$name ($kind) on $ground reaches $least:1', ({ name, ground, least }) => {
    const front = tokens.get(name)?.[theme] ?? '';
    const back = tokens.get(ground)?.[theme] ?? '';
    expect(contrast(front, back)).toBeGreaterThanOrEqual(least);
  });
});
