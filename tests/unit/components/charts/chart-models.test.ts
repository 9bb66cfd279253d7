import { describe, expect, test } from 'vitest';

import { curveModel, type CurveModelInput } from '@/components/charts/curve-model';
import { residualModel } from '@/components/charts/residual-model';
import { nearest } from '@/components/charts/spectra-chart';
import { spectraModel, type PlottedSpectrum } from '@/components/charts/spectra-model';
import { spectrumLooks } from '@/components/charts/spectrum-look';

const spectrum = (id: string, peak: number, more: Partial<PlottedSpectrum> = {}): PlottedSpectrum => ({
  id,
  name: id,
  role: 'standard',
  concentration: peak,
  wavelengthNm: [480, 500, 520],
  absorbance: [0, peak, null],
  ...more,
});

describe('spectrumLooks', () => {
  test('runs standards from light to dark by concentration, whatever their order', () => {
    const looks = spectrumLooks([
      { id: 'c', role: 'standard', concentration: 4 },
      { id: 'a', role: 'standard', concentration: 1 },
      { id: 'b', role: 'standard', concentration: 2 },
    ]);
    expect(['a', 'b', 'c'].map((id) => looks.get(id)?.colour)).toEqual([
      { standard: 0 },
      { standard: 0.5 },
      { standard: 1 },
    ]);
  });
  test('dashes samples, tells six of them apart, dots a blank', () => {
    const samples = Array.from({ length: 6 }, (_, i) => ({ id: `u${i}`, role: 'sample' as const }));
    const looks = [...spectrumLooks([...samples, { id: 'b', role: 'blank' }]).values()];
    expect(new Set(looks.map((look) => `${look.dash} ${JSON.stringify(look.colour)}`)).size).toBe(7);
    expect(looks.slice(0, 6).some((look) => look.dash === 'solid')).toBe(false);
    expect(looks[6]?.dash).toBe('dotted');
  });
});

describe('spectraModel', () => {
  const build = (peak: number) =>
    spectraModel({ spectra: [spectrum('S1', peak)], absorbanceLimit: 2, height: 400 });

  test('shades what lies above the absorbance limit, and says why, only when something does', () => {
    expect(build(2.4).regions).toMatchObject([{ axis: 'y', from: 2, to: null, tone: 'stop' }]);
    expect(build(2.4).regions[0]?.sentence).toBe('above 2: under 1 % of light gets through');
    expect(build(1.5).regions).toEqual([]);
  });
  test('keeps a gap a gap, and gives each point its share of light', () => {
    const [line] = build(1).lines;
    expect(line?.y).toEqual([0, 1, null]);
    expect(line?.hover?.extra).toEqual([100, 10, null]);
  });
  test('says in words where each spectrum is highest', () => {
    expect(build(2.4).summary).toContain('highest absorbance 2.400 at 500 nm, above the limit of 2');
  });
  test('marks the chosen band', () => {
    const model = spectraModel({
      spectra: [spectrum('S1', 1)],
      absorbanceLimit: 2,
      chosen: { atNm: 510, halfWidthNm: 1 },
      height: 400,
    });
    expect(model.markers).toEqual([{ x: 510, halfWidth: 1, label: '510 ± 1 nm' }]);
  });
  test('names a peak on the side where there is room for its name, on a telephone too', () => {
    const rangeNm = { from: 490, to: 520 };
    const sides = ['S1', 'A long sample name'].map((name) => {
      const spectra = [spectrum('a', 1, { name })];
      return spectraModel({ spectra, absorbanceLimit: 2, rangeNm, height: 400 }).labels[0]?.side;
    });
    expect(sides).toEqual(['left', 'above-right']);
  });
  test('draws an empty visible range when there is no spectrum', () => {
    expect(spectraModel({ spectra: [], absorbanceLimit: 2, height: 400 }).x).toMatchObject({
      min: 380,
      max: 750,
    });
  });
});

test('nearest takes the member of the grid, not the place of the pointer', () => {
  expect(nearest([400, 402, 404], 402.9)).toBe(402);
  expect(nearest([400, 402, 404], 403.1)).toBe(404);
  expect(nearest([400, 402, 404], 9999)).toBe(404);
});

describe('curveModel', () => {
  const input: CurveModelInput = {
    points: [
      { id: 'p0', name: 'S1', concentration: 1, absorbance: 0.2 },
      { id: 'p1', name: 'S2', concentration: 4, absorbance: 0.8, excluded: true, note: 'bubble in the cell' },
    ],
    line: { concentration: [0, 4], fitted: [0, 0.8], confidence: { low: [-0.01, 0.79], high: [0.01, 0.81] } },
    range: { min: 1, max: 4 },
    unit: 'mg/L',
    yLabel: 'A per 10 mm',
    unknowns: [{ id: 'u', name: 'Weir 3', concentration: 5, absorbance: 1, label: 'Weir 3', tone: 'stop' }],
    height: 340,
  };

  test('shades both sides of the standards', () => {
    expect(curveModel(input).regions).toMatchObject([
      { from: null, to: 1, tone: 'decide' },
      { from: 4, to: null, tone: 'stop' },
    ]);
    expect(curveModel({ ...input, range: undefined }).regions).toEqual([]);
  });
  test('keeps a point that was left out visible, hollow, with its reason', () => {
    const point = curveModel(input).points.find((each) => each.id === 'p1');
    expect(point).toMatchObject({ hollow: true });
    expect(point?.hover).toContain('left out of the fit');
    expect(point?.hover).toContain('bubble in the cell');
  });
  test('gives an unknown its own shape, guides, and room on both axes', () => {
    const model = curveModel(input);
    expect(model.points.find((each) => each.id === 'u')).toMatchObject({ shape: 'triangle', large: true });
    expect(model.guides).toMatchObject([{ x: 5, y: 1 }]);
    expect(model.x.max).toBeGreaterThan(5);
    expect(model.y.max).toBeGreaterThan(1);
  });
  test('is drawn before there is a line', () => {
    const model = curveModel({ ...input, line: null });
    expect(model.lines).toEqual([]);
    expect(model.bands).toEqual([]);
  });
  test('counts in words what is in the fit and what is not', () => {
    expect(curveModel(input).summary).toContain('1 readings in the fit, 1 left out');
  });
});

test('residuals stand on an axis that is even around zero, and the largest in the fit is named', () => {
  const model = residualModel({
    points: [
      { id: 'a', name: 'S1', concentration: 1, residual: -0.002 },
      { id: 'b', name: 'S2', concentration: 2, residual: 0.009, excluded: true },
    ],
    unit: 'mg/L',
    residualSd: 0.003,
    height: 240,
  });
  expect(model.y.min).toBe(-model.y.max);
  expect(model.y.max).toBeGreaterThan(0.009);
  expect(model.summary).toContain('S1 at 1 mg/L');
});
