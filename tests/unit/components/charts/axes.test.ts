import { describe, expect, test } from 'vitest';

import { placeLabels } from '@/components/charts/place-labels';
import { axisAround, tickText, ticksBetween } from '@/components/charts/ticks';
import { thinLine } from '@/components/charts/thin-line';

describe('ticksBetween', () => {
  test.each([
    [400, 700, 6, [400, 450, 500, 550, 600, 650, 700]],
    [0, 2.65, 5, [0, 0.5, 1, 1.5, 2, 2.5]],
    [-0.0046, 0.0046, 5, [-0.004, -0.002, 0, 0.002, 0.004]],
  ])('between %s and %s, about %s', (min, max, target, expected) => {
    expect(ticksBetween(min, max, target).at).toEqual(expected);
  });

  // Property: whatever the axis, every tick lies on it and there are few of them.
  test.each([1e-9, 3e-4, 0.7, 1, 9.99, 1234, 5e8])('keeps to an axis of length %s', (span) => {
    const { at } = ticksBetween(-0.3 * span, 0.7 * span, 6);
    expect(at.length).toBeGreaterThanOrEqual(3);
    expect(at.length).toBeLessThanOrEqual(12);
    for (const tick of at) expect(Math.abs(tick)).toBeLessThanOrEqual(0.7 * span * (1 + 1e-9));
  });

  test('has no ticks on an axis without length', () => {
    expect(ticksBetween(1, 1).at).toEqual([]);
    expect(ticksBetween(0, NaN).at).toEqual([]);
  });
});

test('a tick below zero carries a true minus sign, and zero none', () => {
  expect(tickText(-0.004, 3)).toBe('\u22120.004');
  expect(tickText(-0, 1)).toBe('0.0');
  expect(tickText(-0.0001, 2)).toBe('0.00');
});

describe('axisAround', () => {
  test('leaves air on both sides and skips what is no number', () => {
    const axis = axisAround([0, NaN, 10], { below: 0.1, above: 0.2 });
    expect(axis).toEqual({ min: -1, max: 12 });
  });
  test('makes an axis of one value and of none', () => {
    expect(axisAround([5]).max).toBeGreaterThan(5);
    expect(axisAround([])).toEqual({ min: 0, max: 1 });
  });
});

describe('thinLine', () => {
  const x = Array.from({ length: 5000 }, (_, i) => 200 + i * 0.1);
  const y = x.map((nm, i) => (i === 2501 ? 3 : i === 4000 ? null : Math.sin(nm)));

  test('keeps a peak of one point, both ends and a gap', () => {
    const thin = thinLine(x, y, 400);
    expect(thin.x.length).toBeLessThan(620);
    expect(Math.max(...thin.y.map((value) => value ?? -9))).toBe(3);
    expect([thin.x[0], thin.x.at(-1)]).toEqual([x[0], x.at(-1)]);
    expect(thin.y).toContain(null);
  });
  test('keeps the order of x, and a short line whole', () => {
    const thin = thinLine(x, y, 400);
    expect(thin.x).toEqual(thin.x.toSorted((a, b) => a - b));
    expect(thinLine([1, 2], [3, null])).toEqual({ x: [1, 2], y: [3, null] });
  });
});

test('a label that would touch an earlier one is left out', () => {
  const label = { x: 500, colour: 'ink', side: 'left' } as const;
  const placed = placeLabels(
    [
      { ...label, y: 1, text: 'S5' },
      { ...label, y: 0.98, text: 'S4' },
      { ...label, y: 0.98, x: 650, text: 'far away' },
      { ...label, y: 0.5, text: 'S3' },
    ],
    300,
    2,
  );
  expect(placed.map((each) => each.text)).toEqual(['S5', 'far away', 'S3']);
});
