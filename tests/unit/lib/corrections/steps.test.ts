import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { averageSpectra } from '@/lib/corrections/average';
import { straightBaseline, threePointBaseline } from '@/lib/corrections/baselines';
import { interpolate, ontoGrid } from '@/lib/corrections/interpolate';
import { offsetAt, offsetByWindow } from '@/lib/corrections/offset';
import { normalisePath } from '@/lib/corrections/path-normalise';
import { subtractSampleBlank } from '@/lib/corrections/sample-blank';
import { subtractSpectrum } from '@/lib/corrections/subtract-spectrum';
import type { Points } from '@/lib/corrections/types';
import { at, gaussian, sampled, withGap } from '../../../support/bands';

const band = gaussian(500, 20, 0.8);
const codes = ({ warnings }: { warnings: readonly { code: string }[] }) => warnings.map(({ code }) => code);
const threeNumbers = fc.tuple(
  ...[0, 0, 0].map(() => fc.double({ min: -2, max: 2, noNaN: true, noDefaultInfinity: true })),
);
const curve = fc.array(fc.double({ min: -1, max: 3, noNaN: true }), { minLength: 21, maxLength: 21 });
const spectrumOf = (absorbance: readonly number[]): Points => ({
  wavelengthNm: absorbance.map((_, i) => 400 + 5 * i),
  absorbance,
});
const close = (a: Points, b: Points) =>
  a.absorbance.forEach((y, i) => expect(y).toBeCloseTo(b.absorbance[i] as number, 9));

describe('a spectrum taken off another', () => {
  test('a straight blank on a coarse grid comes off exactly', () => {
    const blank = sampled((nm) => 0.1 + 0.0002 * nm, 300, 700, 10);
    const { points } = subtractSpectrum(
      sampled((nm) => band(nm) + 0.1 + 0.0002 * nm),
      {
        name: 'b',
        points: blank,
      },
    );
    close(points, sampled(band));
  });

  test('gaps of either stay gaps, and the part outside is told', () => {
    const blank = withGap(
      sampled(() => 0.1, 400, 700, 1),
      450,
    );
    const outcome = subtractSpectrum(withGap(sampled(band), 460), { name: 'Water', points: blank });
    expect([at(outcome.points, 450), at(outcome.points, 460), at(outcome.points, 399)]).toEqual([
      null,
      null,
      null,
    ]);
    expect(outcome.warnings).toEqual([expect.objectContaining({ code: 'BLANK_GRID' })]);
    expect(outcome.warnings[0]?.text).toContain('101 points of 401');
  });

  test('refuses ranges apart', () => {
    expect(() => subtractSpectrum(sampled(band), { name: 'Water', points: sampled(band, 800, 900) })).toThrow(
      /800 to 900 nm and the sample from 300 to 700 nm/,
    );
  });

  test('u adds in quadrature: 3 and 4 make 5', () => {
    const one = (a: number, u: number): Points => ({ wavelengthNm: [500], absorbance: [a], u: [u] });
    expect(subtractSpectrum(one(1, 0.003), { name: 'b', points: one(0.2, 0.004) }).points.u?.[0]).toBeCloseTo(
      0.005,
      12,
    );
  });

  test('a sample blank at half the sample’s concentration counts twice', () => {
    const outcome = subtractSampleBlank(
      sampled(() => 1),
      {
        name: 'b',
        points: sampled(() => 0.2),
        sampleDilution: 5,
        blankDilution: 10,
        ratioRelativeU: 0.01,
      },
    );
    expect(at(outcome.points, 500)).toBeCloseTo(0.6, 12);
    // by hand: 0.2 × 2 × 0.01
    expect(outcome.points.u?.[0]).toBeCloseTo(0.004, 12);
    expect(outcome.did).toContain('times 2');
    expect(() =>
      subtractSampleBlank(sampled(band), {
        name: 'b',
        points: sampled(band),
        sampleDilution: 0,
        blankDilution: 1,
      }),
    ).toThrow(/above zero/);
  });
});

describe('offsets', () => {
  test('at a wavelength, between points too', () => {
    const { points, found } = offsetAt(
      sampled((nm) => band(nm) + 0.05),
      699.5,
    );
    close(points, sampled(band));
    expect(found?.[0]?.value).toBeCloseTo(0.05, 12);
  });

  test('by a window, with the standard uncertainty of its mean', () => {
    const points: Points = { wavelengthNm: [600, 601, 602, 603], absorbance: [0.01, 0.03, 0.03, 0.01] };
    const outcome = offsetByWindow(points, 600, 603);
    // by hand: mean 0.02, s² = 4 × 1e-4 / 3, u = s/2
    expect(outcome.found?.[0]?.value).toBeCloseTo(0.02, 12);
    expect(outcome.found?.[0]?.u).toBeCloseTo(Math.sqrt(4e-4 / 3) / 2, 12);
    expect(outcome.warnings).toEqual([]);
  });

  test('a window that slopes is warned of, a gap in it refused', () => {
    expect(
      codes(
        offsetByWindow(
          sampled((nm) => 0.001 * nm),
          600,
          620,
        ),
      ),
    ).toEqual(['OFFSET_SLOPES']);
    expect(() => offsetByWindow(withGap(sampled(band), 610), 600, 620)).toThrow(/no number at 610 nm/);
  });
});

