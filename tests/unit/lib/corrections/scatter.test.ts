import { describe, expect, test } from 'vitest';
import { scatterCorrection } from '@/lib/corrections/scatter';
import { at, gaussian, sampled, withGap } from '../../../support/bands';

const scatter = (n: number) => (nm: number) => 0.1 * (nm / 500) ** -n;
const band = gaussian(400, 15, 0.8);
const codes = ({ warnings }: { warnings: readonly { code: string }[] }) => warnings.map(({ code }) => code);

describe('scatter by log-log extrapolation', () => {
  test.each([0, 1, 2.7, 4])('λ^-%d comes off exactly, and the exponent is found', (n) => {
    const outcome = scatterCorrection(
      sampled((nm) => band(nm) + scatter(n)(nm)),
      550,
      700,
    );
    expect(outcome.found?.[0]?.value).toBeCloseTo(n, 8);
    expect(outcome.found?.[0]?.u).toBeLessThan(1e-8);
    expect(at(outcome.points, 400)).toBeCloseTo(0.8, 8);
    expect(outcome.warnings).toEqual([]);
  });

  test('uncertainty of the exponent and of the extrapolation: the formulas of a line, by themselves', () => {
    const errors = (nm: number) => 1 + 0.01 * (Math.round(nm) % 2 === 0 ? 1 : -1);
    const points = sampled((nm) => scatter(3)(nm) * errors(nm));
    const outcome = scatterCorrection(points, 600, 700);
    const x = points.wavelengthNm.filter((nm) => nm >= 600).map(Math.log);
    const y = x.map((l) => Math.log(scatter(3)(Math.exp(l)) * errors(Math.exp(l))));
    const n = x.length;
    const mean = (list: number[]) => list.reduce((sum, v) => sum + v, 0) / n;
    const [mx, my] = [mean(x), mean(y)];
    const sxx = x.reduce((sum, v) => sum + (v - mx) ** 2, 0);
    const slope = x.reduce((sum, v, i) => sum + (v - mx) * ((y[i] as number) - my), 0) / sxx;
    const squares = x.reduce((sum, v, i) => sum + ((y[i] as number) - my - slope * (v - mx)) ** 2, 0);
    const s = Math.sqrt(squares / (n - 2));
    expect(outcome.found?.[0]?.value).toBeCloseTo(-slope, 9);
    expect(outcome.found?.[0]?.u).toBeCloseTo(s / Math.sqrt(sxx), 9);
    const fitted = Math.exp(my + slope * (Math.log(400) - mx));
    const u = fitted * s * Math.sqrt(1 / n + (Math.log(400) - mx) ** 2 / sxx);
    expect(outcome.points.u?.[100]).toBeCloseTo(u, 9);
  });

  test('warns of an exponent that no scatter has', () => {
    expect(codes(scatterCorrection(sampled(scatter(5)), 600, 700))).toEqual(['SCATTER_EXPONENT']);
    expect(codes(scatterCorrection(sampled(scatter(-1)), 600, 700))).toEqual(['SCATTER_EXPONENT']);
  });

  test('warns of a bent line, of a poor one, and of one that runs to the red', () => {
    const withTail = sampled((nm) => gaussian(540, 25, 0.8)(nm) + scatter(2)(nm));
    expect(codes(scatterCorrection(withTail, 580, 700))).toEqual(
      expect.arrayContaining(['SCATTER_BENT', 'SCATTER_FIT_POOR']),
    );
    expect(codes(scatterCorrection(sampled(scatter(2)), 300, 400))).toEqual(['SCATTER_EXTRAPOLATED_RED']);
  });

  test('refuses what has no logarithm, too few points, and a window that is none', () => {
    expect(() =>
      scatterCorrection(
        sampled(() => -0.01),
        600,
        700,
      ),
    ).toThrow(/101 points of 101/);
    expect(() => scatterCorrection(withGap(sampled(scatter(2)), 602), 600, 604)).toThrow(/4 points/);
    expect(() => scatterCorrection(sampled(scatter(2)), 700, 600)).toThrow(/before it begins/);
  });
});
