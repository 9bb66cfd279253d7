import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';

import { LightDisc } from '@/components/light-disc';
import { hatchLines, lightWords, litPath } from '@/components/light-disc-path';

/**
 * The area inside a lit path, by the shoelace formula over points on both arcs. It reads the path's own numbers:
 * the outer arc is the right half circle, the terminator a half ellipse that goes back up, on the right when its
 * sweep flag is 0 and on the left when it is 1 (SVG 2, 9.5.1).
 */
function areaOf(path: string): number {
  const arcs = [...path.matchAll(/A([\d.]+) ([\d.]+) 0 0 ([01])/g)].map((arc) => arc.slice(1).map(Number));
  const [outer, terminator] = arcs;
  if (!outer || !terminator) throw new Error(`no two arcs in ${path}`);
  const [radius = 0] = outer;
  const [rx = 0, ry = 0, sweep] = terminator;
  const steps = 20_000;
  const points: [number, number][] = [];
  for (let i = 0; i <= steps; i++) {
    const angle = -Math.PI / 2 + (Math.PI * i) / steps;
    points.push([radius * Math.cos(angle), radius * Math.sin(angle)]);
  }
  const side = sweep === 1 ? -1 : 1;
  for (let i = 0; i <= steps; i++) {
    const angle = Math.PI / 2 - (Math.PI * i) / steps;
    points.push([side * rx * Math.cos(angle), ry * Math.sin(angle)]);
  }
  return Math.abs(
    points.reduce((sum, [x, y], i) => {
      const [nextX, nextY] = points[(i + 1) % points.length] ?? [0, 0];
      return sum + (x * nextY - nextX * y) / 2;
    }, 0),
  );
}

describe('litPath', () => {
  // Definition: A = −log10 T, so the lit fraction of the disc has to be 10^−A.
  test.each([0, 0.0458, 0.1, 0.301, 0.4, 0.5, 1, 1.5, 2, 3])(
    'lights 10^-A of the disc at A = %s',
    (absorbance) => {
      const radius = 7;
      const fraction = areaOf(litPath(10 ** -absorbance, radius)) / (Math.PI * radius ** 2);
      expect(Math.abs(fraction - 10 ** -absorbance)).toBeLessThan(2e-5);
    },
  );

  test('takes more than all of the light as all of it, and less than none as none', () => {
    expect(litPath(1.2, 7)).toBe(litPath(1, 7));
    expect(litPath(-0.1, 7)).toBe(litPath(0, 7));
  });
});

test('the hatching of a gap ends on the rim', () => {
  for (const line of hatchLines(7)) {
    expect(Math.hypot(line.x1, line.y1)).toBeCloseTo(7, 3);
    expect(Math.hypot(line.x2, line.y2)).toBeCloseTo(7, 3);
  }
});

describe('lightWords', () => {
  test.each([
    [0, '100 % of the light gets through'],
    [0.398, '40 % of the light gets through'],
    [1.2, '6.3 % of the light gets through'],
    [2.41, '0.4 % of the light gets through'],
    [4.5, 'Less than 0.01 % of the light gets through'],
    [Infinity, 'Less than 0.01 % of the light gets through'],
    [null, 'No reading'],
    [-0.004, 'More light than through the reference: the absorbance is below zero'],
  ])('says of A = %s: %s', (absorbance, words) => {
    expect(lightWords(absorbance)).toBe(words);
  });

  test('gives the reason of a gap', () => {
    expect(lightWords(null, 'Above range')).toBe('Above range');
  });
});

describe('LightDisc', () => {
  test('speaks its words once, to eyes and ears', () => {
    const html = renderToStaticMarkup(<LightDisc absorbance={0.398} />);
    expect(html).toContain('role="img"');
    expect(html).toContain('aria-label="40 % of the light gets through"');
    expect(html).toContain('<title>40 % of the light gets through</title>');
  });

  test('is silent where the words stand beside it', () => {
    const html = renderToStaticMarkup(<LightDisc absorbance={0.398} silent />);
    expect(html).toContain('aria-hidden="true"');
    expect(html).not.toContain('<title>');
  });

  test('hatches a gap instead of lighting it, and marks a reading below zero on its rim', () => {
    expect(renderToStaticMarkup(<LightDisc absorbance={null} />)).toContain('<line');
    expect(renderToStaticMarkup(<LightDisc absorbance={null} />)).not.toContain('fill-moon');
    expect(renderToStaticMarkup(<LightDisc absorbance={-0.01} />)).toContain('fill-red');
    expect(renderToStaticMarkup(<LightDisc absorbance={0.01} />)).not.toContain('fill-red');
  });
});
