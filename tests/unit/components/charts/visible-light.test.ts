import { describe, expect, test } from 'vitest';

import { ribbonBetween, visibleColour } from '@/components/charts/visible-light';

describe('visibleColour', () => {
  // The spectral colours by their names (for instance CIE 15, or any optics text): which channel leads where
  test.each([
    [460, 2],
    [530, 1],
    [640, 0],
    [700, 0],
  ])('at %s nm channel %s leads', (nm, channel) => {
    const colour = visibleColour(nm);
    expect(Math.max(...colour)).toBe(colour[channel]);
  });

  test('yellow near 575 nm is red and green together, and hardly blue', () => {
    const [r, g, b] = visibleColour(575);
    expect(r).toBeGreaterThan(180);
    expect(g).toBeGreaterThan(180);
    expect(b).toBeLessThan(60);
  });

  test.each([379, 751, NaN])('shows nothing at %s nm', (nm) => {
    expect(visibleColour(nm)).toEqual([0, 0, 0]);
  });
});

describe('ribbonBetween', () => {
  test('is drawn between 380 and 750 nm and nowhere else', () => {
    expect(ribbonBetween(190, 1100)).toMatchObject({ from: 380, to: 750 });
    expect(ribbonBetween(400, 700)).toMatchObject({ from: 400, to: 700 });
    expect(ribbonBetween(200, 350)).toBeNull();
    expect(ribbonBetween(800, 1100)).toBeNull();
  });
  test('runs from 0 to 1', () => {
    const stops = ribbonBetween(400, 700)?.stops ?? [];
    expect([stops[0]?.offset, stops.at(-1)?.offset]).toEqual([0, 1]);
  });
});
