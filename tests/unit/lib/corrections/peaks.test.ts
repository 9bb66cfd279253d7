import { describe, expect, test } from 'vitest';
import { compareShape } from '@/lib/corrections/peaks/compare-shape';
import { findPeaks } from '@/lib/corrections/peaks/find-peaks';
import { isosbesticPoints } from '@/lib/corrections/peaks/isosbestic';
import { noiseOf } from '@/lib/corrections/peaks/noise';
import { shiftFrom } from '@/lib/corrections/peaks/shift';
import { findShoulders } from '@/lib/corrections/peaks/shoulders';
import { findSpikes } from '@/lib/corrections/peaks/spikes';
import { area, peakHeight } from '@/lib/corrections/readings/over-baseline';
import { ratio } from '@/lib/corrections/readings/ratio';
import { FWHM, gaussian, sampled, withGap } from '../../../support/bands';

// Analytic throughout: a Gaussian band's top, width 2 √(2 ln 2) σ and area σ h √(2π) are known exactly.
const band = gaussian(510.3, 30, 0.8);

describe('peaks of an analytic band', () => {
  test('stand where the band has its top, with its height and half-width', () => {
    const [peak, ...others] = findPeaks(sampled(band));
    expect(others).toEqual([]);
    expect(peak?.positionNm).toBeCloseTo(510.3, 3);
    expect(peak?.height).toBeCloseTo(0.8, 6);
    expect(peak?.halfWidthNm).toBeCloseTo(FWHM * 30, 1);
  });

  test('two bands give two peaks, the higher first; the method is told how far the nearest is off', () => {
    const weak = gaussian(360, 15, 0.3);
    const peaks = findPeaks(sampled((nm) => band(nm) + weak(nm)));
    expect(peaks.map(({ positionNm }) => Math.round(positionNm))).toEqual([510, 360]);
    const shift = shiftFrom(peaks, 365);
    expect(Math.round(shift?.peak.positionNm ?? 0)).toBe(360);
    expect(shift?.warnings[0]?.code).toBe('PEAK_SHIFTED');
    expect(shiftFrom(peaks, 510)?.warnings).toEqual([]);
    expect(shiftFrom([], 510)).toBeNull();
  });

  test('a weak band on the flank of a strong one is a shoulder, not a peak', () => {
    const shape = sampled((nm) => gaussian(500, 20, 1)(nm) + gaussian(545, 15, 0.25)(nm));
    expect(findPeaks(shape)).toHaveLength(1);
    const shoulders = findShoulders(shape);
    expect(shoulders).toHaveLength(1);
    expect(Math.abs((shoulders[0]?.positionNm ?? 0) - 545)).toBeLessThan(4);
  });
});

describe('isosbestic points', () => {
  // Two species ε1, ε2 at constant total: every mixture crosses where the two bands are equal, at the middle.
  const mixture = (share: number) =>
    sampled((nm) => share * gaussian(450, 30, 1)(nm) + (1 - share) * gaussian(550, 30, 1)(nm));

  test('of two species lie where both absorb alike', () => {
    const points = isosbesticPoints([0, 0.3, 0.6, 1].map(mixture));
    expect(points).toHaveLength(1);
    expect(points[0]?.positionNm).toBeCloseTo(500, 2);
    expect(points[0]?.absorbance).toBeCloseTo(gaussian(450, 30, 1)(500), 3);
  });

  test('there is none when a third species comes in', () => {
    const third = sampled((nm) => gaussian(450, 30, 0.5)(nm) + gaussian(520, 10, 0.6)(nm));
    expect(isosbesticPoints([mixture(0), mixture(1), third])).toEqual([]);
    expect(() => isosbesticPoints([mixture(1)])).toThrow(/two spectra/);
  });
});