describe('baselines', () => {
  test('any straight background comes off, whatever its line', () => {
    fc.assert(
      fc.property(threeNumbers, ([a = 0, b = 0]) => {
        const line = (nm: number) => a + (b * (nm - 500)) / 100;
        const clean = (nm: number) => (nm > 420 && nm < 580 ? band(nm) : 0);
        close(
          straightBaseline(
            sampled((nm) => clean(nm) + line(nm)),
            400,
            600,
          ).points,
          sampled(clean),
        );
      }),
      { numRuns: 30 },
    );
  });

  test('is linear: the baseline of p X + q Y is p and q times theirs', () => {
    const take = (points: Points) => straightBaseline(points, 410, 487).points.absorbance as number[];
    fc.assert(
      fc.property(curve, curve, threeNumbers, (x, y, [p = 0, q = 0]) => {
        const mixed = take(spectrumOf(x.map((v, i) => p * v + q * (y[i] as number))));
        const [tx, ty] = [take(spectrumOf(x)), take(spectrumOf(y))];
        mixed.forEach((v, i) => expect(v).toBeCloseTo(p * (tx[i] as number) + q * (ty[i] as number), 9));
      }),
      { numRuns: 50 },
    );
  });

  test('three points: the formula of Morton and Stubbs, by hand', () => {
    const points: Points = {
      wavelengthNm: [310, 325, 334],
      absorbance: [0.5, 0.6, 0.4],
      u: [0.001, 0.001, 0.001],
    };
    const outcome = threePointBaseline(points, 310, 325, 334);
    // 0.6 - (0.5 × 9 + 0.4 × 15)/24; u: 0.001 √(1 + (9/24)² + (15/24)²)
    expect(outcome.found?.[0]?.value).toBeCloseTo(0.1625, 12);
    expect(outcome.found?.[0]?.u).toBeCloseTo(0.001 * Math.sqrt(1 + (9 / 24) ** 2 + (15 / 24) ** 2), 12);
    expect(outcome.points.absorbance[1]).toBeCloseTo(0.1625, 12);
    expect(outcome.warnings).toEqual([]);
  });

  test('says how much is extrapolated; refuses an order that is none and a place outside', () => {
    expect(straightBaseline(sampled(band), 400, 600).warnings[0]?.text).toContain('200 points of 401');
    expect(() => straightBaseline(sampled(band), 600, 400)).toThrow(/ascending/);
    expect(() => threePointBaseline(sampled(band), 400, 300, 600)).toThrow(/three ascending/);
    expect(() => straightBaseline(sampled(band), 200, 400)).toThrow(/outside this spectrum/);
  });
});

describe('averages', () => {
  test('the order of the replicates changes nothing', () => {
    const set = fc.array(curve, { minLength: 3, maxLength: 3 });
    fc.assert(
      fc.property(set, (curves) => {
        const [a, b, c] = curves.map(spectrumOf) as [Points, Points, Points];
        expect(averageSpectra([c, a, b]).points).toEqual(averageSpectra([a, b, c]).points);
      }),
      { numRuns: 50 },
    );
  });

  test('mean and standard uncertainty by hand; common range; gaps', () => {
    const wide = withGap(
      sampled(() => 0.3, 400, 600, 1),
      500,
    );
    const outcome = averageSpectra([sampled(() => 0.1, 450, 700, 2), wide, sampled(() => 0.2, 300, 560, 1)]);
    expect(outcome.points.wavelengthNm[0]).toBe(450);
    expect(outcome.points.wavelengthNm.at(-1)).toBe(560);
    expect(outcome.points.wavelengthNm[1]).toBe(452);
    expect(outcome.points.absorbance[0]).toBeCloseTo(0.2, 12);
    // s = 0.1 for 0.1, 0.2, 0.3
    expect(outcome.points.u?.[0]).toBeCloseTo(0.1 / Math.sqrt(3), 12);
    expect(at(outcome.points, 500)).toBeNull();
    expect(codes(outcome)).toEqual(['AVERAGE_GAPS']);
  });

  test('refuses one, and ranges apart', () => {
    expect(() => averageSpectra([sampled(band)])).toThrow(/two spectra/);
    expect(() => averageSpectra([sampled(band, 300, 400), sampled(band, 500, 600)])).toThrow(/in common/);
  });
});

describe('grids and paths', () => {
  test('interpolates straight pieces exactly, beside a gap not at all', () => {
    const outcome = interpolate(
      withGap(
        sampled((nm) => 2 * nm),
        310,
      ),
      299,
      320,
      0.5,
    );
    expect(at(outcome.points, 300.5)).toBeCloseTo(601, 9);
    expect([309.5, 310, 310.5].map((nm) => at(outcome.points, nm))).toEqual([null, null, null]);
    expect(at(outcome.points, 311)).toBe(622);
    expect(codes(outcome)).toEqual(['GRID_OUTSIDE']);
    expect(() => interpolate(sampled(band), 800, 900, 1)).toThrow(/no point/);
    expect(() => interpolate(sampled(band), 300, 400, 0)).toThrow(/steps of 0 nm/);
  });

  test('its own grid gives a spectrum back', () => {
    const points = sampled(band);
    expect(ontoGrid(points, points.wavelengthNm)).toEqual(points);
  });

  test('5 mm to 10 mm doubles, with the uncertainty of the path', () => {
    const { points } = normalisePath({ wavelengthNm: [500], absorbance: [0.4], u: [0.003] }, 5, 0.05);
    expect(points.absorbance[0]).toBeCloseTo(0.8, 12);
    // 0.8 × 1 % and 2 × 0.003
    expect(points.u?.[0]).toBeCloseTo(0.01, 12);
    expect(() => normalisePath(points, 0)).toThrow(/above zero/);
  });
});
