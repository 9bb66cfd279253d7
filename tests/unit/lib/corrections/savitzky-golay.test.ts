import { describe, expect, test } from 'vitest';
import { derivative, smooth } from '@/lib/corrections/savitzky-golay';
import type { Points } from '@/lib/corrections/types';
import { at, sampled, withGap } from '../../../support/bands';

/** The answer to a single 1 is the row of coefficients. */
function coefficients(filter: { windowPoints: number; polynomial: number }, order: number): number[] {
  const half = (filter.windowPoints - 1) / 2;
  const impulse = sampled((nm) => (nm === 500 ? 1 : 0), 480, 520);
  const { points } = order === 0 ? smooth(impulse, filter) : derivative(impulse, filter, order);
  return Array.from({ length: filter.windowPoints }, (_, i) => at(points, 500 + half - i) as number);
}

describe('Savitzky-Golay', () => {
  // Savitzky and Golay 1964, Analytical Chemistry 36, 1627, with the corrections of Steinier 1972; typed from memory
  test.each([
    ['smoothing, 5 points, quadratic', 5, 2, 0, [-3, 12, 17, 12, -3], 35],
    ['smoothing, 7 points, quadratic', 7, 2, 0, [-2, 3, 6, 7, 6, 3, -2], 21],
    ['first derivative, 5 points, quadratic', 5, 2, 1, [-2, -1, 0, 1, 2], 10],
    ['second derivative, 5 points, quadratic', 5, 2, 2, [2, -1, -2, -1, 2], 7],
    ['first derivative, 5 points, quartic', 5, 4, 1, [1, -8, 0, 8, -1], 12],
  ] as const)('%s', (_, windowPoints, polynomial, order, printed, norm) => {
    const found = coefficients({ windowPoints, polynomial }, order);
    printed.forEach((c, i) => expect(found[i]).toBeCloseTo(c / norm, 12));
  });

  test.each([1, 2, 3, 4])('derivative %i of a polynomial of its degree is exact, ends and all', (order) => {
    const t = (nm: number) => (nm - 500) / 10;
    const f = (nm: number) => 1 + t(nm) - 2 * t(nm) ** 2 + 0.5 * t(nm) ** 3 + 0.25 * t(nm) ** 4;
    // by hand, with the chain rule: each order divides by 10
    const exact = [
      (x: number) => (1 - 4 * x + 1.5 * x ** 2 + x ** 3) / 10,
      (x: number) => (-4 + 3 * x + 3 * x ** 2) / 100,
      (x: number) => (3 + 6 * x) / 1000,
      () => 6 / 10000,
    ][order - 1] as (x: number) => number;
    const { points } = derivative(sampled(f, 480, 520, 0.5), { windowPoints: 11, polynomial: 4 }, order);
    points.wavelengthNm.forEach((nm, i) => expect(points.absorbance[i]).toBeCloseTo(exact(t(nm)), 7));
  });

  test('u of a smoothed point: √(17/35) of that of a point', () => {
    const points: Points = { ...sampled(() => 1, 500, 510), u: Array<number>(11).fill(0.01) };
    // Σc² is the middle coefficient for a smoothing filter
    expect(smooth(points, { windowPoints: 5, polynomial: 2 }).points.u?.[5]).toBeCloseTo(
      0.01 * Math.sqrt(17 / 35),
      12,
    );
  });

  test('a gap parts the spectrum; short runs become gaps and are told', () => {
    const outcome = smooth(
      withGap(
        sampled((nm) => nm, 500, 520),
        503,
      ),
      { windowPoints: 5, polynomial: 2 },
    );
    expect([500, 502, 503].map((nm) => at(outcome.points, nm))).toEqual([null, null, null]);
    expect(at(outcome.points, 504)).toBeCloseTo(504, 9);
    expect(outcome.warnings).toEqual([expect.objectContaining({ code: 'FILTER_GAPS' })]);
    expect(outcome.warnings[0]?.text).toContain('3 points');
  });

  test('says the largest change', () => {
    const outcome = smooth(
      sampled((nm) => (nm === 510 ? 0.35 : 0), 500, 520),
      {
        windowPoints: 5,
        polynomial: 2,
      },
    );
    // 0.35 × (17/35 - 1)
    expect(outcome.found?.[0]?.value).toBeCloseTo(-0.18, 12);
    expect(outcome.did).toContain('at 510 nm');
  });

  test('refuses uneven wavelengths, filters that do not fit, and a spectrum too short', () => {
    const uneven: Points = { wavelengthNm: [500, 501, 503, 504, 505], absorbance: [1, 1, 1, 1, 1] };
    expect(() => smooth(uneven, { windowPoints: 5, polynomial: 2 })).toThrow(/1 to 2 nm apart/);
    const points = sampled(() => 1, 500, 503);
    expect(() => smooth(points, { windowPoints: 5, polynomial: 2 })).toThrow(/as long as the window/);
    expect(() => smooth(points, { windowPoints: 6, polynomial: 2 })).toThrow(/odd window/);
    expect(() => smooth(points, { windowPoints: 5, polynomial: 5 })).toThrow(/got window 5, degree 5/);
    expect(() => derivative(points, { windowPoints: 7, polynomial: 2 }, 3)).toThrow(/derivative 3/);
  });
});