describe('shape against a standard', () => {
  const standard = sampled(gaussian(510, 30, 1));

  test('the same shape gives its scale and nothing left over', () => {
    const same = compareShape(sampled(gaussian(510, 30, 0.37)), standard, { fromNm: 450, toNm: 570 });
    expect(same.scale).toBeCloseTo(0.37, 12);
    expect(same.relativeResidualSd).toBeLessThan(1e-12);
    expect(same.warnings).toEqual([]);
  });

  test('a foreign band is flagged where it is worst', () => {
    const foreign = sampled((nm) => gaussian(510, 30, 0.5)(nm) + gaussian(470, 8, 0.2)(nm));
    const found = compareShape(foreign, standard, { fromNm: 450, toNm: 570 });
    expect(Math.abs(found.worstNm - 470)).toBeLessThan(3);
    expect(found.warnings.length).toBeGreaterThan(0);
    expect(found.relativeResidualSd).toBeGreaterThan(0.05);
  });
});

describe('noise and spikes', () => {
  // +a, -a by turns: second differences are 4a, so that √(16a²/6) = 1.633a is reported; a straight line gives none.
  test('noise is that of the second differences, and a straight line has none', () => {
    const zigzag = sampled((nm) => 0.3 + 0.001 * (nm % 2 === 0 ? 1 : -1));
    expect(noiseOf(zigzag).sd).toBeCloseTo((4 * 0.001) / Math.sqrt(6), 10);
    expect(noiseOf(sampled((nm) => 0.001 * nm)).sd).toBeLessThan(1e-12);
    expect(noiseOf({ wavelengthNm: [500, 501], absorbance: [0.1, 0.2] }).sd).toBeNull();
  });

  test('one point thrown off a smooth band is a spike; the band itself is none', () => {
    const smooth = sampled((nm) => band(nm) + 1e-4 * Math.sin(nm * 12.9898));
    expect(findSpikes(smooth)).toEqual([]);
    const thrown = smooth.absorbance.map((a, i) => (smooth.wavelengthNm[i] === 480 ? (a ?? 0) + 0.05 : a));
    expect(findSpikes({ ...smooth, absorbance: thrown }).map(({ atNm }) => atNm)).toEqual([480]);
  });
});

describe('readings over a baseline', () => {
  const tilted = sampled((nm) => band(nm) + 0.1 + 0.0005 * (nm - 300));

  test('height and area of a band on a slope are those of the band', () => {
    const height = peakHeight(
      tilted,
      { kind: 'interpolated', wavelengthNm: 510 },
      { lowNm: 310, highNm: 690 },
    );
    expect(height.value).toBeCloseTo(band(510), 5);
    const whole = area(tilted, 310, 690, { lowNm: 310, highNm: 690 });
    expect(whole.value).toBeCloseTo(30 * 0.8 * Math.sqrt(2 * Math.PI), 3);
    expect(whole.u).toBeNull();
  });

  test('a gap inside an area, a range upside down and a wavelength outside are refused', () => {
    expect(() => area(withGap(tilted, 500), 400, 600)).toThrow(/no number at 500/);
    expect(() => area(tilted, 600, 400)).toThrow(/upwards/);
    expect(() => area(tilted, 200, 400)).toThrow(/outside/);
  });

  test('a ratio carries the uncertainty of both and warns of weak readings', () => {
    const good = ratio({ value: 0.9, u: 0.003 }, { value: 0.5, u: 0.002 });
    expect(good.value).toBeCloseTo(1.8, 12);
    // u² = (u_a² + r² u_b²)/b² by hand: √(9e-6 + 3.24 · 4e-6)/0.5
    expect(good.u).toBeCloseTo(Math.sqrt(9e-6 + 12.96e-6) / 0.5, 12);
    expect(good.warnings).toEqual([]);
    expect(ratio({ value: 0.9, u: null }, { value: 0.05, u: null }).warnings[0]?.code).toBe(
      'RATIO_WEAK_READING',
    );
    expect(ratio({ value: 0.9, u: null }, { value: 0, u: null }).value).toBeNull();
  });
});
